import { describe, expect, it } from 'vitest';
import { readBytes } from '../../reads/read-bytes';
import { chanceOf } from '../chance';
import { exportOf } from './exports';
import { layoutNames, type LayoutName, type Ride } from './journey';
import { placeLegs } from './place-legs';
import { temperaturesOf } from './temperatures';

const dueMs = Date.parse('2026-04-03T05:30:00Z');
const legs = placeLegs(
	[
		{ by: 'grower', place: 'store', hours: 6, setPointCelsius: 1 },
		{ by: 'haulier', place: 'road', hours: 20, setPointCelsius: 1 }
	],
	dueMs,
	[0, 0.5]
);
const arrivedMs = dueMs + 30 * 60_000;
const ride: Ride = {
	...{ line: 1, position: 'nose', placement: 'between-cases', exposure: 1, offsetCelsius: 0 },
	layout: 'iso'
};
const written = temperaturesOf({ legs, arrivedMs, incidents: [] }, ride, chanceOf('journey'));

function understood(layout: LayoutName, zone = 'Europe/Amsterdam') {
	const file = exportOf(layout, { serial: 'SB-30418', trip: 'Lettuce, 12 heads', zone, written });
	return readBytes({
		bytes: new TextEncoder().encode(file.text),
		context: {
			uploadedMs: arrivedMs + 600_000,
			siteZone: zone,
			journeyFromMs: legs[0]?.actualMs ?? null,
			journeyToMs: arrivedMs,
			answers: {}
		},
		withTraces: true
	});
}

describe('an export of the demo', () => {
	const readAtOnce = layoutNames.filter((name) => name !== 'two-probes' && name !== 'no-unit');
	it.each(readAtOnce)('is read whole and without a question as %s', (layout) => {
		const { summary, traces } = understood(layout);
		const chosen = traces.find(({ isChosen }) => isChosen);
		expect(summary.kind).toBe('ok');
		expect(chosen?.readings).toBe(written.times.length);
		expect([chosen?.firstMs, chosen?.lastMs]).toEqual([written.times[0], written.times.at(-1)]);
		expect(chosen?.maxCelsius).toBeCloseTo(Math.max(...written.celsius), 1);
	});

	it.each(['two-probes', 'no-unit'] as const)('asks something as %s', (layout) => {
		expect(understood(layout).summary.kind).toBe('question');
	});

	it('keeps its instants in °F by an American clock', () => {
		const { traces } = understood('american', 'America/New_York');
		expect(traces[0]?.firstMs).toBe(written.times[0]);
		expect(traces[0]?.unit).toBe('fahrenheit');
	});
});

describe('a journey of the demo', () => {
	it('lasts as planned where nothing is late, and later legs begin later where one is', () => {
		expect(legs[0]?.plannedMs).toBe(dueMs - 26 * 3_600_000);
		expect(legs[1]?.actualMs).toBe(legs[1]?.plannedMs);
		const late = placeLegs(legs, dueMs, [2, 0]);
		expect((late[1]?.actualMs ?? 0) - (late[1]?.plannedMs ?? 0)).toBe(2 * 3_600_000);
	});

	it('stays near its set-point, warms in an incident, and less where it is less exposed', () => {
		const incidents = [{ leg: 1, afterHours: 4, hours: 6, airCelsius: 15 }];
		const warmest = (exposure: number) =>
			Math.max(
				...temperaturesOf({ legs, arrivedMs, incidents }, { ...ride, exposure }, chanceOf('journey')).celsius
			);
		expect(Math.max(...written.celsius)).toBeLessThan(4);
		expect(Math.min(...written.celsius)).toBeGreaterThan(0);
		expect(warmest(1)).toBeGreaterThan(13);
		expect(warmest(0.3)).toBeLessThan(7);
	});

	it('leaves out what a logger did not write', () => {
		const course = { legs, arrivedMs, incidents: [] };
		const gap = temperaturesOf(
			course,
			{ ...ride, gap: { leg: 1, afterHours: 3, hours: 2 } },
			chanceOf('journey')
		);
		expect(written.times.length - gap.times.length).toBe(11);
		const early = temperaturesOf(course, { ...ride, stopsEarlyHours: 7 }, chanceOf('journey'));
		expect(early.times.at(-1)).toBe(arrivedMs - 7 * 3_600_000);
	});
});
