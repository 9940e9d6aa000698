import type { ReadContext } from '../ingestion';
import type { Stated } from '../layout/preamble';
import type { Timing } from '../layout/timing';
import { msPerDay } from '../times/calendar';
import { utcOfLocal } from '../times/local-times';
import { emptyStamp, noOffset, noTime, scanStamp } from '../times/stamp';
import { offsetAtOf, offsetText } from '../times/zone';
import type { Gathered } from './gathered';
import { isDescending, momentMs, type Instants } from './instants';
import { openStart } from './open-start';
import type { AxisOrOpen } from './open-times';
import { decideOrder, openDaysIn } from './order';
import { countedMs } from './row-index';
import { distinctZones, zonesFor, type UsedZone } from './zone-choice';

/** Intervals to offer when the file names none: the usual settings of the trade (5 to 15 minutes). */
const usualIntervals = [5, 10, 15] as const;
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
	place(startMs: number, intervalMs: number, zone: string): Instants;
}

function runnerOf(gathered: Gathered, timing: Timing, stated: Stated): Runner {
	const isClock = timing.kind === 'time-of-day' && !isRunning(gathered, stated.startText);
	const own = gathered.times.ms.subarray(0, gathered.count);
	return {
		isClock,
		place(startMs, intervalMs, zone) {
			if (isClock) return clocksFrom(gathered, startMs + offsetAtOf(zone)(startMs) * 60_000, zone);
			const since =
				timing.kind === 'none'
					? countedMs(own, intervalMs)
					: timing.kind === 'day-and-clock'
						? fromFirst(own)
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
	const intervalSeconds =
		answers.intervalSeconds ?? (stated.intervalMinutes === null ? null : stated.intervalMinutes * 60);
	const intervalMs = Math.round((intervalSeconds ?? 0) * 1000);
	const startText = stated.startText ?? (runner.isClock ? stated.dateText : null);
	const decided = decideOrder(openDaysIn(startText), stated, context);
	const zones = startZones(gathered, stated, startText, context);
	const [likeliest] = zones;
	const zone = likeliest?.zone ?? 'UTC';
	if (answers.startMs === undefined && decided.possible.length > 1) {
		const msOf = (order: (typeof decided.possible)[number]): Float64Array =>
			runner.place(momentMs(startText, order, zone) ?? 0, intervalMs, zone).ms;
		return {
			code: 'date-order',
			why: decided.why,
			options: decided.possible.map((order) => ({
				answer: { dateOrder: order },
				label: order,
				ms: msOf(order)
			}))
		};
	}
	const startIn = (name: string): number | null =>
		answers.startMs ?? momentMs(startText, decided.order, name);
	if (startIn(zone) === null) {
		const isBack = timing.kind === 'elapsed' && (gathered.times.ms[gathered.count - 1] ?? 1) <= 0;
		const rowsFrom = (ms: number): Float64Array => runner.place(ms, intervalMs, zone).ms;
		return isBack
			? countedBack(context, rowsFrom)
			: openStart('no-times', context, rowsFrom, runner.isClock ? msPerDay : 1);
	}
	if (timing.kind === 'none' && intervalSeconds === null)
		return openInterval(runner, startIn(zone) ?? 0, zone);
	const places = distinctZones(
		zones,
		(name) => runner.place(startIn(name) ?? 0, intervalMs, name),
		context.uploadedMs
	);
	const [only] = places;
	if (places.length > 1 || only === undefined)
		return {
			code: 'zone',
			why: 'no-zone',
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
		isLocal: !isAnswered
	};
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

function openInterval(runner: Runner, startMs: number, zone: string): AxisOrOpen {
	const options = usualIntervals.map((minutes) => ({
		answer: { intervalSeconds: minutes * 60 },
		label: String(minutes),
		ms: runner.place(startMs, minutes * 60_000, zone).ms
	}));
	return { code: 'interval', why: 'no-times', options };
}
