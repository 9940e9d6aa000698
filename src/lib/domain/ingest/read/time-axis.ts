import type { Answers, Decision, Oddity, QuestionCode, ReadContext } from '../ingestion';
import type { Stated } from '../layout/preamble';
import type { Timing } from '../layout/timing';
import { msPerDay } from '../times/calendar';
import type { DateOrder } from '../times/date-order';
import { offsetAtOf, utcOfLocal } from '../times/zone';
import type { Gathered } from './gathered';
import { instantsOf, momentMs, zoneFor, zoneOfStart, type Instants, type UsedZone } from './instants';
import { decideOrder, openDaysIn, openDaysOf, type DecidedOrder, type OrderBy } from './order';

/** Every row in UTC, with what was taken to get there. */
export interface TimeAxis extends Instants {
	readonly zone: UsedZone;
	readonly order: DateOrder | null;
	readonly orderBy: OrderBy | null;
	/** Whether local times had to be placed in a zone at all. */
	readonly isLocal: boolean;
	/** What else was decided or seen on the way, told as it stands. */
	readonly decisions?: readonly Decision[];
	readonly oddities?: readonly Oddity[];
}

/** What stays open about the times, with each answer and the times it would give. */
export interface OpenTimes {
	readonly code: QuestionCode;
	readonly why: string;
	readonly options: readonly {
		readonly answer: Answers;
		readonly label: string;
		readonly ms: Float64Array | null;
	}[];
}

const noChange = { change: null, changeRows: [] } as const;
/** Intervals to offer when the file names none: the usual settings of the trade (5 to 15 minutes). */
const usualIntervals = [5, 10, 15] as const;

function openOrder(
	possible: readonly DateOrder[],
	why: string,
	msOf: (order: DateOrder) => Float64Array
): OpenTimes {
	return {
		code: 'date-order',
		why,
		options: possible.map((order) => ({ answer: { dateOrder: order }, label: order, ms: msOf(order) }))
	};
}

/** Rows that carry a whole calendar moment. */
function calendarAxis(gathered: Gathered, stated: Stated, context: ReadContext): TimeAxis | OpenTimes {
	const days = openDaysOf(gathered);
	const decided = decideOrder(days, stated, context);
	const zone = zoneFor(gathered, stated, context);
	if (decided.possible.length > 1) {
		return openOrder(decided.possible, decided.why, (order) => instantsOf(gathered, order, zone.zone).ms);
	}
	const isIso = days.length === 0;
	return {
		...instantsOf(gathered, decided.order, zone.zone),
		zone,
		order: isIso ? 'ymd' : decided.order,
		orderBy: isIso ? (gathered.times.isSettled[0] === 2 ? 'month-name' : 'iso') : decided.by,
		isLocal: true
	};
}

function running(
	gathered: Gathered,
	timing: Timing,
	startMs: number,
	intervalMs: number,
	offsetMs: number
): Float64Array {
	const ms = new Float64Array(gathered.count);
	let days = 0;
	for (let i = 0; i < gathered.count; i++) {
		if (timing.kind === 'elapsed') ms[i] = startMs + (gathered.times.ms[i] ?? NaN);
		else if (timing.kind === 'none') ms[i] = startMs + i * intervalMs;
		else {
			const clock = gathered.times.msOfDay[i] ?? 0;
			// Time of day alone: midnight has passed where the clock falls back by more than half a day.
			if (i > 0 && clock < (gathered.times.msOfDay[i - 1] ?? 0) - msPerDay / 2) days++;
			const local = startMs + offsetMs;
			ms[i] = Math.floor(local / msPerDay) * msPerDay + days * msPerDay + clock - offsetMs;
		}
	}
	return ms;
}

function openStart(timing: Timing, gathered: Gathered, context: ReadContext, intervalMs: number): OpenTimes {
	// Counted back from "now": nobody but the dock knows when that was.
	if (timing.kind === 'elapsed' && (gathered.times.ms[gathered.count - 1] ?? 1) <= 0) {
		const ms = running(gathered, timing, context.uploadedMs, 0, 0);
		return {
			code: 'start',
			why: 'relative-times',
			options: [{ answer: { startMs: context.uploadedMs }, label: 'upload', ms }]
		};
	}
	const { journeyFromMs: from } = context;
	const options =
		from === null
			? []
			: [{ answer: { startMs: from }, label: 'journey', ms: running(gathered, timing, from, intervalMs, 0) }];
	return { code: 'start', why: 'no-times', options };
}

/** Rows that only run on from a start which is stated outside them. */
function runningAxis(
	gathered: Gathered,
	timing: Timing,
	stated: Stated,
	context: ReadContext
): TimeAxis | OpenTimes {
	const { answers } = context;
	const intervalSeconds =
		answers.intervalSeconds ?? (stated.intervalMinutes === null ? null : stated.intervalMinutes * 60);
	const stamped = openDaysIn(stated.startText);
	const decided: DecidedOrder = decideOrder(stamped, stated, context);
	const zone =
		answers.startMs === undefined
			? zoneOfStart(gathered, stated, context)
			: ({ zone: 'UTC', by: 'answer' } satisfies UsedZone);
	const start = (order: DateOrder | null): number | null =>
		answers.startMs ?? momentMs(stated.startText, order, zone.zone);
	const intervalMs = Math.round((intervalSeconds ?? 0) * 1000);
	const offset = (ms: number): number => offsetAtOf(zone.zone)(ms) * 60_000;
	const rowsFrom = (ms: number, step: number): Float64Array =>
		running(gathered, timing, ms, step, offset(ms));
	if (answers.startMs === undefined && decided.possible.length > 1) {
		return openOrder(decided.possible, decided.why, (order) => rowsFrom(start(order) ?? 0, intervalMs));
	}
	const startMs = start(decided.order);
	if (startMs === null) return openStart(timing, gathered, context, intervalMs);
	if (timing.kind === 'none' && intervalSeconds === null) {
		const options = usualIntervals.map((minutes) => ({
			answer: { intervalSeconds: minutes * 60 },
			label: String(minutes),
			ms: rowsFrom(startMs, minutes * 60_000)
		}));
		return { code: 'interval', why: 'no-times', options };
	}
	return {
		ms: rowsFrom(startMs, intervalMs),
		...noChange,
		zone,
		order: decided.order,
		orderBy: decided.by,
		isLocal: zone.by !== 'answer'
	};
}

/** Puts every gathered row on the UTC axis, or says what has to be asked first. */
export function timeAxisOf(
	gathered: Gathered,
	timing: Timing,
	stated: Stated,
	context: ReadContext
): TimeAxis | OpenTimes {
	if (timing.kind === 'epoch') {
		return {
			ms: gathered.times.ms.slice(0, gathered.count),
			...noChange,
			zone: { zone: 'UTC', by: 'file' },
			order: null,
			orderBy: null,
			isLocal: false
		};
	}
	if (timing.kind === 'serial-day') {
		const local = gathered.times.ms.slice(0, gathered.count);
		const named = stated.zone;
		const zone: UsedZone =
			context.answers.zone !== undefined
				? { zone: context.answers.zone, by: 'answer' }
				: named === null
					? { zone: context.siteZone, by: 'site' }
					: { zone: named, by: 'file' };
		const { utc, change, rows } = utcOfLocal(local, zone.zone);
		return { ms: utc, change, changeRows: rows, zone, order: null, orderBy: null, isLocal: true };
	}
	if (timing.kind === 'elapsed' || timing.kind === 'none' || timing.kind === 'time-of-day') {
		return runningAxis(gathered, timing, stated, context);
	}
	return calendarAxis(gathered, stated, context);
}
