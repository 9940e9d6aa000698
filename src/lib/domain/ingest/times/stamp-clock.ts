import { dayHalfOf, type DayHalf } from './day-halves';
import { monthOfName } from './month-names';
import { fillers } from './stamp-fillers';
import { before, colon, comma, digitsOf, point, take, tokens, value, type Stamp } from './stamp-parts';

/** Index of the number that is the hour: the one before the first `:`; or, without any, the one before an `h`. */
function hourIndex(): number {
	// 2026:04:14 11:00 and 14:04:2026 11:00 write the date with colons too.
	const isColonDate = before(1) === colon && before(2) === colon && (digitsOf(0) === 4 || digitsOf(2) === 4);
	if (isColonDate && tokens.count >= 5) return 3;
	for (let i = 1; i < tokens.count; i++)
		if (before(i) === colon && before(i - 1) !== 43 && digitsOf(i - 1) <= 2) return i - 1;
	const h = tokens.words.indexOf('h');
	if (h >= 0) {
		const at = (tokens.wordAt[h] ?? 0) - 1;
		if (at >= 0 && digitsOf(at) <= 2) return at;
	}
	// Points or spaces all through: the first three numbers are the date, or two beside a month's name.
	const hasMonth = tokens.words.some((word) => !fillers.has(word) && monthOfName(word) > 0);
	const dateNumbers = hasMonth ? 2 : 3;
	const left = tokens.count - dateNumbers;
	return left >= 2 && left <= 4 && digitsOf(dateNumbers) <= 2 ? dateNumbers : -1;
}

/** Reads the clock of a text, with seconds and the half of the day; false where it cannot be one. */
export function readTime(into: Stamp): boolean {
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
			take(next++);
		}
	}
	const half = halfOfClock(at, next);
	// 13:05 PM and 00:30 AM are said twice; 0:30 PM is half past noon, as Japanese clocks show it.
	if (half === 'evening' && hours < 12) hours += 12;
	if (half === 'morning' && hours === 12) hours = 0;
	return finishTime(into, hours, minutes, ms, at);
}

/** The half of the day named anywhere, or by a word of several meanings right beside the clock. */
function halfOfClock(hourAt: number, end: number): DayHalf | null {
	for (let w = 0; w < tokens.words.length; w++) {
		const at = tokens.wordAt[w] ?? -1;
		const half = dayHalfOf(tokens.words[w] ?? '', at === hourAt ? -1 : at === end ? 1 : 0);
		if (half === null) continue;
		tokens.halfWord = w;
		return half;
	}
	return null;
}

function finishTime(into: Stamp, hours: number, minutes: number, ms: number, at: number): boolean {
	if (digitsOf(at) > 2 || minutes > 59 || digitsOf(at + 1) > 2) return false;
	into.msOfDay = (hours * 60 + minutes) * 60_000 + ms;
	return into.msOfDay <= 86_400_000;
}

/** `+02:00`, `+0200`, `+2` after a time, or after `UTC`/`GMT`. */
export function readOffset(into: Stamp): boolean {
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
