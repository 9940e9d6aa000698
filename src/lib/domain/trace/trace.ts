import { celsiusFromScaled, type TemperatureUnit } from '../units';

/** What a channel measures. Only temperature is assessed; the others are kept as they came. */
export const quantities = ['temperature', 'humidity', 'dew-point', 'light', 'shock', 'other'] as const;
export type Quantity = (typeof quantities)[number];

/** Where the sensor rode: decides which grace applies and what its readings can prove. */
export const placements = ['air', 'between-cases', 'in-product'] as const;
export type Placement = (typeof placements)[number];

/**
 * All readings of one temperature channel, in the file's own unit.
 * `times[i]` is UTC epoch milliseconds, strictly ascending; `scaled[i]` the temperature in 10^-`decimals` of `unit`.
 */
export interface Trace {
	readonly unit: TemperatureUnit;
	readonly decimals: number;
	readonly times: Float64Array;
	readonly scaled: Int32Array;
}

/** The readings in °C; one conversion per reading. */
export function celsiusOf(trace: Trace): Float64Array {
	const celsius = new Float64Array(trace.scaled.length);
	for (let i = 0; i < celsius.length; i++) {
		celsius[i] = celsiusFromScaled(trace.scaled[i] as number, trace.decimals, trace.unit);
	}
	return celsius;
}
