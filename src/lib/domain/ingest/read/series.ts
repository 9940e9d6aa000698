import { celsiusFromScaled, type TemperatureUnit } from '../../units';
import type { GatheredValues } from './gathered';

/** Readings of one channel, sorted and without repeats, with the line each came from. */
export interface Series {
	readonly unit: TemperatureUnit;
	readonly decimals: number;
	readonly times: Float64Array;
	readonly scaled: Int32Array;
	readonly lines: Int32Array;
	readonly missing: readonly number[];
	readonly impossible: readonly number[];
	readonly dropped: readonly number[];
	readonly conflicting: readonly number[];
	/** Rows that stood before an earlier one; all of them when the file runs backwards. */
	readonly resorted: readonly number[];
	readonly isDescending: boolean;
}

/** Below the boiling point of nitrogen (−195.8 °C) no logger measures; above 150 °C no perishable travels. */
const coldestCelsius = -200;
const warmestCelsius = 150;
/** Values that instruments write for "no sensor". Inside the possible range they only count as such after a leap. */
const sentinels = new Set([
	-127, -100, -99.9, -99, -99.99, -88.8, -50, -55, -40, 80, 85, 99, 99.9, 99.99, 100, 120, 125, 127, 127.9,
	128, 150
]);
const leapCelsius = 30;
const longestLoss = 500;

/** A sentinel as written, or turned into the unit of the file by its writer. */
function isSentinel(raw: number, celsius: number): boolean {
	return sentinels.has(raw) || sentinels.has(Math.round(celsius * 100) / 100);
}

function largestDecimals(values: GatheredValues, count: number): number {
	let most = 0;
	for (let i = 0; i < count; i++)
		if (values.isMissing[i] === 0 && (values.decimals[i] ?? 0) > most) most = values.decimals[i] ?? 0;
	return most;
}

const powers = [1, 10, 100, 1000, 10_000] as const;

const isBeyondPhysics = (celsius: number): boolean => celsius < coldestCelsius || celsius > warmestCelsius;

function rawOf(values: GatheredValues, i: number): number {
	return (values.mantissa[i] ?? 0) / (powers[values.decimals[i] ?? 0] ?? 1);
}

/**
 * A "no sensor" figure away from the readings before it, unless the readings go on from it: a logger put into a freezer
 * leaps to −40 too, and stays near it.
 */
function isLeapToSentinel(
	values: GatheredValues,
	i: number,
	count: number,
	unit: TemperatureUnit,
	last: number
): boolean {
	const celsiusAt = (k: number): number =>
		celsiusFromScaled(values.mantissa[k] ?? 0, values.decimals[k] ?? 0, unit);
	const celsius = celsiusAt(i);
	// Most readings end here: the leap is the cheap question.
	if (!(Math.abs(celsius - last) > leapCelsius) || !isSentinel(rawOf(values, i), celsius)) return false;
	// A sensor that stays lost for longer than this is lost.
	for (let k = i + 1; k < Math.min(count, i + longestLoss); k++) {
		if (values.isMissing[k] !== 0 || values.mantissa[k] === values.mantissa[i]) continue;
		const next = celsiusAt(k);
		return isBeyondPhysics(next) || Math.abs(next - celsius) > leapCelsius / 3;
	}
	return true;
}

interface Kept {
	count: number;
	readonly times: Float64Array;
	readonly scaled: Int32Array;
	readonly lines: Int32Array;
}

function firstPlausible(values: GatheredValues, ms: Float64Array, unit: TemperatureUnit): number {
	for (let i = 0; i < ms.length; i++) {
		if (values.isMissing[i] !== 0) continue;
		const celsius = celsiusFromScaled(values.mantissa[i] ?? 0, values.decimals[i] ?? 0, unit);
		if (!isBeyondPhysics(celsius) && !isSentinel(rawOf(values, i), celsius)) return celsius;
	}
	return NaN;
}

/** Drops what is no value, tells what cannot be one, and brings the rest into the order of time. */
export function seriesOf(
	values: GatheredValues,
	ms: Float64Array,
	lines: Int32Array,
	unit: TemperatureUnit,
	/** Other quantities know no sentinel and no bound. */
	isTemperature = true
): Series {
	const count = ms.length;
	const decimals = largestDecimals(values, count);
	const kept: Kept = {
		count: 0,
		times: new Float64Array(count),
		scaled: new Int32Array(count),
		lines: new Int32Array(count)
	};
	const missing: number[] = [];
	const impossible: number[] = [];
	let last = firstPlausible(values, ms, unit);
	for (let i = 0; i < count; i++) {
		const at = ms[i] ?? NaN;
		const line = lines[i] ?? 0;
		if (Number.isNaN(at)) continue;
		if (values.isMissing[i] !== 0) {
			if (values.isMissing[i] === 1) missing.push(line);
			continue;
		}
		const own = values.decimals[i] ?? 0;
		const mantissa = values.mantissa[i] ?? 0;
		const celsius = celsiusFromScaled(mantissa, own, unit);
		if (isTemperature && (isBeyondPhysics(celsius) || isLeapToSentinel(values, i, count, unit, last))) {
			impossible.push(line);
			continue;
		}
		last = celsius;
		kept.times[kept.count] = at;
		kept.scaled[kept.count] = mantissa * (powers[decimals - own] ?? 1);
		kept.lines[kept.count++] = line;
	}
	return { unit, decimals, missing, impossible, ...inOrder(kept) };
}

type Ordered = Omit<Series, 'unit' | 'decimals' | 'missing' | 'impossible'>;

function stepsBack({ count, times, lines }: Kept): { back: number[]; down: number } {
	const back: number[] = [];
	let down = 0;
	let latest = -Infinity;
	for (let i = 0; i < count; i++) {
		const at = times[i] ?? 0;
		if (at < latest) back.push(lines[i] ?? 0);
		if (i > 0 && at < (times[i - 1] ?? 0)) down++;
		latest = Math.max(latest, at);
	}
	return { back, down };
}

function isDescendingThroughout({ count, times }: Kept): boolean {
	for (let i = 1; i < count; i++) if ((times[i] ?? 0) > (times[i - 1] ?? 0)) return false;
	return true;
}

function permutation(kept: Kept, isDescending: boolean, isSorted: boolean): (k: number) => number {
	if (isSorted) return (k) => k;
	const { count, times } = kept;
	const reversed = (k: number): number => count - 1 - k;
	const base = isDescending ? reversed : (k: number): number => k;
	if (isDescending && isDescendingThroughout(kept)) return base;
	const order = new Uint32Array(count);
	for (let k = 0; k < count; k++) order[k] = base(k);
	order.sort((p, q) => (times[p] ?? 0) - (times[q] ?? 0));
	return (k) => order[k] ?? 0;
}

function hasRepeat({ count, times }: Kept): boolean {
	for (let i = 1; i < count; i++) if (times[i] === times[i - 1]) return true;
	return false;
}

function inOrder(kept: Kept): Ordered {
	const { back, down } = stepsBack(kept);
	const isDescending = kept.count > 2 && down > (kept.count - 1) / 2;
	if (back.length === 0 && !hasRepeat(kept)) {
		const { count, times, scaled, lines } = kept;
		return {
			times: times.subarray(0, count),
			scaled: scaled.subarray(0, count),
			lines: lines.subarray(0, count),
			dropped: [],
			conflicting: [],
			resorted: back,
			isDescending
		};
	}
	const at = permutation(kept, isDescending, back.length === 0);
	const times = new Float64Array(kept.count);
	const scaled = new Int32Array(kept.count);
	const lines = new Int32Array(kept.count);
	const dropped: number[] = [];
	const conflicting: number[] = [];
	let n = 0;
	for (let k = 0; k < kept.count; k++) {
		const i = at(k);
		if (n > 0 && times[n - 1] === kept.times[i]) {
			(scaled[n - 1] === kept.scaled[i] ? dropped : conflicting).push(kept.lines[i] ?? 0);
			continue;
		}
		times[n] = kept.times[i] ?? 0;
		scaled[n] = kept.scaled[i] ?? 0;
		lines[n++] = kept.lines[i] ?? 0;
	}
	return {
		times: times.slice(0, n),
		scaled: scaled.slice(0, n),
		lines: lines.slice(0, n),
		dropped,
		conflicting,
		resorted: back,
		isDescending
	};
}
