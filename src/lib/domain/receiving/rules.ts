import { msPerHour } from '../units';
import type { Assessment, Excursion, LegUse, StopHit } from './assessment';
import type { Evidence } from './evidence';
import type { Grade, Reason } from './recommendation';

/** A rule looks at the evidence and says what it found: nothing, one thing or several. */
export interface Rule {
	readonly name: string;
	readonly find: (evidence: Evidence) => readonly Reason[];
}

/** Unobserved time up to this part of the window is a note. */
const unobservedNoteFraction = 0.25;
/** A logger silent this long before the end of the journey is a note; longer and the life figure lacks too much. */
const stoppedEarlyNoteHours = 4;
/** Pulp and the last readings are expected to agree within this beside the logger's accuracy. Practice: ±1 °C probes. */
const pulpAgreementCelsius = 1;

const excursionGrades = { minor: 'inform', major: 'note', critical: 'hold' } as const;

/**
 * The rules, in the order their reasons are shown within one grade.
 *
 * | finding | grade |
 * | --- | --- |
 * | low meets the need | inform |
 * | value meets it, low does not; or high alone does | hold |
 * | not even the high meets it | reject |
 * | no trace | note: never a hold by itself |
 * | stop reached / in doubt | reject / hold |
 * | excursion minor / major / critical | inform / note / hold; one grade down to note at most where in doubt |
 * | unobserved up to a quarter of the window / more | note / hold |
 * | logger stopped up to 4 h early / more | note / hold |
 * | mean kinetic temperature over its limit | hold |
 * | time outside the model, opening undeclared, calibration overdue, pulp against trace, cases | note |
 * | loggers disagree, seal broken, pulp beyond the limit | hold |
 */
export const rules: readonly Rule[] = [
	{ name: 'life', find: lifeReasons },
	{
		name: 'stops',
		find: (evidence) => (evidence.assessment?.stops ?? []).map((hit) => stopReason(hit, evidence))
	},
	{ name: 'excursions', find: ({ assessment }) => (assessment === null ? [] : excursionReasons(assessment)) },
	{ name: 'pulp limit', find: pulpLimitReasons },
	{ name: 'seal', find: sealReasons },
	{ name: 'disagreement', find: disagreementReasons },
	{ name: 'mean kinetic temperature', find: mktReasons },
	{ name: 'early stop', find: earlyStopReasons },
	{ name: 'unobserved', find: unobservedReasons },
	{ name: 'outside the model', find: modelReasons },
	{ name: 'opening', find: openingReasons },
	{ name: 'pulp against trace', find: pulpAgainstTraceReasons },
	{ name: 'cases', find: caseReasons },
	{ name: 'calibration', find: calibrationReasons }
];

function lifeReasons({ assessment, neededHours }: Evidence): Reason[] {
	if (assessment === null) return [{ code: 'life-not-known', grade: 'note' }];
	const { low: lowHours, value: valueHours, high: highHours } = assessment.remainingHours;
	if (lowHours >= neededHours)
		return [{ code: 'life-suffices', grade: 'inform', lowHours, valueHours, neededHours }];
	if (valueHours >= neededHours)
		return [{ code: 'life-low-short', grade: 'hold', lowHours, valueHours, neededHours }];
	const grade: Grade = highHours >= neededHours ? 'hold' : 'reject';
	return [{ code: 'life-short', grade, lowHours, highHours, valueHours, neededHours }];
}

function stopReason(hit: StopHit, { accuracyCelsius }: Evidence): Reason {
	const { kind: stop, stopCelsius, extremeCelsius, firstAtMs: atMs, minutes } = hit;
	if (hit.isInDoubt) {
		return { code: 'stop-in-doubt', grade: 'hold', stop, stopCelsius, extremeCelsius, accuracyCelsius };
	}
	return { code: 'stop-reached', grade: 'reject', stop, stopCelsius, extremeCelsius, atMs, minutes };
}

function excursionReasons({ excursions, legs }: Assessment): Reason[] {
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

function pulpLimitReasons({ spec, pulp }: Evidence): Reason[] {
	const limitCelsius = spec.upper?.celsius;
	if (limitCelsius === undefined) return [];
	return pulp
		.filter((reading) => reading.celsius > limitCelsius)
		.map(({ celsius, position }) => ({
			code: 'pulp-above-limit',
			grade: 'hold',
			pulpCelsius: celsius,
			limitCelsius,
			position
		}));
}

function sealReasons({ seal }: Evidence): Reason[] {
	return seal === null || seal.isIntact ? [] : [{ code: 'seal-broken', grade: 'hold', seal: seal.text }];
}

function disagreementReasons({ disagreement }: Evidence): Reason[] {
	if (disagreement === null || disagreement.differenceCelsius <= disagreement.allowedCelsius) return [];
	return [{ code: 'loggers-disagree', grade: 'hold', ...disagreement }];
}

function mktReasons({ spec, assessment }: Evidence): Reason[] {
	const { limitCelsius, windowHours } = spec.mkt;
	if (assessment === null || limitCelsius === null) return [];
	const mktCelsius = assessment.worstWindowMktCelsius ?? assessment.mktCelsius;
	return mktCelsius > limitCelsius
		? [{ code: 'mkt-over-limit', grade: 'hold', mktCelsius, limitCelsius, windowHours }]
		: [];
}

function earlyStopReasons({ assessment, journeyEndMs }: Evidence): Reason[] {
	if (assessment === null || journeyEndMs === null) return [];
	const missingMs = journeyEndMs - assessment.windowToMs;
	// The last interval is never complete: the journey ends between two readings.
	if (missingMs <= 2 * assessment.usualIntervalMs) return [];
	const missingHours = missingMs / msPerHour;
	const grade: Grade = missingHours > stoppedEarlyNoteHours ? 'hold' : 'note';
	return [{ code: 'logger-stopped-early', grade, missingHours }];
}

function unobservedReasons({ assessment }: Evidence): Reason[] {
	if (assessment === null || assessment.gaps.length === 0) return [];
	const windowHours = (assessment.windowToMs - assessment.windowFromMs) / msPerHour;
	const { unobservedHours: hours, unobservedUsedHours, gaps } = assessment;
	const grade: Grade = hours > unobservedNoteFraction * windowHours ? 'hold' : 'note';
	return [{ code: 'unobserved', grade, hours, usedHours: unobservedUsedHours.value, gaps: gaps.length }];
}

function modelReasons({ spec, assessment }: Evidence): Reason[] {
	if (assessment === null) return [];
	const hours = assessment.belowModelHours + assessment.aboveModelHours;
	const { validFromCelsius: fromCelsius, validToCelsius: toCelsius } = spec;
	return hours > 0 ? [{ code: 'outside-model', grade: 'note', hours, fromCelsius, toCelsius }] : [];
}

function openingReasons({ assessment, openingKind }: Evidence): Reason[] {
	if (assessment === null || openingKind !== 'undeclared') return [];
	return [{ code: 'opening-undeclared', grade: 'note', assumedHours: assessment.openingHours.value }];
}

function pulpAgainstTraceReasons({ assessment, pulp, accuracyCelsius }: Evidence): Reason[] {
	const celsius = assessment?.series.celsius;
	const traceCelsius = celsius?.[celsius.length - 1];
	if (traceCelsius === undefined) return [];
	const apart = (reading: { readonly celsius: number }) => Math.abs(reading.celsius - traceCelsius);
	const worst = [...pulp].sort((a, b) => apart(b) - apart(a))[0];
	if (worst === undefined || apart(worst) <= accuracyCelsius + pulpAgreementCelsius) return [];
	return [{ code: 'pulp-against-air', grade: 'note', pulpCelsius: worst.celsius, traceCelsius }];
}

function caseReasons({ cases }: Evidence): Reason[] {
	return cases === null || cases.advised === cases.received
		? []
		: [{ code: 'cases-differ', grade: 'note', ...cases }];
}

/** A calibration due on the day of arrival still holds on that day. */
function calibrationReasons({ calibrations, arrivedOn }: Evidence): Reason[] {
	return calibrations.flatMap(({ serial, dueOn }) =>
		dueOn !== null && dueOn < arrivedOn ? [{ code: 'calibration-overdue', grade: 'note', serial, dueOn }] : []
	);
}
