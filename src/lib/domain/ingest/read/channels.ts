import { usualIntervalMs } from '../../trace/interval';
import type { Quantity } from '../../trace/trace';
import { celsiusFromScaled, type TemperatureUnit } from '../../units';
import type { Channel } from '../ingestion';
import type { Series } from './series';

/** A step over this many usual intervals is told as a long one. */
const longFactor = 1.5;

/** The sum is of whole numbers, so it is exact; the mean is converted and divided once. */
function statisticsOf({ scaled, decimals, unit }: Series): { min: number; max: number; mean: number } {
	let [low, high, sum] = [Infinity, -Infinity, 0];
	for (let i = 0; i < scaled.length; i++) {
		const value = scaled[i] ?? 0;
		if (value < low) low = value;
		if (value > high) high = value;
		sum += value;
	}
	return {
		min: celsiusFromScaled(low, decimals, unit),
		max: celsiusFromScaled(high, decimals, unit),
		mean: meanCelsius(sum, scaled.length, 10 ** decimals, unit)
	};
}

function meanCelsius(sum: number, count: number, scale: number, unit: TemperatureUnit): number {
	if (unit === 'celsius') return sum / (count * scale);
	if (unit === 'fahrenheit') return ((sum - 32 * scale * count) * 5) / (9 * scale * count);
	return (sum * 100 - 27_315 * scale * count) / (100 * scale * count);
}

/** Steps over 1.5 usual intervals, each as its two ends one after the other. */
export function longStepsOf(times: Float64Array, usualMs: number): Float64Array {
	const isLong = (i: number): boolean => (times[i] ?? 0) - (times[i - 1] ?? 0) > longFactor * usualMs;
	let count = 0;
	for (let i = 1; i < times.length; i++) if (isLong(i)) count++;
	const ends = new Float64Array(count * 2);
	let at = 0;
	for (let i = 1; i < times.length; i++) {
		if (!isLong(i)) continue;
		ends[at++] = times[i - 1] ?? 0;
		ends[at++] = times[i] ?? 0;
	}
	return ends;
}

/** What a channel is called and is, before its readings. */
export interface ChannelHead {
	readonly name: string;
	readonly quantity: Quantity;
	readonly unit: string | null;
	readonly isPrimary: boolean;
	/** Rows that are too short to hold its value. */
	readonly shortRows: number;
}

/** A channel with its figures; temperatures of a known unit keep their readings too. */
export function channelOf(head: ChannelHead, series: Series, isTemperature: boolean): Channel {
	const { times, scaled, lines, unit, decimals, missing, impossible } = series;
	const count = times.length;
	const usualMs = count < 2 ? null : usualIntervalMs(times);
	const figures = isTemperature && count > 0 ? statisticsOf(series) : null;
	const { shortRows, ...told } = head;
	return {
		...told,
		trace: figures === null ? null : { unit, decimals, times, scaled },
		lines: figures === null ? null : lines,
		readings: count,
		missing: missing.length + impossible.length + shortRows,
		firstMs: times[0] ?? null,
		lastMs: times[count - 1] ?? null,
		usualIntervalMs: usualMs,
		longSteps: usualMs === null ? new Float64Array(0) : longStepsOf(times, usualMs),
		minCelsius: figures?.min ?? null,
		maxCelsius: figures?.max ?? null,
		meanCelsius: figures?.mean ?? null
	};
}
