import { describe, expect, it } from 'vitest';
import { exp } from '../math/exp';
import { exponentialPiece, logMean, steadyPiece } from './piece';

describe('the logarithmic mean', () => {
	it('is (b − a) / ln(b/a)', () => {
		// Source: the definition; means of 1 and e, of 1 and 3.
		expect(logMean(1, Math.E, 1)).toBeCloseTo(Math.E - 1, 14);
		expect(logMean(1, 3, 1.0986122886681098)).toBeCloseTo(1.8204784532536746, 14);
	});

	it('is the figure itself where both are equal', () => {
		expect(logMean(2.5, 2.5, 0)).toBeCloseTo(2.5, 15);
		expect(logMean(0.25, 0.25, 0)).toBe(0.25);
	});

	it('keeps its digits where the two are nearly equal', () => {
		// Source: (e^d − 1)/d = 1 + d/2 + d²/6 + d³/24 + d⁴/120 + d⁵/720, exact to a double for such d.
		for (const d of [1e-12, 1e-8, 1e-5, 1e-3, 0.011]) {
			const expected = 1 + (d / 2) * (1 + (d / 3) * (1 + (d / 4) * (1 + (d / 5) * (1 + d / 6))));
			expect(Math.abs(logMean(1, exp(d), d) - expected)).toBeLessThan(3e-15);
		}
	});

	it('does not jump where the series ends', () => {
		for (const d of [0.79999, 0.8, 0.80001]) {
			expect(logMean(1, exp(d), d)).toBeCloseTo((exp(d) - 1) / d, 13);
		}
	});

	it('lies between the two, and is the same either way round', () => {
		for (const d of [0.01, 0.3, 0.9, 3, -0.5]) {
			const b = exp(d);
			expect(logMean(1, b, d)).toBeGreaterThan(Math.min(1, b));
			expect(logMean(1, b, d)).toBeLessThan(Math.max(1, b));
			expect(logMean(b, 1, -d)).toBeCloseTo(logMean(1, b, d), 14);
		}
	});
});

describe('pieces of a rate', () => {
	it('run through their anchor', () => {
		const piece = exponentialPiece(0, 10, 0.1, 5, 2);
		expect(piece.rateAt(5)).toBe(2);
		expect(piece.rateAt(10)).toBeCloseTo(2 * Math.exp(0.5), 12);
		expect([piece.fromCelsius, piece.toCelsius]).toEqual([0, 10]);
	});

	it('have an exact mean', () => {
		const piece = exponentialPiece(-50, 50, 0.1, 0, 1);
		const mean = piece.meanRate(0, 10, piece.rateAt(0), piece.rateAt(10));
		expect(mean).toBeCloseTo((Math.E - 1) / 1, 13);
	});

	it('may stand still', () => {
		const piece = steadyPiece(-Infinity, 0, 0.7);
		expect(piece.rateAt(-30)).toBe(0.7);
		expect(piece.meanRate(-30, -10, 0.7, 0.7)).toBe(0.7);
	});
});
