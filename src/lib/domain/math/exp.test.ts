import stdlibExp from '@stdlib/math-base-special-exp';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exp } from './exp';

/** Distance in units of the last place of `expected`. */
function ulps(actual: number, expected: number): number {
	if (Object.is(actual, expected)) return 0;
	const view = new DataView(new ArrayBuffer(16));
	view.setFloat64(0, actual);
	view.setFloat64(8, expected);
	return Math.abs(Number(view.getBigInt64(0) - view.getBigInt64(8)));
}

describe('exp', () => {
	it('gives the doubles nearest to known values', () => {
		// Source: NIST Digital Library of Mathematical Functions, e = 2.71828 18284 59045 23536; OEIS A001113, A068985.
		expect(exp(0)).toBe(1);
		expect(ulps(exp(1), 2.718281828459045)).toBeLessThanOrEqual(1);
		expect(ulps(exp(-1), 0.36787944117144233)).toBeLessThanOrEqual(1);
		expect(ulps(exp(10), 22026.465794806718)).toBeLessThanOrEqual(1);
	});

	it('stays within one unit of the last place of the reference implementation', () => {
		fc.assert(
			fc.property(fc.double({ min: -745, max: 709, noNaN: true }), (x) => {
				expect(ulps(exp(x), stdlibExp(x))).toBeLessThanOrEqual(1);
			}),
			{ numRuns: 5000 }
		);
	});

	it('equals the reference on a grid of the exponents a rate model can have', () => {
		let worst = 0;
		for (let i = -40_000; i <= 40_000; i++) worst = Math.max(worst, ulps(exp(i / 1000), stdlibExp(i / 1000)));
		expect(worst).toBeLessThanOrEqual(1);
	});

	it('runs out at both ends as a double does', () => {
		expect(exp(710)).toBe(Infinity);
		expect(exp(709.78)).toBeLessThan(Infinity);
		expect(exp(-746)).toBe(0);
		expect(exp(-745.1)).toBeGreaterThan(0);
		expect(ulps(exp(-740), stdlibExp(-740))).toBeLessThanOrEqual(1);
		expect(exp(Infinity)).toBe(Infinity);
		expect(exp(-Infinity)).toBe(0);
		expect(exp(NaN)).toBeNaN();
	});

	it('gives digits fixed once and for all', () => {
		// A change here changes every stored figure: it needs a new engine version.
		expect([0.1, 0.43944491546724385, 3.3, -8.25].map(exp)).toEqual([
			1.1051709180756477, 1.5518455739153596, 27.112638920657883, 0.00026125855730166754
		]);
	});
});
