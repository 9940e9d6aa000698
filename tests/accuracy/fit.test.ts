import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { fitModels, type Fit } from '../../src/lib/domain/shelf-life/fit-models';
import { rateAt } from '../../src/lib/domain/shelf-life/rate-curve';
import type { LifePoint, RateModel, RateModelKind } from '../../src/lib/domain/shelf-life/spec';
import { buildSpec, dayHours } from './build';

type Found = Extract<Fit, { model: RateModel }>;
const daysAt = (pairs: readonly (readonly [number, number])[]): LifePoint[] =>
	pairs.map(([celsius, days]) => ({ celsius, lifeHours: days * dayHours }));

function fitOf(kind: RateModelKind, points: readonly LifePoint[], referenceCelsius = 0): Found {
	const fit = fitModels(points, referenceCelsius).find((one) => one.kind === kind);
	if (!fit || 'fault' in fit) throw new Error(`no fit of ${kind}: ${fit && 'fault' in fit ? fit.fault : ''}`);
	return fit;
}
function faultOf(kind: RateModelKind, points: readonly LifePoint[]): string | null {
	const fit = fitModels(points, points[0]?.celsius ?? 0).find((one) => one.kind === kind);
	return fit && 'fault' in fit ? fit.fault : null;
}
function modelOf<Kind extends RateModelKind>(kind: Kind, points: readonly LifePoint[]) {
	return fitOf(kind, points).model as RateModel & { kind: Kind };
}

describe('a fit to a published table', () => {
	it('of the postharvest handbook finds its Q10 by band', () => {
		// Source: Saltveit, USDA Agriculture Handbook 66: lives 100, 33.3, 13.3, 6.7, 4.4 by Q10 of 3, 2.5, 2 and 1.5.
		const points = daysAt([
			[0, 100],
			[10, 100 / 3],
			[20, 100 / 7.5],
			[30, 100 / 15],
			[40, 100 / 22.5]
		]);
		const { bands } = modelOf('banded-q10', points);
		expect(bands.map(({ fromCelsius, toCelsius }) => [fromCelsius, toCelsius])).toEqual([
			[0, 10],
			[10, 20],
			[20, 30],
			[30, 40]
		]);
		[3, 2.5, 2, 1.5].forEach((q10, i) => expect(bands[i]?.q10).toBeCloseTo(q10, 10));
		const { lnScatter, freedom } = fitOf('banded-q10', points);
		expect([lnScatter < 1e-12, freedom]).toEqual([true, 0]);
	});

	it('of fish in ice finds −10 °C', () => {
		// Source: FAO Fisheries Technical Paper 348, 6.1: 14 d in ice, 6.22 d at 5 °C (÷ 2.25), 3.5 d at 10 °C (÷ 4).
		const exact = daysAt([
			[0, 14],
			[5, 14 / 2.25],
			[10, 3.5]
		]);
		expect(modelOf('square-root', exact).minCelsius).toBeCloseTo(-10, 9);
		expect(fitOf('square-root', exact).lifeHours).toBeCloseTo(14 * dayHours, 8);
		const printed = daysAt([
			[0, 14],
			[5, 6.22],
			[10, 3.5]
		]);
		expect(Math.abs(modelOf('square-root', printed).minCelsius + 10)).toBeLessThan(0.05);
	});

	it('of packed cod, crab and salmon finds a Tmin near that of the general model', () => {
		// Source: the same, measured lives in days at 0, 5 and 10 °C; the general model has −10 °C.
		for (const lives of [
			[14, 6, 3],
			[10.1, 5.5, 2.6],
			[11.8, 8, 3]
		]) {
			const points = daysAt(lives.map((days, i) => [i * 5, days] as const));
			const { minCelsius } = modelOf('square-root', points);
			expect(minCelsius).toBeGreaterThan(-14);
			expect(minCelsius).toBeLessThan(-7);
		}
	});

	it('of a vaccine vial monitor finds its activation energy', () => {
		// Source: WHO specification E6/IN5: VVM30 193 d at 25 °C and 30 d at 37 °C, VVM14 90 and 14, VVM7 45 and 7.
		for (const [at25, at37, energy] of [
			[193, 30, 119.27],
			[90, 14, 119.22],
			[45, 7, 119.22]
		] as const) {
			const { activationEnergyKilojoulesPerMole } = fitOf(
				'arrhenius',
				daysAt([
					[25, at25],
					[37, at37]
				]),
				25
			).model as RateModel & { kind: 'arrhenius' };
			expect(Math.abs(activationEnergyKilojoulesPerMole - energy)).toBeLessThan(0.05);
		}
	});

	it('of broccoli says which kind is near and by how much', () => {
		// Source: UC Davis Postharvest Center, broccoli: 28, 14 and 5 d at 0, 5 and 10 °C; overall Q10 5.60.
		const points = daysAt([
			[0, 28],
			[5, 14],
			[10, 5]
		]);
		const { model, residuals, freedom } = fitOf('constant-q10', points);
		// Three even points: the slope is that of the ends, the level their mean.
		expect((model as RateModel & { kind: 'constant-q10' }).q10).toBeCloseTo(5.6, 10);
		const bend = Math.log(14 / Math.sqrt(28 * 5));
		[-bend / 3, (2 * bend) / 3, -bend / 3].forEach((off, i) =>
			expect(residuals[i]?.lnDifference).toBeCloseTo(off, 12)
		);
		expect(freedom).toBe(1);
		expect(fitOf('life-table', points).lnScatter).toBeLessThan(1e-14);
		expect(fitOf('two-lives', points).residuals[1]?.lnDifference).toBeCloseTo(bend, 12);
	});
});

describe('a fit beside numpy and scipy', () => {
	// Source: make-fit-cases.py beside this file: numpy's polyfit and scipy's least_squares on noisy tables.
	const figure = z.number();
	const { cases } = z
		.object({
			cases: z.array(
				z.object({
					points: z.array(z.tuple([figure, figure])),
					q10: figure,
					lifeAtZero: figure,
					activationEnergyKjPerMol: figure,
					minCelsius: figure,
					squareRootLnScatter: figure
				})
			)
		})
		.parse(JSON.parse(readFileSync(join(import.meta.dirname, 'fit-cases.json'), 'utf8')));
	const near = (ours: number, theirs: number, relative: number) =>
		expect(Math.abs(ours / theirs - 1)).toBeLessThan(relative);

	it.each(cases.map((one, i) => ({ ...one, i })))('finds the same figures, table $i', (theirs) => {
		const points = theirs.points.map(([celsius, lifeHours]) => ({ celsius, lifeHours }));
		near(modelOf('constant-q10', points).q10, theirs.q10, 1e-9);
		near(fitOf('constant-q10', points).lifeHours, theirs.lifeAtZero, 1e-9);
		near(
			modelOf('arrhenius', points).activationEnergyKilojoulesPerMole,
			theirs.activationEnergyKjPerMol,
			1e-9
		);
		// Their minimum is found on a flat floor, to the root of the last digit.
		expect(Math.abs(modelOf('square-root', points).minCelsius - theirs.minCelsius)).toBeLessThan(2e-4);
		near(fitOf('square-root', points).lnScatter, theirs.squareRootLnScatter, 1e-6);
	});

	it('was given enough tables', () => expect(cases.length).toBeGreaterThanOrEqual(40));
});

describe('any fit', () => {
	const table = fc
		.uniqueArray(fc.integer({ min: -20, max: 300 }), { minLength: 3, maxLength: 9 })
		.chain((tenths) =>
			fc.tuple(
				fc.constant(tenths.map((one) => one / 10)),
				fc.array(fc.integer({ min: 10, max: 900 }), { minLength: tenths.length, maxLength: tenths.length })
			)
		)
		.map(([celsius, hours]) => celsius.map((one, i) => ({ celsius: one, lifeHours: hours[i] ?? 1 })));
	const coldestOf = (points: readonly LifePoint[]) => Math.min(...points.map(({ celsius }) => celsius));

	it('gives a rate of 1 at the reference, never falling, or says why it gives none', () => {
		fc.assert(
			fc.property(table, (points) => {
				for (const fit of fitModels(points, coldestOf(points))) {
					if ('fault' in fit) continue;
					const spec = buildSpec({
						model: fit.model,
						referenceCelsius: coldestOf(points),
						validFromCelsius: -60
					});
					expect(rateAt(spec, coldestOf(points))).toBeCloseTo(1, 9);
					expect(rateAt(spec, 30)).toBeGreaterThanOrEqual(1 - 1e-9);
					expect(fit.lnScatter).toBeGreaterThanOrEqual(0);
				}
			})
		);
	});

	it('does not depend on the order of points, nor on their unit of life', () => {
		fc.assert(
			fc.property(table, (points) => {
				const reversed = fitModels([...points].reverse(), coldestOf(points));
				expect(reversed).toEqual(fitModels(points, coldestOf(points)));
				const inDays = fitModels(
					points.map(({ celsius, lifeHours }) => ({ celsius, lifeHours: lifeHours * 24 })),
					coldestOf(points)
				);
				inDays.forEach((fit, i) => {
					const own = reversed[i] as Fit;
					expect('fault' in fit).toBe('fault' in own);
					if (!('fault' in fit) && !('fault' in own)) expect(fit.lnScatter).toBeCloseTo(own.lnScatter, 6);
				});
			})
		);
	});

	it('of a straight line is beaten by no other straight line', () => {
		fc.assert(
			fc.property(table, fc.double({ min: 0.9, max: 1.1, noNaN: true }), (points, factor) => {
				const fit = fitModels(points, coldestOf(points)).find((one) => one.kind === 'constant-q10');
				if (!fit || 'fault' in fit || fit.model.kind !== 'constant-q10') return;
				const coldest = coldestOf(points);
				const slope = (Math.log(fit.model.q10) / 10) * factor;
				const offs = points.map(
					({ celsius, lifeHours }) => Math.log(lifeHours) + slope * (celsius - coldest)
				);
				const level = offs.reduce((sum, one) => sum + one, 0) / offs.length;
				const scatter = Math.sqrt(offs.reduce((sum, one) => sum + (one - level) ** 2, 0) / offs.length);
				expect(scatter).toBeGreaterThanOrEqual(fit.lnScatter - 1e-12);
			})
		);
	});
});

describe('what cannot be fitted', () => {
	it('says that one temperature is too few, however often', () => {
		const points = daysAt([
			[5, 10],
			[5, 12],
			[5, 11]
		]);
		for (const fit of fitModels(points, 5)) expect(fit).toEqual({ kind: fit.kind, fault: 'points-too-few' });
	});

	it('says that life lasts longer when warmer', () => {
		const points = daysAt([
			[0, 5],
			[5, 6],
			[10, 7]
		]);
		for (const kind of ['constant-q10', 'two-lives', 'banded-q10', 'arrhenius', 'life-table'] as const)
			expect(faultOf(kind, points)).toBe('life-longer-when-warmer');
		expect(faultOf('square-root', points)).toBe('minimum-not-settled');
	});

	it('says where the points do not settle Tmin', () => {
		// A Q10 model bends the other way: the parabola fits best infinitely far off.
		const points = daysAt([
			[0, 30],
			[10, 29],
			[20, 25]
		]);
		expect(faultOf('square-root', points)).toBe('minimum-not-settled');
	});

	it('joins bands where one of them would run backwards', () => {
		const points = daysAt([
			[0, 30],
			[5, 25],
			[10, 8],
			[15, 12],
			[20, 14],
			[30, 3]
		]);
		const { bands } = modelOf('banded-q10', points);
		expect(bands.length).toBeLessThan(3);
		for (const { q10 } of bands) expect(q10).toBeGreaterThanOrEqual(1);
	});

	it('takes lives of one temperature together where a table needs one', () => {
		const { model, lnScatter, freedom } = fitOf(
			'life-table',
			daysAt([
				[0, 20],
				[5, 8],
				[5, 12.5]
			])
		);
		expect(model).toMatchObject({
			points: [{ celsius: 0 }, { celsius: 5, lifeHours: expect.closeTo(240, 9) }]
		});
		expect(lnScatter).toBeCloseTo(Math.sqrt((2 * Math.log(0.8) ** 2) / 3), 9);
		expect(freedom).toBe(1);
	});
});
