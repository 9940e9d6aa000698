import { day, time, zoneOffsetMinutes } from '../../format-time';

export interface TimeTick {
	ms: number;
	/** `06`, or `06:30` where minutes are in view. */
	text: string;
	isMidnight: boolean;
}

export interface TimeTicks {
	hours: TimeTick[];
	/** One a day, at its midnight; the first day in view stands at the left edge. */
	days: { ms: number; text: string; isAtEdge: boolean }[];
}

const minute = 60_000;
const hour = 60 * minute;
/** A day's name at the left edge, and half of the next, which stands centred on its midnight. */
const edgeRoomPx = 116;
const dayMs = 24 * hour;

/** Steps that end on local midnight, so that a day's first tick is always its beginning. */
const steps = [1, 2, 5, 10, 15, 30, 60, 120, 180, 360, 720, 1440].map((minutes) => minutes * minute);

/** The instant at which the zone's clocks show this wall time; a wall time that is skipped moves on with the clocks. */
function instantOfWall(wallMs: number, zone: string): number {
	const guess = wallMs - zoneOffsetMinutes(wallMs, zone) * minute;
	return wallMs - zoneOffsetMinutes(guess, zone) * minute;
}

function wallOf(ms: number, zone: string): number {
	return ms + zoneOffsetMinutes(ms, zone) * minute;
}

/** Ticks of whole local hours, spaced so that their figures do not touch. */
export function timeTicks(
	fromMs: number,
	toMs: number,
	zone: string,
	widthPx: number,
	locale: string
): TimeTicks {
	const perPx = (toMs - fromMs) / Math.max(1, widthPx);
	const step = steps.find((candidate) => candidate / perPx >= (candidate < hour ? 52 : 34)) ?? dayMs;
	const hours: TimeTick[] = [];
	const firstWall = Math.ceil(wallOf(fromMs, zone) / step) * step;
	for (let wall = firstWall; hours.length < 500; wall += step) {
		const ms = instantOfWall(wall, zone);
		if (ms > toMs) break;
		const text = step < hour ? time(ms, zone) : time(ms, zone).slice(0, 2);
		if (ms >= fromMs) hours.push({ ms, text, isMidnight: wall % dayMs === 0 });
	}
	return { hours: step === dayMs ? [] : hours, days: dayTicks(fromMs, toMs, zone, perPx, locale) };
}

function dayTicks(
	fromMs: number,
	toMs: number,
	zone: string,
	perPx: number,
	locale: string
): TimeTicks['days'] {
	const days: TimeTicks['days'] = [];
	const every = Math.max(1, Math.ceil((78 * perPx) / dayMs));
	const firstMidnight = Math.ceil(wallOf(fromMs, zone) / dayMs) * dayMs;
	for (let wall = firstMidnight; days.length < 500; wall += every * dayMs) {
		const ms = instantOfWall(wall, zone);
		if (ms > toMs) break;
		days.push({ ms, text: day(ms, zone, locale), isAtEdge: false });
	}
	const next = days[0]?.ms ?? Infinity;
	// The part of a day that comes first is named too, where its name does not touch the next.
	if ((next - fromMs) / perPx > edgeRoomPx)
		days.unshift({ ms: fromMs, text: day(fromMs, zone, locale), isAtEdge: true });
	return days;
}
