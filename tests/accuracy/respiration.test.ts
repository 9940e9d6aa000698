import { describe, expect, it } from 'vitest';
import { q10FromTwoRates } from '../../src/lib/domain/shelf-life/rate-q10';

describe('Q10 from respiration', () => {
	// Source: USDA Agriculture Handbook 66 (Saltveit, "Respiratory metabolism", summary table), mg CO₂/kg·h at 0, 10 and
	// 20 °C; Q10 over each ten degrees is the quotient, printed to two decimals.
	it.each([
		['apple, fall', 3, 9, 20, 3.0, 2.22],
		['apple, summer', 5, 17, 31, 3.4, 1.82],
		['asparagus', 60, 215, 270, 3.58, 1.26],
		['blueberry', 6, 29, 70, 4.83, 2.41],
		['broccoli', 21, 81, 300, 3.86, 3.7],
		['cabbage', 5, 18, 42, 3.6, 2.33],
		['cauliflower', 17, 34, 79, 2.0, 2.32],
		['grape, table', 3, 13, 27, 4.33, 2.08],
		['lettuce, head', 12, 31, 56, 2.58, 1.81],
		['lettuce, leaf', 23, 39, 101, 1.7, 2.59],
		['mushroom', 36, 97, 264, 2.69, 2.72],
		['raspberry', 17, 35, 125, 2.06, 3.57],
		['snap bean', 20, 58, 130, 2.9, 2.24],
		['spinach', 21, 110, 230, 5.24, 2.09],
		['strawberry', 16, 75, 150, 4.69, 2.0],
		['sweet corn', 41, 105, 261, 2.56, 2.49]
	])('of %s', (_, at0, at10, at20, lower, upper) => {
		expect(Math.abs(q10FromTwoRates(0, at0, 10, at10) - lower)).toBeLessThan(0.0051);
		expect(Math.abs(q10FromTwoRates(10, at10, 20, at20) - upper)).toBeLessThan(0.0051);
	});

	// Source: UC Davis Postharvest Center fact sheets, midpoints of the printed ranges, ml CO₂/kg·h at 0, 10, 20 °C.
	it.each([
		['strawberry', 8, 37.5, 75, 4.69, 2.0, 3.06],
		['broccoli', 10.5, 40.5, 150, 3.86, 3.7, 3.78],
		['lettuce, crisphead', 5.5, 15.5, 27.5, 2.82, 1.77, 2.24],
		['grape clusters', 1.5, 6.5, 13.5, 4.33, 2.08, 3.0]
	])('of %s in millilitres', (_, at0, at10, at20, lower, upper, whole) => {
		expect(q10FromTwoRates(0, at0, 10, at10)).toBeCloseTo(lower, 2);
		expect(q10FromTwoRates(10, at10, 20, at20)).toBeCloseTo(upper, 2);
		expect(q10FromTwoRates(0, at0, 20, at20)).toBeCloseTo(whole, 2);
	});
});
