import { fullYear } from './calendar';
import { isWeekday, monthOfName } from './month-names';
import { emptyTokens, tokenise, type StampTokens } from './stamp-tokens';

export const noTime = -1;
export const noOffset = -32_768;

/**
 * What a time text says, before anybody knows whether day or month stands first.
 * `shape`: `none` no date; `year-first` and `named` are settled as a year, b month, c day; `open` keeps the numbers in
 * the order of the file.
 */
export interface Stamp {
	shape: 'none' | 'year-first' | 'named' | 'open';
	a: number;
	b: number;
	c: number;
	/** Milliseconds since midnight, or {@link noTime}; 86 400 000 for 24:00. */
	msOfDay: number;
	/** Minutes east of UTC, or {@link noOffset}. */
	offsetMinutes: number;
	/** A zone named by letters that give no offset of their own (`CST`). */
	zoneWord: string | null;
}

export function emptyStamp(): Stamp {
	return { shape: 'none', a: 0, b: 0, c: 0, msOfDay: noTime, offsetMinutes: noOffset, zoneWord: null };
}

const tokens: StampTokens = emptyTokens();
const value = (i: number): number => tokens.value[i] ?? 0;
const digitsOf = (i: number): number => tokens.digits[i] ?? 0;
const before = (i: number): number => tokens.before[i] ?? 0;
const take = (i: number): void => {
	tokens.used[i] = 1;
};
const colon = 58;
const point = 46;
const comma = 44;

const fillers = new Set([
	't',
	'at',
	'on',
	'um',
	'uhr',
	'h',
	'hrs',
	'hr',
	'm',
	'min',
	's',
	'de',
	'del',
	'à',
	'a',
	'le',
	'den',
	'the',
	'of',
	'th',
	'st',
	'nd',
	'rd',
	'o',
	'r',
	'kl',
	'the'
]);
const morning = new Set(['am', 'a', 'vorm', '上午', '午前', '오전', 'öö', 'πμ']);
const evening = new Set(['pm', 'p', 'nachm', '下午', '午後', '오후', 'ös', 'μμ']);

/** Index of the number that is the hour: the one before the first `:`; or, without any, the one before an `h`. */
function hourIndex(): number {
	for (let i = 1; i < tokens.count; i++) if (before(i) === colon && before(i - 1) !== 43) return i - 1;
	const h = tokens.words.indexOf('h');
	if (h >= 0) {
		const at = (tokens.wordAt[h] ?? 0) - 1;
		if (at >= 0 && digitsOf(at) <= 2) return at;
	}
	// Six plain numbers, or five: the first three are the date.
	if (tokens.count >= 5 && tokens.count <= 7 && tokens.words.length === 0) return 3;
	return -1;
}

function readTime(into: Stamp): boolean {
	const at = hourIndex();
	if (at < 0) return true;
	let hours = value(at);
	const isColon = before(at + 1) === colon;
	const minutes = at + 1 < tokens.count ? value(at + 1) : 0;
	let next = at + 2;
	let ms = 0;
	take(at);
	if (at + 1 < tokens.count) take(at + 1);
	if (next < tokens.count && (before(next) === colon || (!isColon && before(next) === before(at + 1)))) {
		if (value(next) > 60 || digitsOf(next) > 2) return false;
		ms = value(next) * 1000;
		take(next++);
		if (next < tokens.count && (before(next) === point || before(next) === comma || before(next) === colon)) {
			ms += Math.floor((value(next) * 1000) / 10 ** digitsOf(next));
			take(next);
		}
	}
	for (const word of tokens.words) {
		if (evening.has(word) || morning.has(word)) {
			if (hours < 1 || hours > 12) return hours <= 24 && finishTime(into, hours, minutes, ms, at);
			hours = (hours % 12) + (evening.has(word) ? 12 : 0);
		}
	}
	return finishTime(into, hours, minutes, ms, at);
}

function finishTime(into: Stamp, hours: number, minutes: number, ms: number, at: number): boolean {
	if (digitsOf(at) > 2 || minutes > 59 || digitsOf(at + 1) > 2) return false;
	into.msOfDay = (hours * 60 + minutes) * 60_000 + ms;
	return into.msOfDay <= 86_400_000;
}

/** `+02:00`, `+0200`, `+2` after a time, or after `UTC`/`GMT`. */
function readOffset(into: Stamp): boolean {
	for (let i = 1; i < tokens.count; i++) {
		const sign = before(i);
		if (tokens.used[i] === 1 || (sign !== 43 && sign !== 45) || tokens.used[i - 1] !== 1) continue;
		if (sign === 45 && i + 2 < tokens.count + 0 && before(i + 1) === 45) continue;
		take(i);
		let minutes = value(i) * 60;
		if (digitsOf(i) === 4) minutes = Math.floor(value(i) / 100) * 60 + (value(i) % 100);
		else if (digitsOf(i) > 2) return false;
		else if (i + 1 < tokens.count && before(i + 1) === colon) {
			minutes += value(i + 1);
			take(i + 1);
		}
		if (minutes > 14 * 60) return false;
		into.offsetMinutes = sign === 43 ? minutes : -minutes;
		return true;
	}
	return true;
}

function readWords(into: Stamp): number {
	let month = 0;
	for (const word of tokens.words) {
		if (word === 'z' || word === 'utc' || word === 'gmt') {
			if (into.offsetMinutes === noOffset) into.offsetMinutes = 0;
		} else if (fillers.has(word) || morning.has(word) || evening.has(word)) continue;
		else if (month === 0 && monthOfName(word) > 0) month = monthOfName(word);
		else if (isWeekday(word)) continue;
		else if (monthOfName(word) > 0) month = monthOfName(word);
		else if (into.msOfDay !== noTime && into.zoneWord === null && /^[a-z]{2,5}$/.test(word))
			into.zoneWord = word;
		else return -1;
	}
	return month;
}

function readCompact(into: Stamp, i: number): boolean {
	const digits = digitsOf(i);
	if (digits !== 8 && digits !== 12 && digits !== 14) return false;
	let rest = value(i);
	if (digits > 8) {
		const seconds = digits === 14 ? rest % 100 : 0;
		if (digits === 14) rest = Math.floor(rest / 100);
		const clock = rest % 10_000;
		rest = Math.floor(rest / 10_000);
		if (clock >= 2400 || clock % 100 > 59 || seconds > 59) return false;
		into.msOfDay = (Math.floor(clock / 100) * 60 + (clock % 100)) * 60_000 + seconds * 1000;
	}
	into.shape = 'year-first';
	into.a = Math.floor(rest / 10_000);
	into.b = Math.floor(rest / 100) % 100;
	into.c = rest % 100;
	return into.a >= 1900 && into.a <= 2200 && into.b >= 1 && into.b <= 12 && into.c >= 1 && into.c <= 31;
}

const free = [0, 0, 0];

function readDate(into: Stamp, month: number): boolean {
	let count = 0;
	for (let i = 0; i < tokens.count; i++) {
		if (tokens.used[i] === 1) continue;
		if (count === 3) return false;
		free[count++] = i;
	}
	if (count === 0) return month === 0;
	const [p, q, r] = [free[0] ?? 0, free[1] ?? 0, free[2] ?? 0];
	if (month > 0) return count === 2 && readNamed(into, month, p, q);
	if (count === 1) return readCompact(into, p);
	if (count === 2) return digitsOf(p) === 8 && readCompactPair(into, p, q);
	if (digitsOf(q) > 2 || digitsOf(p) === 3 || digitsOf(r) === 3 || digitsOf(r) > 4 || digitsOf(p) > 4)
		return false;
	into.a = value(p);
	into.b = value(q);
	into.c = value(r);
	if (digitsOf(p) === 4) {
		into.shape = 'year-first';
		return digitsOf(r) <= 2 && into.a >= 1900 && into.b >= 1 && into.b <= 12 && into.c >= 1 && into.c <= 31;
	}
	into.shape = 'open';
	return digitsOf(r) === 4
		? into.c >= 1900 && into.a >= 1 && into.b >= 1 && into.a <= 31 && into.b <= 31
		: true;
}

/** `20240301 1030` and `20240301T103000`. */
function readCompactPair(into: Stamp, p: number, q: number): boolean {
	if (into.msOfDay !== noTime || !readCompact(into, p)) return false;
	const digits = digitsOf(q);
	if (digits !== 4 && digits !== 6) return false;
	const clock = digits === 6 ? Math.floor(value(q) / 100) : value(q);
	const seconds = digits === 6 ? value(q) % 100 : 0;
	if (clock > 2400 || clock % 100 > 59 || seconds > 59) return false;
	into.msOfDay = (Math.floor(clock / 100) * 60 + (clock % 100)) * 60_000 + seconds * 1000;
	return true;
}

function readNamed(into: Stamp, month: number, p: number, q: number): boolean {
	const isYearFirst = digitsOf(p) === 4;
	const [yearAt, dayAt] = isYearFirst ? [p, q] : [q, p];
	if (digitsOf(dayAt) > 2 || (digitsOf(yearAt) !== 2 && digitsOf(yearAt) !== 4)) return false;
	into.shape = 'named';
	into.a = fullYear(value(yearAt), digitsOf(yearAt));
	into.b = month;
	into.c = value(dayAt);
	return into.c >= 1 && into.c <= 31;
}

/** Reads one time text. False when it is none; the numbers of an open date are kept as they stood. */
export function scanStamp(text: string, into: Stamp): boolean {
	into.shape = 'none';
	into.msOfDay = noTime;
	into.offsetMinutes = noOffset;
	into.zoneWord = null;
	if (!tokenise(text, tokens)) return false;
	// One bare number is a count or a temperature unless it is a compact date.
	if (tokens.count === 1 && tokens.words.length === 0 && digitsOf(0) < 8) return false;
	if (!readTime(into) || !readOffset(into)) return false;
	const month = readWords(into);
	if (month < 0 || !readDate(into, month)) return false;
	return into.shape !== 'none' || into.msOfDay !== noTime;
}
