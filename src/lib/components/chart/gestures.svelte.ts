import { zoomAround, type Window } from './cursor';
import { pannedView, pinchedView } from './pinch';

/** What of a pointer or wheel event counts here. */
type Pointed = Pick<PointerEvent, 'pointerId' | 'pointerType' | 'button' | 'clientX'>;
type Wheeled = Pick<
	WheelEvent,
	'deltaX' | 'deltaY' | 'clientX' | 'ctrlKey' | 'metaKey' | 'altKey' | 'shiftKey' | 'preventDefault'
>;

/** The plot as it is shown now. */
interface Plot {
	view: Window;
	whole: Window;
	leftPx: number;
	widthPx: number;
}

interface Acts {
	/** The crosshair goes to this instant. */
	onmove: (ms: number) => void;
	/** The view changes; null: the whole. */
	onview: (view: Window | null) => void;
}

/** A drag shorter than this is a click. */
const shortestDragPx = 6;

/**
 * Mouse: moving carries the crosshair, dragging chooses a part, the wheel zooms with Ctrl, Alt or Cmd and pans with Shift.
 * Touch: one finger carries the crosshair, two zoom and pan; up and down is left to the page.
 */
export class Gestures {
	#fromPx = $state<number | null>(null);
	#toPx = $state(0);
	#fingers: { id: number; px: number }[] = [];
	#pinch: { view: Window; fingers: readonly [number, number] } | null = null;
	readonly #plot: () => Plot;
	readonly #acts: Acts;

	constructor(plot: () => Plot, acts: Acts) {
		this.#plot = plot;
		this.#acts = acts;
	}

	/** What a mouse is choosing, px in the plot; null while it is not. */
	get chosen(): { leftPx: number; widthPx: number } | null {
		const from = this.#fromPx;
		if (from === null || Math.abs(this.#toPx - from) <= shortestDragPx) return null;
		return { leftPx: Math.min(from, this.#toPx), widthPx: Math.abs(this.#toPx - from) };
	}

	down(event: Pointed): void {
		const px = this.#pxOf(event);
		if (event.pointerType === 'touch') this.#touch(event.pointerId, px);
		else if (event.button === 0) this.#fromPx = this.#toPx = px;
		if (!this.#pinch) this.#acts.onmove(this.#msOf(px));
	}

	move(event: Pointed): void {
		const px = this.#pxOf(event);
		const finger = this.#fingers.find(({ id }) => id === event.pointerId);
		if (finger) finger.px = px;
		if (this.#pinch) return this.#pinched(this.#pinch);
		if (this.#fromPx !== null) this.#toPx = px;
		this.#acts.onmove(this.#msOf(px));
	}

	up(event: Pointed, isCancelled = false): void {
		this.#fingers = this.#fingers.filter(({ id }) => id !== event.pointerId);
		if (this.#fingers.length < 2) this.#pinch = null;
		const chosen = this.chosen;
		this.#fromPx = null;
		if (!chosen || isCancelled) return;
		this.#acts.onview({
			fromMs: this.#msOf(chosen.leftPx),
			toMs: this.#msOf(chosen.leftPx + chosen.widthPx)
		});
	}

	/** Without a key the page scrolls. */
	wheel(event: Wheeled): void {
		const { view, whole, widthPx } = this.#plot();
		if (event.ctrlKey || event.metaKey || event.altKey) {
			event.preventDefault();
			this.#acts.onview(
				zoomAround(view, whole, this.#msOf(this.#pxOf(event)), event.deltaY > 0 ? 1.25 : 0.8)
			);
		} else if (event.shiftKey) {
			event.preventDefault();
			this.#acts.onview(pannedView(view, whole, event.deltaX || event.deltaY, widthPx));
		}
	}

	#touch(id: number, px: number): void {
		this.#fingers.push({ id, px });
		const [a, b, more] = this.#fingers;
		if (a && b && !more) this.#pinch = { view: this.#plot().view, fingers: [a.px, b.px] };
	}

	#pinched({ view, fingers }: { view: Window; fingers: readonly [number, number] }): void {
		const { whole, widthPx } = this.#plot();
		const [a, b] = this.#fingers;
		if (a && b) this.#acts.onview(pinchedView(view, whole, fingers, [a.px, b.px], widthPx));
	}

	#pxOf({ clientX }: { clientX: number }): number {
		const { leftPx, widthPx } = this.#plot();
		return Math.min(widthPx, Math.max(0, clientX - leftPx));
	}

	#msOf(px: number): number {
		const { view, widthPx } = this.#plot();
		return view.fromMs + (px / widthPx) * (view.toMs - view.fromMs);
	}
}
