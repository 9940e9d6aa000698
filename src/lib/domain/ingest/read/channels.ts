import type { Channel } from '../ingestion';
import type { Quantity } from '../../trace/trace';
import { celsiusFromScaled } from '../../units';
import type { Series } from './series';

/** Mean by Neumaier's compensated sum: the same digits whatever the length. */
function statisticsOf({ scaled, decimals, unit }: Series): { min: number; max: number; mean: number } {
	let [low, high, sum, rest] = [Infinity, -Infinity, 0, 0];
	for (let i = 0; i < scaled.length; i++) {
		const value = scaled[i] ?? 0;
		if (value < low) low = value;
		if (value > high) high = value;
		const celsius = celsiusFromScaled(value, decimals, unit);
		const next = sum + celsius;
		rest += Math.abs(sum) >= Math.abs(celsius) ? sum - next + celsius : celsius - next + sum;
		sum = next;
	}
	return {
		min: celsiusFromScaled(low, decimals, unit),
		max: celsiusFromScaled(high, decimals, unit),
		mean: (sum + rest) / scaled.length
	};
}

/** A temperature channel with its trace and figures. */
export function channelOf(name: string, series: Series): Channel {
	if (series.times.length === 0) return namedChannel(name, 'temperature');
	const { min, max, mean } = statisticsOf(series);
	const { unit, decimals, times, scaled, lines } = series;
	return {
		name,
		quantity: 'temperature',
		trace: { unit, decimals, times, scaled },
		lines,
		minCelsius: min,
		maxCelsius: max,
		meanCelsius: mean
	};
}

/** A channel that is kept by name only: it is not assessed. */
export function namedChannel(name: string, quantity: Quantity): Channel {
	return { name, quantity, trace: null, lines: null, minCelsius: null, maxCelsius: null, meanCelsius: null };
}
