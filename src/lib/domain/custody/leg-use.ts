import type { LegUse } from '../receiving/assessment';
import { trimmed, unobserved, type Course } from '../shelf-life/course';
import { usedUntil, type LifeUsed } from '../shelf-life/life-used';
import { curveRateAt, type RateCurve } from '../shelf-life/rate-curve';
import { msPerHour, msPerMinute } from '../units';
import type { Leg } from './legs';

/** What the legs are charged with. */
export interface LegEvidence {
	readonly referenceCelsius: number;
	readonly course: Course;
	readonly curve: RateCurve;
	readonly used: LifeUsed;
	/** Remaining life of the line, for the but-for figure. */
	readonly remainingHours: number;
}

/** Life is booked in steps of 2^-32 h, under a microsecond, so that sums and differences of bookings are exact. */
const bookingStepsPerHour = 2 ** 32;

function booked(hours: number): number {
	return Math.round(hours * bookingStepsPerHour) / bookingStepsPerHour;
}

/**
 * What each leg used against what it was allowed.
 *
 * With r the rate at the leg's set-point, the allowance a (given, or planned hours × r) lasts a/r hours there, and
 *   too late = hours taken × r − a, which is (taken − planned) × r under a planned allowance;
 *   too warm = used − hours taken × r;
 * so that used − allowed = too warm + too late, to the last digit. Both are signed: a leg that was early has a
 * negative too late that sets off its warmth, one kept colder than agreed a negative too warm. Time no reading covers
 * used nothing that is known: it lowers too warm, and `coveredFraction` says by how much of the leg.
 */
export function legUses(evidence: LegEvidence, legs: readonly Leg[]): LegUse[] {
	const total = booked(evidence.used.usedHours[evidence.used.usedHours.length - 1] ?? 0);
	return legs.map((leg) => legUse(evidence, leg, total));
}

function legUse({ course, curve, used, ...evidence }: LegEvidence, leg: Leg, totalHours: number): LegUse {
	const { handover, fromMs, toMs, plannedMs } = leg;
	const setPointCelsius = handover.setPointCelsius ?? evidence.referenceCelsius;
	const rate = curveRateAt(curve, setPointCelsius);
	const usedHours =
		booked(usedUntil(course, curve, used, toMs)) - booked(usedUntil(course, curve, used, fromMs));
	const allowed = handover.allowedHours ?? (plannedMs === null ? null : (plannedMs / msPerHour) * rate);
	const tookHours = (toMs - fromMs) / msPerHour;
	return {
		ordinal: leg.ordinal,
		handoverId: handover.id,
		holder: handover.holder,
		place: handover.place,
		fromMs,
		toMs,
		plannedMinutes: plannedMs === null ? null : plannedMs / msPerMinute,
		tookMinutes: (toMs - fromMs) / msPerMinute,
		setPointCelsius,
		usedHours,
		...overUse(usedHours, allowed, tookHours * rate, evidence.remainingHours),
		shareOfUsed: totalHours > 0 ? usedHours / totalHours : 0,
		coveredFraction: coveredFraction(course, fromMs, toMs)
	};
}

function overUse(usedHours: number, allowed: number | null, atSetPointHours: number, remainingHours: number) {
	if (allowed === null) {
		return {
			allowedHours: null,
			overHours: null,
			tooWarmHours: null,
			tooLateHours: null,
			butForRemainingHours: null
		};
	}
	const allowedHours = booked(allowed);
	const atSetPoint = booked(atSetPointHours);
	const overHours = usedHours - allowedHours;
	return {
		allowedHours,
		overHours,
		tooWarmHours: usedHours - atSetPoint,
		tooLateHours: atSetPoint - allowedHours,
		butForRemainingHours: remainingHours + overHours
	};
}

/** Part of the leg in which readings stand at both ends of the step and no gap or trim lies between. */
function coveredFraction({ times, steps, isEven = false }: Course, fromMs: number, toMs: number): number {
	if (toMs <= fromMs || times.length === 0) return 0;
	const within = (from: number, to: number) => Math.max(0, Math.min(toMs, to) - Math.max(fromMs, from));
	let coveredMs = within(times[0] as number, times[times.length - 1] as number);
	for (const kind of isEven ? [] : [unobserved, trimmed]) {
		for (let i = steps.indexOf(kind); i >= 0; i = steps.indexOf(kind, i + 1)) {
			coveredMs -= within(times[i] as number, times[i + 1] as number);
		}
	}
	return coveredMs / (toMs - fromMs);
}
