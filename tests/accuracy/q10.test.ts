import { describe, expect, it } from 'vitest';
import { q10FromTwoLives, q10FromTwoRates } from '../../src/lib/domain/shelf-life/rate-q10';
import { rateAt } from '../../src/lib/domain/shelf-life/rate-curve';
import type { RateModel } from '../../src/lib/domain/shelf-life/spec';
import { celsiusFromFahrenheit } from '../../src/lib/domain/units';
import { buildSpec, dayHours } from './build';

describe('the postharvest Q10 table', () => {
	// Source: Saltveit, "Respiratory metabolism", USDA Agriculture Handbook 66 (2002 draft revision), reproduced in
	// Produce Degradation: Reaction Pathways and their Prevention (CRC), ch. 20, tables 20.3 and 20.4.
	const model: RateModel = {
		kind: 'banded-q10',
		bands: [
			{ fromCelsius: 0, toCelsius: 10, q10: 3 },
			{ fromCelsius: 10, toCelsius: 20, q10: 2.5 },
			{ fromCelsius: 20, toCelsius: 30, q10: 2 },
			{ fromCelsius: 30, toCelsius: 40, q10: 1.5 }
		]
	};
	const printed = [
		{ celsius: 0, velocity: 1, life: 100 },
		{ celsius: 10, velocity: 3, life: 33 },
		{ celsius: 20, velocity: 7.5, life: 13 },
		{ celsius: 30, velocity: 15, life: 7 },
		{ celsius: 40, velocity: 22.5, life: 4 }
	];
	const spec = buildSpec({ model });

	it.each(printed)(
		'prints velocity $velocity and life $life at $celsius °C',
		({ celsius, velocity, life }) => {
			expect(rateAt(spec, celsius)).toBeCloseTo(velocity, 12);
			expect(Math.round(100 / rateAt(spec, celsius))).toBe(life);
		}
	);

	it('runs on inside a band by that band’s Q10', () => {
		// Source: the table's own definition, 3^0.4, 3 × 2.5^0.5, 7.5 × 2^0.5.
		expect(rateAt(spec, 4)).toBeCloseTo(1.5518, 4);
		expect(100 / rateAt(spec, 4)).toBeCloseTo(64.439, 3);
		expect(rateAt(spec, 15)).toBeCloseTo(4.7434, 4);
		expect(rateAt(spec, 25)).toBeCloseTo(10.6066, 4);
	});

	it('reads 13 d at 20 °C as 100 d at 0 and 4 d at 40', () => {
		const atTwenty = buildSpec({ model, referenceCelsius: 20 });
		expect(Math.round((40 / 3) * (1 / rateAt(atTwenty, 0)))).toBe(100);
		expect(Math.round((40 / 3) * (1 / rateAt(atTwenty, 40)))).toBe(4);
	});

	it('holds the rate outside its bands', () => {
		expect(rateAt(spec, -5)).toBe(1);
		expect(rateAt(spec, 50)).toBeCloseTo(22.5, 12);
	});
});

describe('Q10 from two figures', () => {
	it('comes from two lives in °C; ten degrees Fahrenheit would be wrong', () => {
		// Source: university extension rule, 60 weeks at 33 °F against 4 weeks at 72 °F: Q10 3.49 = 15^(18/39).
		const lower = { celsius: celsiusFromFahrenheit(33), lifeHours: 60 * 7 * dayHours };
		const upper = { celsius: celsiusFromFahrenheit(72), lifeHours: 4 * 7 * dayHours };
		expect(q10FromTwoLives(lower, upper)).toBeCloseTo(3.4899, 4);
		const wrong = q10FromTwoLives({ ...lower, celsius: 33 }, { ...upper, celsius: 72 });
		expect(wrong).toBeCloseTo(2.0025, 3);
	});

	it('is the model’s Q10 over any ten degrees', () => {
		const lower = { celsius: 0, lifeHours: 28 * dayHours };
		const upper = { celsius: 5, lifeHours: 14 * dayHours };
		const spec = buildSpec({ model: { kind: 'two-lives', lower, upper }, referenceCelsius: 2 });
		expect(rateAt(spec, 2)).toBe(1);
		expect(rateAt(spec, 12)).toBeCloseTo(q10FromTwoLives(lower, upper), 12);
		expect(rateAt(spec, 5) / rateAt(spec, 0)).toBeCloseTo(2, 12);
	});

	it('comes from two respiration rates, whatever their unit', () => {
		// Source: USDA Agriculture Handbook 66, blueberry 6, 29, 70, 101 mg CO₂/kg·h at 0, 10, 20, 25 °C.
		expect(q10FromTwoRates(0, 6, 25, 101)).toBeCloseTo(3.094, 3);
		expect(q10FromTwoRates(10, 29, 25, 101)).toBeCloseTo(2.298, 3);
		expect(q10FromTwoRates(10, 29, 20, 70)).toBeCloseTo(2.414, 3);
		expect(q10FromTwoRates(0, 6, 10, 29)).toBeCloseTo(4.83, 2);
	});

	it('is the same for strawberry in mg as in ml', () => {
		// Source: AH-66, 16 and 75 mg; UC Davis fact sheet midpoints, 8 and 37.5 ml CO₂/kg·h, at 0 and 10 °C.
		expect(q10FromTwoRates(0, 16, 10, 75)).toBeCloseTo(4.69, 2);
		expect(q10FromTwoRates(0, 8, 10, 37.5)).toBe(q10FromTwoRates(0, 16, 10, 75));
	});
});
