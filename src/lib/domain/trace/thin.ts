import { gapsIn, usualIntervalMs, type Silence } from './interval';

/** Stands in a thinned index list where the line is to be broken. */
export const lineBreak = -1;

/** A series for drawing; a null temperature breaks the line. `indexes` leads back to the readings (−1 at a break). */
export interface ThinnedSeries {
	readonly indexes: Int32Array;
	readonly times: number[];
	readonly celsius: (number | null)[];
}

/**
 * At most `mostPoints` points of a series, breaks included: first and last, the coldest and the warmest of each
 * equal stretch of time, and both ends of every gap that gets a break. Where gaps are more than the points
 * allow, the longest are broken.
 */
export function thinSeries(times: Float64Array, celsius: Float64Array, mostPoints: number): ThinnedSeries {
	const gaps = gapsIn(times, usualIntervalMs(times));
	const kept = keptIndexes(times, celsius, gaps, mostPoints);
	const indexes = withBreaks(kept, longest(gaps, breaksFor(mostPoints)));
	const drawn: ThinnedSeries = { indexes, times: [], celsius: [] };
	indexes.forEach((index, at) => {
		const isBreak = index === lineBreak;
		const before = times[indexes[at - 1] ?? 0] ?? 0;
		const after = times[indexes[at + 1] ?? 0] ?? 0;
		drawn.times.push(isBreak ? (before + after) / 2 : (times[index] as number));
		drawn.celsius.push(isBreak ? null : (celsius[index] as number));
	});
	return drawn;
}

function breaksFor(mostPoints: number): number {
	return Math.floor(mostPoints / 8);
}

function longest(gaps: readonly Silence[], most: number): Silence[] {
	const byLength = [...gaps].sort((a, b) => b.toMs - b.fromMs - (a.toMs - a.fromMs) || a.index - b.index);
	return byLength.slice(0, most).sort((a, b) => a.index - b.index);
}

function keptIndexes(
	times: Float64Array,
	celsius: Float64Array,
	gaps: readonly Silence[],
	mostPoints: number
): number[] {
	const count = times.length;
	const broken = longest(gaps, breaksFor(mostPoints));
	if (count + broken.length <= mostPoints) return Array.from(times.keys());
	const kept = new Set<number>([0, count - 1]);
	for (const gap of broken) kept.add(gap.index).add(gap.index + 1);
	const buckets = Math.floor((mostPoints - 2 - 3 * broken.length) / 2);
	for (const index of extremesByBucket(times, celsius, buckets)) kept.add(index);
	return [...kept].sort((a, b) => a - b);
}

function extremesByBucket(times: Float64Array, celsius: Float64Array, buckets: number): number[] {
	const first = times[0] as number;
	const span = (times[times.length - 1] as number) - first;
	const coldest = new Int32Array(Math.max(0, buckets)).fill(-1);
	const warmest = coldest.slice();
	for (let i = 0; i < times.length && buckets > 0; i++) {
		const bucket = Math.min(buckets - 1, Math.floor((((times[i] as number) - first) / span) * buckets));
		const cold = coldest[bucket] as number;
		const warm = warmest[bucket] as number;
		if (cold < 0 || (celsius[i] as number) < (celsius[cold] as number)) coldest[bucket] = i;
		if (warm < 0 || (celsius[i] as number) > (celsius[warm] as number)) warmest[bucket] = i;
	}
	return [...coldest, ...warmest].filter((index) => index >= 0);
}

function withBreaks(kept: readonly number[], broken: readonly Silence[]): Int32Array {
	const after = new Set(broken.map((gap) => gap.index));
	return Int32Array.from(kept.flatMap((index) => (after.has(index) ? [index, lineBreak] : [index])));
}
