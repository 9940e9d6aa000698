import { curveRateAt, rateCurve, type RateCurve, type RateSpec } from '../shelf-life/rate-curve';
import { hoursPerDay, msPerHour } from '../units';
import type { Range } from './assessment';
import { forecastAt, type Forecast } from './forecast';

/** A stretch of what is still to come, as somebody expects it. */
export interface OnwardLeg {
	readonly hours: number;
	readonly celsius: number;
	readonly plusMinusCelsius: number;
}

/** What the customer must still have on arrival. */
export interface NeedAtCustomer {
	readonly days: number;
	readonly celsius: number;
}

export const tripAnswers = ['yes', 'in-doubt', 'no'] as const;
export type TripAnswer = (typeof tripAnswers)[number];

/** What an onward trip leaves of the life. */
export interface TripForecast {
	readonly arrivesMs: number;
	/** Life used by each leg, hours at the reference temperature. */
	readonly legUsedHours: readonly Range[];
	readonly remainingHours: Range;
	/** Days that life lasts at the customer's temperature; null where it does not run there. */
	readonly daysAtCustomer: Range | null;
	/** Even the low has the days / not even the high has / neither. */
	readonly answer: TripAnswer;
}

/** "Will it still have N days at the customer after this trip?" The low of the life takes the warm side of each leg. */
export function forecastTrip(
	spec: RateSpec,
	remaining: Range,
	fromMs: number,
	legs: readonly OnwardLeg[],
	need: NeedAtCustomer
): TripForecast {
	const curve = rateCurve(spec);
	const legUsedHours = legs.map((leg) => legUse(curve, leg));
	const total = (side: keyof Range) => legUsedHours.reduce((sum, used) => sum + used[side], 0);
	const remainingHours: Range = {
		value: remaining.value - total('value'),
		low: remaining.low - total('high'),
		high: remaining.high - total('low')
	};
	const neededHours = need.days * hoursPerDay * curveRateAt(curve, need.celsius);
	return {
		arrivesMs: fromMs + legs.reduce((sum, leg) => sum + leg.hours, 0) * msPerHour,
		legUsedHours,
		remainingHours,
		daysAtCustomer: daysAt(remainingHours, curveRateAt(curve, need.celsius)),
		answer: answerOf(remainingHours, neededHours)
	};
}

function legUse(curve: RateCurve, { hours, celsius, plusMinusCelsius }: OnwardLeg): Range {
	return {
		value: hours * curveRateAt(curve, celsius),
		low: hours * curveRateAt(curve, celsius - plusMinusCelsius),
		high: hours * curveRateAt(curve, celsius + plusMinusCelsius)
	};
}

function daysAt({ value, low, high }: Range, rate: number): Range | null {
	if (rate <= 0) return null;
	const days = (hours: number) => hours / rate / hoursPerDay;
	return { value: days(value), low: days(low), high: days(high) };
}

function answerOf({ low, high }: Range, neededHours: number): TripAnswer {
	if (low >= neededHours) return 'yes';
	return high >= neededHours ? 'in-doubt' : 'no';
}

/** "Life ends about" at each of several temperatures; null where life does not run. */
export function forecastTable(
	spec: RateSpec,
	remaining: Range,
	fromMs: number,
	celsius: readonly number[],
	plusMinusCelsius = 0
): { readonly celsius: number; readonly forecast: Forecast | null }[] {
	return celsius.map((at) => ({
		celsius: at,
		forecast: forecastAt(spec, remaining, fromMs, at, plusMinusCelsius)
	}));
}
