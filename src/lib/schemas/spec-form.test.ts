import { describe, expect, it } from 'vitest';
import type { Spec } from '../domain/shelf-life/spec';
import { readSpecForm } from './spec-form';
import { filledRows, specFormValues, type SpecFormValues } from './spec-form-values';

const limit = {
	celsius: 5,
	graceMinutes: 30,
	graceMinutesInAll: 120,
	hysteresisCelsius: 0.5,
	majorMinutes: 120,
	criticalMinutes: 360
};

/** UC Davis Postharvest Center, produce fact sheet, broccoli: 21 to 28 d at 0 °C, 14 at 5 °C, 5 at 10 °C. */
const broccoli: Spec = {
	referenceCelsius: 0,
	fullLifeHours: 672,
	fullLifeUncertaintyHours: 168,
	model: {
		kind: 'life-table',
		points: [
			{ celsius: 0, lifeHours: 672 },
			{ celsius: 5, lifeHours: 336 },
			{ celsius: 10, lifeHours: 120 }
		]
	},
	validFromCelsius: 0,
	validToCelsius: 10,
	chillingCelsius: null,
	freezingCelsius: -0.6,
	ceilingCelsius: null,
	upper: { ...limit, airGraceMinutes: 60, airGraceMinutesInAll: 240 },
	lower: { ...limit, celsius: -0.3, hysteresisCelsius: 0.1 },
	neededHours: 240,
	openingDefaultHours: 96,
	mkt: { activationEnergyKilojoulesPerMole: null, windowHours: 24, limitCelsius: 8 },
	sources: [
		{ text: 'Fact sheet: 21 to 28 d', point: { celsius: 0, lifeHours: 504 }, lifeHoursHigh: 672 },
		{ text: 'Handbook', point: null, lifeHoursHigh: null }
	],
	caution: 'Quality estimate only.'
};

const models: Spec['model'][] = [
	{ kind: 'constant-q10', q10: 3.2 },
	{ kind: 'two-lives', lower: { celsius: 0, lifeHours: 672 }, upper: { celsius: 10, lifeHours: 120 } },
	{ kind: 'two-lives', lower: { celsius: -6, lifeHours: 900 }, upper: { celsius: 0, lifeHours: 672 } },
	{
		kind: 'banded-q10',
		bands: [
			{ fromCelsius: 0, toCelsius: 10, q10: 4.83 },
			{ fromCelsius: 10, toCelsius: 20, q10: 2.41 }
		]
	},
	{ kind: 'arrhenius', activationEnergyKilojoulesPerMole: 119.22 },
	{ kind: 'square-root', minCelsius: -10 },
	broccoli.model
];

const filled = (changes: SpecFormValues = {}): SpecFormValues => ({
	...specFormValues(broccoli, 'celsius'),
	...changes
});
const faultsOf = (changes: SpecFormValues) => readSpecForm(filled(changes)).faults;

describe('the spec editor’s fields', () => {
	it('give back the very figures they were written from, for every model and in both units', () => {
		for (const model of models) {
			const spec = { ...broccoli, model };
			for (const unit of ['celsius', 'fahrenheit'] as const) {
				expect(readSpecForm(specFormValues(spec, unit))).toEqual({ spec, faults: [] });
			}
		}
	});

	// UCUM, [degF]: °C = 5/9 (°F − 32); a difference is scaled only.
	it('are in the reader’s unit: 41 °F is 5 °C, a difference of 0.9 °F is 0.5 °C', () => {
		const values = specFormValues(broccoli, 'fahrenheit');
		expect([values.upperDegrees, values.upperBack, values.freezing]).toEqual(['41', '0.9', '30.92']);
	});

	it('take a comma, a true minus and spaces as people type them', () => {
		const { spec } = readSpecForm(filled({ freezing: ' −0,7 ', upperDegrees: '4,5' }));
		expect([spec?.freezingCelsius, spec?.upper?.celsius]).toEqual([-0.7, 4.5]);
	});

	it('may be left empty where there is none: stops, limits, uncertainty, caution', () => {
		const { spec } = readSpecForm(filled({ freezing: '', lowerDegrees: '', uncertainty: '', caution: ' ' }));
		expect(spec).toMatchObject({
			freezingCelsius: null,
			lower: null,
			fullLifeUncertaintyHours: 0,
			caution: null
		});
	});

	it('take the range of validity from the entered lives where none is given, and ask for it elsewhere', () => {
		expect(readSpecForm(filled({ validFrom: '', validTo: '' })).spec).toMatchObject({
			validFromCelsius: 0,
			validToCelsius: 10
		});
		expect(faultsOf({ model: 'constant-q10', q10: '3', validTo: '' })).toEqual([
			{ field: 'validTo', code: 'missing' }
		]);
	});

	it('sort the points of a table, and skip empty rows between them', () => {
		const { spec } = readSpecForm(
			filled({
				point0Degrees: '10',
				point0Life: '5',
				point1Degrees: '',
				point1Life: '',
				point2Degrees: '5',
				point2Life: '14'
			})
		);
		expect(spec?.model).toEqual(broccoli.model);
		expect(filledRows(filled({ point4Life: '1' }), 'point')).toBe(5);
		expect(filledRows(filled({ point99Life: '1' }), 'point')).toBe(100);
	});
});

describe('needs and the model’s own ±', () => {
	const stated: Spec = {
		...broccoli,
		model: { kind: 'constant-q10', q10: 3 },
		sensitivityPlusMinus: 0.4,
		// 4 d at 5 °C at a Q10 of 3: 96 × 3^0.5 h at the reference of 0 °C.
		neededHours: 96 * Math.sqrt(3),
		neededAtDock: { hours: 96, celsius: 5 },
		neededAtCustomer: { hours: 48, celsius: 4 }
	};

	it('come back as they were stated, in both units, for every model that has a figure', () => {
		for (const unit of ['celsius', 'fahrenheit'] as const) {
			const { spec, faults } = readSpecForm(specFormValues(stated, unit));
			expect(faults).toEqual([]);
			expect(spec).toEqual({ ...stated, neededHours: expect.closeTo(stated.neededHours, 9) as number });
		}
		const fish: Spec = {
			...broccoli,
			model: { kind: 'square-root', minCelsius: -10 },
			sensitivityPlusMinus: 2
		};
		expect(specFormValues(fish, 'fahrenheit').sensitivity).toBe('3.6');
		expect(readSpecForm(specFormValues(fish, 'fahrenheit')).spec).toEqual(fish);
	});

	it('are left out where nothing is entered, so that older versions keep their text and hash', () => {
		const { spec } = readSpecForm(filled());
		expect(Object.keys(spec ?? {}).filter((key) => /neededAt|sensitivity/.test(key))).toEqual([]);
	});

	it('a table has no figure of its own: what was typed for another model does not follow it', () => {
		expect(readSpecForm(filled({ sensitivity: '0.4' })).spec?.sensitivityPlusMinus).toBeUndefined();
	});

	it.each([
		[{ customerNeeded: '2', customerDegrees: '' }, 'customerDegrees', 'missing'],
		[{ customerNeeded: '', customerDegrees: '4' }, 'customerNeeded', 'missing'],
		[{ customerNeeded: '6', customerDegrees: '10' }, 'customerNeeded', 'more-than-full-life'],
		[{ needed: '6', neededDegrees: '10' }, 'needed', 'more-than-full-life'],
		[{ needed: '5', neededDegrees: 'warm' }, 'neededDegrees', 'not-a-number'],
		[{ model: 'constant-q10', q10: '3', sensitivity: '-1' }, 'sensitivity', 'negative'],
		[{ model: 'square-root', tmin: '-10', sensitivity: '11' }, 'sensitivity', 'sensitivity-too-wide']
	])('of %j are faulty at their field', (changes, field, code) => {
		expect(faultsOf(changes as SpecFormValues)).toContainEqual({ field, code });
	});
});

describe('a fault', () => {
	it.each([
		[{ model: '' }, 'model', 'missing'],
		[{ reference: 'ice' }, 'reference', 'not-a-number'],
		[
			{ fullLife: '0', point0Degrees: '', point0Life: '', point1Degrees: '', point1Life: '' },
			'fullLife',
			'not-positive'
		],
		[{ needed: '29' }, 'needed', 'more-than-full-life'],
		[{ point1Life: '15' }, 'point1Life', 'life-longer-when-warmer'],
		[{ point0Degrees: '' }, 'point0Degrees', 'missing'],
		[{ upperMajor: '120' }, 'upperMajor', 'not-a-clock'],
		[{ upperCritical: '1:59' }, 'upperCritical', 'severity-upside-down'],
		[{ lowerGraceInAll: '20' }, 'lowerGraceInAll', 'grace-in-all-short'],
		[{ upperAirGraceInAll: '59' }, 'upperAirGraceInAll', 'grace-in-all-short'],
		[{ lowerDegrees: '5' }, 'lowerDegrees', 'limits-upside-down'],
		[{ model: 'constant-q10', q10: '0.9' }, 'q10', 'q10-below-one'],
		[{ model: 'two-lives', otherDegrees: '10', otherLife: '30' }, 'otherLife', 'life-longer-when-warmer'],
		[{ model: 'square-root', tmin: '0' }, 'tmin', 'reference-not-above-minimum'],
		[{ model: 'banded-q10', band0From: '0', band0To: '10', band0Q10: '' }, 'band0Q10', 'missing'],
		[{ source1Text: '', source1Degrees: '0', source1Life: '3' }, 'source1Text', 'missing'],
		[{ source1High: '9' }, 'source1Life', 'row-incomplete'],
		[{ caution: 'x'.repeat(501) }, 'caution', 'text-too-long'],
		[{ chilling: '1' }, 'chilling', 'reference-below-chilling']
	])('of %j is found at its field', (changes, field, code) => {
		expect(faultsOf(changes as SpecFormValues)).toContainEqual({ field, code });
		expect(readSpecForm(filled(changes as SpecFormValues)).spec).toBeNull();
	});

	it('of an empty form is found at every figure that is needed', () => {
		const fields = readSpecForm({ unit: 'celsius' }).faults.map((fault) => fault.field);
		expect(new Set(fields)).toEqual(
			new Set(['reference', 'fullLife', 'model', 'validFrom', 'validTo', 'needed', 'openingDefault'])
		);
	});
});
