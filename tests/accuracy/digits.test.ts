import { describe, expect, it } from 'vitest';
import { assess } from '../../src/lib/domain/receiving/assess';
import { engineVersion } from '../../src/lib/domain/receiving/engine-version';
import type { RateModel } from '../../src/lib/domain/shelf-life/spec';
import { wanderingTrace } from '../bench/engine';
import { buildInput, buildSpec } from './build';

const models: Readonly<Record<string, RateModel>> = {
	'constant-q10': { kind: 'constant-q10', q10: 3 },
	arrhenius: { kind: 'arrhenius', activationEnergyKilojoulesPerMole: 83.144 },
	'square-root': { kind: 'square-root', minCelsius: -10 },
	'life-table': {
		kind: 'life-table',
		points: [
			{ celsius: -2, lifeHours: 900 },
			{ celsius: 4, lifeHours: 336 },
			{ celsius: 12, lifeHours: 60 }
		]
	}
};

/** Printed once by this engine version; a stored assessment must be recomputed to these very digits. */
const stored: Readonly<Record<string, readonly number[]>> = {
	'constant-q10': [
		179.77799568122958, 170.16900970466685, 189.92957523377905, 7.0101836963039545, 6.893648729745949
	],
	arrhenius: [
		208.2459151958532, 195.38194196774657, 221.90653326808302, 7.0101836963039545, 6.893648729745949
	],
	'square-root': [
		239.46402555555568, 225.59709222222236, 253.74754222222234, 7.0101836963039545, 6.893648729745949
	],
	'life-table': [
		312.95711515920476, 281.2238971903647, 348.50021190164466, 7.0101836963039545, 6.893648729745949
	]
};

describe(`engine ${engineVersion}`, () => {
	it.each(Object.entries(models))('gives the digits it gave before, with %s', (name, model) => {
		const assessment = assess(
			buildInput(wanderingTrace(5000), buildSpec({ model }), { accuracyCelsius: 0.5 })
		);
		const { usedHours, mktCelsius, meanCelsius } = assessment;
		expect([usedHours.value, usedHours.low, usedHours.high, mktCelsius, meanCelsius]).toEqual(stored[name]);
	});
});
