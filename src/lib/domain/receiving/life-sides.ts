import { RunningSum } from '../math/sum';
import { observed, trimmed, unobserved, type Course } from '../shelf-life/course';
import type { LifeUsed } from '../shelf-life/life-used';
import { passageAt, type Passages } from '../shelf-life/passages';
import { ownRoom, type Room } from '../trace/room';
import { msPerHour } from '../units';
import type { Range } from './assessment';
import { LevelRates, type RateGiven, type SideIndex } from './level-rates';

/** Life used by the readings as they are at every reading, and with them moved by the accuracy to either side. */
export interface LifeSides {
	readonly value: LifeUsed;
	readonly lowHours: number;
	readonly highHours: number;
	/** How far the two are from the value by what was watched alone, gaps left out: below nothing, and above it. */
	readonly watchedHours: { readonly low: number; readonly high: number };
	/** The low or the high at every reading: for whoever draws it, since it takes as long again. */
	seriesOf(side: 'low' | 'high'): Float64Array;
	/** What a gap after a reading used: bridged linearly, and held at the colder or warmer neighbour. */
	acrossGap(reading: number): Range;
}

/** Plain sums of this few terms lose under a tenth of 1e-13; the sums of the blocks are compensated. */
const blockSteps = 256;

/** What the loop over a million readings goes through. */
interface Integrand {
	readonly course: Course;
	readonly passages: Passages;
	readonly rates: LevelRates;
	/** By place among the passages: the hours used by each where all steps are alike, else the mean rate. */
	readonly table: Float64Array;
	readonly usedHours: Float64Array;
}

/**
 * Integrates the rate over the course on all three sides, exactly for temperature in a straight line between readings,
 * and keeps the total of the readings as they are at every one. Trimmed steps use nothing.
 *
 * Low and high move every reading by the instrument's accuracy: an offset that lasts is the worst a calibrated logger
 * can do, so nothing averages out. What nobody watched may have been as cold, or as warm, as either neighbour all
 * through, moved likewise. The bounds given are the slowest and the fastest the model can be by its own ±: the low
 * runs on the one, the high on the other. How far they are from the value is added up by passage: nothing where nothing
 * is in doubt, and no matter in which order the readings came.
 */
export function lifeSides(
	course: Course,
	passages: Passages,
	given: RateGiven,
	room: Room = ownRoom
): LifeSides {
	const rates = new LevelRates(course.levels, given);
	const table = room.floats('means', passages.ms.length);
	const [below, above] = [new RunningSum(), new RunningSum()];
	rates.fill(table, passages, course.isEven ? course.usualIntervalMs / msPerHour : 1, below, above);
	const apartHours = (sum: RunningSum, side: 1 | 2, readings: readonly number[], isSilent: boolean) => {
		for (const at of readings) sum.add(acrossHours(course, rates, side, at, isSilent));
		for (const at of readings) sum.add(-acrossHours(course, rates, 0, at, isSilent));
		return sum.total;
	};
	const watchedHours = {
		low: apartHours(below, 1, passages.far, false),
		high: apartHours(above, 2, passages.far, false)
	};
	const usedHours = room.floats('used', course.times.length).fill(0, 0, 1);
	addValue({ course, passages, rates, table, usedHours });
	const totalHours = usedHours[usedHours.length - 1] ?? 0;
	return {
		value: { usedHours, levelRates: rates.of[0], shiftCelsius: 0 },
		lowHours: totalHours + apartHours(below, 1, passages.silent, true),
		highHours: totalHours + apartHours(above, 2, passages.silent, true),
		watchedHours,
		seriesOf: (side) => sideSeries(course, rates, side === 'low' ? 1 : 2),
		acrossGap: (reading) => gapRange(course, rates, reading)
	};
}

function addValue(integrand: Integrand): void {
	const { course, usedHours } = integrand;
	const sum = new RunningSum();
	const addBlock = course.isEven ? addEvenBlock : addUnevenBlock;
	for (let from = 0; from < course.steps.length; from += blockSteps) {
		usedHours[from] = sum.total;
		sum.add(addBlock(integrand, from, Math.min(from + blockSteps, course.steps.length)));
	}
}

/** Adds the steps of one block and gives what they used. */
function addEvenBlock(integrand: Integrand, from: number, to: number): number {
	const { course, passages, rates, table, usedHours } = integrand;
	const { levelOf, usualIntervalMs } = course;
	const { reach } = passages;
	const width = 2 * reach + 1;
	const baseHours = usedHours[from] as number;
	let hours = 0;
	let a = levelOf[from] as number;
	for (let i = from + 1; i <= to; i++) {
		const b = levelOf[i] as number;
		const apart = b - a + reach;
		if (apart >= 0 && apart < width) hours += table[a * width + apart] as number;
		else hours += (usualIntervalMs / msPerHour) * rates.mean(0, a, b);
		usedHours[i] = baseHours + hours;
		a = b;
	}
	return hours;
}

/** The same of steps of any length, some of them gaps or trims. */
function addUnevenBlock(integrand: Integrand, from: number, to: number): number {
	const { course, passages, rates, table, usedHours } = integrand;
	const { levelOf, times, steps } = course;
	const baseHours = usedHours[from] as number;
	let hours = 0;
	for (let i = from + 1; i <= to; i++) {
		const [a, b] = [levelOf[i - 1] as number, levelOf[i] as number];
		const at = steps[i - 1] === observed ? passageAt(passages, a, b) : -1;
		hours += hoursOf(times, steps, i - 1) * (at < 0 ? rates.mean(0, a, b) : (table[at] as number));
		usedHours[i] = baseHours + hours;
	}
	return hours;
}

function acrossHours(
	{ times, steps, levelOf }: Course,
	rates: LevelRates,
	side: SideIndex,
	at: number,
	isSilent: boolean
): number {
	const rate = rates.across(side, levelOf[at] as number, levelOf[at + 1] as number, isSilent);
	return hoursOf(times, steps, at) * rate;
}

/** Hours of the step after a reading; none where it was trimmed. */
function hoursOf(times: Float64Array, steps: Uint8Array, at: number): number {
	return steps[at] === trimmed ? 0 : ((times[at + 1] as number) - (times[at] as number)) / msPerHour;
}

/** One side at every reading, in blocks as the value is. */
function sideSeries(course: Course, rates: LevelRates, side: 1 | 2): Float64Array {
	const series = new Float64Array(course.times.length);
	const sum = new RunningSum();
	let inBlock = 0;
	for (let i = 1; i < series.length; i++) {
		inBlock += acrossHours(course, rates, side, i - 1, course.steps[i - 1] === unobserved);
		series[i] = sum.total + inBlock;
		if (i % blockSteps !== 0) continue;
		sum.add(inBlock);
		inBlock = 0;
	}
	return series;
}

function gapRange(course: Course, rates: LevelRates, reading: number): Range {
	const used = (side: SideIndex) => acrossHours(course, rates, side, reading, true);
	return { value: used(0), low: used(1), high: used(2) };
}
