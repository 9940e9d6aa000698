import { describe, expect, it } from 'vitest';
import { buildSpec } from '../../../../tests/accuracy/build';
import { needWorthHours } from './need';
import { rateBounds } from './rate-bounds';
import { curveRateAt, meanRate, rateAt, rateCurve } from './rate-curve';
import type { RateModel, Spec } from './spec';
import { validateSpec } from './validate';

const q10: RateModel = { kind: 'constant-q10', q10: 3 };
const models: readonly (readonly [RateModel, number])[] = [
	[q10, 0.5],
	[{ kind: 'two-lives', lower: { celsius: 0, lifeHours: 600 }, upper: { celsius: 12, lifeHours: 150 } }, 0.4],
	[
		{
			kind: 'banded-q10',
			bands: [
				{ fromCelsius: -20, toCelsius: 5, q10: 4 },
				{ fromCelsius: 5, toCelsius: 40, q10: 1.2 }
			]
		},
		0.5
	],
	[{ kind: 'arrhenius', activationEnergyKilojoulesPerMole: 83.144 }, 10],
	[{ kind: 'square-root', minCelsius: -10 }, 2]
];
const temperatures = [-40, -19, -9.5, -3, 0, 1, 2, 2.5, 4.9, 5.1, 12, 30];

describe.each(models)('the bounds of %o', (model, sensitivityPlusMinus) => {
	const spec = buildSpec({ model, referenceCelsius: 2, validFromCelsius: -30, sensitivityPlusMinus });
	const { low, high } = rateBounds(spec);

	it('enclose the rate at every temperature, and meet it at the reference', () => {
		for (const celsius of temperatures) {
			const rate = rateAt(spec, celsius);
			expect(curveRateAt(low, celsius)).toBeLessThanOrEqual(rate * (1 + 1e-14));
			expect(curveRateAt(high, celsius)).toBeGreaterThanOrEqual(rate * (1 - 1e-14));
		}
		expect(curveRateAt(low, 2)).toBeCloseTo(1, 13);
		expect(curveRateAt(high, 2)).toBeCloseTo(1, 13);
		expect(curveRateAt(high, 12) / curveRateAt(low, 12)).toBeGreaterThan(1.05);
	});

	it('never fall as it gets warmer, nor leave a hole', () => {
		for (const curve of [low, high]) {
			temperatures.reduce((before, celsius) => {
				expect(curveRateAt(curve, celsius)).toBeGreaterThanOrEqual(curveRateAt(curve, before) * (1 - 1e-14));
				return celsius;
			});
			curve.pieces.slice(1).forEach((piece, i) => expect(piece.fromCelsius).toBe(curve.pieces[i]?.toCelsius));
			expect(curve.pieces[0]?.fromCelsius).toBe(-Infinity);
			expect(curve.pieces[curve.pieces.length - 1]?.toCelsius).toBe(Infinity);
		}
	});

	it('are integrated across the reference like any curve', () => {
		for (const curve of [low, high]) {
			const mean = (a: number, b: number) =>
				meanRate(curve, a, b, curveRateAt(curve, a), curveRateAt(curve, b));
			expect(mean(-4, 9) * 13).toBeCloseTo(mean(-4, 2) * 6 + mean(2, 9) * 7, 9);
		}
	});
});

describe('bounds', () => {
	it('are the models at either end of the ±', () => {
		// Q10 of 2.5 and 3.5: ten degrees above the reference the rates are these, ten below one over these.
		const { low, high } = rateBounds(buildSpec({ model: q10, sensitivityPlusMinus: 0.5 }));
		expect(curveRateAt(low, 10)).toBeCloseTo(2.5, 12);
		expect(curveRateAt(high, 10)).toBeCloseTo(3.5, 12);
		expect(curveRateAt(low, -10)).toBeCloseTo(1 / 3.5, 12);
		expect(curveRateAt(high, -10)).toBeCloseTo(1 / 2.5, 12);
	});

	it('go no further than a rate that is the same everywhere', () => {
		const { low } = rateBounds(buildSpec({ model: q10, sensitivityPlusMinus: 5 }));
		expect(curveRateAt(low, 10)).toBe(1);
	});

	it('are the curve itself without a ±', () => {
		const spec = buildSpec({ model: q10 });
		const { low, high } = rateBounds(spec);
		expect(low).toBe(high);
		expect(curveRateAt(low, 7)).toBe(curveRateAt(rateCurve(spec), 7));
	});

	it('leave the chilling threshold where it is: cold earns no credit in either', () => {
		const spec = buildSpec({
			model: q10,
			referenceCelsius: 14,
			chillingCelsius: 13,
			sensitivityPlusMinus: 0.5
		});
		const { low, high } = rateBounds(spec);
		for (const curve of [low, high]) expect(curveRateAt(curve, 2)).toBe(curveRateAt(curve, 13));
	});
});

describe('a need at a temperature of its own', () => {
	const need = { hours: 72, celsius: 4 };
	const faults = (overrides: Partial<Spec>) =>
		validateSpec(buildSpec(overrides)).map(({ field, code }) => `${field} ${code}`);

	it('is worth its hours times the rate there', () => {
		// Source: 3^0.4 = 1.5518, the rate at 4 °C by a Q10 of 3 from 0 °C.
		expect(needWorthHours(buildSpec(), need)).toBeCloseTo(72 * 1.5518455739153598, 9);
		expect(needWorthHours(buildSpec(), { hours: 72, celsius: 0 })).toBe(72);
	});

	it('must agree with the need in hours at the reference', () => {
		const neededHours = 72 * 1.5518455739153598;
		expect(faults({ neededAtDock: need, neededHours })).toEqual([]);
		expect(faults({ neededAtDock: need, neededHours: 72 })).toEqual(['neededHours need-disagrees']);
	});

	it.each([
		[{ neededAtCustomer: { hours: 0, celsius: 4 } }, 'neededAtCustomer.hours not-positive'],
		[{ neededAtCustomer: { hours: 9, celsius: -300 } }, 'neededAtCustomer.celsius below-absolute-zero'],
		[{ neededAtCustomer: { hours: 300, celsius: 4 } }, 'neededAtCustomer.hours more-than-full-life'],
		[{ sensitivityPlusMinus: -0.1 }, 'sensitivityPlusMinus negative'],
		[{ sensitivityPlusMinus: NaN }, 'sensitivityPlusMinus not-a-number'],
		[
			{ sensitivityPlusMinus: 10, model: { kind: 'square-root', minCelsius: -10 } },
			'sensitivityPlusMinus sensitivity-too-wide'
		]
	] as const)('%o is refused', (overrides, expected) => {
		expect(faults(overrides)).toEqual([expected]);
	});

	it('a table has no figure that could be off', () => {
		const points = [
			{ celsius: 0, lifeHours: 672 },
			{ celsius: 5, lifeHours: 336 }
		];
		expect(faults({ model: { kind: 'life-table', points }, sensitivityPlusMinus: 1 })).toEqual([
			'sensitivityPlusMinus sensitivity-without-figure'
		]);
	});
});
