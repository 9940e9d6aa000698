import type { ReadContext } from '../ingestion';
import type { Stated } from '../layout/preamble';
import type { Timing } from '../layout/timing';
import { msPerDay } from '../times/calendar';
import { momentMs } from './instants';
import { openBeginning } from './open-start';
import { endsOf, startingAt, type AxisOrOpen, type TimeAxis } from './open-times';

const msPerYear = 365 * msPerDay;
/** No logger wrote a file before 1975; readings over a year ahead of their upload are no drift but a wrong date. */
const earliestMs = Date.UTC(1975, 0, 1);
const furthestAheadMs = 366 * msPerDay;

/** Moments at which clocks begin that were never set. */
const clockZeros = [Date.UTC(1980, 0, 1), Date.UTC(1980, 0, 6), Date.UTC(2000, 0, 1)] as const;

/** Days between the calendars of 1900 and of 1904. Source: ECMA-376 part 1 §18.17.4.1. */
const calendarGapMs = 1462 * msPerDay;

const dayOf = (ms: number): string => new Date(ms).toISOString().slice(0, 10);

function overlapsJourney(ms: Float64Array, { journeyFromMs: from, journeyToMs: to }: ReadContext): boolean {
	if (from === null && to === null) return false;
	const { firstMs, lastMs } = endsOf(ms);
	const [early, late] = [from ?? (to ?? 0) - 30 * msPerDay, to ?? (from ?? 0) + 30 * msPerDay];
	return lastMs >= early - msPerDay && firstMs <= late + msPerDay;
}

function beginsAtZero(ms: Float64Array, { uploadedMs }: ReadContext): boolean {
	const { firstMs, lastMs } = endsOf(ms);
	const isNew = clockZeros.some((zero) => firstMs >= zero - msPerDay / 2 && firstMs < zero + msPerDay);
	return isNew && uploadedMs - lastMs > 2 * msPerYear;
}

/** Days counted from 1904 read as from 1900 lie four years back: evidence decides, else the dock is asked. */
function judgeSerial(axis: TimeAxis, stated: Stated, context: ReadContext): AxisOrOpen {
	const later = axis.ms.map((at) => at + calendarGapMs);
	const { firstMs, lastMs } = endsOf(axis.ms);
	const moved: TimeAxis = {
		...axis,
		ms: later,
		decisions: [{ field: 'time', value: '1904', because: 'declared', detail: null }]
	};
	const startMs = momentMs(stated.startText ?? stated.stopText, null, axis.zone.zone);
	const isNear = (first: number, last: number): boolean =>
		startMs !== null && startMs >= first - msPerDay && startMs <= last + msPerDay;
	if (isNear(firstMs, lastMs) || overlapsJourney(axis.ms, context)) return axis;
	if (isNear(firstMs + calendarGapMs, lastMs + calendarGapMs)) return moved;
	if (overlapsJourney(later, context))
		return { ...moved, decisions: [{ field: 'time', value: '1904', because: 'journey', detail: null }] };
	const isOld = context.uploadedMs - lastMs > 3 * msPerYear;
	const isRecent = lastMs + calendarGapMs <= context.uploadedMs + msPerDay;
	if (!isOld || !isRecent || context.uploadedMs - lastMs - calendarGapMs > msPerYear) return axis;
	const other = { answer: { startMs: firstMs + calendarGapMs }, label: 'days-of-1904', ms: later };
	return openBeginning('two-calendars', axis.ms, { ...context, journeyFromMs: null, journeyToMs: null }, [
		other
	]);
}

/**
 * Refuses dates that cannot be right in any way, and asks about a clock that was never set; everything else passes.
 * An answered start moves such a file as a whole.
 */
export function judgeDates(axis: TimeAxis, timing: Timing, stated: Stated, context: ReadContext): AxisOrOpen {
	const { firstMs, lastMs } = endsOf(axis.ms);
	if (Number.isNaN(firstMs)) return axis;
	const isCounted =
		timing.kind === 'elapsed' ||
		timing.kind === 'counted' ||
		timing.kind === 'none' ||
		timing.kind === 'day-and-clock';
	if (lastMs < earliestMs || firstMs > context.uploadedMs + furthestAheadMs)
		return { refusal: 'implausible-dates', found: dayOf(firstMs) };
	if (isCounted || timing.kind === 'time-of-day') return axis;
	const judged = timing.kind === 'serial-day' ? judgeSerial(axis, stated, context) : axis;
	const isUnset = beginsAtZero(axis.ms, context) && !overlapsJourney(axis.ms, context);
	const asked =
		'options' in judged ? judged : isUnset ? openBeginning('clock-never-set', axis.ms, context, []) : null;
	const { startMs } = context.answers;
	if (asked === null || startMs === undefined) return asked ?? judged;
	const value = new Date(startMs).toISOString();
	const decision = { field: 'start', value, because: 'answer', detail: null } as const;
	return { ...axis, ms: startingAt(axis.ms, startMs), decisions: [...(axis.decisions ?? []), decision] };
}
