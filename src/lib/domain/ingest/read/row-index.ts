/** The most frequent difference between neighbours; 0 without any. */
function usualStep(values: Float64Array): number {
	const counts = new Map<number, number>();
	for (let i = 1; i < values.length; i++) {
		const step = Math.abs((values[i] ?? 0) - (values[i - 1] ?? 0));
		counts.set(step, (counts.get(step) ?? 0) + 1);
	}
	let [usual, most] = [0, 0];
	for (const [step, count] of counts) if (count > most) [usual, most] = [step, count];
	return usual;
}

/** Whether the numbers beside the rows count them: whole, and strictly up or down all the way. */
function isCount(index: Float64Array): boolean {
	const way = Math.sign((index[1] ?? 0) - (index[0] ?? 0));
	for (let i = 0; i < index.length; i++) {
		if (!Number.isInteger(index[i])) return false;
		if (i > 0 && Math.sign((index[i] ?? 0) - (index[i - 1] ?? 0)) !== way) return false;
	}
	return way !== 0;
}

/**
 * Milliseconds since the first reading of rows that carry no time: by their number where the file counts them, so that
 * a row which is missing leaves its place empty; else one interval after the other.
 */
export function countedMs(index: Float64Array, intervalMs: number): Float64Array {
	if (!isCount(index)) return Float64Array.from(index, (_, i) => i * intervalMs);
	const step = usualStep(index);
	const lowest = Math.min(index[0] ?? 0, index.at(-1) ?? 0);
	return index.map((place) => Math.round(((place - lowest) / step) * intervalMs));
}
