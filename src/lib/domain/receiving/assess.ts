import { custodyWindow, legsOf } from '../custody/legs';
import { legUses } from '../custody/leg-use';
import { placeExcursion } from '../custody/place-excursion';
import { findExcursions } from '../excursions/find-excursions';
import { findIncidents } from '../excursions/find-incidents';
import { findStops } from '../excursions/find-stops';
import { limitTimes } from '../excursions/limit-times';
import { courseOf, type Course } from '../shelf-life/course';
import { hoursAbove, hoursBelow, type LifeUsed } from '../shelf-life/life-used';
import { passagesOf } from '../shelf-life/passages';
import { rateBounds } from '../shelf-life/rate-bounds';
import { rateCurve, type RateCurve } from '../shelf-life/rate-curve';
import type { SpecFault } from '../shelf-life/spec-fault';
import { validateSpec } from '../shelf-life/validate';
import { ownRoom, type Room } from '../trace/room';
import { msPerHour } from '../units';
import { engineVersion } from './engine-version';
import type { AssessInput, Assessment, Gap, Range } from './assessment';
import { openingHours } from './opening';
import { rangeParts } from './range-parts';
import { gapsOf, journeyFigures } from './journey';
import { levelTimes } from './level-times';
import { lifeSides, type LifeSides } from './life-sides';

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

/**
 * What one trace says about one line: life used at every reading that counts, what is left, and what went wrong where.
 *
 * Low and high of what is left stack every bound the same way (warm readings, unkind gaps, the larger opening balance,
 * the shorter full life; and the reverse), because they are bounds and not deviations: the low holds if all are
 * unlucky at once, and the low decides.
 *
 * The series lies in `room`: in a shared one it lasts until the next assessment.
 */
export function assess(input: AssessInput, room: Room = ownRoom): Assessment {
	const { spec, trace, accuracyCelsius } = input;
	const faults = validateSpec(spec);
	if (faults.length > 0) throw new AssessmentRefusal('spec-faulty', faults);
	const lastReadingMs = trace.times[trace.times.length - 1] ?? 0;
	const course = courseOf(trace, custodyWindow(input.handovers, lastReadingMs), input.trims, room);
	if (course.times.length === 0) throw new AssessmentRefusal('no-readings-in-window');
	if (course.times.length === 1) throw new AssessmentRefusal('one-reading-in-window');
	const curve = rateCurve(spec);
	const bounds = rateBounds(spec);
	const passages = passagesOf(course, room);
	const sides = lifeSides(course, passages, { curve, bounds, accuracyCelsius }, room);
	const opening = openingHours(input.opening, spec, curve, course.times[0] as number, bounds);
	const used = totalOf(sides);
	const remaining = remainingOf(spec.fullLifeHours, spec.fullLifeUncertaintyHours, opening, used);
	const unobserved = unobservedFigures(gapsOf(course, passages, sides));
	const held = levelTimes(course, passages);
	const journey = journeyFigures(course, spec.mkt, held);
	const totalMs = held.besideMs.reduce((sum, ms) => sum + ms, 0) / 2;
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
		rangeParts: rangeParts(
			sides.watchedHours,
			unobserved.unobservedUsedHours,
			opening,
			spec.fullLifeUncertaintyHours
		),
		...journey,
		...unobserved,
		...modelFigures(course, curve, spec.chillingCelsius),
		limitTimes: limitTimes(spec, course, {
			meanCelsius: journey.meanCelsius,
			totalMs,
			restingMs: held.restingMs
		}),
		incidents: findIncidents(course, input.placement, held.standsForMs),
		...custodyFigures(input, course, curve, sides.value, remaining.value, lastReadingMs),
		series: seriesOf(course, sides)
	};
}

function totalOf({ value, lowHours, highHours }: LifeSides): Range {
	return { value: value.usedHours[value.usedHours.length - 1] as number, low: lowHours, high: highHours };
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
	const coldest = course.levels[0] as number;
	const warmest = course.levels[course.levels.length - 1] as number;
	return {
		belowModelHours: coldest < curve.fromCelsius ? hoursBelow(course, curve.fromCelsius) : 0,
		aboveModelHours: warmest > curve.toCelsius ? hoursAbove(course, curve.toCelsius) : 0,
		chilledHours:
			chillingCelsius !== null && coldest < chillingCelsius ? hoursBelow(course, chillingCelsius) : 0
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

/** All but what was used is worked out when it is asked for: only the chart draws them. */
function seriesOf(course: Course, sides: LifeSides): Assessment['series'] {
	let low: Float64Array | null = null;
	let high: Float64Array | null = null;
	return {
		times: course.times,
		get celsius() {
			return course.celsius;
		},
		usedHours: sides.value.usedHours,
		get usedLowHours() {
			return (low ??= sides.seriesOf('low'));
		},
		get usedHighHours() {
			return (high ??= sides.seriesOf('high'));
		}
	};
}
