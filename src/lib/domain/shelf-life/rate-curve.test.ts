import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildSpec } from '../../../../tests/accuracy/build';
import { curveRateAt, meanRate, rateAt, rateCurve } from './rate-curve';
import type { RateModel } from './spec';

const models: readonly RateModel[] = [
	{ kind: 'constant-q10', q10: 2.7 },
	{ kind: 'two-lives', lower: { celsius: 0, lifeHours: 600 }, upper: { celsius: 12, lifeHours: 150 } },
	{
		kind: 'banded-q10',
		bands: [
			{ fromCelsius: -5, toCelsius: 3, q10: 4 },
			{ fromCelsius: 3, toCelsius: 9, q10: 1 },
			{ fromCelsius: 9, toCelsius: 20, q10: 2 }
		]
	},
	{ kind: 'arrhenius', activationEnergyKilojoulesPerMole: 83.144 },
	{
		kind: 'life-table',
		points: [
			{ celsius: -2, lifeHours: 800 },
			{ celsius: 4, lifeHours: 400 },
			{ celsius: 11, lifeHours: 90 }
		]
	},
	{ kind: 'square-root', minCelsius: -8 }
];
const specOf = (model: RateModel) => buildSpec({ model, validFromCelsius: -6, validToCelsius: 16 });
const celsius = fc.double({ min: -30, max: 40, noNaN: true });

describe.each(models)('the curve of $kind', (model) => {
	const spec = specOf(model);
	const curve = rateCurve(spec);
	const mean = (a: number, b: number) => meanRate(curve, a, b, curveRateAt(curve, a), curveRateAt(curve, b));

	it('is 1 at the reference temperature', () => {
		expect(rateAt(spec, 0)).toBeCloseTo(1, 14);
	});

	it('never falls as it gets warmer', () => {
		fc.assert(
			fc.property(celsius, celsius, (a, b) => {
				const [cold, warm] = a < b ? [a, b] : [b, a];
				expect(rateAt(spec, cold)).toBeLessThanOrEqual(rateAt(spec, warm) * (1 + 1e-14));
			})
		);
	});

	it('is held outside the model', () => {
		expect(rateAt(spec, 50)).toBe(rateAt(spec, curve.toCelsius));
		expect(rateAt(spec, -50)).toBe(rateAt(spec, curve.fromCelsius));
		expect(curve.toCelsius).toBeLessThanOrEqual(16);
		expect(curve.fromCelsius).toBeGreaterThanOrEqual(-6);
	});

	it('leaves no hole and no jump between its pieces', () => {
		curve.pieces.slice(1).forEach((piece, i) => {
			const before = curve.pieces[i];
			expect(piece.fromCelsius).toBe(before?.toCelsius);
			expect(piece.rateAt(piece.fromCelsius)).toBeCloseTo(before?.rateAt(piece.fromCelsius) ?? NaN, 12);
		});
		expect(curve.pieces[0]?.fromCelsius).toBe(-Infinity);
		expect(curve.pieces[curve.pieces.length - 1]?.toCelsius).toBe(Infinity);
	});

	it('has the mean of many small steps over any line', () => {
		for (const [a, b] of [
			[-20, 30],
			[30, -20],
			[2.9, 3.1],
			[4, 4],
			[-7, -5.9],
			[15, 40]
		] as const) {
			const parts = 20_000;
			let sum = 0;
			for (let i = 0; i < parts; i++) sum += rateAt(spec, a + ((b - a) * (i + 0.5)) / parts);
			expect(Math.abs(mean(a, b) / (sum / parts) - 1)).toBeLessThan(1e-7);
		}
	});

	it('has the same mean wherever the line is cut', () => {
		fc.assert(
			fc.property(celsius, celsius, fc.double({ min: 0.01, max: 0.99, noNaN: true }), (a, b, part) => {
				const cut = a + (b - a) * part;
				const whole = mean(a, b) * (b - a);
				const halves = mean(a, cut) * (cut - a) + mean(cut, b) * (b - cut);
				expect(Math.abs(whole - halves)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(whole)));
			})
		);
	});
});

describe('a chilling threshold', () => {
	// Source: USDA Agriculture Handbook 66: banana keeps at 13–14 °C; below 13 it is injured, it does not keep longer.
	const banana = buildSpec({ referenceCelsius: 14, chillingCelsius: 13 });

	it('holds the rate below it: cold earns no credit', () => {
		expect(rateAt(banana, 5)).toBe(rateAt(banana, 13));
		expect(rateAt(banana, 5)).toBeLessThan(1);
		expect(rateAt(banana, 13.5)).toBeGreaterThan(rateAt(banana, 13));
	});

	it('does not move what the model knows', () => {
		expect(rateCurve(banana).fromCelsius).toBe(-60);
	});
});

describe('Arrhenius near absolute zero', () => {
	const spec = buildSpec({
		model: { kind: 'arrhenius', activationEnergyKilojoulesPerMole: 83.144 },
		validFromCelsius: -Infinity,
		validToCelsius: Infinity
	});
	const curve = rateCurve(spec);
	const mean = (a: number, b: number) => meanRate(curve, a, b, curveRateAt(curve, a), curveRateAt(curve, b));

	it('has no rate there, nor below where only an accuracy can lead', () => {
		expect(rateAt(spec, -273.15)).toBe(0);
		expect(rateAt(spec, -280)).toBe(0);
		expect(rateAt(spec, -273.149)).toBe(0);
	});

	it('has the mean of a line that begins there, without counting for ever', () => {
		// Source: θ e^(θ/Tref) [e^(−x)/x − E1(x)] over the width, x = θ/T, E1 by its asymptotic series.
		const theta = 83_144 / 8.314462618;
		const x = theta / 293.15;
		let [term, series] = [1, 1];
		for (let n = 1; n <= 25; n++) series += term *= -n / x;
		const bracket = (Math.exp(theta / 273.15 - x) / x) * (1 - series);
		const expected = (theta * bracket) / 293.15;
		expect(Math.abs(mean(-273.15, 20) / expected - 1)).toBeLessThan(1e-9);
		expect(mean(-273.149999999, 20)).toBeCloseTo(mean(-273.15, 20), 9);
	});

	it('does not jump where a line is first cut', () => {
		// e^60 below the rate at 20 °C lies at 1/(1/293.15 + 60/θ), −166.9 °C.
		expect(mean(-166.8, 20) * 186.8).toBeCloseTo(mean(-167, 20) * 187, 9);
	});
});
