import { describe, expect, it } from 'vitest';
import { buildHandover, hourMs, minuteMs, startMs } from '../../../../tests/accuracy/build';
import type { FoundExcursion } from '../excursions/find-excursions';
import { legsOf } from './legs';
import { placeExcursion } from './place-excursion';

const at = (hours: number) => startMs + hours * hourMs;

/** Two legs of ten hours; the handover between them is known to so many minutes. */
function placed(fromHours: number, toHours: number, plusMinusMinutes = 0, costHours = 6) {
	const handovers = [0, 10, 20].map((hours, i) =>
		buildHandover(`H${i}`, at(hours), { plusMinusMinutes: i === 1 ? plusMinusMinutes : 0 })
	);
	const excursion: FoundExcursion = {
		kind: 'too-warm',
		severity: 'major',
		limitCelsius: 4,
		fromMs: at(fromHours),
		toMs: at(toHours),
		minutes: (toHours - fromHours) * 60,
		extremeCelsius: 9,
		extremeAtMs: at(fromHours) + minuteMs,
		meanCelsius: 6,
		degreeMinutes: 100,
		costHours,
		isInDoubt: false,
		isOpen: false
	};
	return placeExcursion(excursion, legsOf(handovers, at(20)), handovers);
}

describe('the leg of an excursion', () => {
	it.each([
		[2, 5, [1], [6]],
		[12, 15, [2], [6]],
		// Across the handover by time: four hours in the first leg, two in the second.
		[6, 12, [1, 2], [4, 2]],
		[0, 20, [1, 2], [3, 3]],
		// It ends as the handover is made, or begins with it: the other leg was not touched.
		[8, 10, [1], [6]],
		[10, 13, [2], [6]]
	] as const)('from %d h to %d h is %j, and costs them %j h', (from, to, legs, costs) => {
		const { legs: named, legCostHours, unsettledHandoverId } = placed(from, to);
		expect(named).toEqual(legs);
		legCostHours?.forEach((cost, i) => expect(cost).toBeCloseTo(costs[i] ?? NaN, 9));
		expect(unsettledHandoverId).toBeUndefined();
	});

	it.each([
		[9.6, 9.9],
		[10.2, 11],
		[9.5, 10.5],
		// Exactly at the end of the error counts as within it.
		[9.5, 9.8],
		[10.5, 11]
	])('is neither neighbour’s where it begins within 30 min of the handover: %d h to %d h', (from, to) => {
		const found = placed(from, to, 30);
		expect(found.unsettledHandoverId).toBe('H1');
		expect(found.legs).toEqual([]);
		expect(found.legCostHours).toEqual([]);
	});

	it('is settled where it begins outside that error, though it runs through the handover', () => {
		expect(placed(9.4, 12, 30)).toMatchObject({ legs: [1, 2] });
		expect(placed(9.4, 12, 30).unsettledHandoverId).toBeUndefined();
		expect(placed(10, 12, 0).unsettledHandoverId).toBeUndefined();
	});

	it('names legs beyond the neighbours of a handover it begins beside', () => {
		const handovers = [0, 10, 12, 20].map((hours, i) =>
			buildHandover(`H${i}`, at(hours), { plusMinusMinutes: i === 1 ? 30 : 0 })
		);
		const long = { ...placed(10.1, 16), legs: undefined, legCostHours: undefined };
		const { legs: _, legCostHours: __, ...excursion } = long;
		const found = placeExcursion(excursion, legsOf(handovers, at(20)), handovers);
		expect(found.legs).toEqual([3]);
		// Four of its 5.9 hours.
		expect(found.legCostHours?.[0]).toBeCloseTo((6 * 4) / 5.9, 9);
	});

	it('is none where no handover is known', () => {
		const { legs: _, legCostHours: __, ...excursion } = placed(2, 5);
		expect(placeExcursion(excursion, [], []).legs).toEqual([]);
	});

	it('apportions the whole cost where legs cover it whole', () => {
		for (const [from, to] of [
			[0.1, 19.9],
			[3, 11],
			[9.99, 10.01]
		] as const) {
			const { legCostHours } = placed(from, to);
			expect(legCostHours?.reduce((sum, cost) => sum + cost, 0)).toBeCloseTo(6, 9);
		}
	});
});
