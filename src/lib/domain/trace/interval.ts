import { msPerMinute } from '../units';

/** A gap is longer than this many usual intervals, and longer than half an hour. */
const gapIntervals = 3;
const gapFloorMs = 30 * msPerMinute;

/** A stretch without readings, between the neighbours at `index` and `index + 1`. */
export interface Silence {
	readonly index: number;
	readonly fromMs: number;
	readonly toMs: number;
}

/** The most frequent step between readings, the shorter one where two are equally frequent; 0 without a step. */
export function usualIntervalMs(times: ArrayLike<number>): number {
	const counts = new Map<number, number>();
	let running = 0;
	let length = 0;
	for (let i = 1; i < times.length; i++) {
		const step = (times[i] as number) - (times[i - 1] as number);
		// Loggers are steady: a map is asked where the step changes, not a million times.
		if (step !== running) {
			counts.set(running, (counts.get(running) ?? 0) + length);
			running = step;
			length = 0;
		}
		length++;
	}
	counts.set(running, (counts.get(running) ?? 0) + length);
	return mostFrequent(counts);
}

function mostFrequent(counts: ReadonlyMap<number, number>): number {
	let usual = 0;
	let most = 0;
	for (const [step, count] of counts) {
		if (count > most || (count === most && count > 0 && step < usual)) {
			usual = step;
			most = count;
		}
	}
	return usual;
}

/** The longest step that hides no readings: three usual intervals, half an hour at least. */
export function longestWatchedMs(usualMs: number): number {
	return Math.max(gapIntervals * usualMs, gapFloorMs);
}

/** Whether a step of this length hides readings: over three usual intervals and over 30 min. */
export function isGap(stepMs: number, usualMs: number): boolean {
	return stepMs > longestWatchedMs(usualMs);
}

/** Every gap of the trace, in order of time. */
export function gapsIn(times: ArrayLike<number>, usualMs: number = usualIntervalMs(times)): Silence[] {
	const gaps: Silence[] = [];
	for (let i = 1; i < times.length; i++) {
		const fromMs = times[i - 1] as number;
		const toMs = times[i] as number;
		if (isGap(toMs - fromMs, usualMs)) gaps.push({ index: i - 1, fromMs, toMs });
	}
	return gaps;
}
