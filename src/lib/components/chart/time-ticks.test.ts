import { describe, expect, it } from 'vitest';
import { timeTicks } from './time-ticks';

const zone = 'Europe/Berlin';
const at = (iso: string) => Date.parse(iso);

describe('ticks of the time axis', () => {
	const trip = timeTicks(at('2026-03-30T06:10:00Z'), at('2026-04-03T05:10:00Z'), zone, 760, 'en');

	it('falls on whole local hours that leave room for their figures', () => {
		expect(trip.hours.slice(0, 4).map((tick) => tick.text)).toEqual(['12', '18', '00', '06']);
		expect(trip.hours[2]?.isMidnight).toBe(true);
	});

	it('names every day at its midnight, and the first at the edge', () => {
		expect(trip.days.map((tick) => tick.text)).toEqual([
			'Mon 30 Mar',
			'Tue 31 Mar',
			'Wed 1 Apr',
			'Thu 2 Apr',
			'Fri 3 Apr'
		]);
		expect(trip.days.map((tick) => tick.isAtEdge)).toEqual([true, false, false, false, false]);
		expect(trip.days[1]?.ms).toBe(at('2026-03-30T22:00:00Z'));
	});

	// Source: EU Directive 2000/84/EC: clocks go forward at 01:00 UTC on the last Sunday of March.
	it('keeps to the wall clock over a change of clocks', () => {
		const { hours } = timeTicks(at('2026-03-28T23:00:00Z'), at('2026-03-29T22:00:00Z'), zone, 200, 'en');
		expect(hours.map((tick) => tick.text)).toEqual(['00', '06', '12', '18', '00']);
		expect(hours[1]?.ms).toBe(at('2026-03-29T04:00:00Z'));
		expect(hours[4]?.ms).toBe(at('2026-03-29T22:00:00Z'));
	});

	it('shows minutes when zoomed in', () => {
		const { hours } = timeTicks(at('2026-04-02T07:00:00Z'), at('2026-04-02T08:00:00Z'), zone, 390, 'en');
		expect(hours.map((tick) => tick.text)).toEqual([
			'09:00',
			'09:10',
			'09:20',
			'09:30',
			'09:40',
			'09:50',
			'10:00'
		]);
	});

	it('leaves out hours, then days, over a long voyage', () => {
		const { hours, days } = timeTicks(
			at('2026-01-01T00:00:00Z'),
			at('2026-03-02T00:00:00Z'),
			zone,
			600,
			'en'
		);
		expect(hours).toEqual([]);
		expect(days.length).toBeLessThanOrEqual(9);
	});
});
