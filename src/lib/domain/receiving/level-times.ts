import { RunningSum } from '../math/sum';
import { trimmed, type Course } from '../shelf-life/course';

/** Whole milliseconds by level, so that sums of them are exact. */
export interface LevelTimes {
	/** Each reading stands for the interval that follows it: the weights of the mean kinetic temperature. */
	readonly standsForMs: Float64Array;
	/** Time of the steps that count on both sides of each reading: twice its weight in a mean along straight lines. */
	readonly besideMs: Float64Array;
}

/**
 * How long each level was held.
 *
 * A reading stands for the interval that follows it, the last for the usual interval, so that an evenly spaced log
 * gives the textbook figure over its readings. Before a trim it stands for the usual interval too: what was cut out
 * is not the journey.
 */
export function levelTimes(course: Course): LevelTimes {
	return course.isEven ? evenTimes(course) : unevenTimes(course);
}

function evenTimes({ levels, levelOf, usualIntervalMs }: Course): LevelTimes {
	// Two counters take turns: a logger repeats itself, and one would wait for its own last write.
	const even = new Float64Array(levels.length);
	const odd = new Float64Array(levels.length);
	let i = 0;
	for (; i + 1 < levelOf.length; i += 2) {
		const a = levelOf[i] as number;
		const b = levelOf[i + 1] as number;
		even[a] = (even[a] as number) + 1;
		odd[b] = (odd[b] as number) + 1;
	}
	if (i < levelOf.length) {
		const last = levelOf[i] as number;
		even[last] = (even[last] as number) + 1;
	}
	const standsForMs = even.map((count, level) => (count + (odd[level] as number)) * usualIntervalMs);
	const besideMs = standsForMs.map((ms) => 2 * ms);
	for (const end of [levelOf[0] as number, levelOf[levelOf.length - 1] as number]) {
		besideMs[end] = (besideMs[end] as number) - usualIntervalMs;
	}
	return { standsForMs, besideMs };
}

function unevenTimes({ times, steps, levels, levelOf, usualIntervalMs }: Course): LevelTimes {
	const standsForMs = new Float64Array(levels.length);
	const besideMs = new Float64Array(levels.length);
	const add = (sums: Float64Array, reading: number, ms: number) => {
		const level = levelOf[reading] as number;
		sums[level] = (sums[level] as number) + ms;
	};
	for (let i = 0; i < steps.length; i++) {
		const ms = (times[i + 1] as number) - (times[i] as number);
		const counts = steps[i] !== trimmed;
		add(standsForMs, i, counts ? ms : Math.min(ms, usualIntervalMs));
		if (!counts) continue;
		add(besideMs, i, ms);
		add(besideMs, i + 1, ms);
	}
	add(standsForMs, levelOf.length - 1, usualIntervalMs);
	return { standsForMs, besideMs };
}

/** Mean over time, linear between readings; where no time passes that counts, over what the readings stand for. */
export function meanOverTime(levels: Float64Array, { standsForMs, besideMs }: LevelTimes): number {
	return weightedMean(levels, besideMs) ?? weightedMean(levels, standsForMs) ?? (levels[0] as number);
}

function weightedMean(levels: Float64Array, weights: Float64Array): number | null {
	const area = new RunningSum();
	const weight = new RunningSum();
	for (let level = 0; level < levels.length; level++) {
		area.add((weights[level] as number) * (levels[level] as number));
		weight.add(weights[level] as number);
	}
	return weight.total > 0 ? area.total / weight.total : null;
}
