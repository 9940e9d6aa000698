import type { ReadContext } from '../ingestion';
import type { Stated } from '../layout/preamble';
import type { Timing } from '../layout/timing';
import { msPerDay } from '../times/calendar';
import type { DateOrder } from '../times/date-order';
import { utcOfLocal } from '../times/local-times';
import { emptyStamp, noOffset, noTime, scanStamp } from '../times/stamp';
import { offsetAtOf, offsetText } from '../times/zone';
import type { Gathered } from './gathered';
import { isDescending, momentMs, type Instants } from './instants';
import { openStart } from './open-start';
import { endsOf, type AxisOrOpen, type TimeOption } from './open-times';
import { decideOrder, openDaysIn, type DecidedOrder } from './order';
import { countedMs } from './row-index';
import { intervalBetween, stepsOf, type Steps } from './row-interval';
import { distinctZones, whyZone, zonesFor, type UsedZone } from './zone-choice';

const halfDay = msPerDay / 2;
const stamp = emptyStamp();
const noChange = { change: null, changeRows: [] } as const;

/** Whether times of day are lengths of time: over a day, with days, or from nought while the start stands elsewhere. */
function isRunning(gathered: Gathered, startText: string | null): boolean {
	const { times, count } = gathered;
	for (let i = 0; i < count; i++)
		if (times.msOfDay[i] === noTime || (times.ms[i] ?? 0) >= msPerDay) return true;
	if ((times.ms[0] ?? NaN) !== 0 || startText === null || !scanStamp(startText, stamp)) return false;
	return stamp.msOfDay > 60_000;
}

/** Clocks without a date, put on days from the one on which they start. */
function clocksFrom(gathered: Gathered, startLocalMs: number, zone: string): Instants {
	const { times, count } = gathered;
	const clocks = Float64Array.from(times.msOfDay.subarray(0, count));
	const isBackwards = isDescending(clocks);
	const at = (i: number): number => (isBackwards ? count - 1 - i : i);
	const local = new Float64Array(count);
	let day = Math.floor(startLocalMs / msPerDay) * msPerDay;
	let last = startLocalMs - day;
	for (let i = 0; i < count; i++) {
		const clock = clocks[at(i)] ?? 0;
		// Midnight has passed where the clock falls back by more than half a day.
		if (clock < last - halfDay) day += msPerDay;
		last = clock;
		local[i] = day + clock;
	}
	const { utc, change, rows } = utcOfLocal(local, zone);
	return { ms: Float64Array.from(utc, (_, i) => utc[at(i)] ?? NaN), change, changeRows: rows.map(at) };
}

/** Times that count from the first row: the day's number and a clock. */
function fromFirst(ms: Float64Array): Float64Array {
	const first = ms[0] ?? 0;
	return ms.map((at) => at - first);
}

interface Runner {
	readonly isClock: boolean;
	/** Null where the rows carry the length of their steps themselves. */
	readonly steps: Steps | null;
	place(startMs: number, intervalMs: number, zone: string): Instants;
}

function runnerOf(gathered: Gathered, timing: Timing, stated: Stated): Runner {
	const isClock = timing.kind === 'time-of-day' && !isRunning(gathered, stated.startText);
	const own = gathered.times.ms.subarray(0, gathered.count);
	const steps =
		timing.kind === 'none'
			? { count: gathered.count - 1, size: 1, isCount: false }
			: timing.kind === 'counted'
				? stepsOf(own)
				: null;
	return {
		isClock,
		steps,
		place(startMs, intervalMs, zone) {
			if (isClock) return clocksFrom(gathered, startMs + offsetAtOf(zone)(startMs) * 60_000, zone);
			const since =
				timing.kind === 'none'
					? countedMs(own, intervalMs)
					: timing.kind === 'day-and-clock'
						? fromFirst(own)
						: timing.kind === 'counted'
							? own.map((count) => Math.round((count * intervalMs) / (steps?.size ?? 1)))
							: own;
			return { ms: Float64Array.from(since, (at) => startMs + at), ...noChange };
		}
	};
}

/** The zone of times that run on from a stated start: the start's own offset where it has one. */
function startZones(
	gathered: Gathered,
	stated: Stated,
	startText: string | null,
	context: ReadContext
): readonly UsedZone[] {
	if (startText !== null && scanStamp(startText, stamp) && stamp.offsetMinutes !== noOffset)
		return [{ zone: offsetText(stamp.offsetMinutes), by: 'file' }];
	return zonesFor(gathered, stated, context, NaN);
}

/** Rows that only run on from a start which is stated outside them. */
export function runningAxis(
	gathered: Gathered,
	timing: Timing,
	stated: Stated,
	context: ReadContext
): AxisOrOpen {
	const { answers } = context;
	const runner = runnerOf(gathered, timing, stated);
	const startText = stated.startText ?? (runner.isClock ? stated.dateText : null);
	const days = [...openDaysIn(startText), ...openDaysIn(stated.stopText)];
	const decided = decideOrder(days, stated, context);
	const zones = startZones(gathered, stated, startText, context);
	const zone = zones[0]?.zone ?? 'UTC';
	const startIn = (name: string): number | null =>
		answers.startMs ?? momentMs(startText, decided.order, name);
	const [startMs, stopMs] = [startIn(zone), momentMs(stated.stopText, decided.order, zone)];
	const spanMs = startMs === null || stopMs === null ? null : stopMs - startMs;
	const interval = runner.steps && intervalBetween(runner.steps, stated, spanMs, context);
	const intervalMs = interval !== null && 'seconds' in interval ? Math.round(interval.seconds * 1000) : 0;
	if (answers.startMs === undefined && startText !== null && decided.possible.length > 1) {
		const msOf = (order: (typeof decided.possible)[number]): Float64Array =>
			runner.place(momentMs(startText, order, zone) ?? 0, intervalMs, zone).ms;
		return openOrder(decided, msOf);
	}
	const isOpen = interval !== null && 'offered' in interval;
	if (isOpen && (startMs !== null || runner.steps?.isCount === true))
		return openInterval(runner, startMs, interval.offered, zone);
	// A day alone leaves open when on it the readings began, unless they say so themselves.
	const isDayOnly = answers.startMs === undefined && !runner.isClock && !hasClock(startText);
	if (startMs === null || isDayOnly) {
		const isBack =
			(timing.kind === 'elapsed' || timing.kind === 'counted') &&
			(gathered.times.ms[gathered.count - 1] ?? 1) <= 0;
		const rowsFrom = (ms: number): Float64Array => runner.place(ms, intervalMs, zone).ms;
		if (isBack) return countedBack(context, rowsFrom);
		const others = runner.isClock ? [] : startsStated(startMs, stopMs, rowsFrom);
		return openStart('no-times', context, rowsFrom, runner.isClock ? msPerDay : 1, others);
	}
	const places = distinctZones(
		zones,
		(name) => runner.place(startIn(name) ?? 0, intervalMs, name),
		context.uploadedMs
	);
	const [only] = places;
	if (places.length > 1 || only === undefined)
		return {
			code: 'zone',
			why: whyZone(stated),
			options: places.map(({ zone: used, placed }) => ({
				answer: { zone: used.zone },
				label: used.zone,
				ms: placed.ms
			}))
		};
	const isAnswered = answers.startMs !== undefined && !runner.isClock;
	return {
		...only.placed,
		zone: isAnswered ? { zone: 'UTC', by: 'answer' } : only.zone,
		order: decided.order,
		orderBy: decided.by,
		isLocal: !isAnswered,
		...(interval !== null &&
			'seconds' in interval &&
			interval.because === 'declared' && {
				decisions: [
					{ field: 'intervalSeconds', value: String(interval.seconds), because: 'declared', detail: null }
				]
			})
	};
}

function openOrder({ why, possible }: DecidedOrder, msOf: (order: DateOrder) => Float64Array): AxisOrOpen {
	return {
		code: 'date-order',
		why,
		options: possible.map((order) => ({ answer: { dateOrder: order }, label: order, ms: msOf(order) }))
	};
}

function hasClock(text: string | null): boolean {
	return text !== null && scanStamp(text, stamp) && stamp.msOfDay !== noTime;
}

/** Starts that the file suggests without settling them: the day it names, and the one that makes it end when it says. */
function startsStated(
	dayMs: number | null,
	stopMs: number | null,
	rowsFrom: (startMs: number) => Float64Array
): TimeOption[] {
	const options: TimeOption[] = [];
	const offer = (label: string, startMs: number): void => {
		if (Number.isFinite(startMs)) options.push({ answer: { startMs }, label, ms: rowsFrom(startMs) });
	};
	if (stopMs !== null) {
		const { firstMs, lastMs } = endsOf(rowsFrom(0));
		offer('declared-end', stopMs - (lastMs - firstMs) - firstMs);
	}
	if (dayMs !== null) offer('declared-day', dayMs);
	return options;
}

/** Counted back from "now": nobody but the dock knows when that was. */
function countedBack(context: ReadContext, rowsFrom: (ms: number) => Float64Array): AxisOrOpen {
	const { journeyToMs: to, uploadedMs } = context;
	const moments: [string, number][] = [['upload', uploadedMs]];
	if (to !== null && to < uploadedMs) moments.push(['arrival', to]);
	return {
		code: 'start',
		why: 'relative-times',
		options: moments.map(([label, startMs]) => ({ answer: { startMs }, label, ms: rowsFrom(startMs) }))
	};
}

function openInterval(
	runner: Runner,
	startMs: number | null,
	offered: readonly number[],
	zone: string
): AxisOrOpen {
	const options = offered.slice(0, 3).map((seconds) => ({
		answer: { intervalSeconds: seconds },
		label: String(seconds / 60),
		ms: startMs === null ? null : runner.place(startMs, seconds * 1000, zone).ms
	}));
	return { code: 'interval', why: 'no-times', options };
}
