import type { AssessmentView, SeriesView } from '../../schemas/docket';
import { nearestIndex, type Window } from './cursor';

/** Everything that was read, trimmed parts included. */
export function wholeOf(series: readonly SeriesView[], assessment: AssessmentView | null): Window {
	const ends = series.flatMap((one) => [one.times[0], one.times.at(-1)]).filter((ms) => ms !== undefined);
	if (assessment) ends.push(Date.parse(assessment.windowFromAt), Date.parse(assessment.windowToAt));
	return { fromMs: Math.min(...ends), toMs: Math.max(...ends) };
}

/** Finer series cover only the part that is zoomed to; the whole never shrinks to it. */
export function spanOf(known: Window | undefined, next: Window): Window {
	if (!known) return next;
	return { fromMs: Math.min(known.fromMs, next.fromMs), toMs: Math.max(known.toMs, next.toMs) };
}

/** Where the crosshair stands at first: the worst of the costliest excursion, otherwise the last reading. */
export function worstIndex(times: ArrayLike<number>, assessment: AssessmentView | null): number {
	const costliest = [...(assessment?.excursions ?? [])].sort((a, b) => b.costHours - a.costHours)[0];
	return costliest ? nearestIndex(times, costliest.extremeAtMs) : Math.max(0, times.length - 1);
}
