import { describe, expect, it } from 'vitest';
import { buildSpec, hourMs, startMs } from '../../../../tests/accuracy/build';
import { forecastTable, forecastTrip, type OnwardLeg } from './onward-trip';

// Cod by (1 + 0.1 T)², FAO Fisheries Technical Paper 348, 6.1: 1.44 at 2 °C, 1.96 at 4 °C, 2.25 at 5 °C.
const spec = buildSpec({ model: { kind: 'square-root', minCelsius: -10 } });
const sure = (hours: number) => ({ value: hours, low: hours, high: hours });
const leg = (hours: number, celsius: number, plusMinusCelsius = 0): OnwardLeg => ({
	hours,
	celsius,
	plusMinusCelsius
});

describe('an onward trip', () => {
	it('uses life leg by leg and arrives when they are over', () => {
		const trip = forecastTrip(spec, sure(176.64), startMs, [leg(24, 4), leg(10, 2)], { days: 3, celsius: 5 });
		expect(trip.arrivesMs).toBe(startMs + 34 * hourMs);
		expect(trip.legUsedHours.map(({ value }) => value)).toEqual([
			expect.closeTo(47.04, 9),
			expect.closeTo(14.4, 9)
		]);
		expect(trip.remainingHours.value).toBeCloseTo(115.2, 9);
		// 115.2 h at 0 °C are 51.2 h at 5 °C: 2.1333 days, and three were asked for.
		expect(trip.daysAtCustomer?.value).toBeCloseTo(2.13333, 4);
		expect(trip.answer).toBe('no');
	});

	it.each([
		[{ low: 108, value: 120, high: 130 }, 2, 'yes'],
		[{ low: 107.9, value: 120, high: 130 }, 2, 'in-doubt'],
		[{ low: 100, value: 104, high: 108 }, 2, 'in-doubt'],
		[{ low: 100, value: 104, high: 107.9 }, 2, 'no'],
		[{ low: -5, value: -1, high: 3 }, 0, 'in-doubt'],
		[{ low: 0, value: 1, high: 3 }, 0, 'yes']
	] as const)('with %o left and %d days at 5 °C asked for: %s', (remaining, days, answer) => {
		expect(forecastTrip(spec, remaining, startMs, [], { days, celsius: 5 }).answer).toBe(answer);
	});

	it('takes the warm side of every leg for the low', () => {
		const { remainingHours, legUsedHours } = forecastTrip(spec, sure(100), startMs, [leg(10, 2, 2)], {
			days: 1,
			celsius: 0
		});
		expect(legUsedHours[0]?.low).toBeCloseTo(10, 9);
		expect(legUsedHours[0]?.high).toBeCloseTo(19.6, 9);
		expect(remainingHours.low).toBeCloseTo(80.4, 9);
		expect(remainingHours.high).toBeCloseTo(90, 9);
	});

	it('is the same in any order of its legs, and split anywhere', () => {
		const remaining = { low: 90, value: 100, high: 110 };
		const need = { days: 1, celsius: 4 };
		const whole = forecastTrip(spec, remaining, startMs, [leg(12, 4, 1), leg(20, 1)], need);
		const other = forecastTrip(spec, remaining, startMs, [leg(20, 1), leg(5, 4, 1), leg(7, 4, 1)], need);
		expect(other.remainingHours.value).toBeCloseTo(whole.remainingHours.value, 9);
		expect(other.remainingHours.low).toBeCloseTo(whole.remainingHours.low, 9);
		expect(other.arrivesMs).toBe(whole.arrivesMs);
	});

	it('knows no days where life does not run at the customer’s', () => {
		const trip = forecastTrip(spec, sure(10), startMs, [], { days: 5, celsius: -10 });
		expect(trip).toMatchObject({ daysAtCustomer: null, answer: 'yes' });
	});
});

describe('the table of temperatures', () => {
	it('says how long the life lasts at each, and never longer where it is warmer', () => {
		const rows = forecastTable(spec, { low: 90, value: 144, high: 150 }, startMs, [-10, 0, 2, 5], 1);
		expect(rows.map(({ celsius }) => celsius)).toEqual([-10, 0, 2, 5]);
		expect(rows[0]?.forecast).toBeNull();
		expect(rows[2]?.forecast?.lastsHours.value).toBeCloseTo(100, 9);
		// At 3 °C life runs 1.69 times as fast: the low of 90 h lasts 53.25 h.
		expect(rows[2]?.forecast?.lastsHours.low).toBeCloseTo(90 / 1.69, 9);
		const ends = rows.slice(1).map(({ forecast }) => forecast?.endsMs.value ?? NaN);
		expect([...ends].sort((a, b) => b - a)).toEqual(ends);
	});
});
