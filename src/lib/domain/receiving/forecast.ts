import { rateAt, type RateSpec } from '../shelf-life/rate-curve';
import { msPerHour } from '../units';
import type { Range } from './assessment';

/** How long the life left lasts at a temperature, and when it ends. An estimate of quality, not a date mark. */
export interface Forecast {
	readonly celsius: number;
	/** Hours by the clock; negative when the life was over before. */
	readonly lastsHours: Range;
	readonly endsMs: Range;
	readonly isOver: boolean;
}

/**
 * "Life ends about": the remaining life, spent from `fromMs` on at a steady temperature, ± how far that may be off.
 * The low has the low of the life at the warm end, the high the reverse. Null where life does not run at one of those
 * temperatures: then no end can be named.
 */
export function forecastAt(
	spec: RateSpec,
	remainingHours: Range,
	fromMs: number,
	celsius: number,
	plusMinusCelsius = 0
): Forecast | null {
	const cold = rateAt(spec, celsius - plusMinusCelsius);
	if (cold <= 0) return null;
	const warm = rateAt(spec, celsius + plusMinusCelsius);
	const lastsHours: Range = {
		value: remainingHours.value / rateAt(spec, celsius),
		// Of a life that is over, the slower rate would place the end farther back: the low stays the lower figure.
		low: remainingHours.low / (remainingHours.low < 0 ? cold : warm),
		high: remainingHours.high / (remainingHours.high < 0 ? warm : cold)
	};
	const endsAt = (hours: number) => Math.round(fromMs + hours * msPerHour);
	return {
		celsius,
		lastsHours,
		endsMs: { value: endsAt(lastsHours.value), low: endsAt(lastsHours.low), high: endsAt(lastsHours.high) },
		isOver: remainingHours.value <= 0
	};
}
