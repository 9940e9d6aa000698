import type { StopHit, StopKind } from '../receiving/assessment';
import type { Course } from '../shelf-life/course';
import type { Spec } from '../shelf-life/spec';
import type { Placement } from '../trace/trace';
import { msPerMinute } from '../units';
import { stretchesBeyond, type Beyond } from './beyond';

/** What a stop is judged by. */
export interface StopEvidence {
	readonly spec: Pick<Spec, 'freezingCelsius' | 'ceilingCelsius' | 'upper' | 'lower'>;
	readonly course: Course;
	readonly accuracyCelsius: number;
	readonly placement: Placement;
}

interface Stop {
	readonly kind: StopKind;
	readonly celsius: number;
	/** The spec's own limit on that side: within it the spec has judged the margin to the stop sufficient. */
	readonly limitCelsius: number | null;
}

/**
 * The absolute stops a reading reached, or may have reached within the instrument's accuracy.
 *
 * A reading at or below the highest freezing point has reached it; one strictly above the food-safety ceiling has
 * passed it. Readings nearer to the stop than the accuracy leave it in doubt, but only where they also left the spec's
 * own limit on that side: else every load of greens at 0 °C would be held. Air cannot prove that the product froze, so
 * there it stays in doubt.
 */
export function findStops(evidence: StopEvidence): StopHit[] {
	const { spec } = evidence;
	const stops: Stop[] = [];
	if (spec.freezingCelsius !== null) {
		stops.push({
			kind: 'freezing',
			celsius: spec.freezingCelsius,
			limitCelsius: spec.lower?.celsius ?? null
		});
	}
	if (spec.ceilingCelsius !== null) {
		stops.push({ kind: 'ceiling', celsius: spec.ceilingCelsius, limitCelsius: spec.upper?.celsius ?? null });
	}
	return stops.map((stop) => hitOf(evidence, stop)).filter((hit) => hit !== null);
}

function hitOf({ course, accuracyCelsius, placement }: StopEvidence, stop: Stop): StopHit | null {
	const { levels } = course;
	if (levels.length === 0) return null;
	const isFreezing = stop.kind === 'freezing';
	const sign = isFreezing ? -1 : 1;
	const extremeCelsius = (isFreezing ? levels[0] : levels[levels.length - 1]) as number;
	const excess = sign * (extremeCelsius - stop.celsius);
	const isReached = isFreezing ? excess >= 0 : excess > 0;
	const hasLeftLimit = stop.limitCelsius === null || sign * (extremeCelsius - stop.limitCelsius) > 0;
	if (!isReached && !(hasLeftLimit && accuracyCelsius > 0 && excess + accuracyCelsius >= 0)) return null;
	// Where only the accuracy reaches the stop, the time is counted from where it began to.
	const threshold = isReached ? stop.celsius : stop.celsius - sign * accuracyCelsius;
	const stretches = stretchesBeyond(
		course,
		threshold,
		isFreezing ? 'below' : 'above',
		threshold,
		isFreezing || !isReached
	);
	return {
		kind: stop.kind,
		stopCelsius: stop.celsius,
		extremeCelsius,
		firstAtMs: (stretches[0] as Beyond).fromMs,
		minutes: stretches.reduce((sum, { fromMs, toMs }) => sum + (toMs - fromMs), 0) / msPerMinute,
		isInDoubt: !isReached || (isFreezing && placement === 'air')
	};
}
