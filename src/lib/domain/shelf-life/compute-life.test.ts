import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { computeLife, isComputable, type LifeQuestion } from './compute-life';
import type { RateModel } from './spec';

const hourMs = 3_600_000;
const models: readonly RateModel[] = [
	{ kind: 'constant-q10', q10: 3 },
	{ kind: 'two-lives', lower: { celsius: 0, lifeHours: 672 }, upper: { celsius: 5, lifeHours: 336 } },
	{ kind: 'arrhenius', activationEnergyKilojoulesPerMole: 83.144 },
	{ kind: 'square-root', minCelsius: -10 },
	{
		kind: 'banded-q10',
		bands: [
			{ fromCelsius: 0, toCelsius: 10, q10: 3 },
			{ fromCelsius: 10, toCelsius: Infinity, q10: 2.5 }
		]
	},
	{
		kind: 'life-table',
		points: [
			{ celsius: 0, lifeHours: 672 },
			{ celsius: 5, lifeHours: 336 },
			{ celsius: 10, lifeHours: 120 }
		]
	}
];

function ask(
	readings: readonly (readonly [hours: number, celsius: number])[],
	overrides: Partial<LifeQuestion> & { model?: RateModel } = {}
) {
	const { model = models[0] as RateModel, ...rest } = overrides;
	return computeLife({
		rate: {
			model,
			referenceCelsius: 0,
			validFromCelsius: -Infinity,
			validToCelsius: Infinity,
			chillingCelsius: null
		},
		lifeHours: 336,
		timesMs: Float64Array.from(readings, ([hours]) => hours * hourMs),
		celsius: Float64Array.from(readings, ([, celsius]) => celsius),
		aboveCelsius: [],
		belowCelsius: [],
		accuracyCelsius: 0,
		deltaHKilojoulesPerMole: null,
		...rest
	});
}

describe('life computed from bare readings', () => {
	it('is a closed form along a straight line', () => {
		// Source: calculus; ∫3^(T/10) dt over 0 to 10 °C in 10 h is 20/ln 3, over a square root of −10 it is 70/3.
		const ramp = [
			[0, 0],
			[10, 10]
		] as const;
		expect(ask(ramp).usedHours).toBeCloseTo(20 / Math.log(3), 12);
		expect(ask(ramp, { model: { kind: 'square-root', minCelsius: -10 } }).usedHours).toBeCloseTo(70 / 3, 12);
	});

	it('is kept at every reading', () => {
		const { usedHoursAtReading } = ask([
			[0, 0],
			[1, 0],
			[2, 10],
			[3, 10]
		]);
		const ramp = 2 / Math.log(3);
		[0, 1, 1 + ramp, 4 + ramp].forEach((hours, i) => expect(usedHoursAtReading[i]).toBeCloseTo(hours, 12));
	});

	it('has bounds by readings moved as a whole; without an accuracy they are the figure', () => {
		const held = [
			[0, 4],
			[10, 4]
		] as const;
		const { lowUsedHours, highUsedHours } = ask(held, { accuracyCelsius: 0.5 });
		expect(lowUsedHours).toBeCloseTo(10 * Math.pow(3, 0.35), 12);
		expect(highUsedHours).toBeCloseTo(10 * Math.pow(3, 0.45), 12);
		const exact = ask(held);
		expect([exact.lowUsedHours, exact.highUsedHours]).toEqual([exact.usedHours, exact.usedHours]);
	});

	it('takes two readings at one time for a jump', () => {
		const jumped = ask([
			[0, 0],
			[5, 0],
			[5, 10],
			[8, 10]
		]);
		expect(jumped.usedHours).toBeCloseTo(5 + 9, 12);
		expect(jumped.meanCelsius).toBeCloseTo(30 / 8, 12);
	});

	it('of one reading is nothing used at its temperature', () => {
		expect(ask([[0, 7]], { aboveCelsius: [5] })).toMatchObject({
			usedHours: 0,
			mktCelsius: expect.closeTo(7, 9),
			meanCelsius: 7,
			secondsAbove: [0],
			exhaustedAfterMs: null
		});
	});

	it('counts seconds beyond each limit from crossing to crossing', () => {
		// Source: plane geometry; ten-minute readings 4.0 4.6 5.4 6.2 5.8 5.0 4.4 are above 5.0 for 35 min, 5.5 for 22.5.
		const readings = [4.0, 4.6, 5.4, 6.2, 5.8, 5.0, 4.4].map((celsius, i) => [i / 6, celsius] as const);
		const { secondsAbove, secondsBelow } = ask(readings, { aboveCelsius: [5, 5.5, 6.2], belowCelsius: [5] });
		expect(secondsAbove[0]).toBeCloseTo(2100, 6);
		expect(secondsAbove[1]).toBeCloseTo(1350, 6);
		expect(secondsAbove[2]).toBe(0);
		expect(secondsBelow[0]).toBeCloseTo(1500, 6);
	});

	it('says how long the temperature lay outside a table', () => {
		const table = models[5] as RateModel;
		const { secondsOutsideModel } = ask(
			[
				[0, -2],
				[1, 0],
				[2, 10],
				[3, 20]
			],
			{ model: table }
		);
		expect(secondsOutsideModel).toBe(7200);
		expect(ask([[0, -2]]).secondsOutsideModel).toBe(0);
	});

	it('gives the mean kinetic temperature of the pharmacopoeia', () => {
		// Source: USP ⟨1160⟩, formula with ΔH 83.144 kJ/mol and R 8.3144: 18 h at 5 °C and 6 h at 14 °C are 8.2852 °C.
		const log = Array.from({ length: 24 }, (_, hour) => [hour, hour < 18 ? 5 : 14] as const);
		expect(ask(log).mktCelsius).toBeCloseTo(8.2852, 4);
		expect(ask(log, { deltaHKilojoulesPerMole: 60 }).mktCelsius).toBeCloseTo(7.9568, 4);
	});

	it('takes for the usual step what fractions of a second make of it', () => {
		// Source: the formula in mpmath at 30 digits, ΔH/R 10 000 K. Thirds of a second come out apart in the last digit;
		// they are four of six steps all the same, so the last reading stands for one: 15.66 °C were it for 2 s.
		const seconds = [0, 1, 2, 3, 4].map((thirds) => 1e6 + thirds / 3);
		const times = [...seconds, 1e6 + 4 / 3 + 2, 1e6 + 4 / 3 + 4].map((at) => at - 1e6);
		const log = times.map((at, i) => [at / 3600, i === 6 ? 25 : 5] as const);
		expect(new Set(log.slice(1, 5).map(([hours], i) => hours - (log[i]?.[0] ?? NaN))).size).toBeGreaterThan(
			1
		);
		expect(ask(log).mktCelsius).toBeCloseTo(8.670571, 6);
	});

	it('knows when no number holds the figure', () => {
		const wild = ask(
			[
				[0, 0],
				[1, 1e6]
			],
			{ model: { kind: 'constant-q10', q10: 1e6 } }
		);
		expect(isComputable(wild)).toBe(false);
		expect(isComputable(ask([[0, 4]]))).toBe(true);
	});
});

describe('the end of life', () => {
	it('lies on the line between two readings, where the figure reaches the life', () => {
		// At a steady 10 °C by a Q10 of 3 a life of 336 h lasts 112 h.
		const { exhaustedAfterMs } = ask([
			[0, 10],
			[100, 10],
			[200, 10]
		]);
		expect(exhaustedAfterMs).toBeCloseTo(112 * hourMs, 3);
		// Along 0 to 10 °C in 1000 h: (3^(t/1000) − 1) × 1000/ln 3 = 336 at t = 1000 ln(1 + 0.336 ln 3)/ln 3.
		const ramp = ask([
			[0, 0],
			[1000, 10]
		]);
		const hours = (1000 * Math.log(1 + 0.336 * Math.log(3))) / Math.log(3);
		expect(ramp.exhaustedAfterMs).toBeCloseTo(hours * hourMs, 3);
	});

	it.each(models)('comes with the last reading where $kind spends just the whole life', (model) => {
		for (const [celsius, parts] of [
			[0, 7],
			[5, 13],
			[7.3, 11]
		] as const) {
			const whole =
				336 /
				ask(
					[
						[0, celsius],
						[1, celsius]
					],
					{ model }
				).usedHours;
			const readings = Array.from({ length: parts + 1 }, (_, i) => [(i * whole) / parts, celsius] as const);
			const { exhaustedAfterMs } = ask(readings, { model });
			expect((exhaustedAfterMs ?? NaN) / hourMs).toBeCloseTo(whole, 9);
		}
	});

	it('is none while some is left, and the first instant where life then stands still', () => {
		expect(
			ask([
				[0, 0],
				[335.9, 0]
			]).exhaustedAfterMs
		).toBeNull();
		const frozen = ask(
			[
				[0, 0],
				[336, 0],
				[336, -40],
				[900, -40]
			],
			{ model: { kind: 'square-root', minCelsius: -10 } }
		);
		expect((frozen.exhaustedAfterMs ?? NaN) / hourMs).toBeCloseTo(336, 9);
	});
});

describe.each(models)('life by $kind', (model) => {
	const celsius = fc.integer({ min: -300, max: 400 }).map((tenths) => tenths / 10);
	const journey = fc.array(fc.tuple(fc.integer({ min: 0, max: 600 }), celsius), {
		minLength: 2,
		maxLength: 30
	});
	const timed = (steps: readonly (readonly [number, number])[]) => {
		let minutes = 0;
		return steps.map(([more, reading]) => [(minutes += more) / 60, reading] as const);
	};
	const used = (readings: readonly (readonly [number, number])[]) => ask(readings, { model }).usedHours;
	const same = (a: number, b: number) =>
		expect(Math.abs(a - b)).toBeLessThanOrEqual(1e-9 * Math.max(1e-3, Math.abs(b)));

	it('never falls with time, and low and high enclose it', () => {
		fc.assert(
			fc.property(journey, (steps) => {
				const computed = ask(timed(steps), { model, accuracyCelsius: 0.7 });
				computed.usedHoursAtReading.forEach((hours, i, all) =>
					expect(hours).toBeGreaterThanOrEqual(all[i - 1] ?? 0)
				);
				expect(computed.lowUsedHours).toBeLessThanOrEqual(computed.usedHours * (1 + 1e-12));
				expect(computed.highUsedHours).toBeGreaterThanOrEqual(computed.usedHours * (1 - 1e-12));
			})
		);
	});

	it('is never less when warmer', () => {
		fc.assert(
			fc.property(journey, fc.double({ min: 0, max: 20, noNaN: true }), (steps, more) => {
				const warmer = timed(steps).map(([at, reading]) => [at, reading + more] as const);
				expect(used(warmer)).toBeGreaterThanOrEqual(used(timed(steps)) * (1 - 1e-12));
			})
		);
	});

	it('adds up over a split at any reading, and over a reading put on the line', () => {
		fc.assert(
			fc.property(journey, fc.nat(), fc.double({ min: 0, max: 1, noNaN: true }), (steps, at, part) => {
				const readings = timed(steps);
				const cut = at % (readings.length - 1);
				same(used(readings.slice(0, cut + 1)) + used(readings.slice(cut)), used(readings));
				const [[hours, from], [hoursAfter, to]] = readings.slice(cut, cut + 2) as [
					readonly [number, number],
					readonly [number, number]
				];
				const between = [hours + part * (hoursAfter - hours), from + part * (to - from)] as const;
				same(used([...readings.slice(0, cut + 1), between, ...readings.slice(cut + 1)]), used(readings));
			})
		);
	});

	it('does not change when a reading comes twice', () => {
		fc.assert(
			fc.property(journey, (steps) => {
				const readings = timed(steps);
				const doubled = readings.flatMap((reading) => [reading, reading]);
				const [once, twice] = [ask(readings, { model }), ask(doubled, { model })];
				same(twice.usedHours, once.usedHours);
				expect(twice.meanCelsius).toBeCloseTo(once.meanCelsius, 9);
				expect(twice.exhaustedAfterMs).toBe(once.exhaustedAfterMs);
			})
		);
	});

	it('does not change with where time begins', () => {
		fc.assert(
			fc.property(journey, fc.integer({ min: 1, max: 1000 }), (steps, late) => {
				const readings = timed(steps);
				same(used(readings.map(([at, reading]) => [at + late, reading] as const)), used(readings));
			})
		);
	});
});
