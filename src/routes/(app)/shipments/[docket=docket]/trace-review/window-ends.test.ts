import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import { layoutOf } from '$lib/components/chart/drawing';
import type { End, Stretch } from './trim-ends';
import WindowEnds from './WindowEnds.svelte';

let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

const minute = 60_000;
const start = Date.parse('2026-03-30T06:10:00Z');
const times = Float64Array.from({ length: 101 }, (_, i) => start + i * 10 * minute);
const layout = layoutOf(1122);
/** 1,000 px of plot for 1,000 minutes. */
const view = { fromMs: start, toMs: start + 1000 * minute };

function show(stretch: Stretch | null = null, shownView = view): [End, number | null][] {
	const moves: [End, number | null][] = [];
	shown = mount(WindowEnds, {
		target: document.body,
		props: {
			view: shownView,
			layout,
			times,
			stretch,
			zone: 'Europe/Berlin',
			onmove: (end: End, index: number | null) => moves.push([end, index])
		}
	});
	flushSync();
	return moves;
}

const grips = () => [...document.querySelectorAll<HTMLElement>('[role=slider]')];
const grip = (end: End) => grips()[end === 'from' ? 0 : 1] as HTMLElement;

function press(end: End, key: string, shiftKey = false): KeyboardEvent {
	const event = new KeyboardEvent('keydown', { key, shiftKey, bubbles: true, cancelable: true });
	grip(end).dispatchEvent(event);
	return event;
}

function pointer(end: End, type: string, clientX: number, button = 0) {
	grip(end).dispatchEvent(new PointerEvent(type, { clientX, button, pointerId: 1, bubbles: true }));
}

describe('the ends of the custody window', () => {
	it('are sliders over the readings that count, and say the local time', () => {
		show();
		expect(grips().map((one) => one.getAttribute('aria-label'))).toEqual([
			'Custody window begins',
			'Custody window ends'
		]);
		const told = (end: End) =>
			['min', 'max', 'now', 'text'].map((name) => grip(end).getAttribute(`aria-value${name}`));
		expect(told('from')).toEqual(['0', '99', '0', 'Mon 30 Mar 08:10 CEST']);
		expect(told('to')).toEqual(['1', '100', '100', 'Tue 31 Mar 00:50 CEST']);
		expect(grips().every((one) => one.tabIndex === 0)).toBe(true);
	});

	it('say how many readings a move leaves out', () => {
		show({ fromMs: start, toMs: start + 25 * minute });
		expect(grip('from').getAttribute('aria-valuetext')).toBe('Mon 30 Mar 08:40 CEST, 3 readings left out');
		expect(grip('to').getAttribute('aria-valuenow')).toBe('100');
		expect(document.querySelector<HTMLElement>('.band')?.style.width).toBe('25px');
	});

	it.each([
		['from', 'ArrowRight', false, 1],
		['from', 'ArrowRight', true, 10],
		['from', 'ArrowLeft', false, 0],
		['from', 'End', false, 99],
		['to', 'ArrowLeft', false, 99],
		['to', 'ArrowLeft', true, 90],
		['to', 'Home', false, 1]
	] as const)('%s: %s, Shift %s, asks for reading %d', (end, key, shiftKey, expected) => {
		const moves = show();
		expect(press(end, key, shiftKey).defaultPrevented).toBe(true);
		expect(moves).toEqual([[end, expected]]);
	});

	it('are put back by Escape where one was moved, and leave it to the chart otherwise', () => {
		const moves = show();
		expect(press('from', 'Escape').defaultPrevented).toBe(false);
		expect(press('from', 'x').defaultPrevented).toBe(false);
		expect(moves).toEqual([]);
	});

	it('are put back by Escape', () => {
		const moves = show({ fromMs: start, toMs: start + 25 * minute });
		expect(press('from', 'Escape').defaultPrevented).toBe(true);
		expect(moves).toEqual([['from', null]]);
	});

	it('follow the pointer that holds them, from where they were taken', () => {
		const moves = show();
		// Moved without being held: nothing.
		pointer('from', 'pointermove', 300);
		pointer('from', 'pointerdown', 12);
		pointer('from', 'pointermove', 12 + 96);
		pointer('from', 'pointerup', 12 + 96);
		pointer('from', 'pointermove', 500);
		expect(moves).toEqual([['from', 10]]);
	});

	it('are not taken by another button', () => {
		const moves = show();
		pointer('to', 'pointerdown', 1000, 2);
		pointer('to', 'pointermove', 500);
		expect(moves).toEqual([]);
	});

	it('wait at the edge where they are out of view', () => {
		show(null, { fromMs: start + 200 * minute, toMs: start + 400 * minute });
		expect(grips().map((one) => one.style.left)).toEqual(['0px', '1000px']);
		expect(document.querySelectorAll('.is-beyond')).toHaveLength(2);
	});
});
