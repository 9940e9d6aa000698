import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import type { ProposedTrim } from '$lib/domain/custody/propose-trims';
import ProposedTrims from './ProposedTrims.svelte';

let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

const start = Date.parse('2026-03-30T06:10:00Z');
const times = Float64Array.from({ length: 101 }, (_, i) => start + i * 600_000);
const from: ProposedTrim = { end: 'from', index: 3, outermostCelsius: 21.4, restingCelsius: 2 };
const to: ProposedTrim = { end: 'to', index: 97, outermostCelsius: 14, restingCelsius: 2 };

function show(proposed: ProposedTrim[]): ProposedTrim[] {
	const taken: ProposedTrim[] = [];
	shown = mount(ProposedTrims, {
		target: document.body,
		props: {
			label: 'L3',
			proposed,
			times,
			zone: 'Europe/Berlin',
			unit: 'celsius',
			ontake: (trim: ProposedTrim) => taken.push(trim)
		}
	});
	flushSync();
	return taken;
}

describe('proposed trims', () => {
	it('say which readings, by the clock of the site, and why', () => {
		show([from, to]);
		const rows = [...document.querySelectorAll('li')].map((row) => row.textContent?.replace(/\s+/g, ' '));
		expect(rows[0]).toContain('Readings before Mon 30 Mar 08:40 CEST. Begins at 21.4 °C');
		expect(rows[1]).toContain('Readings after Tue 31 Mar 00:20 CEST. Leaves 2.0 °C');
	});

	it('are taken one at a time, by their button', () => {
		const taken = show([from, to]);
		document.querySelectorAll('button')[1]?.click();
		expect(taken).toEqual([to]);
	});

	it('are not spoken of where there are none', () => {
		show([]);
		expect(document.body.textContent?.trim()).toBe('');
	});
});
