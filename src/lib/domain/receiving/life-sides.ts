import { RunningSum } from '../math/sum';
import { observed, trimmed, type Course } from '../shelf-life/course';
import type { LifeUsed } from '../shelf-life/life-used';
import type { RateBounds } from '../shelf-life/rate-bounds';
import { curveRateAt, meanRate, type RateCurve } from '../shelf-life/rate-curve';
import { ownRoom, type Room } from '../trace/room';
import { msPerHour } from '../units';
import type { Range } from './assessment';

/** Life used by the readings as they are at every reading, and with them moved by the accuracy to either side. */
export interface LifeSides {
	readonly value: LifeUsed;
	readonly lowHours: number;
	readonly highHours: number;
	/** The low or the high at every reading: for whoever draws it, since it takes as long again. */
	seriesOf(side: 'low' | 'high'): Float64Array;
	/** What a gap after a reading used: bridged linearly, and held at the colder or warmer neighbour. */
	acrossGap(reading: number): Range;
}

/** Neighbouring readings are seldom further apart than this many levels: their mean rates are kept in a table. */
const reach = 8;
const width = 2 * reach + 1;
const sides = 3;
/** Plain sums of this few terms lose under a tenth of 1e-13; the sums of the blocks are compensated. */
const blockSteps = 256;

/** The rate at each level on the three sides, and the mean between two levels, worked out once. */
class LevelRates {
	readonly #curves: readonly [RateCurve, RateCurve, RateCurve];
	readonly shifts: readonly [number, number, number];
	readonly rates: readonly [Float64Array, Float64Array, Float64Array];
	/** Mean rates value, low, high for level a to a + d at ((a × width) + d + reach) × 3; NaN until asked for. */
	readonly means: Float64Array;
	readonly #levels: Float64Array;

	constructor(levels: Float64Array, curve: RateCurve, accuracyCelsius: number, bounds: RateBounds) {
		this.#curves = [curve, bounds.low, bounds.high];
		this.#levels = levels;
		this.shifts = [0, -accuracyCelsius, accuracyCelsius];
		const ratesOf = (side: 0 | 1 | 2) =>
			levels.map((celsius) => curveRateAt(this.#curves[side], celsius + this.shifts[side]));
		this.rates = [ratesOf(0), ratesOf(1), ratesOf(2)];
		this.means = new Float64Array(levels.length * width * sides).fill(NaN);
	}

	mean(side: 0 | 1 | 2, a: number, b: number): number {
		const shift = this.shifts[side];
		const rates = this.rates[side];
		const from = (this.#levels[a] as number) + shift;
		const to = (this.#levels[b] as number) + shift;
		return meanRate(this.#curves[side], from, to, rates[a] as number, rates[b] as number);
	}

	fill(at: number, a: number, b: number): void {
		this.means[at] = this.mean(0, a, b);
		this.means[at + 1] = this.mean(1, a, b);
		this.means[at + 2] = this.mean(2, a, b);
	}

	across(a: number, b: number): readonly [number, number, number] {
		return [this.mean(0, a, b), this.mean(1, a, b), this.mean(2, a, b)];
	}

	/** Across a gap the low holds the colder neighbour all through and the high the warmer. */
	bracket(a: number, b: number): readonly [number, number, number] {
		const [, low, high] = this.rates;
		return [
			this.mean(0, a, b),
			Math.min(low[a] as number, low[b] as number),
			Math.max(high[a] as number, high[b] as number)
		];
	}
}

/**
 * Integrates the rate over the course on all three sides at once, exactly for temperature in a straight line between
 * readings, and keeps the total at every reading. Trimmed steps use nothing.
 *
 * Low and high move every reading by the instrument's accuracy: an offset that lasts is the worst a calibrated logger
 * can do, so nothing averages out. What nobody watched may have been as cold, or as warm, as either neighbour all
 * through, moved likewise. `bounds` are the slowest and the fastest the model can be by its own ±: the low runs on
 * the one, the high on the other.
 */
export function lifeSides(
	course: Course,
	curve: RateCurve,
	accuracyCelsius: number,
	room: Room = ownRoom,
	bounds: RateBounds = { low: curve, high: curve }
): LifeSides {
	const rates = new LevelRates(course.levels, curve, accuracyCelsius, bounds);
	const usedHours = room.floats('used', course.times.length).fill(0, 0, 1);
	const [value, low, high] = [new RunningSum(), new RunningSum(), new RunningSum()];
	const block = new Float64Array(sides);
	for (let from = 0; from < course.steps.length; from += blockSteps) {
		usedHours[from] = value.total;
		addBlock(course, rates, usedHours, from, Math.min(from + blockSteps, course.steps.length), block);
		value.add(block[0] as number);
		low.add(block[1] as number);
		high.add(block[2] as number);
	}
	return {
		value: { usedHours, levelRates: rates.rates[0], shiftCelsius: 0 },
		lowHours: low.total,
		highHours: high.total,
		seriesOf: (side) => sideSeries(course, rates, side === 'low' ? 1 : 2),
		acrossGap: (reading) => gapRange(course, rates, reading)
	};
}

/** Adds the steps of one block; `block` gets what they used. The loop a million readings go through. */
function addBlock(
	{ times, steps, levelOf, isEven = false, usualIntervalMs }: Course,
	rates: LevelRates,
	usedHours: Float64Array,
	from: number,
	to: number,
	block: Float64Array
): void {
	const { means } = rates;
	const baseHours = usedHours[from] as number;
	let hours = usualIntervalMs / msPerHour;
	let value = 0;
	let low = 0;
	let high = 0;
	let a = levelOf[from] as number;
	for (let i = from + 1; i <= to; i++) {
		const b = levelOf[i] as number;
		if (!isEven) hours = hoursOf(times, steps, i - 1);
		const apart = b - a + reach;
		if (apart >= 0 && apart < width && (isEven || steps[i - 1] === observed)) {
			const at = (a * width + apart) * sides;
			if (Number.isNaN(means[at])) rates.fill(at, a, b);
			value += hours * (means[at] as number);
			low += hours * (means[at + 1] as number);
			high += hours * (means[at + 2] as number);
		} else {
			const means = isEven || steps[i - 1] === observed ? rates.across(a, b) : rates.bracket(a, b);
			value += hours * means[0];
			low += hours * means[1];
			high += hours * means[2];
		}
		usedHours[i] = baseHours + value;
		a = b;
	}
	block[0] = value;
	block[1] = low;
	block[2] = high;
}

/** Hours of the step after a reading; none where it was trimmed. */
function hoursOf(times: Float64Array, steps: Uint8Array, at: number): number {
	return steps[at] === trimmed ? 0 : ((times[at + 1] as number) - (times[at] as number)) / msPerHour;
}

/** One side at every reading, added up as `addBlock` does, to the same digits. */
function sideSeries(course: Course, rates: LevelRates, side: 1 | 2): Float64Array {
	const { times, steps, levelOf } = course;
	const series = new Float64Array(times.length);
	const sum = new RunningSum();
	let inBlock = 0;
	for (let i = 1; i < series.length; i++) {
		const [a, b] = [levelOf[i - 1] as number, levelOf[i] as number];
		const rate = steps[i - 1] === observed ? rates.mean(side, a, b) : rates.bracket(a, b)[side];
		inBlock += hoursOf(times, steps, i - 1) * rate;
		series[i] = sum.total + inBlock;
		if (i % blockSteps !== 0) continue;
		sum.add(inBlock);
		inBlock = 0;
	}
	return series;
}

function gapRange({ times, steps, levelOf }: Course, rates: LevelRates, reading: number): Range {
	const hours = hoursOf(times, steps, reading);
	const [value, low, high] = rates.bracket(levelOf[reading] as number, levelOf[reading + 1] as number);
	return { value: hours * value, low: hours * low, high: hours * high };
}
