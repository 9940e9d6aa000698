import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { pow } from './pow';

describe('pow', () => {
	it('is exact for whole exponents with whole results', () => {
		expect(pow(3, 1)).toBe(3);
		expect(pow(3, 2)).toBe(9);
		expect(pow(2, -3)).toBe(0.125);
		expect(pow(2.5, 0)).toBe(1);
		expect(pow(10, 15)).toBe(1e15);
	});

	it('gives the accelerated-ageing factors', () => {
		// Source: ASTM F1980, AAF = Q10^((TAA − TRT)/10); 55 against 22 °C with Q10 2.0, 60/22, 50/25, 55/22 with 1.8.
		expect(pow(2, 3.3)).toBeCloseTo(9.8492, 4);
		expect(pow(2, 3.8)).toBeCloseTo(13.9288, 4);
		expect(pow(2, 2.5)).toBeCloseTo(5.6569, 4);
		expect(pow(1.8, 3.3)).toBeCloseTo(6.9566, 4);
	});

	it('gives Q10 from two lives, also where they were read in °F', () => {
		// Source: university extension rule, 60 weeks at 33 °F against 4 weeks at 72 °F: Q10 = 15^(18/39).
		expect(pow(15, 18 / 39)).toBeCloseTo(3.4899, 4);
	});

	it('turns back on itself', () => {
		fc.assert(
			fc.property(
				fc.double({ min: 0.1, max: 50, noNaN: true }),
				fc.double({ min: 0.05, max: 8, noNaN: true }),
				(b, e) => {
					expect(Math.abs(pow(pow(b, e), 1 / e) / b - 1)).toBeLessThan(1e-12);
				}
			)
		);
	});

	it('has no power of a base that is not positive', () => {
		expect(pow(0, 2)).toBeNaN();
		expect(pow(-2, 2)).toBeNaN();
	});
});
