import { RunningSum } from '../math/sum';
import { usualIntervalMs } from '../trace/interval';
import { timeWeightedMean } from '../trace/statistics';
import { bareCourse } from './bare-course';
import { lifeRunsOutMs } from './life-runs-out';
import { fractionBeyond, lifeUsed } from './life-used';
import { meanKineticCelsius } from './mean-kinetic';
import { rateCurve, type RateCurve, type RateSpec } from './rate-curve';

/** A model, its full life and bare readings: what another program asks about, without spec, custody or gaps. */
export interface LifeQuestion {
	readonly rate: RateSpec;
	readonly lifeHours: number;
	/** ms since the first reading, ascending; two readings at one time are a jump. */
	readonly timesMs: Float64Array;
	readonly celsius: Float64Array;
	readonly aboveCelsius: readonly number[];
	readonly belowCelsius: readonly number[];
	readonly accuracyCelsius: number;
	/** null: the customary one. */
	readonly deltaHKilojoulesPerMole: number | null;
}

/** Hours are hours at the model's reference temperature; seconds are by the clock. */
export interface LifeComputed {
	readonly usedHours: number;
	readonly usedHoursAtReading: Float64Array;
	/** With every reading colder, and warmer, by the accuracy. */
	readonly lowUsedHours: number;
	readonly highUsedHours: number;
	readonly mktCelsius: number;
	readonly meanCelsius: number;
	readonly secondsAbove: readonly number[];
	readonly secondsBelow: readonly number[];
	readonly secondsOutsideModel: number;
	/** ms since the first reading at which the life is used up; null while some is left. */
	readonly exhaustedAfterMs: number | null;
}

/** Computes life used, exactly for temperature in a straight line between readings. Needs one reading at least. */
export function computeLife(question: LifeQuestion): LifeComputed {
	const { timesMs, celsius, lifeHours, accuracyCelsius } = question;
	const curve = rateCurve(question.rate);
	const course = bareCourse(timesMs, celsius);
	const used = lifeUsed(course, curve, 0, 'value');
	const last = timesMs.length - 1;
	const usedHours = used.usedHours[last] as number;
	const shifted = (side: 'low' | 'high') =>
		accuracyCelsius === 0
			? usedHours
			: (lifeUsed(course, curve, accuracyCelsius, side).usedHours[last] as number);
	const seconds = (limitCelsius: number, sign: 1 | -1) => secondsBeyond(timesMs, celsius, limitCelsius, sign);
	return {
		usedHours,
		usedHoursAtReading: used.usedHours,
		lowUsedHours: shifted('low'),
		highUsedHours: shifted('high'),
		mktCelsius: mktOf(timesMs, celsius, question.deltaHKilojoulesPerMole),
		meanCelsius: timeWeightedMean(timesMs, celsius) as number,
		secondsAbove: question.aboveCelsius.map((limitCelsius) => seconds(limitCelsius, 1)),
		secondsBelow: question.belowCelsius.map((limitCelsius) => seconds(limitCelsius, -1)),
		secondsOutsideModel: outsideOf(curve, seconds),
		exhaustedAfterMs: lifeRunsOutMs(course, curve, used, lifeHours)
	};
}

function outsideOf(curve: RateCurve, seconds: (limitCelsius: number, sign: 1 | -1) => number): number {
	const below = curve.fromCelsius === -Infinity ? 0 : seconds(curve.fromCelsius, -1);
	const above = curve.toCelsius === Infinity ? 0 : seconds(curve.toCelsius, 1);
	return below + above;
}

function secondsBeyond(
	timesMs: Float64Array,
	celsius: Float64Array,
	limitCelsius: number,
	sign: 1 | -1
): number {
	const sum = new RunningSum();
	for (let i = 0; i + 1 < timesMs.length; i++) {
		const fraction = fractionBeyond(celsius, i, limitCelsius, sign);
		if (fraction > 0) sum.add(fraction * ((timesMs[i + 1] as number) - (timesMs[i] as number)));
	}
	return sum.total / 1000;
}

/** Each reading stands for the interval that follows it, the last for the usual one; without time all alike. */
function mktOf(timesMs: Float64Array, celsius: Float64Array, deltaH: number | null): number {
	const usualMs = usualStepMs(timesMs);
	const weights = timesMs.map((ms, i) =>
		i + 1 < timesMs.length ? (timesMs[i + 1] as number) - ms : usualMs
	);
	const timed = meanKineticCelsius(celsius, weights, deltaH);
	return timed ?? (meanKineticCelsius(celsius, weights.fill(1), deltaH) as number);
}

/** Steps are told apart by this much: times sent as fractions of a second do not come out alike to the last digit. */
const stepGrainMs = 0.01;

/** The most frequent step that takes time, the shorter one where two are equally frequent; 0 without one. */
function usualStepMs(timesMs: Float64Array): number {
	const steps = timesMs.subarray(1).map((ms, i) => ms - (timesMs[i] as number));
	const taking = steps.filter((stepMs) => stepMs > 0).map((stepMs) => Math.round(stepMs / stepGrainMs));
	let grains = 0;
	const usual = usualIntervalMs([0, ...taking].map((step) => (grains += step)));
	return steps.find((stepMs) => stepMs > 0 && Math.round(stepMs / stepGrainMs) === usual) ?? 0;
}

/** Whether every figure is one: a model may run so fast that no number holds what it uses. */
export function isComputable(computed: LifeComputed): boolean {
	const { usedHours, lowUsedHours, highUsedHours, mktCelsius, meanCelsius } = computed;
	return [usedHours, lowUsedHours, highUsedHours, mktCelsius, meanCelsius].every(Number.isFinite);
}
