import type { Course } from '../shelf-life/course';
import type { Spec } from '../shelf-life/spec';
import { msPerMinute } from '../units';
import { stretchesBeyond } from './beyond';

export const limitNames = ['upper', 'lower', 'ceiling', 'freezing'] as const;
export type LimitName = (typeof limitNames)[number];

/** Time strictly above and strictly below one limit, and the degrees beyond it integrated over that time. */
export interface LimitTime {
	readonly limit: LimitName;
	readonly celsius: number;
	readonly minutesAbove: number;
	readonly minutesBelow: number;
	readonly degreeMinutesAbove: number;
	readonly degreeMinutesBelow: number;
}

/** What the mean and the length of a course are known to be already. */
export interface CourseTotals {
	readonly meanCelsius: number;
	/** Time that counts: trims are left out. */
	readonly totalMs: number;
	/** By level, time between two readings that both stand on it. */
	readonly restingMs: Float64Array;
}

/** How long, and by how much, a course ran above and below each limit and stop of the spec. No grace is given here. */
export function limitTimes(
	spec: Pick<Spec, 'upper' | 'lower' | 'ceilingCelsius' | 'freezingCelsius'>,
	course: Course,
	totals: CourseTotals
): LimitTime[] {
	const limits: Record<LimitName, number | null> = {
		upper: spec.upper?.celsius ?? null,
		lower: spec.lower?.celsius ?? null,
		ceiling: spec.ceilingCelsius,
		freezing: spec.freezingCelsius
	};
	return limitNames.flatMap((limit) => {
		const celsius = limits[limit];
		return celsius === null ? [] : [{ limit, celsius, ...timesBeyond(course, celsius, totals) }];
	});
}

/**
 * The rarer side is walked along; the other follows, since the degrees above less those below are the mean's distance
 * from the limit times the whole time, and what is neither above nor below is on the limit.
 */
function timesBeyond(course: Course, celsius: number, { meanCelsius, totalMs, restingMs }: CourseTotals) {
	const onLimitMs = restingMs[course.levels.indexOf(celsius)] ?? 0;
	const isMostlyBelow = meanCelsius <= celsius;
	const walked = sumOf(course, celsius, isMostlyBelow ? 'above' : 'below');
	const sign = isMostlyBelow ? 1 : -1;
	const other = {
		ms: Math.max(0, totalMs - walked.ms - onLimitMs),
		degreeMs: Math.max(0, walked.degreeMs - sign * (meanCelsius - celsius) * totalMs)
	};
	const [above, below] = isMostlyBelow ? [walked, other] : [other, walked];
	return {
		minutesAbove: above.ms / msPerMinute,
		minutesBelow: below.ms / msPerMinute,
		degreeMinutesAbove: above.degreeMs / msPerMinute,
		degreeMinutesBelow: below.degreeMs / msPerMinute
	};
}

function sumOf(course: Course, celsius: number, side: 'above' | 'below') {
	let ms = 0;
	let degreeMs = 0;
	for (const stretch of stretchesBeyond(course, celsius, side, celsius)) {
		ms += stretch.toMs - stretch.fromMs;
		degreeMs += stretch.degreeMs;
	}
	return { ms, degreeMs };
}
