import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { computeLifeOf } from '../../src/lib/server/specs/compute-life';
import type { ComputeAnswer } from '../../src/lib/schemas/compute';

// Source: scipy's adaptive quadrature (QUADPACK) over each model's published formula, independent of this code:
// make-life-cases.py beside this file wrote the cases, with uneven steps, gaps, plateaus and jumps.
const figure = z.number();
const reference = z.object({
	source: z.string().startsWith('scipy'),
	generated: z.iso.date(),
	cases: z.array(
		z.object({
			question: z.looseObject({
				model: z.looseObject({ kind: z.string() }),
				readings: z.array(z.tuple([figure, figure])),
				accuracyCelsius: figure
			}),
			expected: z.object({
				usedFraction: figure,
				usedHours: figure,
				usedFractionAtReading: z.array(figure),
				lowUsedFraction: figure,
				highUsedFraction: figure,
				mktCelsius: figure,
				meanCelsius: figure,
				secondsAbove: z.record(z.string(), figure),
				secondsBelow: z.record(z.string(), figure),
				secondsOutsideModel: figure,
				exhaustedAtEpochSeconds: figure.nullable()
			})
		})
	)
});
const path = join(import.meta.dirname, 'life-cases.json');
const { cases } = reference.parse(JSON.parse(readFileSync(path, 'utf8')));

const promised = 1e-9;
const kinds = ['q10', 'twoLives', 'arrhenius', 'squareRoot', 'lifeTable', 'bandedQ10'];

/** Difference relative to the reference; to one thousandth of a life or a second where that is next to nothing. */
function differenceOf(ours: number, theirs: number, least: number): number {
	return Math.abs(ours - theirs) / Math.max(Math.abs(theirs), least);
}

function worstOf(kind: string): { worst: number; seconds: number; instant: number; cases: number } {
	let [worst, seconds, instant] = [0, 0, 0];
	const ofKind = cases.filter(({ question }) => question.model.kind === kind);
	for (const { question, expected } of ofKind) {
		const answer = computeLifeOf(question);
		for (const [ours, theirs] of figuresOf(answer, expected))
			worst = Math.max(worst, differenceOf(ours, theirs, 1e-6));
		for (const key of ['secondsAbove', 'secondsBelow'] as const) {
			expect(Object.keys(answer[key]).sort()).toEqual(Object.keys(expected[key]).sort());
			for (const [limit, theirs] of Object.entries(expected[key]))
				seconds = Math.max(seconds, differenceOf(answer[key][limit] ?? NaN, theirs, 1));
		}
		const outside = differenceOf(answer.secondsOutsideModel, expected.secondsOutsideModel, 1);
		seconds = Math.max(seconds, outside);
		const endsAt = answer.exhaustedAt === null ? null : Date.parse(answer.exhaustedAt) / 1000;
		expect(endsAt === null).toBe(expected.exhaustedAtEpochSeconds === null);
		instant = Math.max(instant, Math.abs((endsAt ?? 0) - (expected.exhaustedAtEpochSeconds ?? 0)));
	}
	return { worst, seconds, instant, cases: ofKind.length };
}

type Figures = Pick<
	ComputeAnswer,
	| 'usedFraction'
	| 'usedHours'
	| 'usedFractionAtReading'
	| 'lowUsedFraction'
	| 'highUsedFraction'
	| 'meanCelsius'
>;
function figuresOf(answer: Figures, expected: Figures): [number, number][] {
	expect(answer.usedFractionAtReading).toHaveLength(expected.usedFractionAtReading.length);
	return [
		...answer.usedFractionAtReading.map((one, i): [number, number] => [
			one,
			expected.usedFractionAtReading[i] ?? NaN
		]),
		...(['usedFraction', 'usedHours', 'lowUsedFraction', 'highUsedFraction'] as const).map(
			(key): [number, number] => [answer[key], expected[key]]
		)
	];
}

describe('against an independent integrator', () => {
	beforeAll(() => expect(cases.length).toBeGreaterThanOrEqual(200));

	it.each(kinds)('life by %s is the same to one part in a thousand million', (kind) => {
		const { worst, seconds, instant, cases: count } = worstOf(kind);
		expect(count).toBeGreaterThanOrEqual(30);
		expect(worst).toBeLessThan(promised);
		expect(seconds).toBeLessThan(promised);
		// The instant is given in whole milliseconds.
		expect(instant).toBeLessThanOrEqual(0.000_51);
	});

	it('means are the same', () => {
		for (const { question, expected } of cases) {
			const { mktCelsius, meanCelsius } = computeLifeOf(question);
			// Kelvin are what the formula works with; 1e-9 of them is 3e-7 °C.
			expect(Math.abs(mktCelsius - expected.mktCelsius)).toBeLessThan(3e-7);
			expect(Math.abs(meanCelsius - expected.meanCelsius)).toBeLessThan(1e-9 * 40);
		}
	});

	it('the cases hold what is hard: gaps, plateaus, jumps, ends of life', () => {
		const steps = cases.flatMap(({ question: { readings } }) =>
			readings.slice(1).map(([time, celsius], i) => {
				const [timeBefore = NaN, celsiusBefore = NaN] = readings[i] ?? [];
				return { seconds: time - timeBefore, rise: Math.abs(celsius - celsiusBefore) };
			})
		);
		const count = (isSuch: (step: { seconds: number; rise: number }) => boolean) =>
			steps.filter(isSuch).length;
		expect(count(({ seconds }) => seconds > 86_400)).toBeGreaterThan(100);
		expect(count(({ seconds, rise }) => seconds > 0 && rise === 0)).toBeGreaterThan(100);
		expect(count(({ seconds, rise }) => seconds === 0 && rise > 0)).toBeGreaterThan(50);
		expect(count(({ rise }) => rise > 0 && rise < 1e-5)).toBeGreaterThan(20);
		const ended = cases.filter(({ expected }) => expected.exhaustedAtEpochSeconds !== null);
		expect(ended.length).toBeGreaterThan(20);
		expect(cases.length - ended.length).toBeGreaterThan(20);
	});
});
