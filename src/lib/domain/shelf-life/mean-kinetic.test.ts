import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { meanKineticCelsius, worstWindowMeanKinetic } from './mean-kinetic';

const equal = (celsius: readonly number[]) => celsius.map(() => 1);
const mkt = (celsius: readonly number[], energy: number | null = null) =>
	meanKineticCelsius(celsius, equal(celsius), energy) ?? NaN;
const temperatures = fc.array(fc.double({ min: -30, max: 45, noNaN: true }), { minLength: 1, maxLength: 40 });

describe('mean kinetic temperature', () => {
	it('lies between the mean and the warmest', () => {
		fc.assert(
			fc.property(temperatures, (celsius) => {
				const mean = celsius.reduce((sum, one) => sum + one, 0) / celsius.length;
				expect(mkt(celsius)).toBeGreaterThanOrEqual(mean - 1e-9);
				expect(mkt(celsius)).toBeLessThanOrEqual(Math.max(...celsius) + 1e-9);
			})
		);
	});

	it('does not care for order, nor for every reading twice', () => {
		fc.assert(
			fc.property(temperatures, (celsius) => {
				expect(mkt([...celsius].reverse())).toBeCloseTo(mkt(celsius), 9);
				expect(mkt([...celsius, ...celsius])).toBeCloseTo(mkt(celsius), 9);
			})
		);
	});

	it('rises with the activation energy', () => {
		expect(mkt([2, 8], 60)).toBeLessThan(mkt([2, 8], 83.144));
		expect(mkt([2, 8], 83.144)).toBeLessThan(mkt([2, 8], 100));
	});

	it('is 10 000 K over R by the customary figures', () => {
		// Source: USP ⟨1160⟩: 83.144 kJ/mol and 8.3144 × 10⁻³ kJ/(K·mol). Two readings, the formula written out.
		const kelvin = 10_000 / -Math.log((Math.exp(-10_000 / 293.15) + Math.exp(-10_000 / 303.15)) / 2);
		expect(mkt([20, 30])).toBeCloseTo(kelvin - 273.15, 9);
		expect(mkt([20, 30], 83.144)).toBe(mkt([20, 30]));
	});

	it('does not run out at deep cold', () => {
		expect(mkt([-80, -80])).toBeCloseTo(-80, 9);
		expect(mkt([-196, -196], 500)).toBeCloseTo(-196, 9);
		expect(mkt([-196, 25], 200)).toBeGreaterThan(0);
	});

	it('is none where nothing has weight', () => {
		expect(meanKineticCelsius([], [])).toBeNull();
		expect(meanKineticCelsius([5], [0])).toBeNull();
	});
});

describe('the worst window', () => {
	const worst = (celsius: readonly number[], window: number) =>
		worstWindowMeanKinetic(celsius, equal(celsius), window) ?? NaN;

	it('is the warmest run of readings', () => {
		expect(worst([5, 5, 5, 14, 14, 5, 5], 2)).toBeCloseTo(14, 9);
		expect(worst([14, 5, 5, 5], 2)).toBeCloseTo(mkt([14, 5]), 9);
		expect(worst([5, 5, 5, 14], 2)).toBeCloseTo(mkt([5, 14]), 9);
	});

	it('may begin or end inside a reading’s stretch', () => {
		const inside = worstWindowMeanKinetic([5, 14, 5], [10, 1, 10], 3) ?? NaN;
		expect(inside).toBeCloseTo(meanKineticCelsius([5, 14], [2, 1]) ?? NaN, 9);
	});

	it('is the whole where that is shorter', () => {
		expect(worst([5, 14], 24)).toBe(mkt([5, 14]));
	});

	it('is at least the whole, and no window placed anywhere is worse', () => {
		fc.assert(
			fc.property(temperatures, fc.integer({ min: 1, max: 20 }), (celsius, window) => {
				const found = worst(celsius, window);
				for (let from = 0; from + window <= celsius.length; from += 0.5) {
					const weights = celsius.map((_, i) =>
						Math.max(0, Math.min(i + 1, from + window) - Math.max(i, from))
					);
					expect(meanKineticCelsius(celsius, weights) ?? NaN).toBeLessThanOrEqual(found + 1e-9);
				}
			}),
			{ numRuns: 60 }
		);
	});
});
