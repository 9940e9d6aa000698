export const msPerDay = 86_400_000;

const monthLengths = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31] as const;

function isLeap(year: number): boolean {
	return (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
}

function daysInMonth(year: number, month: number): number {
	return month === 2 && isLeap(year) ? 29 : (monthLengths[month - 1] ?? 0);
}

/**
 * Days since 1970-01-01 of a calendar day, or NaN where there is no such day.
 * Source: Gregorian calendar; era arithmetic after Howard Hinnant, "chrono-compatible low-level date algorithms".
 */
export function dayNumber(year: number, month: number, day: number): number {
	if (month < 1 || month > 12 || day < 1 || day > daysInMonth(year, month)) return NaN;
	const y = month <= 2 ? year - 1 : year;
	const era = Math.floor(y / 400);
	const yearOfEra = y - era * 400;
	const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + day - 1;
	const dayOfEra = yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
	return era * 146_097 + dayOfEra - 719_468;
}

/** Two-digit years are of this century up to 79: no logger is older than 1980, none will be read after 2079. */
export function fullYear(year: number, digits: number): number {
	if (digits > 2) return year;
	return year < 80 ? 2000 + year : 1900 + year;
}
