import type { Course } from './course';
import { usedUntil, type LifeUsed } from './life-used';
import type { RateCurve } from './rate-curve';

/** What adding up a journey may lose to rounding, as a part of the life. */
const roundingFraction = 1e-12;

/**
 * The time of the course at which a life is used up, on the straight line between two readings; null while some is
 * left. The first such time, where life then stands still. A life that ends with the last reading has run out, though
 * rounding may have left a trillionth of it.
 */
export function lifeRunsOutMs(
	course: Course,
	curve: RateCurve,
	used: LifeUsed,
	lifeHours: number
): number | null {
	const { times } = course;
	const last = times.length - 1;
	const isOver = (hours: number) => hours >= lifeHours * (1 - roundingFraction);
	if (last < 0 || !isOver(used.usedHours[last] as number)) return null;
	const at = firstOver(used.usedHours, isOver);
	if (at === 0) return times[0] as number;
	let before = times[at - 1] as number;
	let after = times[at] as number;
	// Halving ends where no double lies between: exact to the last digit whatever the model.
	for (;;) {
		const middle = before + (after - before) / 2;
		if (middle <= before || middle >= after) return after;
		if (usedUntil(course, curve, used, middle) >= lifeHours) after = middle;
		else before = middle;
	}
}

/** Index of the first reading by which the life is over; what is used never falls. */
function firstOver(usedHours: Float64Array, isOver: (hours: number) => boolean): number {
	let low = -1;
	let high = usedHours.length - 1;
	while (high - low > 1) {
		const middle = (low + high) >> 1;
		if (isOver(usedHours[middle] as number)) high = middle;
		else low = middle;
	}
	return high;
}
