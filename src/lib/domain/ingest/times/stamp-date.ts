import { dayNumber, fullYear } from './calendar';
import { digitsOf, noTime, tokens, value, type Stamp } from './stamp-parts';

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

/** Reads the numbers that are left as a date; `month` is 1–12 where a word named it, else 0. */
export function readDate(into: Stamp, month: number): boolean {
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
	if (count === 2) {
		if (digitsOf(p) === 4 && digitsOf(q) === 3) return readOrdinalDay(into, value(p), value(q));
		return digitsOf(p) === 8 && readCompactPair(into, p, q);
	}
	if (digitsOf(q) > 2 || digitsOf(p) === 3 || digitsOf(r) === 3 || digitsOf(r) > 4 || digitsOf(p) > 4)
		return false;
	into.a = value(p);
	into.b = value(q);
	into.c = value(r);
	if (digitsOf(p) === 4) {
		into.shape = 'year-first';
		return digitsOf(r) <= 2 && into.a >= 1899 && into.b >= 1 && into.b <= 12 && into.c >= 1 && into.c <= 31;
	}
	into.shape = 'open';
	return digitsOf(r) === 4
		? into.c >= 1900 && into.a >= 1 && into.b >= 1 && into.a <= 31 && into.b <= 31
		: true;
}

/** `2024-061` of ISO 8601: the year and the day in it. */
function readOrdinalDay(into: Stamp, year: number, dayOfYear: number): boolean {
	if (year < 1900 || year > 2200 || dayOfYear < 1) return false;
	const start = dayNumber(year, 1, 1) + dayOfYear - 1;
	into.shape = 'year-first';
	into.isOrdinal = true;
	into.a = year;
	for (let month = 12; month >= 1; month--) {
		const first = dayNumber(year, month, 1);
		if (start < first) continue;
		into.b = month;
		into.c = start - first + 1;
		return into.c <= 31;
	}
	return false;
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
	// A year of four digits is written out: 0026 is damage, not the year 26.
	if (digitsOf(yearAt) === 4 && value(yearAt) < 1900) return false;
	into.shape = 'named';
	into.a = fullYear(value(yearAt), digitsOf(yearAt));
	into.b = month;
	into.c = value(dayAt);
	return into.c >= 1 && into.c <= 31;
}
