import { describe, expect, it } from 'vitest';
import { computeIssues } from '../messages/en/compute-faults';
import { computeLifeOf } from '../server/specs/compute-life';
import { readComputeRequest } from './compute';

const model = { kind: 'q10', q10: 3, referenceCelsius: 0, lifeHours: 336 };
const readings = [
	['2026-04-03T06:00:00Z', 0],
	['2026-04-03T16:00:00Z', 10]
];
const question = { model, readings, limits: { above: [5], below: [2] } };

function issuesOf(input: unknown): Record<string, string> {
	const request = readComputeRequest(input);
	return 'question' in request ? {} : computeIssues(request);
}
const fieldsOf = (input: unknown) => Object.keys(issuesOf(input));
const withModel = (sent: unknown) => fieldsOf({ ...question, model: sent });
const withReadings = (sent: unknown) => issuesOf({ ...question, readings: sent });

describe('a question of another program', () => {
	it('is answered with every key, always', () => {
		const answer = computeLifeOf({ model, readings });
		expect(Object.keys(answer)).toEqual([
			'usedFraction',
			'usedHours',
			'usedFractionAtReading',
			'lowUsedFraction',
			'highUsedFraction',
			'mktCelsius',
			'meanCelsius',
			'secondsAbove',
			'secondsBelow',
			'secondsOutsideModel',
			'exhaustedAt'
		]);
		// Source: calculus; 10 h from 0 to 10 °C by a Q10 of 3 are 20/ln 3 hours at 0 °C.
		expect(answer.usedHours).toBeCloseTo(20 / Math.log(3), 12);
		expect(answer.usedFraction).toBeCloseTo(20 / Math.log(3) / 336, 14);
		expect(answer).toMatchObject({ meanCelsius: 5, secondsAbove: {}, secondsBelow: {}, exhaustedAt: null });
	});

	it('has its limits named as they were sent', () => {
		const { secondsAbove, secondsBelow } = computeLifeOf({
			...question,
			limits: { above: [5, 7.5, 5], below: [-1, 2] }
		});
		expect(secondsAbove).toEqual({ '5': 18_000, '7.5': 9000 });
		expect(secondsBelow).toEqual({ '-1': 0, '2': 7200 });
		expect(issuesOf({ ...question, limits: { above: [5] } })).toEqual({});
		expect(issuesOf({ ...question, limits: {} })).toEqual({});
	});

	it.each([
		['epoch seconds', 1_775_196_000, 1_775_232_000],
		['another offset', '2026-04-03T08:00:00+02:00', '2026-04-03T18:00:00+0200'],
		['the day before in the west', '2026-04-02t23:00:00.000-07:00', '2026-04-03 09:00:00,000-07:00'],
		['minutes only', '2026-04-03T06:00Z', '2026-04-03T16:00z'],
		['one of each', 1_775_196_000.0, '2026-04-03T16:00:00Z']
	])('may write its times in %s', (_, from, to) => {
		const sent = {
			...question,
			readings: [
				[from, 0],
				[to, 10]
			]
		};
		expect(computeLifeOf(sent)).toEqual(computeLifeOf(question));
	});

	it('keeps parts of a second, far from 1970 too', () => {
		const held = (from: unknown, to: unknown) =>
			computeLifeOf({
				model,
				readings: [
					[from, 0],
					[to, 0]
				]
			}).usedHours * 3600;
		expect(held('2026-04-03T06:00:00.125Z', '2026-04-03T06:00:00.250Z')).toBeCloseTo(0.125, 12);
		expect(held(1_775_196_000.125, 1_775_196_000.25)).toBeCloseTo(0.125, 12);
		expect(held('2026-04-03T06:00:00.9999Z', '2026-04-03T06:00:01Z')).toBeCloseTo(0.0001, 12);
		expect(held('1899-12-31T23:59:59Z', '1900-01-01T00:00:01Z')).toBeCloseTo(2, 12);
	});

	it('out of order is put in order, and answered in the order sent', () => {
		const ordered = Array.from({ length: 9 }, (_, i) => [1_775_196_000 + i * i * 600, (i * 7) % 5]);
		const places = [4, 0, 8, 2, 6, 1, 7, 3, 5];
		const whole = computeLifeOf({ model, readings: ordered });
		const mixed = computeLifeOf({ model, readings: places.map((at) => ordered[at]) });
		const { usedFractionAtReading, ...figures } = mixed;
		expect(figures).toEqual({ ...whole, usedFractionAtReading: undefined });
		expect(usedFractionAtReading).toEqual(places.map((at) => whole.usedFractionAtReading[at]));
	});

	it('says the instant at which life ran out, to the millisecond', () => {
		const at = (lifeHours: number) =>
			computeLifeOf({ model: { ...model, lifeHours }, readings: [readings[0], ['2026-04-03T16:00:00Z', 0]] })
				.exhaustedAt;
		expect(at(2.5)).toBe('2026-04-03T08:30:00.000Z');
		expect(at(1 / 3600)).toBe('2026-04-03T06:00:01.000Z');
		expect(at(10)).toBe('2026-04-03T16:00:00.000Z');
		expect(at(10.001)).toBeNull();
	});

	it('gets the wider of the bounds from the larger accuracy', () => {
		const bounds = (accuracyCelsius?: number) => {
			const { lowUsedFraction, usedFraction, highUsedFraction } = computeLifeOf({
				...question,
				accuracyCelsius
			});
			return [lowUsedFraction / usedFraction, highUsedFraction / usedFraction];
		};
		expect(bounds()).toEqual([1, 1]);
		// By a Q10 of 3 half a degree is a factor of 3^0.05, whatever the temperature.
		expect(bounds(0.5)[0]).toBeCloseTo(3 ** -0.05, 12);
		expect(bounds(0.5)[1]).toBeCloseTo(3 ** 0.05, 12);
	});

	it('may ask for a mean kinetic temperature by another energy', () => {
		const log = Array.from({ length: 24 }, (_, hour) => [hour * 3600, hour < 18 ? 5 : 14]);
		const mkt = (sent?: unknown) => computeLifeOf({ model, readings: log, mkt: sent }).mktCelsius;
		// Source: USP ⟨1160⟩ formula; 18 h at 5 °C and 6 h at 14 °C.
		expect(mkt()).toBeCloseTo(8.2852, 4);
		expect(mkt({})).toBe(mkt());
		expect(mkt({ deltaHKjPerMol: 83.144 })).toBe(mkt());
		expect(mkt({ deltaHKjPerMol: 100 })).toBeCloseTo(8.5308, 4);
	});
});

describe('each model', () => {
	const lifeAt = (celsius: number, sent: unknown) => {
		const { usedFraction } = computeLifeOf({
			model: sent,
			readings: [
				[0, celsius],
				[3600, celsius]
			]
		});
		return 1 / usedFraction;
	};

	it('of two lives gives both, the colder one its reference, in whichever order', () => {
		for (const points of [
			[
				[0, 672],
				[5, 336]
			],
			[
				[5, 336],
				[0, 672]
			]
		]) {
			const sent = { kind: 'twoLives', points };
			expect(lifeAt(0, sent)).toBeCloseTo(672, 9);
			expect(lifeAt(5, sent)).toBeCloseTo(336, 9);
			expect(lifeAt(10, sent)).toBeCloseTo(168, 9);
			const { usedHours } = computeLifeOf({
				model: sent,
				readings: [
					[0, 0],
					[3600, 0]
				]
			});
			expect(usedHours).toBe(1);
		}
	});

	it('of a table is log-linear inside and held outside', () => {
		// Source: UC Davis Postharvest Center, broccoli: 0 °C 28 d, 5 °C 14 d, 10 °C about 5 d; 8 °C is 14 (5/14)^(3/5).
		const sent = {
			kind: 'lifeTable',
			points: [
				[10, 120],
				[0, 672],
				[5, 336]
			]
		};
		expect(lifeAt(5, sent)).toBeCloseTo(336, 9);
		expect(lifeAt(8, sent) / 24).toBeCloseTo(7.548, 3);
		expect(lifeAt(2.5, sent) / 24).toBeCloseTo(19.799, 3);
		expect(lifeAt(-5, sent)).toBeCloseTo(672, 9);
		expect(lifeAt(25, sent)).toBeCloseTo(120, 9);
	});

	it('of bands has its own Q10 in each, the last without end, held below the first', () => {
		// Source: Saltveit, USDA Agriculture Handbook 66: Q10 3, 2.5, 2, 1.5 give 100, 33.3, 13.3, 6.7, 4.4 from 100 at 0 °C.
		const bands = [
			[20, 2],
			[0, 3],
			[30, 1.5],
			[10, 2.5]
		];
		const sent = { kind: 'bandedQ10', referenceCelsius: 0, lifeHours: 100, bands };
		const printed = [
			[0, 100],
			[10, 33.3333],
			[20, 13.3333],
			[30, 6.6667],
			[40, 4.4444],
			[4, 64.439],
			[15, 21.082]
		];
		for (const [celsius = NaN, life = NaN] of printed) expect(lifeAt(celsius, sent)).toBeCloseTo(life, 3);
		expect(lifeAt(50, sent)).toBeCloseTo(100 / 33.75, 9);
		expect(lifeAt(-10, sent)).toBeCloseTo(100, 9);
		const outside = (celsius: number) =>
			computeLifeOf({
				model: sent,
				readings: [
					[0, celsius],
					[60, celsius]
				]
			}).secondsOutsideModel;
		expect([outside(-1), outside(0), outside(90)]).toEqual([60, 0, 0]);
	});

	it('of a square root stands still at and below its least temperature', () => {
		// Source: FAO Fisheries Technical Paper 348, 6.1: (1 + 0.1 T)².
		const sent = { kind: 'squareRoot', minCelsius: -10, referenceCelsius: 0, lifeHours: 336 };
		expect(lifeAt(5, sent)).toBeCloseTo(336 / 2.25, 9);
		expect(lifeAt(-10, sent)).toBe(Infinity);
		expect(lifeAt(-15, sent)).toBe(Infinity);
	});

	it('of Arrhenius has the ratio of its energy', () => {
		// Source: k = A e^(−Ea/RT) with R 8.314462618 J/(mol·K): k(25 °C)/k(5 °C) at 50 kJ/mol is 4.2643.
		const sent = { kind: 'arrhenius', activationEnergyKjPerMol: 50, referenceCelsius: 5, lifeHours: 100 };
		expect(100 / lifeAt(25, sent)).toBeCloseTo(4.2643, 4);
	});
});

describe('nonsense is refused by field, in words', () => {
	const reference = { referenceCelsius: 0, lifeHours: 336 };

	it.each([
		[{ ...model, q10: 0.9 }, 'model.q10'],
		[{ ...model, q10: '3' }, 'model.q10'],
		[{ ...model, lifeHours: 0 }, 'model.lifeHours'],
		[{ ...model, lifeHours: undefined }, 'model.lifeHours'],
		[{ ...model, referenceCelsius: -273.15 }, 'model.referenceCelsius'],
		[{ ...model, reference: 0 }, 'model.reference'],
		[{ kind: 'q11' }, 'model.kind'],
		[{}, 'model.kind'],
		[null, 'model'],
		[{ kind: 'twoLives', points: [[0, 100]] }, 'model.points'],
		[
			{
				kind: 'twoLives',
				points: [
					[0, 100],
					[5, 50],
					[9, 20]
				]
			},
			'model.points'
		],
		[
			{
				kind: 'twoLives',
				points: [
					[0, 100],
					[5, 101]
				]
			},
			'model.points.1'
		],
		[
			{
				kind: 'twoLives',
				points: [
					[5, 100],
					[0, 50]
				]
			},
			'model.points.0'
		],
		[
			{
				kind: 'twoLives',
				points: [
					[5, 100],
					[5, 50]
				]
			},
			'model.points.1'
		],
		[{ kind: 'lifeTable', points: [[5, 100]] }, 'model.points'],
		[
			{
				kind: 'lifeTable',
				points: [
					[0, 100],
					[5, -1]
				]
			},
			'model.points.1.1'
		],
		[{ kind: 'lifeTable', points: [[0, 100], [5]] }, 'model.points.1'],
		[
			{
				kind: 'lifeTable',
				points: [
					[9, 30],
					[0, 100],
					[5, 20]
				]
			},
			'model.points.0'
		],
		[{ kind: 'arrhenius', activationEnergyKjPerMol: 0, ...reference }, 'model.activationEnergyKjPerMol'],
		[{ kind: 'squareRoot', minCelsius: 0, ...reference }, 'model.minCelsius'],
		[{ kind: 'bandedQ10', bands: [], ...reference }, 'model.bands'],
		[
			{
				kind: 'bandedQ10',
				bands: [
					[0, 3],
					[0, 2]
				],
				...reference
			},
			'model.bands.1'
		],
		[{ kind: 'bandedQ10', bands: [[0, 0.5]], ...reference }, 'model.bands.0.1'],
		[{ kind: 'bandedQ10', bands: [[2, 3]], ...reference }, 'model.referenceCelsius']
	])('%j', (sent, field) => {
		const issues = issuesOf({ ...question, model: sent });
		expect(Object.keys(issues)).toEqual([field]);
		for (const sentence of Object.values(issues)) expect(sentence).toMatch(/^[A-Z].+\.$/);
	});

	it.each([
		[undefined, 'readings', /list/],
		[[], 'readings', /no reading/],
		[{}, 'readings', /list/],
		[[[0]], 'readings.0', /pair/],
		[[[0, 1, 2]], 'readings.0', /pair/],
		[[[0, 1], 5], 'readings.1', /pair/],
		[[[0, '4.5']], 'readings.0.1', /number/],
		[[[0, null]], 'readings.0.1', /number/],
		[[[0, -273.15]], 'readings.0.1', /cold/],
		[[['2026-04-03T06:00:00', 4]], 'readings.0.0', /offset/],
		[[['03/04/2026 06:00', 4]], 'readings.0.0', /no time/],
		[[['2026-04-03', 4]], 'readings.0.0', /no time/],
		[[['1775196000', 4]], 'readings.0.0', /no time/],
		[[[true, 4]], 'readings.0.0', /no time/],
		[[['2026-02-29T06:00:00Z', 4]], 'readings.0.0', /no such time/],
		[[['2026-04-03T24:00:00Z', 4]], 'readings.0.0', /no such time/],
		[[['2026-04-03T06:00:00+25:00', 4]], 'readings.0.0', /no such time/],
		[[['1990-12-31T23:59:60Z', 4]], 'readings.0.0', /sixtieth/],
		[[[1_775_196_000_000, 4]], 'readings.0.0', /milliseconds/],
		[[[1e300, 4]], 'readings.0.0', /years/]
	])('readings %j', (sent, field, words) => {
		const issues = withReadings(sent);
		expect(Object.keys(issues)).toEqual([field]);
		expect(issues[field]).toMatch(words);
	});

	it('names every faulty field at once, and keys that are none', () => {
		const sent = {
			model: { ...model, q10: 0 },
			readings: [],
			limits: { above: [null], beneath: [] },
			accuracyCelsius: -1,
			mkt: { deltaHKjPerMol: 0 },
			accuracy: 0.5
		};
		expect(fieldsOf(sent).sort()).toEqual([
			'accuracy',
			'accuracyCelsius',
			'limits.above.0',
			'limits.beneath',
			'mkt.deltaHKjPerMol',
			'model.q10',
			'readings'
		]);
	});

	it.each([null, 5, 'text', [], undefined])('%j is no question', (sent) => {
		expect(fieldsOf(sent)).toEqual(['form']);
	});

	it('a run that no number holds is the model’s fault', () => {
		const wild = {
			...question,
			model: { ...model, q10: 1e300 },
			readings: [
				[0, 0],
				[60, 1e5]
			]
		};
		expect(() => computeLifeOf(wild)).toThrow(/^model: .+no number/);
		expect(withModel({ ...model, q10: 1e300 })).toEqual([]);
	});
});
