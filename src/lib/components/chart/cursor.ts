/** What is in view, UTC ms. */
export interface Window {
	fromMs: number;
	toMs: number;
}

/** Index of the reading nearest in time; times ascend and there is at least one. */
export function nearestIndex(times: ArrayLike<number>, ms: number): number {
	let low = 0;
	let high = times.length - 1;
	while (high - low > 1) {
		const middle = (low + high) >> 1;
		if ((times[middle] ?? 0) < ms) low = middle;
		else high = middle;
	}
	return Math.abs((times[low] ?? 0) - ms) <= Math.abs((times[high] ?? 0) - ms) ? low : high;
}

/** The beginning of the next leg, or of this one and then the one before. */
export function stepLeg(starts: readonly number[], ms: number, direction: 1 | -1): number | null {
	const ordered = direction === 1 ? starts : [...starts].reverse();
	return ordered.find((start) => (direction === 1 ? start > ms : start < ms)) ?? null;
}

/** Narrows or widens the view around an instant that keeps its place, within the whole and not under ten minutes. */
export function zoomAround(view: Window, whole: Window, ms: number, factor: number): Window {
	const span = Math.max(600_000, (view.toMs - view.fromMs) * factor);
	if (span >= whole.toMs - whole.fromMs) return { ...whole };
	const share = (ms - view.fromMs) / (view.toMs - view.fromMs);
	return shifted({ fromMs: ms - share * span, toMs: ms + (1 - share) * span }, whole);
}

/** The view moved just so far that the instant is in it. */
export function panTo(view: Window, whole: Window, ms: number): Window {
	if (ms >= view.fromMs && ms <= view.toMs) return view;
	const by = ms < view.fromMs ? ms - view.fromMs : ms - view.toMs;
	return shifted({ fromMs: view.fromMs + by, toMs: view.toMs + by }, whole);
}

function shifted(view: Window, whole: Window): Window {
	const by = Math.max(0, whole.fromMs - view.fromMs) - Math.max(0, view.toMs - whole.toMs);
	return { fromMs: Math.max(whole.fromMs, view.fromMs + by), toMs: Math.min(whole.toMs, view.toMs + by) };
}
