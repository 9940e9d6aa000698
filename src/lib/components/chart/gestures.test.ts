import { describe, expect, it } from 'vitest';
import type { Window } from './cursor';
import { Gestures } from './gestures.svelte';

const hour = 3_600_000;
const whole = { fromMs: 0, toMs: 100 * hour };

/** A plot of 200 px whose left edge stands at 40 px; the view follows what is done to it. */
function scene(view: Window = whole) {
	const seen: { ms: number[]; views: (Window | null)[] } = { ms: [], views: [] };
	const state = { view };
	const gestures = new Gestures(() => ({ view: state.view, whole, leftPx: 40, widthPx: 200 }), {
		onmove: (ms) => seen.ms.push(ms / hour),
		onview: (next) => {
			state.view = next ?? whole;
			seen.views.push(next && { fromMs: next.fromMs / hour, toMs: next.toMs / hour });
		}
	});
	return { gestures, seen };
}

const mouse = (clientX: number, button = 0) => ({ pointerId: 1, pointerType: 'mouse', button, clientX });
const finger = (pointerId: number, clientX: number) => ({
	pointerId,
	pointerType: 'touch',
	button: 0,
	clientX
});

function wheel(parts: Partial<WheelEvent>) {
	const state = { isPrevented: false };
	const event = {
		...{ deltaX: 0, deltaY: 0, clientX: 140, ctrlKey: false, metaKey: false, altKey: false, shiftKey: false },
		...parts,
		preventDefault: () => {
			state.isPrevented = true;
		}
	};
	return { event, state };
}

describe('a mouse on the chart', () => {
	it('carries the crosshair, and does not leave the plot', () => {
		const { gestures, seen } = scene();
		for (const x of [40, 140, 240, 0, 999]) gestures.move(mouse(x));
		expect(seen.ms).toEqual([0, 50, 100, 0, 100]);
		expect(seen.views).toEqual([]);
	});

	it('chooses a part by a drag, in either direction', () => {
		for (const [from, to] of [
			[80, 160],
			[160, 80]
		] as const) {
			const { gestures, seen } = scene();
			gestures.down(mouse(from));
			gestures.move(mouse(to));
			expect(gestures.chosen).toEqual({ leftPx: 40, widthPx: 80 });
			gestures.up(mouse(to));
			expect(seen.views).toEqual([{ fromMs: 20, toMs: 60 }]);
			expect(gestures.chosen).toBeNull();
		}
	});

	it.each([
		['a click', 80, 84, 0, false],
		['a drag with another button', 80, 160, 2, false],
		['a drag that was broken off', 80, 160, 0, true]
	])('chooses nothing by %s', (_, from, to, button, isCancelled) => {
		const { gestures, seen } = scene();
		gestures.down(mouse(from, button));
		gestures.move(mouse(to, button));
		gestures.up(mouse(to, button), isCancelled);
		expect(seen.views).toEqual([]);
	});
});

describe('the wheel', () => {
	it.each([{ ctrlKey: true }, { metaKey: true }, { altKey: true }])(
		'zooms with %j around the pointer',
		(key) => {
			const { gestures, seen } = scene();
			const turn = wheel({ ...key, deltaY: -100 });
			gestures.wheel(turn.event);
			expect(seen.views).toEqual([{ fromMs: 10, toMs: 90 }]);
			expect(turn.state.isPrevented).toBe(true);
		}
	);

	it('pans with Shift where a part is shown', () => {
		const { gestures, seen } = scene({ fromMs: 40 * hour, toMs: 60 * hour });
		gestures.wheel(wheel({ shiftKey: true, deltaY: 100 }).event);
		expect(seen.views).toEqual([{ fromMs: 50, toMs: 70 }]);
	});

	it('without a key belongs to the page', () => {
		const { gestures, seen } = scene();
		const turn = wheel({ deltaY: 100 });
		gestures.wheel(turn.event);
		expect(turn.state.isPrevented).toBe(false);
		expect(seen).toEqual({ ms: [], views: [] });
	});
});

describe('fingers on the chart', () => {
	it('carry the crosshair one at a time, and choose nothing', () => {
		const { gestures, seen } = scene();
		gestures.down(finger(1, 60));
		gestures.move(finger(1, 160));
		gestures.up(finger(1, 160));
		expect(seen).toEqual({ ms: [10, 60], views: [] });
	});

	it('zoom two at a time, and leave the crosshair where it is', () => {
		const { gestures, seen } = scene({ fromMs: 40 * hour, toMs: 60 * hour });
		gestures.down(finger(1, 90));
		gestures.down(finger(2, 190));
		gestures.move(finger(1, 40));
		gestures.move(finger(2, 240));
		expect(seen.ms).toEqual([45]);
		const last = seen.views.at(-1);
		expect(last?.fromMs).toBeCloseTo(45, 6);
		expect(last?.toMs).toBeCloseTo(55, 6);
	});

	it('go on with the crosshair when the second has gone', () => {
		const { gestures, seen } = scene();
		gestures.down(finger(1, 90));
		gestures.down(finger(2, 190));
		gestures.up(finger(2, 190), true);
		gestures.move(finger(1, 140));
		expect(seen.ms).toEqual([25, 50]);
		expect(seen.views).toEqual([]);
	});
});
