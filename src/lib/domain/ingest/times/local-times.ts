import { msPerDay } from './calendar';
import { offsetAtOf, type OffsetAt } from './zone';

const msPerMinute = 60_000;

export interface LocalTimes {
	readonly utc: Float64Array;
	/** `changed`: the clock was put forward or back in the file; `kept`: it was not, though the zone's was. */
	readonly change: 'changed' | 'kept' | null;
	/** Rows inside the hour that occurs twice or not at all. */
	readonly rows: readonly number[];
}

interface Transition {
	readonly beforeMinutes: number;
	readonly afterMinutes: number;
}

function transitionOn(dayStart: number, offsetAt: OffsetAt): Transition {
	const middle = offsetAt(dayStart) * msPerMinute;
	return {
		beforeMinutes: offsetAt(dayStart - middle - 2 * 3_600_000),
		afterMinutes: offsetAt(dayStart + msPerDay - middle + 2 * 3_600_000)
	};
}

/**
 * Local times, in the order in which they were logged, to UTC. In the hour that occurs twice the order decides; where
 * the clock runs on evenly through a change that the zone made, the logger kept its old offset and so do we.
 */
export function utcOfLocal(local: Float64Array, zone: string): LocalTimes {
	const offsetAt = offsetAtOf(zone);
	const utc = new Float64Array(local.length);
	const rows: number[] = [];
	let change: LocalTimes['change'] = null;
	let day = NaN;
	let lastMinutes = NaN;
	let today: Transition = { beforeMinutes: 0, afterMinutes: 0 };
	for (let i = 0; i < local.length; i++) {
		const at = local[i] ?? 0;
		const start = Math.floor(at / msPerDay) * msPerDay;
		if (start !== day) {
			day = start;
			today = transitionOn(start, offsetAt);
			const isChange = today.beforeMinutes !== today.afterMinutes;
			if (isChange && change === null && keepsClock(local, i, today, offsetAt)) {
				return { utc: shifted(local, utc, i, today.beforeMinutes), change: 'kept', rows: [i] };
			}
		}
		const minutes = minutesOn({ local, utc, at: i }, today, offsetAt, rows);
		utc[i] = at - minutes * msPerMinute;
		if (i > 0 && minutes !== lastMinutes) change = 'changed';
		lastMinutes = minutes;
	}
	// A time that the zone's clock shows twice or never is told even where no offset changes within the file.
	return { utc, change: change ?? (rows.length > 0 ? 'changed' : null), rows };
}

interface Walk {
	readonly local: Float64Array;
	readonly utc: Float64Array;
	readonly at: number;
}

/** Offset of one local time on a day when it may have changed. */
function minutesOn(walk: Walk, day: Transition, offsetAt: OffsetAt, rows: number[]): number {
	const { beforeMinutes, afterMinutes } = day;
	if (beforeMinutes === afterMinutes) return beforeMinutes;
	const local = walk.local[walk.at] ?? 0;
	const early = local - beforeMinutes * msPerMinute;
	const isEarly = offsetAt(early) === beforeMinutes;
	const isLate = offsetAt(local - afterMinutes * msPerMinute) === afterMinutes;
	if (isEarly === isLate) rows.push(walk.at);
	if (isEarly && isLate) return isSecondTime(walk, day, offsetAt) ? afterMinutes : beforeMinutes;
	return isLate ? afterMinutes : beforeMinutes;
}

/** Whether a time of the hour that stands twice is meant the second time: by the order, then by the step. */
function isSecondTime({ local, utc, at }: Walk, day: Transition, offsetAt: OffsetAt): boolean {
	const here = local[at] ?? 0;
	const early = here - day.beforeMinutes * msPerMinute;
	const late = here - day.afterMinutes * msPerMinute;
	if (at === 0) return runsOnEvenly(local, day, offsetAt);
	const last = utc[at - 1] ?? 0;
	if (early <= last) return true;
	const usual = at > 1 ? last - (utc[at - 2] ?? 0) : NaN;
	return late - last === usual && early - last !== usual;
}

/** For a file that begins within that hour: no row steps back, and the local clock runs evenly out of it. */
function runsOnEvenly(local: Float64Array, day: Transition, offsetAt: OffsetAt): boolean {
	const usual = (local[1] ?? NaN) - (local[0] ?? NaN);
	for (let i = 1; i < local.length; i++) {
		const here = local[i] ?? 0;
		const step = here - (local[i - 1] ?? 0);
		if (step <= 0) return false;
		const isEarly = offsetAt(here - day.beforeMinutes * msPerMinute) === day.beforeMinutes;
		if (!isEarly) return step === usual;
	}
	return false;
}

function shifted(local: Float64Array, utc: Float64Array, from: number, minutes: number): Float64Array {
	for (let i = from; i < local.length; i++) utc[i] = (local[i] ?? 0) - minutes * msPerMinute;
	return utc;
}

/** True where the written clock steps evenly past the moment at which the zone's clock jumped. */
function keepsClock(local: Float64Array, from: number, change: Transition, offsetAt: OffsetAt): boolean {
	const first = Math.max(1, from);
	const end = Math.min(local.length, first + 20_000);
	for (let i = first; i < end; i++) {
		const at = local[i] ?? 0;
		if (at >= (local[from] ?? 0) + 2 * msPerDay) return false;
		const last = local[i - 1] ?? 0;
		const wasBefore = offsetAt(last - change.beforeMinutes * msPerMinute) === change.beforeMinutes;
		const isAfterOnly = offsetAt(at - change.beforeMinutes * msPerMinute) !== change.beforeMinutes;
		if (!wasBefore || !isAfterOnly || i + 1 >= local.length) continue;
		// The step across the change is measured against the ones around it.
		const across = at - last;
		const usual = (local[i + 1] ?? 0) - at;
		const before = i > 1 ? last - (local[i - 2] ?? 0) : usual;
		return across === usual && before === usual && across > 0 && !hasStepBack(local, i);
	}
	return false;
}

/** Whether the clock was put back within the three hours up to a row. */
function hasStepBack(local: Float64Array, at: number): boolean {
	for (let i = at; i > 0 && (local[at] ?? 0) - (local[i] ?? 0) < 3 * 3_600_000; i--) {
		if ((local[i] ?? 0) <= (local[i - 1] ?? 0)) return true;
	}
	return false;
}
