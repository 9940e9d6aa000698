import type { LegUse, Range } from '../receiving/assessment';

/** What would be left had one leg used no more than its allowance. */
export interface ButFor {
	readonly ordinal: number;
	readonly remainingHours: Range;
	/** The low of that figure meets the need: the load would have been taken. */
	readonly passes: boolean;
}

/** "Without leg D 11.6 d, passes": one figure for each leg whose allowance is known. */
export function butFor(legs: readonly LegUse[], remaining: Range, neededHours: number): ButFor[] {
	return legs.flatMap(({ ordinal, overHours }) => {
		if (overHours === null) return [];
		const low = remaining.low + overHours;
		const remainingHours = { value: remaining.value + overHours, low, high: remaining.high + overHours };
		return [{ ordinal, remainingHours, passes: low >= neededHours }];
	});
}
