import { custodyWindow, legsOf } from '../custody/legs';
import { legUses } from '../custody/leg-use';
import { placeExcursion } from '../custody/place-excursion';
import { findExcursions } from '../excursions/find-excursions';
import { findStops } from '../excursions/find-stops';
import { courseOf, type Course } from '../shelf-life/course';
import { hoursAbove, hoursBelow, lifeUsed, type LifeUsed } from '../shelf-life/life-used';
import { rateCurve, type RateCurve } from '../shelf-life/rate-curve';
import type { SpecFault } from '../shelf-life/spec-fault';
import { validateSpec } from '../shelf-life/validate';
import { msPerHour } from '../units';
import { engineVersion } from './engine-version';
import type { AssessInput, Assessment, Gap, Range } from './assessment';
import { openingHours } from './opening';
import { gapsOf, journeyFigures } from './journey';

/** Why there is nothing to assess; the spec's faults come with it where they are the reason. */
export type AssessmentRefusalCode = 'spec-faulty' | 'no-readings-in-window' | 'one-reading-in-window';

/** The input cannot be assessed; to be said to whoever gave it, never replaced by a default. */
export class AssessmentRefusal extends Error {
	override readonly name = 'AssessmentRefusal';

	constructor(
		readonly code: AssessmentRefusalCode,
		readonly specFaults: readonly SpecFault[] = []
	) {
		super(code);
	}
}

interface Sides {
	readonly value: LifeUsed;
	readonly low: LifeUsed;
	readonly high: LifeUsed;
}

/**
 * What one trace says about one line: life used at every reading that counts, what is left, and what went wrong where.
 *
 * Low and high of what is left stack every bound the same way (warm readings, unkind gaps, the larger opening balance,
 * the shorter full life; and the reverse), because they are bounds and not deviations: the low holds if all are
 * unlucky at once, and the low decides.
 */
export function assess(input: AssessInput): Assessment {
	const { spec, trace, accuracyCelsius } = input;
	const faults = validateSpec(spec);
	if (faults.length > 0) throw new AssessmentRefusal('spec-faulty', faults);
	const lastReadingMs = trace.times[trace.times.length - 1] ?? 0;
	const course = courseOf(trace, custodyWindow(input.handovers, lastReadingMs), input.trims);
	if (course.times.length === 0) throw new AssessmentRefusal('no-readings-in-window');
	if (course.times.length === 1) throw new AssessmentRefusal('one-reading-in-window');
	const curve = rateCurve(spec);
	const sides: Sides = {
		value: lifeUsed(course, curve, accuracyCelsius, 'value'),
		low: lifeUsed(course, curve, accuracyCelsius, 'low'),
		high: lifeUsed(course, curve, accuracyCelsius, 'high')
	};
	const opening = openingHours(input.opening, spec, curve, course.times[0] as number);
	const used = rangeAt(sides, course.times.length - 1);
	const remaining = remainingOf(spec.fullLifeHours, spec.fullLifeUncertaintyHours, opening, used);
	const gaps = gapsOf(course, sides);
	return {
		engineVersion,
		windowFromMs: course.times[0] as number,
		windowToMs: course.times[course.times.length - 1] as number,
		readings: course.times.length,
		usualIntervalMs: course.usualIntervalMs,
		fullLifeHours: spec.fullLifeHours,
		neededHours: input.neededHours ?? spec.neededHours,
		openingHours: opening,
		usedHours: used,
		remainingHours: remaining,
		...journeyFigures(course, spec.mkt),
		...unobservedFigures(gaps),
		...modelFigures(course, curve, spec.chillingCelsius),
		...custodyFigures(input, course, curve, sides.value, remaining.value, lastReadingMs),
		series: seriesOf(course, sides)
	};
}

function rangeAt(sides: Sides, index: number): Range {
	return {
		value: sides.value.usedHours[index] as number,
		low: sides.low.usedHours[index] as number,
		high: sides.high.usedHours[index] as number
	};
}

/** Full − opening − used. The low takes the high of what was used, and the reverse; nothing is clipped at zero. */
export function remainingOf(fullHours: number, plusMinusHours: number, opening: Range, used: Range): Range {
	return {
		value: fullHours - opening.value - used.value,
		low: fullHours - plusMinusHours - opening.high - used.high,
		high: fullHours + plusMinusHours - opening.low - used.low
	};
}

function unobservedFigures(gaps: readonly Gap[]) {
	const total = (figure: (gap: Gap) => number) => gaps.reduce((sum, gap) => sum + figure(gap), 0);
	return {
		gaps,
		unobservedHours: total((gap) => gap.toMs - gap.fromMs) / msPerHour,
		unobservedUsedHours: {
			value: total((gap) => gap.usedHours.value),
			low: total((gap) => gap.usedHours.low),
			high: total((gap) => gap.usedHours.high)
		}
	};
}

function modelFigures(course: Course, curve: RateCurve, chillingCelsius: number | null) {
	return {
		belowModelHours: hoursBelow(course, curve.fromCelsius),
		aboveModelHours: hoursAbove(course, curve.toCelsius),
		chilledHours: chillingCelsius === null ? 0 : hoursBelow(course, chillingCelsius)
	};
}

function custodyFigures(
	input: AssessInput,
	course: Course,
	curve: RateCurve,
	used: LifeUsed,
	remainingHours: number,
	lastReadingMs: number
) {
	const { spec, accuracyCelsius, placement, handovers } = input;
	const legs = legsOf(handovers, lastReadingMs);
	const found = findExcursions({ spec, course, curve, used, accuracyCelsius, placement });
	const { referenceCelsius } = spec;
	return {
		excursions: found.map((excursion) => placeExcursion(excursion, legs, handovers)),
		stops: findStops({ spec, course, accuracyCelsius, placement }),
		legs: legUses({ referenceCelsius, course, curve, used, remainingHours }, legs)
	};
}

function seriesOf(course: Course, sides: Sides): Assessment['series'] {
	return {
		times: course.times,
		celsius: course.celsius,
		usedHours: sides.value.usedHours,
		usedLowHours: sides.low.usedHours,
		usedHighHours: sides.high.usedHours
	};
}
