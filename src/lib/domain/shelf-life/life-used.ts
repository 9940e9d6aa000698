import { RunningSum } from '../math/sum';
import { msPerHour } from '../units';
import { trimmed, unobserved, type Course } from './course';
import { curveRateAt, meanRate, type RateCurve } from './rate-curve';

/** Which bound is being worked out: readings as they are, or moved by the accuracy to the cold or the warm side. */
export type Side = 'value' | 'low' | 'high';

/** Life used from the first counted reading to each, hours at the reference temperature. */
export interface LifeUsed {
	readonly usedHours: Float64Array;
	/** Rate at each level of the course, shifted as the side demands. */
	readonly levelRates: Float64Array;
	readonly shiftCelsius: number;
}

/**
 * Integrates the rate over the course, exactly for temperature in a straight line between readings, and keeps the
 * total at every reading. Trimmed steps use nothing.
 *
 * Low and high move every reading by the instrument's accuracy: an offset that lasts is the worst a calibrated logger
 * can do, so nothing averages out. Across a gap the low holds the colder neighbour all through and the high the
 * warmer, each moved likewise: what nobody watched may have been either.
 */
export function lifeUsed(course: Course, curve: RateCurve, accuracyCelsius: number, side: Side): LifeUsed {
	const shiftCelsius = side === 'value' ? 0 : side === 'low' ? -accuracyCelsius : accuracyCelsius;
	const levels = course.levels.map((celsius) => celsius + shiftCelsius);
	const levelRates = levels.map((celsius) => curveRateAt(curve, celsius));
	const usedHours = new Float64Array(course.times.length);
	const sum = new RunningSum();
	for (let i = 0; i < course.steps.length; i++) {
		const step = course.steps[i];
		const a = course.levelOf[i] as number;
		const b = course.levelOf[i + 1] as number;
		if (step !== trimmed) {
			const hours = ((course.times[i + 1] as number) - (course.times[i] as number)) / msPerHour;
			const rateA = levelRates[a] as number;
			const rateB = levelRates[b] as number;
			const rate =
				step === unobserved && side !== 'value'
					? bracket(rateA, rateB, side)
					: meanRate(curve, levels[a] as number, levels[b] as number, rateA, rateB);
			sum.add(hours * rate);
		}
		usedHours[i + 1] = sum.total;
	}
	return { usedHours, levelRates, shiftCelsius };
}

function bracket(rateA: number, rateB: number, side: Side): number {
	return side === 'low' ? Math.min(rateA, rateB) : Math.max(rateA, rateB);
}

/** Index of the last reading at or before a time; −1 before the first. */
export function readingBefore(times: Float64Array, ms: number): number {
	let low = -1;
	let high = times.length;
	while (high - low > 1) {
		const middle = (low + high) >> 1;
		if ((times[middle] as number) <= ms) low = middle;
		else high = middle;
	}
	return low;
}

/**
 * Life used up to any instant, by the readings as they are: within a step the temperature is on the line between
 * its neighbours, so that cutting a journey anywhere changes nothing. Held at the ends of the course.
 */
export function usedUntil(course: Course, curve: RateCurve, used: LifeUsed, ms: number): number {
	const at = readingBefore(course.times, ms);
	if (at < 0) return 0;
	const before = used.usedHours[at] as number;
	if (at >= course.steps.length || course.steps[at] === trimmed || course.times[at] === ms) return before;
	const fromMs = course.times[at] as number;
	const { levels, levelOf } = course;
	const from = levels[levelOf[at] as number] as number;
	const fraction = (ms - fromMs) / ((course.times[at + 1] as number) - fromMs);
	const celsius = from + fraction * ((levels[levelOf[at + 1] as number] as number) - from);
	const rates = [curveRateAt(curve, from), curveRateAt(curve, celsius)] as const;
	return before + ((ms - fromMs) / msPerHour) * meanRate(curve, from, celsius, ...rates);
}

/** Hours the course spends strictly below a temperature, by the straight lines between readings. */
export function hoursBelow(course: Course, celsius: number): number {
	return hoursBeyond(course, celsius, -1);
}

/** Hours strictly above a temperature. */
export function hoursAbove(course: Course, celsius: number): number {
	return hoursBeyond(course, celsius, 1);
}

/** The part of the step after reading `at` that lies strictly above (1) or below (−1) a temperature. */
export function fractionBeyond(
	readings: ArrayLike<number>,
	at: number,
	celsius: number,
	sign: 1 | -1
): number {
	const a = sign * ((readings[at] as number) - celsius);
	const b = sign * ((readings[at + 1] as number) - celsius);
	if (a <= 0 && b <= 0) return 0;
	return a >= 0 && b >= 0 ? 1 : Math.max(a, b) / Math.abs(a - b);
}

function hoursBeyond(course: Course, celsius: number, sign: 1 | -1): number {
	const sum = new RunningSum();
	for (let i = 0; i < course.steps.length; i++) {
		if (course.steps[i] === trimmed) continue;
		const fraction = fractionBeyond(course.celsius, i, celsius, sign);
		if (fraction > 0)
			sum.add((fraction * ((course.times[i + 1] as number) - (course.times[i] as number))) / msPerHour);
	}
	return sum.total;
}
