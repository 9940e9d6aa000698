import { describe, expect, it } from 'vitest';
import { buildLimit, buildSpec } from '../../../../tests/accuracy/build';
import type { RateModel, Spec } from './spec';
import { validateSpec } from './validate';

function faultsOf(overrides: Partial<Spec>): string[] {
	return validateSpec(buildSpec(overrides)).map(({ code, field }) => `${field} ${code}`);
}
const faultsOfModel = (model: RateModel) => faultsOf({ model });

describe('a spec', () => {
	it('without a fault has none', () => {
		expect(faultsOf({})).toEqual([]);
		expect(
			faultsOf({ upper: buildLimit(5), lower: buildLimit(-1), freezingCelsius: -2, ceilingCelsius: 8 })
		).toEqual([]);
		expect(faultsOf({ chillingCelsius: 0 })).toEqual([]);
	});

	it.each([
		[{ fullLifeHours: 0 }, 'fullLifeHours not-positive'],
		[{ fullLifeHours: NaN }, 'fullLifeHours not-a-number'],
		[{ fullLifeUncertaintyHours: -1 }, 'fullLifeUncertaintyHours negative'],
		[{ neededHours: 337 }, 'neededHours more-than-full-life'],
		[{ openingDefaultHours: -1 }, 'openingDefaultHours negative'],
		[{ validToCelsius: -60 }, 'validToCelsius range-upside-down'],
		[{ validFromCelsius: 5 }, 'referenceCelsius reference-outside-model'],
		[{ referenceCelsius: -300 }, 'referenceCelsius below-absolute-zero'],
		[{ chillingCelsius: 3 }, 'chillingCelsius reference-below-chilling'],
		[{ upper: buildLimit(2), lower: buildLimit(2) }, 'lower.celsius limits-upside-down'],
		[{ upper: buildLimit(2, { graceMinutes: -1 }) }, 'upper.graceMinutes negative'],
		[
			{ upper: buildLimit(2, { majorMinutes: 60, criticalMinutes: 30 }) },
			'upper.criticalMinutes severity-upside-down'
		],
		[{ lower: buildLimit(Infinity) }, 'lower.celsius not-a-number'],
		[{ freezingCelsius: 4, ceilingCelsius: 4 }, 'freezingCelsius stops-upside-down'],
		[
			{ mkt: { activationEnergyKilojoulesPerMole: 0, windowHours: null, limitCelsius: null } },
			'mkt.activationEnergyKilojoulesPerMole not-positive'
		],
		[
			{ mkt: { activationEnergyKilojoulesPerMole: null, windowHours: -1, limitCelsius: 8 } },
			'mkt.windowHours not-positive'
		]
	] as const)('%o is told where it is wrong', (overrides, fault) => {
		expect(faultsOf(overrides)).toContain(fault);
	});

	it('is told of every fault at once', () => {
		expect(
			faultsOf({ fullLifeHours: -1, openingDefaultHours: -1, validToCelsius: -90 }).length
		).toBeGreaterThan(3);
	});
});

describe('a model', () => {
	it('must not let life last longer when warmer', () => {
		expect(faultsOfModel({ kind: 'constant-q10', q10: 0.9 })).toEqual(['model.q10 q10-below-one']);
		expect(
			faultsOfModel({
				kind: 'two-lives',
				lower: { celsius: 0, lifeHours: 100 },
				upper: { celsius: 5, lifeHours: 101 }
			})
		).toEqual(['model.upper.lifeHours life-longer-when-warmer']);
		expect(
			faultsOfModel({ kind: 'banded-q10', bands: [{ fromCelsius: -1, toCelsius: 9, q10: 0.5 }] })
		).toEqual(['model.bands.0.q10 q10-below-one']);
	});

	it('must have its points in order and at least two', () => {
		const at = (celsius: number, lifeHours: number) => ({ celsius, lifeHours });
		expect(faultsOfModel({ kind: 'life-table', points: [at(0, 9)] })).toContain(
			'model.points points-too-few'
		);
		expect(faultsOfModel({ kind: 'life-table', points: [at(0, 9), at(0, 5)] })).toContain(
			'model.points.1.celsius points-unsorted'
		);
		expect(faultsOfModel({ kind: 'life-table', points: [at(5, 4), at(0, 9)] })).toContain(
			'model.points.1.celsius points-unsorted'
		);
		expect(faultsOfModel({ kind: 'life-table', points: [at(0, 9), at(5, 0)] })).toContain(
			'model.points.1.lifeHours not-positive'
		);
	});

	it('must cover the reference temperature', () => {
		const points = [
			{ celsius: 2, lifeHours: 9 },
			{ celsius: 5, lifeHours: 4 }
		];
		expect(faultsOfModel({ kind: 'life-table', points })).toEqual([
			'referenceCelsius reference-outside-model'
		]);
		expect(faultsOfModel({ kind: 'square-root', minCelsius: 0 })).toEqual([
			'model.minCelsius reference-not-above-minimum'
		]);
	});

	it('must have bands that adjoin, each the right way up', () => {
		const band = (fromCelsius: number, toCelsius: number) => ({ fromCelsius, toCelsius, q10: 2 });
		expect(faultsOfModel({ kind: 'banded-q10', bands: [band(-5, 4), band(5, 9)] })).toEqual([
			'model.bands.1.fromCelsius bands-not-adjoining'
		]);
		expect(faultsOfModel({ kind: 'banded-q10', bands: [band(-5, 4), band(-9, -5)] })).toContain(
			'model.bands.1.fromCelsius points-unsorted'
		);
		expect(faultsOfModel({ kind: 'banded-q10', bands: [band(4, -5)] })).toContain(
			'model.bands.0.toCelsius range-upside-down'
		);
		expect(faultsOfModel({ kind: 'banded-q10', bands: [] })).toContain('model.bands points-too-few');
	});

	it('must have an activation energy', () => {
		expect(faultsOfModel({ kind: 'arrhenius', activationEnergyKilojoulesPerMole: 0 })).toEqual([
			'model.activationEnergyKilojoulesPerMole not-positive'
		]);
	});
});
