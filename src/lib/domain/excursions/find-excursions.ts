import type { Excursion, Severity } from '../receiving/assessment';
import type { Course } from '../shelf-life/course';
import { usedUntil, type LifeUsed } from '../shelf-life/life-used';
import { curveRateAt, type RateCurve } from '../shelf-life/rate-curve';
import type { Limit, Spec } from '../shelf-life/spec';
import type { Placement } from '../trace/trace';
import { msPerHour, msPerMinute } from '../units';
import { stretchesBeyond, type Beyond } from './beyond';

/** What an excursion is found and weighed with. */
export interface ExcursionEvidence {
	readonly spec: Pick<Spec, 'upper' | 'lower'>;
	readonly course: Course;
	readonly curve: RateCurve;
	readonly used: LifeUsed;
	readonly accuracyCelsius: number;
	readonly placement: Placement;
}

/** An excursion before the legs are known. */
export type FoundExcursion = Omit<Excursion, 'legs' | 'unsettledHandoverId'>;

/**
 * Every event beyond the upper or lower limit that its grace does not cover, in order of time.
 *
 * At the limit is within it; minutes are time strictly beyond. An event ends when the temperature is back by the
 * hysteresis: times beyond between which it is not are one event, whose minutes are the sum. An event of no more than
 * the grace minutes is let pass, unless all events of that side together exceed the cumulative grace: then each
 * counts, for together they broke the rule.
 */
export function findExcursions(evidence: ExcursionEvidence): FoundExcursion[] {
	const { upper, lower } = evidence.spec;
	const found = [
		...(upper ? sideExcursions(evidence, upper, 'too-warm') : []),
		...(lower ? sideExcursions(evidence, lower, 'too-cold') : [])
	];
	return found.sort((a, b) => a.fromMs - b.fromMs);
}

function sideExcursions(
	evidence: ExcursionEvidence,
	limit: Limit,
	kind: Excursion['kind']
): FoundExcursion[] {
	const isWarm = kind === 'too-warm';
	const settledAt = limit.celsius + (isWarm ? -limit.hysteresisCelsius : limit.hysteresisCelsius);
	const stretches = stretchesBeyond(evidence.course, limit.celsius, isWarm ? 'above' : 'below', settledAt);
	const events = eventsOf(stretches);
	const { each, inAll } = graceOf(limit, evidence.placement);
	const allMinutes = minutesOf(stretches);
	return events
		.filter((event) => minutesOf(event) > each || allMinutes > inAll)
		.map((event) => described(evidence, limit, kind, event));
}

/** Air swings where the product does not, so an air trace may have a grace of its own. */
function graceOf(limit: Limit, placement: Placement): { each: number; inAll: number } {
	const own = { each: limit.graceMinutes, inAll: limit.graceMinutesInAll };
	if (placement !== 'air') return own;
	return { each: limit.airGraceMinutes ?? own.each, inAll: limit.airGraceMinutesInAll ?? own.inAll };
}

/** Stretches between which the temperature did not settle belong together. */
function eventsOf(stretches: readonly Beyond[]): Beyond[][] {
	const events: Beyond[][] = [];
	let current: Beyond[] = [];
	for (const stretch of stretches) {
		current.push(stretch);
		if (!stretch.isSettled) continue;
		events.push(current);
		current = [];
	}
	if (current.length > 0) events.push(current);
	return events;
}

function minutesOf(stretches: readonly Beyond[]): number {
	return stretches.reduce((sum, stretch) => sum + (stretch.toMs - stretch.fromMs), 0) / msPerMinute;
}

function described(
	evidence: ExcursionEvidence,
	limit: Limit,
	kind: Excursion['kind'],
	event: readonly Beyond[]
): FoundExcursion {
	const sign = kind === 'too-warm' ? 1 : -1;
	const first = event[0] as Beyond;
	const last = event[event.length - 1] as Beyond;
	const worst = event.reduce((a, b) => (sign * (b.extremeCelsius - a.extremeCelsius) > 0 ? b : a));
	const minutes = minutesOf(event);
	const degreeMinutes = event.reduce((sum, stretch) => sum + stretch.degreeMs, 0) / msPerMinute;
	return {
		kind,
		severity: severityOf(limit, minutes),
		limitCelsius: limit.celsius,
		fromMs: first.fromMs,
		toMs: last.toMs,
		minutes,
		extremeCelsius: worst.extremeCelsius,
		extremeAtMs: worst.extremeAtMs,
		meanCelsius: minutes > 0 ? limit.celsius + (sign * degreeMinutes) / minutes : worst.extremeCelsius,
		degreeMinutes,
		costHours: costOf(evidence, limit, event),
		isInDoubt: sign * (worst.extremeCelsius - limit.celsius) <= evidence.accuracyCelsius,
		// Only an event that had not settled can still be running.
		isOpen: !last.isSettled
	};
}

function severityOf(limit: Limit, minutes: number): Severity {
	if (minutes >= limit.criticalMinutes) return 'critical';
	return minutes >= limit.majorMinutes ? 'major' : 'minor';
}

/**
 * Life used beyond the limit, less what the limit's own temperature would have used in that time; never negative.
 * For too cold that is 0: the rate model knows of no harm in cold, and a saving is not to be booked as one. What cold
 * does (freezing, chilling) is reported as a stop and as chilled hours.
 */
function costOf(evidence: ExcursionEvidence, limit: Limit, event: readonly Beyond[]): number {
	const { course, curve, used } = evidence;
	const limitRate = curveRateAt(curve, limit.celsius);
	const cost = event.reduce((sum, { fromMs, toMs }) => {
		const life = usedUntil(course, curve, used, toMs) - usedUntil(course, curve, used, fromMs);
		return sum + life - ((toMs - fromMs) / msPerHour) * limitRate;
	}, 0);
	return Math.max(0, cost);
}
