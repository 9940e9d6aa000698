import type { RunningSum } from '../math/sum';
import { eachPassage, type Passages } from '../shelf-life/passages';
import type { RateBounds } from '../shelf-life/rate-bounds';
import { curveRateAt, meanRate, type RateCurve } from '../shelf-life/rate-curve';
import { msPerHour } from '../units';

/** How fast life runs: by the spec, at the slowest and the fastest it can be, and how far each reading may be off. */
export interface RateGiven {
	readonly curve: RateCurve;
	/** Left out: the model has no ± of its own. */
	readonly bounds?: RateBounds;
	readonly accuracyCelsius: number;
}

/** The readings as they are, moved to the cold, moved to the warm. */
export type SideIndex = 0 | 1 | 2;

/** The rate at each level on the three sides, and the exact mean between two levels. */
export class LevelRates {
	/** By side, the rate at each level. */
	readonly of: readonly [Float64Array, Float64Array, Float64Array];
	readonly #curves: readonly [RateCurve, RateCurve, RateCurve];
	readonly #shifts: readonly [number, number, number];
	readonly #levels: Float64Array;

	constructor(levels: Float64Array, { curve, bounds, accuracyCelsius }: RateGiven) {
		this.#curves = [curve, bounds?.low ?? curve, bounds?.high ?? curve];
		this.#levels = levels;
		this.#shifts = [0, -accuracyCelsius, accuracyCelsius];
		const ratesOf = (side: SideIndex) =>
			levels.map((celsius) => curveRateAt(this.#curves[side], celsius + this.#shifts[side]));
		this.of = [ratesOf(0), ratesOf(1), ratesOf(2)];
	}

	mean(side: SideIndex, a: number, b: number): number {
		const shift = this.#shifts[side];
		const rates = this.of[side];
		const from = (this.#levels[a] as number) + shift;
		const to = (this.#levels[b] as number) + shift;
		return meanRate(this.#curves[side], from, to, rates[a] as number, rates[b] as number);
	}

	/** Where nobody watched, the low holds the colder neighbour all through and the high the warmer. */
	across(side: SideIndex, a: number, b: number, isSilent: boolean): number {
		if (!isSilent || side === 0) return this.mean(side, a, b);
		const rates = this.of[side];
		const bound = side === 1 ? Math.min : Math.max;
		return bound(rates[a] as number, rates[b] as number);
	}

	/** Puts the mean of every passage that took place, times `hours`, at its place; adds how far the bounds are from it. */
	fill(table: Float64Array, passages: Passages, hours: number, low: RunningSum, high: RunningSum): void {
		eachPassage(passages, (at, a, b, ms) => {
			const mean = this.mean(0, a, b);
			table[at] = hours * mean;
			low.add((ms / msPerHour) * (this.mean(1, a, b) - mean));
			high.add((ms / msPerHour) * (this.mean(2, a, b) - mean));
		});
	}
}
