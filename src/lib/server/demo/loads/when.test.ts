import { describe, expect, it } from 'vitest';
import { drawnTogether, inOffice, instantOf } from './when';

const zone = 'Europe/Amsterdam';
const anchor = new Date('2026-04-03T07:35:00Z');

describe('a moment of the demo', () => {
	it('is minutes from now, or a time of the site’s clock whatever the clocks did since', () => {
		expect(instantOf({ minutes: -90 }, anchor, zone)).toBe(Date.parse('2026-04-03T06:05:00Z'));
		// Clocks went forward on 29 March 2026 (Directive 2000/84/EC: last Sunday of March).
		expect(instantOf({ day: -1, clock: '06:00' }, anchor, zone)).toBe(Date.parse('2026-04-02T04:00:00Z'));
		expect(instantOf({ day: -10, clock: '06:00' }, anchor, zone)).toBe(Date.parse('2026-03-24T05:00:00Z'));
	});

	it('draws a morning together only where the docks have been open for some time', () => {
		expect(drawnTogether(new Date('2026-04-03T02:30:00Z'), zone, '04:00')).toBe(1);
		expect(drawnTogether(new Date('2026-04-03T07:30:00Z'), zone, '04:00')).toBeCloseTo(320 / 330, 10);
		expect(drawnTogether(new Date('2026-04-03T15:00:00Z'), zone, '04:00')).toBe(1);
	});

	it('moves paperwork to office hours, over a weekend too, and never past now', () => {
		const at = (text: string) => new Date(inOffice(Date.parse(text), zone, new Date('2026-04-20T08:00:00Z')));
		expect(at('2026-04-02T10:00:00Z')).toEqual(new Date('2026-04-02T10:00:00Z'));
		expect(at('2026-04-02T02:20:00Z')).toEqual(new Date('2026-04-02T07:20:00Z'));
		expect(at('2026-04-03T19:10:00Z')).toEqual(new Date('2026-04-06T07:10:00Z'));
		expect(at('2026-04-20T09:00:00Z')).toEqual(new Date('2026-04-20T07:59:00Z'));
	});
});
