import { longestWatchedMs, usualIntervalMs } from '../trace/interval';
import { levelsOf, type LevelBlocks } from '../trace/levels';
import { ownRoom, type Room } from '../trace/room';
import type { Trace } from '../trace/trace';
import { celsiusFromScaled } from '../units';

/** How the time between a reading and the next counts. */
export const observed = 0;
/** Nobody watched; bridged linearly and reported. */
export const unobserved = 1;
/** Trimmed: not the journey, uses no life. */
export const trimmed = 2;

/** A stretch of time, both ends included. */
export interface Stretch {
	readonly fromMs: number;
	readonly toMs: number;
}

/** The readings that count, in order, and what lies between them. `steps[i]` is between readings i and i + 1. */
export interface Course {
	readonly times: Float64Array;
	readonly celsius: Float64Array;
	readonly steps: Uint8Array;
	/** Each distinct temperature once, coldest first, and which each reading is: rates are worked out per level. Between
	 * the coldest and the warmest there may be some that no reading had. */
	readonly levels: Float64Array;
	readonly levelOf: Int32Array;
	readonly blocks?: LevelBlocks;
	/** Every step is the usual interval and counts; left out where nobody looked. */
	readonly isEven?: boolean;
	/** Of the whole trace, so that trimming it does not redefine what a gap is. */
	readonly usualIntervalMs: number;
}

/**
 * The readings of a trace between the ends of `window` (all of them where it is null) and outside every trim.
 * A reading outside speaks for nothing inside: the logger may have lain in an office until the load was closed.
 */
export function courseOf(
	trace: Trace,
	window: Stretch | null,
	trims: readonly Stretch[],
	room: Room = ownRoom
): Course {
	const isEven = isEvenlySpaced(trace.times);
	const usualMs = isEven ? firstStepMs(trace.times) : usualIntervalMs(trace.times);
	const { times, scaled } = counted(trace, window, trims);
	const { values, levelOf, blocks } = levelsOf(scaled, room);
	const levels = Float64Array.from(values, (value) => celsiusFromScaled(value, trace.decimals, trace.unit));
	let celsius: Float64Array | null = null;
	const steps = room.bytes('steps', Math.max(0, times.length - 1)).fill(observed);
	// Of evenly spaced readings none can be missing but those trimmed away.
	if (!isEven || trims.length > 0) markSteps(steps, times, trims, usualMs);
	return {
		times,
		// Few ask for it: levels say the same.
		get celsius() {
			return (celsius ??= celsiusByLevel(levels, levelOf, room));
		},
		steps,
		levels,
		levelOf,
		blocks,
		usualIntervalMs: usualMs,
		isEven: isEven && trims.length === 0
	};
}

function celsiusByLevel(levels: Float64Array, levelOf: Int32Array, room: Room): Float64Array {
	const celsius = room.floats('celsius', levelOf.length);
	for (let i = 0; i < celsius.length; i++) celsius[i] = levels[levelOf[i] as number] as number;
	return celsius;
}

function firstStepMs(times: Float64Array): number {
	return times.length < 2 ? 0 : (times[1] as number) - (times[0] as number);
}

function isEvenlySpaced(times: Float64Array): boolean {
	const stepMs = firstStepMs(times);
	let before = times[0] as number;
	for (let i = 1; i < times.length; i++) {
		const at = times[i] as number;
		if (at - before !== stepMs) return false;
		before = at;
	}
	return true;
}

/** The readings that count. Without trims they are one run, of which nothing need be copied. */
function counted(trace: Trace, window: Stretch | null, trims: readonly Stretch[]) {
	const { times, scaled } = trace;
	if (trims.length === 0) {
		const from = window === null ? 0 : firstNotBefore(times, window.fromMs);
		let to = window === null ? times.length : firstNotBefore(times, window.toMs);
		if (window !== null && to < times.length && times[to] === window.toMs) to++;
		return { times: times.subarray(from, to), scaled: scaled.subarray(from, to) };
	}
	const indexes = countedIndexes(times, window, trims);
	return {
		times: Float64Array.from(indexes, (at) => times[at] as number),
		scaled: Int32Array.from(indexes, (at) => scaled[at] as number)
	};
}

/** Index of the first time at or after a moment; the length where there is none. */
function firstNotBefore(times: Float64Array, ms: number): number {
	let low = 0;
	let high = times.length;
	while (low < high) {
		const middle = (low + high) >> 1;
		if ((times[middle] as number) < ms) low = middle + 1;
		else high = middle;
	}
	return low;
}

function countedIndexes(times: Float64Array, window: Stretch | null, trims: readonly Stretch[]): Uint32Array {
	const counted = new Uint32Array(times.length);
	let count = 0;
	for (let i = 0; i < times.length; i++) {
		const time = times[i] as number;
		if (window !== null && (time < window.fromMs || time > window.toMs)) continue;
		if (trims.some((trim) => time >= trim.fromMs && time <= trim.toMs)) continue;
		counted[count++] = i;
	}
	return counted.subarray(0, count);
}

function markSteps(steps: Uint8Array, times: Float64Array, trims: readonly Stretch[], usualMs: number): void {
	const longestMs = longestWatchedMs(usualMs);
	for (let i = 0; i < steps.length; i++) {
		if ((times[i + 1] as number) - (times[i] as number) > longestMs) steps[i] = unobserved;
	}
	if (trims.length === 0) return;
	for (let i = 0; i < steps.length; i++) {
		const fromMs = times[i] as number;
		const toMs = times[i + 1] as number;
		if (trims.some((trim) => trim.fromMs < toMs && trim.toMs > fromMs && trim.toMs > trim.fromMs)) {
			steps[i] = trimmed;
		}
	}
}
