import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	buildHandover,
	buildInput,
	buildSpec,
	heldTrace,
	hourMs,
	startMs
} from '../../../../tests/accuracy/build';
import { assess } from '../receiving/assess';
import { butFor } from './but-for';
import { legShares, wholeShares } from './shares';

// Cod of 14 d at 0 °C by (1 + 0.1 T)², FAO Fisheries Technical Paper 348, 6.1: 1.00, 3.92, 1.00 and 0.72 days used,
// against the same hours at 0 °C. The shares are worked out by hand from those.
const stretches = [
	[24, 0],
	[48, 4],
	[6, 10],
	[12, 2]
] as const;
const spec = buildSpec({ model: { kind: 'square-root', minCelsius: -10 }, neededHours: 8 * 24 });
let hours = 0;
const handovers = [0, 24, 48, 6, 12].map((held, i) => {
	hours += held;
	return buildHandover(`H${i}`, startMs + hours * hourMs, { plannedMs: startMs + hours * hourMs });
});
const assessment = assess(buildInput(heldTrace(stretches), spec, { handovers }));
const percents = (basis: 'used' | 'over-use') =>
	legShares(assessment.legs, basis).map(({ percent }) => percent);

describe('the shares of the legs', () => {
	it('by life used are 15, 59, 15 and 11 percent', () => {
		expect(percents('used')).toEqual([15, 59, 15, 11]);
	});

	it('by over-use are those of 1.92, 0.75 and 0.22 days, and none for the leg within its allowance', () => {
		expect(percents('over-use')).toEqual([0, 66, 26, 8]);
		expect(legShares(assessment.legs, 'over-use').every(({ basis }) => basis === 'over-use')).toBe(true);
	});

	it('are not told where an allowance is not known, or nothing was lost', () => {
		const unknown = assessment.legs.map((leg) => ({ ...leg, overHours: null }));
		expect(legShares(unknown, 'over-use')).toEqual([]);
		expect(legShares(unknown, 'used')).toHaveLength(4);
		const saved = assessment.legs.map((leg) => ({ ...leg, overHours: -1 }));
		expect(legShares(saved, 'over-use')).toEqual([]);
	});
});

describe('whole shares', () => {
	it.each([
		[
			[1, 1, 1],
			[34, 33, 33]
		],
		[
			[1, 1, 1, 1, 1, 1],
			[17, 17, 17, 17, 16, 16]
		],
		[
			[0, 5],
			[0, 100]
		],
		[
			[0.005, 0.995],
			[1, 99]
		],
		[[], null],
		[[0, 0], null]
	])('of %j are %j', (parts, expected) => {
		expect(wholeShares(parts)).toEqual(expected);
	});

	it('add up to 100 and are within one of the exact share, whatever the parts', () => {
		const parts = fc.array(fc.double({ min: 0, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 12 });
		fc.assert(
			fc.property(parts, (given) => {
				const shares = wholeShares(given);
				const total = given.reduce((sum, part) => sum + part, 0);
				if (shares === null) {
					expect(total).toBe(0);
					return;
				}
				expect(shares.reduce((sum, share) => sum + share, 0)).toBe(100);
				shares.forEach((share, i) =>
					expect(Math.abs(share - ((given[i] as number) / total) * 100)).toBeLessThanOrEqual(1)
				);
			})
		);
	});
});

describe('the but-for figure', () => {
	it('gives each leg back its own over-use, on all three sides, and says whether that would pass', () => {
		const found = butFor(assessment.legs, assessment.remainingHours, spec.neededHours);
		// 7.36 d are left and 8 are needed: without the road's 1.92 d it passes, without the dock's 0.75 as well.
		expect(found.map(({ remainingHours }) => remainingHours.value / 24)).toEqual([
			expect.closeTo(7.36, 6),
			expect.closeTo(9.28, 6),
			expect.closeTo(8.11, 6),
			expect.closeTo(7.58, 6)
		]);
		expect(found.map(({ passes }) => passes)).toEqual([false, true, true, false]);
	});

	it('judges by the low, and leaves out a leg without an allowance', () => {
		const remaining = { value: 200, low: 100, high: 300 };
		const [leg] = assessment.legs;
		const late = { ...leg, overHours: 80 } as (typeof assessment.legs)[number];
		expect(butFor([late], remaining, 180)[0]).toMatchObject({
			remainingHours: { value: 280, low: 180, high: 380 },
			passes: true
		});
		expect(butFor([late], remaining, 180.1)[0]?.passes).toBe(false);
		expect(butFor([{ ...late, overHours: null }], remaining, 1)).toEqual([]);
	});
});
