import { describe, expect, it } from 'vitest';
import {
	buildInput,
	buildLimit,
	buildSpec,
	buildTrace,
	hourMs,
	minuteMs,
	startMs
} from '../../../../tests/accuracy/build';
import { assess } from '../receiving/assess';
import type { Placement } from '../trace/trace';

/** Two days of air at 2 °C read every 5 min, with rises of so many readings to 6 °C that begin at these hours. */
function airWith(rises: readonly (readonly [atHour: number, readings: number])[]): number[] {
	const celsius = new Array<number>(48 * 12 + 1).fill(2);
	for (const [atHour, readings] of rises) celsius.fill(6, atHour * 12, atHour * 12 + readings);
	return celsius;
}

const spec = buildSpec({ upper: buildLimit(4) });
const assessed = (celsius: readonly number[], placement: Placement = 'air') =>
	assess(buildInput(buildTrace(celsius, 5), spec, { placement }));
const kindsOf = (celsius: readonly number[], placement?: Placement) =>
	assessed(celsius, placement).incidents.map(({ kind }) => kind);

describe('a short rise of the air', () => {
	it('is a door opening, with its figures, and stays an excursion and in every sum', () => {
		const { incidents, excursions, usedHours } = assessed(airWith([[10, 3]]));
		expect(incidents).toHaveLength(1);
		expect(incidents[0]).toMatchObject({
			kind: 'door-opening',
			extremeCelsius: 6,
			restingCelsius: 2,
			extremeAtMs: startMs + 10 * hourMs
		});
		// Above 4 °C half-way up and half-way down: two whole steps and two halves.
		expect(incidents[0]?.minutes).toBeCloseTo(15, 9);
		expect(incidents[0]?.fromMs).toBeCloseTo(startMs + 10 * hourMs - 2.5 * minuteMs, 3);
		expect(excursions).toHaveLength(1);
		expect(usedHours.value).toBeGreaterThan(assessed(airWith([])).usedHours.value);
	});

	it('is none where it lasts longer than 45 min, or never goes back', () => {
		expect(kindsOf(airWith([[10, 10]]))).toEqual([]);
		expect(kindsOf(airWith([[10, 9]]))).toEqual(['door-opening']);
		expect(kindsOf([2, 2, 2, 2, 6, 6])).toEqual([]);
		expect(kindsOf([2, 2, 2, 2, 6, 3.5, 3.5])).toEqual([]);
	});

	it('is none in the product, whose probe does not swing with the air', () => {
		expect(kindsOf(airWith([[10, 3]]), 'in-product')).toEqual([]);
		expect(kindsOf(airWith([[10, 3]]), 'between-cases')).toEqual(['door-opening']);
	});

	it('is a defrost where three or more follow each other at one distance', () => {
		const every6Hours = [6, 12, 18, 24, 30].map((at) => [at, 4] as const);
		expect(kindsOf(airWith(every6Hours))).toEqual(new Array(5).fill('defrost'));
		expect(kindsOf(airWith(every6Hours.slice(0, 2)))).toEqual(['door-opening', 'door-opening']);
	});

	it('is a door opening between defrosts too', () => {
		const rises = [6, 12, 15, 18, 24].map((at) => [at, 4] as const);
		expect(kindsOf(airWith([...rises, [26, 4]]))).toEqual([
			'defrost',
			'defrost',
			'door-opening',
			'defrost',
			'defrost',
			'door-opening'
		]);
	});

	it.each([
		[[1, 2, 3, 4], 'door-opening'],
		[[2, 12, 15, 40], 'door-opening'],
		[[6, 12.5, 18.5, 24.5], 'defrost']
	] as const)('starting at %j h is each a %s', (hours, kind) => {
		expect(kindsOf(airWith(hours.map((at) => [at, 3] as const)))).toEqual(hours.map(() => kind));
	});

	it('is judged from where the trace rests, not from the limit', () => {
		const warm = airWith([[10, 3]]).map((celsius) => celsius + 1.5);
		expect(assessed(warm).incidents[0]?.restingCelsius).toBe(3.5);
		expect(kindsOf(airWith([[10, 3]]).map((celsius) => (celsius === 6 ? 4 : celsius)))).toEqual([]);
	});
});
