import stdlibLn from '@stdlib/math-base-special-ln';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exp } from './exp';
import { ln } from './ln';

describe('ln', () => {
	it('gives the doubles nearest to known values', () => {
		// Source: OEIS A002162 (ln 2), A002391 (ln 3), A002392 (ln 10).
		expect(ln(1)).toBe(0);
		expect(ln(2)).toBe(0.6931471805599453);
		expect(Math.abs(ln(3) - 1.0986122886681098)).toBeLessThanOrEqual(2.3e-16);
		expect(ln(10)).toBe(2.302585092994046);
		expect(ln(0.5)).toBe(-0.6931471805599453);
	});

	it('equals the reference implementation to the last place', () => {
		fc.assert(
			fc.property(fc.double({ min: Number.MIN_VALUE, max: Number.MAX_VALUE, noNaN: true }), (x) => {
				const reference = stdlibLn(x);
				expect(Math.abs(ln(x) - reference)).toBeLessThanOrEqual(Math.abs(reference) * 2.3e-16);
			}),
			{ numRuns: 5000 }
		);
	});

	it('equals the reference near one, where digits cancel', () => {
		for (let i = -1000; i <= 1000; i++) {
			const x = 1 + i / 4096;
			const reference = stdlibLn(x);
			expect(Math.abs(ln(x) - reference)).toBeLessThanOrEqual(Math.abs(reference) * 2.3e-16);
		}
	});

	it('undoes exp', () => {
		for (let x = -700; x <= 700; x += 0.7) expect(Math.abs(ln(exp(x)) - x)).toBeLessThanOrEqual(1e-12);
	});

	it('has the edges of a logarithm', () => {
		expect(ln(0)).toBe(-Infinity);
		expect(ln(-1)).toBeNaN();
		expect(ln(NaN)).toBeNaN();
		expect(ln(Infinity)).toBe(Infinity);
		expect(ln(Number.MIN_VALUE)).toBe(stdlibLn(Number.MIN_VALUE));
	});
});
