import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import CompareLoggers from './CompareLoggers.svelte';
import type { ReadLogger } from './trace-review.svelte';

let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

const logger = (at: number): ReadLogger => ({
	label: `L${at + 1}`,
	serial: `SB-3042${at}`,
	traceId: `t${at + 1}`,
	readId: null,
	status: 'found',
	position: at === 0 ? 'pallet 2, nose' : null,
	placement: 'in-product',
	styleAt: at,
	...{ accuracyCelsius: 0.5, calibrationDueOn: null, everyMinutes: 10, readings: 577 },
	...{ mktCelsius: null, meanCelsius: null, minCelsius: null, maxCelsius: null, gapMinutes: null },
	...{ fileName: null, fileSha256: null, fileBytes: null, zoneBy: null }
});

const atMs = Date.parse('2026-04-02T07:20:00Z');

function show(more: Record<string, unknown> = {}): unknown[][] {
	const calls: unknown[][] = [];
	shown = mount(CompareLoggers, {
		target: document.body,
		props: {
			loggers: [logger(0), logger(1), logger(2), logger(3)],
			drawnIds: ['t1', 't2', 't3'],
			primaryId: 't3',
			apart: {
				t1: { atMs, differenceCelsius: -7.04, meanCelsius: 0.42, compared: 577 },
				t2: null,
				t3: undefined,
				t4: undefined
			},
			zone: 'Europe/Berlin',
			unit: 'celsius',
			ondraw: (id: string, isDrawn: boolean) => calls.push(['draw', id, isDrawn]),
			onprimary: (id: string) => calls.push(['primary', id]),
			onat: (ms: number) => calls.push(['at', ms]),
			...more
		}
	});
	flushSync();
	return calls;
}

const rows = () => [...document.querySelectorAll('tbody tr')];
const textOf = (at: number) => rows()[at]?.textContent?.replace(/\s+/g, ' ').trim() ?? '';
const boxes = () => [...document.querySelectorAll<HTMLInputElement>('input[type=checkbox]')];

describe('the legend of the chart', () => {
	it('shows each logger with a line of its own, told apart without colour', () => {
		show();
		const looks = [...document.querySelectorAll('tbody svg path')].map((path) =>
			['stroke', 'stroke-width', 'stroke-dasharray'].map((name) => path.getAttribute(name)).join(' ')
		);
		expect(looks).toHaveLength(4);
		expect(new Set(looks).size).toBe(4);
	});

	it('names the primary one, which cannot be put away', () => {
		show();
		expect(textOf(2)).toContain('yes, in ink');
		expect(boxes().map(({ checked, disabled }) => [checked, disabled])).toEqual([
			[true, false],
			[true, false],
			[true, true],
			[false, false]
		]);
	});

	it('says how far each is from it at most, which way, and when', () => {
		show();
		expect(textOf(0)).toContain('7.0colder');
		expect(textOf(0)).toContain('Thu 2 Apr 09:20');
		expect(textOf(0)).toContain('0.4');
		expect(textOf(1)).toContain('never at once');
		expect(textOf(3)).toContain('not drawn');
	});

	it('says a difference in the reader’s unit as a difference', () => {
		show({ unit: 'fahrenheit' });
		// 7.04 °C apart are 12.672 °F apart.
		expect(textOf(0)).toContain('12.7colder');
	});

	it('draws and puts away, reads another, and goes to where they part', () => {
		const calls = show();
		boxes()[3]?.click();
		boxes()[0]?.click();
		for (const name of ['Read L1', 'Thu 2 Apr 09:20'])
			[...document.querySelectorAll('button')].find((one) => one.textContent?.trim() === name)?.click();
		expect(calls).toEqual([
			['draw', 't4', true],
			['draw', 't1', false],
			['primary', 't1'],
			['at', atMs]
		]);
	});
});
