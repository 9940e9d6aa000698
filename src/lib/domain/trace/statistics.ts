import { RunningSum } from '../math/sum';

/** Lowest and highest of the values and where they first stand. */
export interface Extremes {
	readonly min: number;
	readonly minAt: number;
	readonly max: number;
	readonly maxAt: number;
}

/** Null of an empty list. */
export function extremesOf(values: ArrayLike<number>): Extremes | null {
	if (values.length === 0) return null;
	let minAt = 0;
	let maxAt = 0;
	for (let i = 1; i < values.length; i++) {
		if ((values[i] as number) < (values[minAt] as number)) minAt = i;
		if ((values[i] as number) > (values[maxAt] as number)) maxAt = i;
	}
	return { min: values[minAt] as number, minAt, max: values[maxAt] as number, maxAt };
}

/** Arithmetic mean over the readings, whatever lies between them: the mean of a channel. Null of an empty list. */
export function arithmeticMean(values: ArrayLike<number>): number | null {
	if (values.length === 0) return null;
	const sum = new RunningSum();
	for (let i = 0; i < values.length; i++) sum.add(values[i] as number);
	return sum.total / values.length;
}

/**
 * Mean over time, linear between readings: the mean of an assessment. Steps for which `isCounted` is false are left
 * out. A lone reading is its own mean; null of an empty list.
 */
export function timeWeightedMean(
	times: ArrayLike<number>,
	values: ArrayLike<number>,
	isCounted: (step: number) => boolean = () => true
): number | null {
	const area = new RunningSum();
	const weight = new RunningSum();
	for (let i = 0; i + 1 < times.length; i++) {
		if (!isCounted(i)) continue;
		const ms = (times[i + 1] as number) - (times[i] as number);
		area.add(ms * (((values[i] as number) + (values[i + 1] as number)) / 2));
		weight.add(ms);
	}
	return weight.total > 0 ? area.total / weight.total : arithmeticMean(values);
}
