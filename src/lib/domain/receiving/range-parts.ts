import type { Range } from './assessment';

export const rangeSources = ['accuracy', 'gaps', 'opening', 'full-life'] as const;
/** What the range of remaining life is made of. */
export type RangeSource = (typeof rangeSources)[number];

/** How much one source takes off the figure for the low, and adds to it for the high; hours at the reference. */
export interface RangePart {
	readonly source: RangeSource;
	readonly lowerHours: number;
	readonly raiseHours: number;
}

/**
 * What the range includes, source by source: their sums are the distance from the figure to its low and its high.
 * `accuracy` is the logger's offset over the time observed, with the ± of the model's own figure where the spec has
 * one, since each widens the other; `gaps` what nobody watched, its offset included.
 */
export function rangeParts(
	watched: { readonly low: number; readonly high: number },
	unobservedUsed: Range,
	opening: Range,
	fullLifeUncertaintyHours: number
): RangePart[] {
	const gaps = {
		lowerHours: unobservedUsed.high - unobservedUsed.value,
		raiseHours: unobservedUsed.value - unobservedUsed.low
	};
	return [
		{
			source: 'accuracy',
			lowerHours: watched.high,
			// Not −0, which a stored figure would not give back.
			raiseHours: 0 - watched.low
		},
		{ source: 'gaps', ...gaps },
		{
			source: 'opening',
			lowerHours: opening.high - opening.value,
			raiseHours: opening.value - opening.low
		},
		{ source: 'full-life', lowerHours: fullLifeUncertaintyHours, raiseHours: fullLifeUncertaintyHours }
	];
}
