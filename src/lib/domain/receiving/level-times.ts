import { RunningSum } from '../math/sum';
import { trimmed, type Course } from '../shelf-life/course';
import { eachPassage, type Passages } from '../shelf-life/passages';

/** Whole milliseconds by level, so that sums of them are exact. */
export interface LevelTimes {
	/** Each reading stands for the interval that follows it: the weights of the mean kinetic temperature. */
	readonly standsForMs: Float64Array;
	/** Time of the steps that count on both sides of each reading: twice its weight in a mean along straight lines. */
	readonly besideMs: Float64Array;
	/** Time between two readings that both stand on the level. */
	readonly restingMs: Float64Array;
}

/**
 * How long each level was held.
 *
 * A reading stands for the interval that follows it, the last for the usual interval, so that an evenly spaced log
 * gives the textbook figure over its readings. Before a trim it stands for the usual interval too: what was cut out
 * is not the journey.
 */
export function levelTimes(course: Course, passages: Passages): LevelTimes {
	const { times, levels, levelOf, usualIntervalMs } = course;
	const held = {
		standsForMs: new Float64Array(levels.length),
		besideMs: new Float64Array(levels.length),
		restingMs: new Float64Array(levels.length)
	};
	eachPassage(passages, (_, from, to, ms) => addPassage(held, from, to, ms));
	for (const at of [...passages.far, ...passages.silent]) {
		const ms = (times[at + 1] as number) - (times[at] as number);
		addPassage(held, levelOf[at] as number, levelOf[at + 1] as number, ms);
	}
	addTrimmed(held.standsForMs, course);
	add(held.standsForMs, levelOf[levelOf.length - 1] as number, usualIntervalMs);
	return held;
}

function addPassage(held: LevelTimes, from: number, to: number, ms: number): void {
	add(held.standsForMs, from, ms);
	add(held.besideMs, from, ms);
	add(held.besideMs, to, ms);
	if (from === to) add(held.restingMs, from, ms);
}

function addTrimmed(
	standsForMs: Float64Array,
	{ times, steps, levelOf, usualIntervalMs, isEven }: Course
): void {
	if (isEven) return;
	for (let i = steps.indexOf(trimmed); i >= 0; i = steps.indexOf(trimmed, i + 1)) {
		const ms = (times[i + 1] as number) - (times[i] as number);
		add(standsForMs, levelOf[i] as number, Math.min(ms, usualIntervalMs));
	}
}

function add(sums: Float64Array, level: number, ms: number): void {
	sums[level] = (sums[level] as number) + ms;
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
