import { needWorthHours } from '../shelf-life/need';
import { rateCurve } from '../shelf-life/rate-curve';
import { msPerHour } from '../units';
import type { Assessment, Excursion, LegUse, StopHit } from './assessment';
import type { Evidence } from './evidence';
import type { Grade, Reason } from './recommendation';

/** Unobserved time up to this part of the window is a note. */
const unobservedNoteFraction = 0.25;
/** A logger silent this long before the end of the journey is a note; longer and the life figure lacks too much. */
const stoppedEarlyNoteHours = 4;

const excursionGrades = { minor: 'inform', major: 'note', critical: 'hold' } as const;

/**
 * Life left against what the customer must have when the onward trip is over: what is not there now will not be there
 * then, however short and cold the trip. What the trip itself takes is the forecast's to say.
 */
export function customerLifeReasons({ assessment, spec }: Evidence): Reason[] {
	const need = spec.neededAtCustomer;
	if (assessment === null || need === undefined) return [];
	const neededHours = needWorthHours(spec, need);
	const lowHours = assessment.remainingHours.low;
	if (lowHours >= neededHours) return [];
	const { hours: customerHours, celsius: customerCelsius } = need;
	return [
		{ code: 'customer-life-short', grade: 'hold', lowHours, neededHours, customerHours, customerCelsius }
	];
}

/** Life left against the life needed. */
export function lifeReasons({ assessment, neededHours }: Evidence): Reason[] {
	if (assessment === null) return [{ code: 'life-not-known', grade: 'note' }];
	const { low: lowHours, value: valueHours, high: highHours } = assessment.remainingHours;
	if (lowHours >= neededHours)
		return [{ code: 'life-suffices', grade: 'inform', lowHours, valueHours, neededHours }];
	if (valueHours >= neededHours)
		return [{ code: 'life-low-short', grade: 'hold', lowHours, valueHours, neededHours }];
	const grade: Grade = highHours >= neededHours ? 'hold' : 'reject';
	return [{ code: 'life-short', grade, lowHours, highHours, valueHours, neededHours }];
}

/** A stop that was reached, or may have been. */
export function stopReason(hit: StopHit, { accuracyCelsius }: Evidence): Reason {
	const { kind: stop, stopCelsius, extremeCelsius, firstAtMs: atMs, minutes } = hit;
	if (hit.isInDoubt) {
		return { code: 'stop-in-doubt', grade: 'hold', stop, stopCelsius, extremeCelsius, accuracyCelsius };
	}
	return { code: 'stop-reached', grade: 'reject', stop, stopCelsius, extremeCelsius, atMs, minutes };
}

/** Every excursion, numbered as on the docket. */
export function excursionReasons({ excursions, legs }: Assessment): Reason[] {
	return excursions.map((excursion, i) => ({
		code: 'excursion',
		grade: excursionGrade(excursion),
		kind: excursion.kind,
		severity: excursion.severity,
		ordinal: i + 1,
		extremeCelsius: excursion.extremeCelsius,
		limitCelsius: excursion.limitCelsius,
		minutes: excursion.minutes,
		costHours: excursion.costHours,
		holders: holdersOf(excursion, legs)
	}));
}

function excursionGrade({ severity, isInDoubt }: Excursion): Grade {
	return isInDoubt && severity === 'critical' ? 'note' : excursionGrades[severity];
}

function holdersOf(excursion: Excursion, legs: readonly LegUse[]): string[] {
	return legs.filter((leg) => excursion.legs.includes(leg.ordinal)).map((leg) => leg.holder);
}

/** Mean kinetic temperature over its limit, the worst window where the spec names one. */
export function mktReasons({ spec, assessment }: Evidence): Reason[] {
	const { limitCelsius, windowHours } = spec.mkt;
	if (assessment === null || limitCelsius === null) return [];
	const mktCelsius = assessment.worstWindowMktCelsius ?? assessment.mktCelsius;
	return mktCelsius > limitCelsius
		? [{ code: 'mkt-over-limit', grade: 'hold', mktCelsius, limitCelsius, windowHours }]
		: [];
}

/** A logger that fell silent before the journey ended. */
export function earlyStopReasons({ assessment, journeyEndMs }: Evidence): Reason[] {
	if (assessment === null || journeyEndMs === null) return [];
	const missingMs = journeyEndMs - assessment.windowToMs;
	// The last interval is never complete: the journey ends between two readings.
	if (missingMs <= 2 * assessment.usualIntervalMs) return [];
	const missingHours = missingMs / msPerHour;
	const grade: Grade = missingHours > stoppedEarlyNoteHours ? 'hold' : 'note';
	return [{ code: 'logger-stopped-early', grade, missingHours }];
}

/** Time nobody watched. */
export function unobservedReasons({ assessment }: Evidence): Reason[] {
	if (assessment === null || assessment.gaps.length === 0) return [];
	const windowHours = (assessment.windowToMs - assessment.windowFromMs) / msPerHour;
	const { unobservedHours: hours, unobservedUsedHours, gaps } = assessment;
	const grade: Grade = hours > unobservedNoteFraction * windowHours ? 'hold' : 'note';
	return [{ code: 'unobserved', grade, hours, usedHours: unobservedUsedHours.value, gaps: gaps.length }];
}

/** Time at temperatures the model does not speak for. */
export function modelReasons({ spec, assessment }: Evidence): Reason[] {
	if (assessment === null) return [];
	const hours = assessment.belowModelHours + assessment.aboveModelHours;
	// A life table or bands may end before the spec's own range does.
	const { fromCelsius, toCelsius } = rateCurve(spec);
	return hours > 0 ? [{ code: 'outside-model', grade: 'note', hours, fromCelsius, toCelsius }] : [];
}

/** An opening balance nobody declared. */
export function openingReasons({ assessment, openingKind }: Evidence): Reason[] {
	if (assessment === null || openingKind !== 'undeclared') return [];
	return [{ code: 'opening-undeclared', grade: 'note', assumedHours: assessment.openingHours.value }];
}
