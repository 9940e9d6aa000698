import { panTo, zoomAround, type Window } from './cursor';

/** Two fingers on the plot, px from its left edge. */
export type Fingers = readonly [number, number];

/** Nearer than this, two fingers are taken for that far apart: a pinch to nothing is no zoom without end. */
const nearestPx = 24;

/** The view under two fingers that have moved: what lay under each of them still does, within the whole. */
export function pinchedView(
	start: Window,
	whole: Window,
	from: Fingers,
	to: Fingers,
	plotPx: number
): Window {
	const perPx = (start.toMs - start.fromMs) / plotPx;
	const factor = spread(from) / spread(to);
	const middleMs = start.fromMs + middle(from) * perPx;
	const zoomed = zoomAround(start, whole, middleMs, factor);
	const nextPerPx = (zoomed.toMs - zoomed.fromMs) / plotPx;
	return pannedView(zoomed, whole, (middleMs - zoomed.fromMs) / nextPerPx - middle(to), plotPx);
}

/** The view so many px further to the right, not past either end of the whole. */
export function pannedView(view: Window, whole: Window, byPx: number, plotPx: number): Window {
	const byMs = (byPx / plotPx) * (view.toMs - view.fromMs);
	if (byMs === 0) return view;
	return panTo(view, whole, byMs > 0 ? view.toMs + byMs : view.fromMs + byMs);
}

function spread([a, b]: Fingers): number {
	return Math.max(nearestPx, Math.abs(b - a));
}

function middle([a, b]: Fingers): number {
	return (a + b) / 2;
}
