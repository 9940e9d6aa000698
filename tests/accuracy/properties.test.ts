import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assess } from '../../src/lib/domain/receiving/assess';
import { recommend } from '../../src/lib/domain/receiving/recommend';
import type { RateModel, Spec } from '../../src/lib/domain/shelf-life/spec';
import { packTrace, unpackTrace } from '../../src/lib/domain/trace/pack';
import type { Trace } from '../../src/lib/domain/trace/trace';
import { buildInput, buildLimit, buildSpec, buildTrace, minuteMs, startMs } from './build';

// Properties that follow from what life used is: an integral of a rate that never falls with temperature.
const models: readonly RateModel[] = [
	{ kind: 'constant-q10', q10: 3 },
	{ kind: 'two-lives', lower: { celsius: 0, lifeHours: 672 }, upper: { celsius: 5, lifeHours: 336 } },
	{ kind: 'arrhenius', activationEnergyKilojoulesPerMole: 83.144 },
	{ kind: 'square-root', minCelsius: -10 },
	{
		kind: 'banded-q10',
		bands: [
			{ fromCelsius: 0, toCelsius: 10, q10: 3 },
			{ fromCelsius: 10, toCelsius: 20, q10: 2.5 }
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
const readings = fc.array(
	fc.integer({ min: -200, max: 300 }).map((tenths) => tenths / 10),
	{ minLength: 3, maxLength: 60 }
);
const close = (a: number, b: number) =>
	expect(Math.abs(a - b)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(b)));

describe.each(models)('with $kind', (model) => {
	const spec = buildSpec({ model, upper: buildLimit(4), lower: buildLimit(-1) });
	const used = (trace: Trace, by: Spec = spec) => assess(buildInput(trace, by)).usedHours.value;

	it('what is left never rises as time passes', () => {
		fc.assert(
			fc.property(readings, (celsius) => {
				const { usedHours, usedLowHours, usedHighHours } = assess(
					buildInput(buildTrace(celsius), spec, { accuracyCelsius: 0.5 })
				).series;
				for (let i = 1; i < usedHours.length; i++) {
					expect(usedHours[i]).toBeGreaterThanOrEqual(usedHours[i - 1] ?? NaN);
					expect(usedLowHours[i]).toBeLessThanOrEqual((usedHours[i] ?? NaN) + 1e-12);
					expect(usedHighHours[i]).toBeGreaterThanOrEqual((usedHours[i] ?? NaN) - 1e-12);
				}
			})
		);
	});

	it('hotter never leaves more', () => {
		fc.assert(
			fc.property(readings, fc.integer({ min: 1, max: 100 }), (celsius, tenths) => {
				const warmer = celsius.map((reading) => reading + tenths / 10);
				expect(used(buildTrace(warmer))).toBeGreaterThanOrEqual(used(buildTrace(celsius)) - 1e-12);
			})
		);
	});

	it('the whole life at the reference temperature leaves exactly nothing', () => {
		const whole = buildTrace([0, 0, 0, 0, 0, 0, 0, 0], (14 * 24 * 60) / 7);
		expect(assess(buildInput(whole, spec)).remainingHours.value).toBe(0);
	});

	it('two files of adjacent periods use what one file does', () => {
		fc.assert(
			fc.property(readings, fc.double({ min: 0.1, max: 0.9, noNaN: true }), (celsius, part) => {
				const cut = Math.max(1, Math.min(celsius.length - 2, Math.floor(part * celsius.length)));
				const first = buildTrace(celsius.slice(0, cut + 1));
				const second = buildTrace(celsius.slice(cut), 10, startMs + cut * 10 * minuteMs);
				close(used(first) + used(second), used(buildTrace(celsius)));
			})
		);
	});

	it('no reading is dropped, and packing changes no digit', () => {
		fc.assert(
			fc.property(readings, (celsius) => {
				const trace = buildTrace(celsius);
				const assessment = assess(buildInput(trace, spec));
				expect(assessment.readings).toBe(celsius.length);
				expect([...assessment.series.celsius]).toEqual(celsius);
				expect(assess(buildInput(unpackTrace(packTrace(trace)), spec))).toEqual(assessment);
			})
		);
	});

	it('a file in °F and its twin in °C give the same verdict', () => {
		fc.assert(
			fc.property(readings, (celsius) => {
				const inCelsius = buildTrace(celsius);
				// Tenths of a degree Celsius are exact in hundredths of a degree Fahrenheit.
				const scaled = Int32Array.from(celsius, (reading) => Math.round(reading * 10) * 18 + 3200);
				const inFahrenheit: Trace = { ...inCelsius, unit: 'fahrenheit', decimals: 2, scaled };
				expect(assess(buildInput(inFahrenheit, spec))).toEqual(assess(buildInput(inCelsius, spec)));
			})
		);
	});
});

describe('the Food Code’s 41 °F', () => {
	// Source: FDA Food Code 3-202.11(A): 41 °F (5 °C) or below when received.
	const spec = buildSpec({ upper: buildLimit(5), ceilingCelsius: 5 });
	const verdict = (unit: Trace['unit'], decimals: number, scaled: number) => {
		const trace: Trace = {
			...buildTrace([0, 0, 0]),
			unit,
			decimals,
			scaled: Int32Array.of(scaled, scaled, scaled)
		};
		const assessment = assess(buildInput(trace, spec));
		const { recommended } = recommend({
			spec,
			assessment,
			accuracyCelsius: 0,
			openingKind: 'declared',
			neededHours: 0,
			seal: null,
			pulp: [],
			cases: null,
			calibrations: [],
			arrivedOn: '2026-04-03',
			disagreement: null,
			journeyEndMs: null
		});
		return [recommended, assessment.excursions.length];
	};

	it.each([
		['fahrenheit', 1, 410, 'accept', 0],
		['fahrenheit', 1, 411, 'reject', 1],
		['fahrenheit', 0, 41, 'accept', 0],
		['celsius', 2, 500, 'accept', 0],
		['celsius', 2, 501, 'reject', 1],
		['kelvin', 2, 27_815, 'accept', 0],
		['kelvin', 2, 27_816, 'reject', 1]
	] as const)('read as %s with %d decimals, %d: %s', (unit, decimals, scaled, recommended, excursions) => {
		expect(verdict(unit, decimals, scaled)).toEqual([recommended, excursions]);
	});
});
