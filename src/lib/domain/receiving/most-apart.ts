import { usualIntervalMs, longestWatchedMs } from '../trace/interval';

/** A channel's readings: ascending times with their temperatures. */
export interface Measured {
	readonly times: Float64Array;
	readonly celsius: Float64Array;
}

/** Where two loggers are furthest apart, and how far on average, over the time both were watching. */
export interface MostApart {
	readonly atMs: number;
	/** Second less first. */
	readonly differenceCelsius: number;
	/** Of the size of the difference, over the instants at which either read. */
	readonly meanCelsius: number;
	readonly compared: number;
}

/**
 * The largest difference between two loggers and when it was, temperature being linear between readings: then it is at
 * a reading of one of them. Nothing is said of a gap of either, nor outside `within`. Null where they never watched
 * at once. Of equal differences the first.
 */
export function mostApart(
	first: Measured,
	second: Measured,
	within: { readonly fromMs: number; readonly toMs: number } | null = null
): MostApart | null {
	const [mine, other] = [reader(first), reader(second)];
	let found: { atMs: number; differenceCelsius: number } | null = null;
	let total = 0;
	let compared = 0;
	for (const atMs of instantsOf(first.times, second.times)) {
		if (within && (atMs < within.fromMs || atMs > within.toMs)) continue;
		const here = mine(atMs);
		const there = other(atMs);
		if (here === null || there === null) continue;
		const differenceCelsius = there - here;
		total += Math.abs(differenceCelsius);
		compared++;
		if (!found || Math.abs(differenceCelsius) > Math.abs(found.differenceCelsius))
			found = { atMs, differenceCelsius };
	}
	return found && { ...found, meanCelsius: total / compared, compared };
}

/** The instants at which either has a reading, once each, in order. */
function* instantsOf(first: Float64Array, second: Float64Array): Generator<number> {
	let [i, k] = [0, 0];
	while (i < first.length || k < second.length) {
		const next = Math.min(first[i] ?? Infinity, second[k] ?? Infinity);
		if (first[i] === next) i++;
		if (second[k] === next) k++;
		yield next;
	}
}

/** Temperature at ascending instants, linear between readings; null in a gap and outside the readings. */
function reader({ times, celsius }: Measured): (ms: number) => number | null {
	const longestMs = longestWatchedMs(usualIntervalMs(times));
	let at = 0;
	return (ms) => {
		while (at + 1 < times.length && (times[at + 1] as number) <= ms) at++;
		const fromMs = times[at];
		if (fromMs === undefined || ms < fromMs) return null;
		if (ms === fromMs) return celsius[at] as number;
		const toMs = times[at + 1];
		if (toMs === undefined || toMs - fromMs > longestMs) return null;
		const from = celsius[at] as number;
		return from + ((celsius[at + 1] as number) - from) * ((ms - fromMs) / (toMs - fromMs));
	};
}
