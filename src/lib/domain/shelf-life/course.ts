import { isGap, usualIntervalMs } from '../trace/interval';
import { celsiusOf, type Trace } from '../trace/trace';

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
	/** Each distinct temperature once, and which of them each reading is: rates are worked out per level. */
	readonly levels: Float64Array;
	readonly levelOf: Uint32Array;
	/** Of the whole trace, so that trimming it does not redefine what a gap is. */
	readonly usualIntervalMs: number;
}

/**
 * The readings of a trace between the ends of `window` (all of them where it is null) and outside every trim.
 * A reading outside speaks for nothing inside: the logger may have lain in an office until the load was closed.
 */
export function courseOf(trace: Trace, window: Stretch | null, trims: readonly Stretch[]): Course {
	const usualMs = usualIntervalMs(trace.times);
	const counts = countedIndexes(trace.times, window, trims);
	const times = picked(trace.times, counts);
	const celsius = picked(celsiusOf(trace), counts);
	const { levels, levelOf } = levelsOf(trace, celsius, counts);
	return {
		times,
		celsius,
		steps: stepsOf(times, trims, usualMs),
		levels,
		levelOf,
		usualIntervalMs: usualMs
	};
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

function stepsOf(times: Float64Array, trims: readonly Stretch[], usualMs: number): Uint8Array {
	const steps = new Uint8Array(Math.max(0, times.length - 1));
	for (let i = 0; i < steps.length; i++) {
		const fromMs = times[i] as number;
		const toMs = times[i + 1] as number;
		if (trims.some((trim) => trim.fromMs < toMs && trim.toMs > fromMs && trim.toMs > trim.fromMs)) {
			steps[i] = trimmed;
		} else {
			steps[i] = isGap(toMs - fromMs, usualMs) ? unobserved : observed;
		}
	}
	return steps;
}

function levelsOf(trace: Trace, celsius: Float64Array, counts: Uint32Array) {
	const known = new Map<number, number>();
	const levels: number[] = [];
	const levelOf = new Uint32Array(counts.length);
	for (let i = 0; i < counts.length; i++) {
		const scaled = trace.scaled[counts[i] as number] as number;
		let level = known.get(scaled);
		if (level === undefined) {
			level = levels.push(celsius[i] as number) - 1;
			known.set(scaled, level);
		}
		levelOf[i] = level;
	}
	return { levels: Float64Array.from(levels), levelOf };
}

function picked(values: Float64Array, indexes: Uint32Array): Float64Array {
	const kept = new Float64Array(indexes.length);
	for (let i = 0; i < kept.length; i++) kept[i] = values[indexes[i] as number] as number;
	return kept;
}
