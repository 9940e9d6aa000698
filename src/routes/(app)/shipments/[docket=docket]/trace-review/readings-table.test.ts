import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import type { ReadingRow } from './reading-row';
import ReadingsTable from './ReadingsTable.svelte';

let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

const minute = 60_000;
const start = Date.parse('2026-03-30T06:10:00Z');

const row = (index: number): ReadingRow => ({
	ms: start + index * 10 * minute,
	celsius: index / 1000,
	counting: index < 3 ? 'before-custody' : 'counted',
	leg: index < 3 ? null : { ordinal: 2, holder: 'Merrow Line' },
	usedHours: index < 3 ? null : index / 10,
	leftHours: index < 3 ? null : 240,
	excursion: index === 7 ? { number: 2, kind: 'too-warm', severity: 'critical' } : null,
	gapMinutes: index === 9 ? 130 : null
});

interface Calls {
	asked: Set<number>;
	chosen: number[];
	acts: string[];
}

function show(count: number, more: Record<string, unknown> = {}): Calls {
	const calls: Calls = { asked: new Set(), chosen: [], acts: [] };
	shown = mount(ReadingsTable, {
		target: document.body,
		props: {
			caption: 'Readings of L3',
			count,
			rowAt: (index: number) => {
				calls.asked.add(index);
				return row(index);
			},
			lineAt: (index: number) => index + 12,
			chosen: 0,
			zone: 'Europe/Berlin',
			unit: 'celsius',
			lifeUnit: 'h at 0 °C',
			onchoose: (index: number) => calls.chosen.push(index),
			online: () => calls.acts.push('line'),
			onchart: () => calls.acts.push('chart'),
			...more
		}
	});
	flushSync();
	return calls;
}

const grid = () => document.querySelector<HTMLElement>('[role=grid]') as HTMLElement;
const rows = () => [...document.querySelectorAll<HTMLElement>('.body [role=row]')];
const cells = (at: number) =>
	[...(rows()[at]?.querySelectorAll('[role=gridcell]') ?? [])].map((cell) =>
		cell.textContent?.replace(/\s+/g, ' ').trim()
	);

function press(key: string) {
	grid().dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }));
	flushSync();
}

describe('the table of readings', () => {
	it('draws two dozen of fifty thousand rows, says how many there are, and asks for no other', () => {
		const calls = show(50_000);
		expect(rows().length).toBeGreaterThan(5);
		expect(rows().length).toBeLessThan(30);
		expect(document.querySelectorAll('[role=gridcell]').length).toBeLessThan(300);
		expect(grid().getAttribute('aria-rowcount')).toBe('50001');
		expect(calls.asked.size).toBe(rows().length);
	});

	it('draws others when it is scrolled, numbered as they stand in the whole', () => {
		show(50_000);
		grid().scrollTop = 30 * 20_000;
		grid().dispatchEvent(new Event('scroll'));
		flushSync();
		const numbers = rows().map((one) => Number(one.getAttribute('aria-rowindex')));
		expect(numbers).toContain(20_002);
		expect(numbers).not.toContain(2);
		expect(rows().length).toBeLessThan(30);
	});

	it('has as many heads as cells, and says so', () => {
		show(20);
		const heads = document.querySelectorAll('[role=columnheader]');
		expect(String(heads.length)).toBe(grid().getAttribute('aria-colcount'));
		expect(cells(0)).toHaveLength(heads.length);
	});

	it('says of a reading when, how warm, in whose hands, what life, what went wrong and on which line', () => {
		show(20);
		expect(cells(7)).toEqual([
			'Mon 30 Mar 09:20 CEST',
			'0.0',
			'B Merrow Line',
			'0.7',
			'10.0',
			'E2 too warm, critical',
			'19'
		]);
		expect(cells(0)).toEqual(['Mon 30 Mar 08:10 CEST', '0.0', '', '', '', 'before custody', '12']);
		expect(cells(9)[5]).toBe('after a gap of 2:10');
	});

	it('shows the reader’s unit beside degrees Celsius', () => {
		show(20, { unit: 'fahrenheit' });
		expect(cells(7).slice(1, 3)).toEqual(['0.0', '32.0']);
		expect(grid().getAttribute('aria-colcount')).toBe('8');
	});

	it.each([
		['ArrowDown', 10, 11],
		['ArrowUp', 10, 9],
		['Home', 10, 0],
		['End', 10, 49_999]
	])('moves the choice by %s', (key, chosen, expected) => {
		const calls = show(50_000, { chosen });
		press(key);
		expect(calls.chosen).toEqual([expected]);
	});

	it('leaves other keys to the browser, and asks for line and chart by Enter and Space', () => {
		const calls = show(50);
		for (const key of ['Tab', 'a', 'Enter', ' ']) press(key);
		expect(calls).toMatchObject({ chosen: [], acts: ['line', 'chart'] });
	});

	it('tells a screen reader which row is chosen, as long as it is drawn', () => {
		show(50_000, { chosen: 4 });
		const named = grid().getAttribute('aria-activedescendant') ?? '';
		expect(document.getElementById(named)?.getAttribute('aria-rowindex')).toBe('6');
		expect(document.getElementById(named)?.getAttribute('aria-selected')).toBe('true');
		grid().scrollTop = 30 * 20_000;
		grid().dispatchEvent(new Event('scroll'));
		flushSync();
		expect(grid().hasAttribute('aria-activedescendant')).toBe(false);
	});

	it('chooses the row that is clicked', () => {
		const calls = show(50);
		rows()[5]?.click();
		expect(calls.chosen).toEqual([5]);
	});
});
