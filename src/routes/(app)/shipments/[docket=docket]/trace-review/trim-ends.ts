/** A stretch of time that is to be left out. */
export interface Stretch {
	fromMs: number;
	toMs: number;
}

export type End = 'from' | 'to';

/** Readings that stay, at least: with fewer there is nothing to assess. */
const fewestLeft = 2;
const minuteMs = 60_000;

/** Where the two ends of what counts stand, as places among the readings that counted so far. */
export function endsAfter(times: ArrayLike<number>, stretch: Stretch | null): { from: number; to: number } {
	let [from, to] = [0, times.length - 1];
	if (!stretch || times.length === 0) return { from, to };
	const [firstMs, lastMs] = [times[0] ?? 0, times[to] ?? 0];
	if (stretch.fromMs <= firstMs) while (from < to && (times[from] ?? 0) <= stretch.toMs) from++;
	else if (stretch.toMs >= lastMs) while (to > from && (times[to] ?? 0) >= stretch.fromMs) to--;
	return { from, to };
}

/** As far as an end may go: the other stays where it was accepted. */
export function reachOf(times: ArrayLike<number>, end: End): { least: number; most: number } {
	const last = Math.max(0, times.length - 1);
	const keeps = fewestLeft - 1;
	return end === 'from'
		? { least: 0, most: Math.max(0, last - keeps) }
		: { least: Math.min(last, keeps), most: last };
}

/**
 * What is left out when an end is moved to this reading: from the first that counted to half way before it, or from
 * half way after it to the last, on a whole minute or second where one lies between. Null where it stands.
 */
export function stretchTo(times: ArrayLike<number>, end: End, index: number): Stretch | null {
	const { least, most } = reachOf(times, end);
	const at = Math.min(most, Math.max(least, index));
	const last = times.length - 1;
	if (end === 'from')
		return at === 0 ? null : { fromMs: times[0] ?? 0, toMs: between(times[at - 1] ?? 0, times[at] ?? 0) };
	return at === last ? null : { fromMs: between(times[at] ?? 0, times[at + 1] ?? 0), toMs: times[last] ?? 0 };
}

/** After the first and before the second; round, so that a person can read it. */
function between(afterMs: number, beforeMs: number): number {
	const middle = (afterMs + beforeMs) / 2;
	for (const step of [minuteMs, 1000]) {
		const rounded = Math.floor(middle / step) * step;
		if (rounded > afterMs && rounded < beforeMs) return rounded;
	}
	return Math.floor(middle);
}

/** Where a key takes an end; null leaves it to the browser. `bigStep` readings go by with Shift. */
export function endByKey(
	key: string,
	hasShift: boolean,
	at: number,
	reach: { least: number; most: number },
	bigStep = 10
): number | null {
	const step = hasShift ? bigStep : 1;
	const moved: Record<string, number> = {
		ArrowRight: at + step,
		ArrowUp: at + step,
		ArrowLeft: at - step,
		ArrowDown: at - step,
		PageUp: at + bigStep,
		PageDown: at - bigStep,
		Home: reach.least,
		End: reach.most
	};
	const next = moved[key];
	return next === undefined ? null : Math.min(reach.most, Math.max(reach.least, next));
}
