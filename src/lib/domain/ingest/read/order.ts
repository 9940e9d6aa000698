import type { ReadContext } from '../ingestion';
import type { Stated } from '../layout/preamble';
import { dayNumber, msPerDay } from '../times/calendar';
import { dayInOrder, orderFromDays, type DateOrder, type OpenDay } from '../times/date-order';
import { emptyStamp, scanStamp } from '../times/stamp';
import type { Gathered } from './gathered';

export type OrderBy =
	'iso' | 'day-over-12' | 'continuity' | 'declared' | 'journey' | 'upload' | 'answer' | 'month-name';

export interface DecidedOrder {
	readonly order: DateOrder | null;
	readonly by: OrderBy | null;
	/** More than one when the file and the dock's knowledge leave it open. */
	readonly possible: readonly DateOrder[];
	readonly why: 'all-one-day' | 'all-days-up-to-12';
}

/** Runs of equal open dates over the whole file, in file order. */
export function openDaysOf({ count, times }: Gathered): OpenDay[] {
	const days: OpenDay[] = [];
	let rows = 0;
	for (let i = 0; i < count; i++) {
		if (times.isSettled[i] !== 0) continue;
		rows++;
		const [a, b, c] = [times.a[i] ?? 0, times.b[i] ?? 0, times.c[i] ?? 0];
		const last = days.at(-1);
		if (last !== undefined && last.a === a && last.b === b && last.c === c) {
			days[days.length - 1] = { a, b, c, rows };
		} else {
			rows = 1;
			days.push({ a, b, c, rows });
		}
	}
	return days;
}

/** The open date of a single text, as if the file had one row. */
export function openDaysIn(text: string | null): OpenDay[] {
	if (text === null || !scanStamp(text, stamp) || stamp.shape !== 'open') return [];
	return [{ a: stamp.a, b: stamp.b, c: stamp.c, rows: 1 }];
}

const stamp = emptyStamp();

/** Dates stated outside the readings: one with a day over 12 shows how this file writes; a plain one shows the day. */
function orderStated(
	stated: Stated,
	days: readonly OpenDay[],
	possible: readonly DateOrder[]
): readonly DateOrder[] {
	if (stated.order !== null && possible.includes(stated.order)) return [stated.order];
	let left = possible;
	for (const text of [stated.startText, stated.stopText, ...stated.momentTexts]) {
		if (text === null || !scanStamp(text, stamp) || stamp.shape === 'none') continue;
		const { a, b, c, shape } = stamp;
		if (shape === 'open') {
			const fits = left.filter((order) => !Number.isNaN(dayInOrder(a, b, c, order)));
			if (fits.length > 0) left = fits;
		}
	}
	if (left.length === 1) return left;
	const edges = [stated.startText, stated.stopText].flatMap((text) => {
		if (text === null || !scanStamp(text, stamp) || stamp.shape === 'none' || stamp.shape === 'open')
			return [];
		return [dayNumber(stamp.a, stamp.b, stamp.c)];
	});
	if (edges.length === 0) return left;
	const near = left.filter((order) =>
		days.some(({ a, b, c }) => edges.some((edge) => Math.abs(dayInOrder(a, b, c, order) - edge) <= 1))
	);
	return near.length > 0 ? near : left;
}

interface Span {
	readonly order: DateOrder;
	readonly fromMs: number;
	readonly toMs: number;
}

function spansOf(days: readonly OpenDay[], orders: readonly DateOrder[]): Span[] {
	return orders.map((order) => {
		let [from, to] = [Infinity, -Infinity];
		for (const { a, b, c } of days) {
			const day = dayInOrder(a, b, c, order) * msPerDay;
			if (day < from) from = day;
			if (day > to) to = day;
		}
		return { order, fromMs: from, toMs: to + msPerDay };
	});
}

/** Zones reach from −12 to +14 h: a span of days is widened by a day before it is held against an instant. */
function byJourney(spans: readonly Span[], context: ReadContext): readonly Span[] {
	const { journeyFromMs: from, journeyToMs: to } = context;
	if (from === null && to === null) return spans;
	const [early, late] = [from ?? (to ?? 0) - 30 * msPerDay, to ?? context.uploadedMs];
	const fits = spans.filter(({ fromMs, toMs }) => toMs >= early - msPerDay && fromMs <= late + msPerDay);
	return fits.length > 0 ? fits : spans;
}

const msPerYear = 365 * msPerDay;
/** A load read years after it travelled is out of the question where the other order says this year. */
const recentYears = 1;
const staleYears = 3;
/** Nor is one of a decade ago where the other order says a few years. */
const fairlyRecentYears = 5;
const ancientYears = 10;

function byUpload(spans: readonly Span[], context: ReadContext): readonly Span[] {
	const past = spans.filter(({ toMs }) => toMs - msPerDay <= context.uploadedMs + msPerDay);
	const left = past.length > 0 ? past : spans;
	const ageYears = ({ toMs }: Span): number => (context.uploadedMs - toMs) / msPerYear;
	const isWithin = (years: number): boolean => left.some((span) => Math.abs(ageYears(span)) < years);
	if (isWithin(recentYears)) return left.filter((span) => ageYears(span) < staleYears);
	return isWithin(fairlyRecentYears) ? left.filter((span) => ageYears(span) < ancientYears) : left;
}

/** Whether two orders read every day the same: 05/05 is one day in both. */
function areSame(days: readonly OpenDay[], one: DateOrder | undefined, other: DateOrder): boolean {
	return (
		one !== undefined && days.every(({ a, b, c }) => dayInOrder(a, b, c, one) === dayInOrder(a, b, c, other))
	);
}

/** Settles day and month by the evidence in the agreed order; what stays open is for a question. */
export function decideOrder(days: readonly OpenDay[], stated: Stated, context: ReadContext): DecidedOrder {
	const why =
		new Set(days.map(({ a, b, c }) => `${a}/${b}/${c}`)).size === 1 ? 'all-one-day' : 'all-days-up-to-12';
	const settled = (order: DateOrder | null, by: OrderBy | null): DecidedOrder => ({
		order,
		by,
		possible: order === null ? [] : [order],
		why
	});
	if (days.length === 0) return settled(null, null);
	const inside = orderFromDays(days);
	const answered = context.answers.dateOrder;
	// An order in which the file's days do not exist is no answer to it.
	const isPossible = inside.by !== 'day-over-12' || (answered && areSame(days, inside.possible[0], answered));
	if (answered !== undefined && isPossible) return settled(answered, 'answer');
	const [only] = inside.possible;
	if (inside.by !== null && only !== undefined) return settled(only, inside.by);
	const steps: readonly [OrderBy, (left: readonly DateOrder[]) => readonly DateOrder[]][] = [
		['declared', (left) => orderStated(stated, days, left)],
		['journey', (left) => byJourney(spansOf(days, left), context).map(({ order }) => order)],
		['upload', (left) => byUpload(spansOf(days, left), context).map(({ order }) => order)]
	];
	let possible = inside.possible;
	for (const [by, narrow] of steps) {
		possible = narrow(possible);
		const [one] = possible;
		if (possible.length === 1 && one !== undefined) return settled(one, by);
	}
	return { order: null, by: null, possible, why };
}
