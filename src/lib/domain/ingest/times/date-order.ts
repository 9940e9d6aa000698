import { dayNumber, fullYear } from './calendar';

export type DateOrder = 'dmy' | 'mdy' | 'ymd';
export const dateOrders: readonly DateOrder[] = ['dmy', 'mdy', 'ymd'];

/** Day number of three numbers as they stand in the file, read in `order`; NaN where there is no such day. */
export function dayInOrder(a: number, b: number, c: number, order: DateOrder): number {
	const digits = (n: number): number => (n > 99 ? 4 : 2);
	if (order === 'dmy') return dayNumber(fullYear(c, digits(c)), b, a);
	if (order === 'mdy') return dayNumber(fullYear(c, digits(c)), a, b);
	return c > 31 ? NaN : dayNumber(fullYear(a, digits(a)), b, c);
}

/** One run of rows that carry the same date, in file order. */
export interface OpenDay {
	readonly a: number;
	readonly b: number;
	readonly c: number;
	readonly rows: number;
}

export interface OrderEvidence {
	/** Orders under which the file still makes sense; never empty. */
	readonly possible: readonly DateOrder[];
	readonly by: 'day-over-12' | 'continuity' | null;
}

function rowsWithoutDay(days: readonly OpenDay[], order: DateOrder): number {
	let bad = 0;
	for (const { a, b, c, rows } of days) if (Number.isNaN(dayInOrder(a, b, c, order))) bad += rows;
	return bad;
}

/** The largest jump between neighbouring dates, in days. */
function largestJump(days: readonly OpenDay[], order: DateOrder): number {
	let last = NaN;
	let jump = 0;
	for (const { a, b, c } of days) {
		const day = dayInOrder(a, b, c, order);
		if (!Number.isNaN(day) && !Number.isNaN(last)) jump = Math.max(jump, Math.abs(day - last));
		if (!Number.isNaN(day)) last = day;
	}
	return jump;
}

/** How many times more the wrong order must jump than the right one. A month against a few days passes easily. */
const jumpRatio = 5;

/** What the dates of the whole file say: a day over 12 first, then which order lets time run on without leaps. */
export function orderFromDays(days: readonly OpenDay[]): OrderEvidence {
	const bad = dateOrders.map((order) => rowsWithoutDay(days, order));
	const least = Math.min(...bad);
	const possible = dateOrders.filter((_, i) => bad[i] === least);
	// 05/05/2024 is the same day in both: nothing is open then.
	const distinct = possible.filter(
		(order, i) =>
			!possible
				.slice(0, i)
				.some((other) =>
					days.every((d) => dayInOrder(d.a, d.b, d.c, order) === dayInOrder(d.a, d.b, d.c, other))
				)
	);
	if (distinct.length === 1) return { possible: distinct, by: 'day-over-12' };
	const jumps = distinct.map((order) => largestJump(days, order));
	const smallest = Math.min(...jumps);
	const smooth = distinct.filter((_, i) => (jumps[i] ?? 0) <= Math.max(smallest * jumpRatio, smallest + 2));
	return { possible: smooth, by: smooth.length === 1 ? 'continuity' : null };
}

const formats: readonly [RegExp, DateOrder][] = [
	[/\b(d{1,2}|j{2}|t{2}|g{2})\s*[-/. ]\s*m{1,3}\s*[-/. ]\s*[yajr]{2,4}\b/i, 'dmy'],
	[/\bm{1,3}\s*[-/. ]\s*d{1,2}\s*[-/. ]\s*y{2,4}\b/i, 'mdy'],
	[/\b[yaj]{2,4}\s*[-/. ]\s*m{1,3}\s*[-/. ]\s*[djt]{1,2}\b/i, 'ymd']
];

/** Order spelled out in a column head or a preamble (`Date (DD/MM/YYYY)`, `TT.MM.JJJJ`). */
export function orderNamedIn(text: string): DateOrder | null {
	return formats.find(([pattern]) => pattern.test(text))?.[1] ?? null;
}
