import { msPerHour, msPerMinute } from '../units';
import type { Evidence } from './evidence';
import type { Reason } from './recommendation';

const hoursPerDay = 24;
const msPerDay = hoursPerDay * msPerHour;

/** A unit's display and the agreed set-point are the same within this; both are read to a tenth. */
const setPointAgreementCelsius = 0.05;

/**
 * Longest interval of recording by the length of the journey.
 * Source: EN 12830:1999, 4.9.2.2: 5 min under 24 h, 15 min from 24 h to 7 d, 60 min above. Whose class a journey of
 * exactly 24 h or 7 d is, is not clear: the stricter is taken.
 */
const intervalClasses = [
	{ upToHours: 24, minutes: 5 },
	{ upToHours: 7 * hoursPerDay, minutes: 15 },
	{ upToHours: Infinity, minutes: 60 }
] as const;

/** At the door, with neither a trace nor a pulp reading: nothing says how the goods are. */
export function incompleteReasons({ assessment, pulp, journeyEndMs }: Evidence): Reason[] {
	const isAtTheDoor = journeyEndMs !== null;
	return isAtTheDoor && assessment === null && pulp.length === 0
		? [{ code: 'evidence-incomplete', grade: 'hold' }]
		: [];
}

/** A required logger of which nothing was read. */
export function loggerMissingReasons({ assessment, isLoggerRequired }: Evidence): Reason[] {
	return isLoggerRequired && assessment === null ? [{ code: 'logger-missing', grade: 'note' }] : [];
}

/** Readings that begin after custody did, by more than two intervals; a start delay is said, not forgiven. */
export function lateStartReasons({ assessment, journeyStartMs, startDelayMinutes = 0 }: Evidence): Reason[] {
	if (assessment === null || journeyStartMs == null) return [];
	const missingMs = assessment.windowFromMs - journeyStartMs;
	if (missingMs <= 2 * assessment.usualIntervalMs) return [];
	const missingHours = missingMs / msPerHour;
	return [{ code: 'logger-started-late', grade: 'note', missingHours, startDelayMinutes }];
}

/** Without a trace, time on the way is what is known: longer than planned is said. */
export function transitReasons(evidence: Evidence): Reason[] {
	const { assessment, journeyStartMs, journeyEndMs, plannedJourneyMs } = evidence;
	if (assessment !== null || journeyStartMs == null || journeyEndMs === null || plannedJourneyMs == null)
		return [];
	const tookMs = journeyEndMs - journeyStartMs;
	if (tookMs <= plannedJourneyMs) return [];
	const [tookHours, plannedHours] = [tookMs / msPerHour, plannedJourneyMs / msPerHour];
	return [{ code: 'transit-late', grade: 'note', tookHours, plannedHours }];
}

/** The cooling unit as the door found it: not set as agreed, or warm where the air returns. */
export function unitReasons({ unit, spec }: Evidence): Reason[] {
	if (!unit) return [];
	const { setPointCelsius, agreedCelsius, returnAirCelsius } = unit;
	const reasons: Reason[] = [];
	const isSet = setPointCelsius !== null && agreedCelsius !== null;
	if (isSet && Math.abs(setPointCelsius - agreedCelsius) > setPointAgreementCelsius)
		reasons.push({ code: 'unit-set-point-differs', grade: 'note', setPointCelsius, agreedCelsius });
	const limitCelsius = spec.upper?.celsius ?? spec.ceilingCelsius;
	if (returnAirCelsius !== null && limitCelsius !== null && returnAirCelsius > limitCelsius)
		reasons.push({ code: 'unit-return-air-warm', grade: 'note', returnAirCelsius, limitCelsius });
	return reasons;
}

/** An interval longer than the class of the journey allows. */
export function intervalReasons({ assessment, journeyStartMs, journeyEndMs }: Evidence): Reason[] {
	if (assessment === null) return [];
	const fromMs = journeyStartMs ?? assessment.windowFromMs;
	const toMs = journeyEndMs ?? assessment.windowToMs;
	const journeyHours = (toMs - fromMs) / msPerHour;
	const allowedMinutes = allowedIntervalMinutes(journeyHours);
	const everyMinutes = assessment.usualIntervalMs / msPerMinute;
	return everyMinutes > allowedMinutes
		? [{ code: 'interval-too-long', grade: 'note', everyMinutes, allowedMinutes, journeyHours }]
		: [];
}

/** The longest interval that EN 12830 has for a journey of this length. */
export function allowedIntervalMinutes(journeyHours: number): number {
	return intervalClasses.find(({ upToHours }) => journeyHours <= upToHours)?.minutes ?? 60;
}

/** The printed date against the day of arrival, the customer's least days, and what was received before. */
export function dateReasons({ printedDate, arrivedOn }: Evidence): Reason[] {
	if (!printedDate) return [];
	const { bestBeforeOn, neededDays, lastBestBeforeOn } = printedDate;
	if (bestBeforeOn === null) {
		const isAskedFor = neededDays !== null || lastBestBeforeOn !== null;
		return isAskedFor ? [{ code: 'date-missing', grade: 'note' }] : [];
	}
	const reasons: Reason[] = [];
	const days = daysBetween(arrivedOn, bestBeforeOn);
	if (days < 0) reasons.push({ code: 'date-passed', grade: 'hold', bestBeforeOn });
	else if (neededDays !== null && days < neededDays)
		reasons.push({ code: 'date-short', grade: 'hold', bestBeforeOn, days, neededDays });
	if (lastBestBeforeOn !== null && bestBeforeOn < lastBestBeforeOn)
		reasons.push({ code: 'older-than-last', grade: 'hold', bestBeforeOn, lastBestBeforeOn });
	return reasons;
}

/** Whole days from one calendar day to another; negative where the second is earlier. */
function daysBetween(fromOn: string, toOn: string): number {
	return Math.round((Date.parse(`${toOn}T00:00:00Z`) - Date.parse(`${fromOn}T00:00:00Z`)) / msPerDay);
}
