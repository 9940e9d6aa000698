import { trimmed, unobserved, type Course } from '../shelf-life/course';
import type { LifeUsed } from '../shelf-life/life-used';
import { meanKineticCelsius, worstWindowMeanKinetic } from '../shelf-life/mean-kinetic';
import type { MktRule } from '../shelf-life/spec';
import { extremesOf, timeWeightedMean } from '../trace/statistics';
import { msPerHour } from '../units';
import type { Gap } from './assessment';

/** Mean, extremes and mean kinetic temperature of a course with readings. */
export function journeyFigures(course: Course, rule: MktRule) {
	const { times, celsius, steps } = course;
	const extremes = extremesOf(celsius);
	const weights = mktWeightsMs(course);
	const energy = rule.activationEnergyKilojoulesPerMole;
	const first = celsius[0] as number;
	return {
		meanCelsius: timeWeightedMean(times, celsius, (step) => steps[step] !== trimmed) ?? first,
		minCelsius: extremes?.min ?? first,
		maxCelsius: extremes?.max ?? first,
		mktCelsius: meanKineticCelsius(celsius, weights, energy) ?? first,
		worstWindowMktCelsius:
			rule.windowHours === null
				? null
				: worstWindowMeanKinetic(celsius, weights, rule.windowHours * msPerHour, energy)
	};
}

/**
 * Each reading stands for the interval that follows it, the last for the usual interval, so that an evenly spaced log
 * gives the textbook figure over its readings. Before a trim a reading stands for the usual interval too: what was
 * cut out is not the journey.
 */
function mktWeightsMs(course: Course): Float64Array {
	const { times, steps, usualIntervalMs } = course;
	const weights = new Float64Array(times.length).fill(usualIntervalMs);
	for (let i = 0; i < steps.length; i++) {
		const stepMs = (times[i + 1] as number) - (times[i] as number);
		weights[i] = steps[i] === trimmed ? Math.min(stepMs, usualIntervalMs) : stepMs;
	}
	return weights;
}

/** Every gap with what it used: bridged linearly, and bracketed by its neighbours. */
export function gapsOf(course: Course, sides: Record<'value' | 'low' | 'high', LifeUsed>): Gap[] {
	const gaps: Gap[] = [];
	course.steps.forEach((step, i) => {
		if (step !== unobserved) return;
		const within = ({ usedHours }: LifeUsed) => (usedHours[i + 1] as number) - (usedHours[i] as number);
		gaps.push({
			fromMs: course.times[i] as number,
			toMs: course.times[i + 1] as number,
			usedHours: { value: within(sides.value), low: within(sides.low), high: within(sides.high) }
		});
	});
	return gaps;
}
