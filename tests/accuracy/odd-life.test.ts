import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { computeLifeOf } from '../../src/lib/server/specs/compute-life';
import type { ComputeAnswer } from '../../src/lib/schemas/compute';

// Source: every integral written out and worked in mpmath at 40 digits, independent of this code:
// make-odd-life-cases.py beside this file wrote the questions, at the edges of what may be asked, and the answers.
const figure = z.number();
const figures = z.array(figure);
const reference = z.object({
	source: z.string().startsWith('mpmath'),
	generated: z.iso.date(),
	cases: z.array(
		z.object({
			question: z.looseObject({
				model: z.looseObject({ kind: z.string() }),
				readings: z.array(z.tuple([figure, figure])),
				limits: z.object({ above: figures, below: figures })
			}),
			expected: z.object({
				usedFraction: figure,
				usedHours: figure,
				usedFractionAtReading: figures,
				lowUsedFraction: figure,
				highUsedFraction: figure,
				mktCelsius: figure,
				meanCelsius: figure,
				secondsAbove: figures,
				secondsBelow: figures,
				secondsOutsideModel: figure,
				exhaustedAtEpochSeconds: figure.nullable()
			})
		})
	)
});
type Case = z.infer<typeof reference>['cases'][number];
const { cases } = reference.parse(
	JSON.parse(readFileSync(join(import.meta.dirname, 'odd-life-cases.json'), 'utf8'))
);

const promised = 1e-9;
const kinds = ['q10', 'twoLives', 'arrhenius', 'squareRoot', 'lifeTable', 'bandedQ10'];

/** The largest relative difference; a figure that ought to be 0 must be. */
function relative(ours: readonly number[], theirs: readonly number[]): number {
	expect(ours).toHaveLength(theirs.length);
	return Math.max(
		0,
		...theirs.map((figure, i) => {
			const apart = Math.abs((ours[i] ?? NaN) - figure);
			return apart === 0 ? 0 : apart / Math.abs(figure);
		})
	);
}

/** Seconds beyond each limit in the order in which the limits were sent. */
function byLimit(answered: Record<string, number>, limits: readonly number[]): number[] {
	expect(Object.keys(answered).sort()).toEqual(limits.map(String).sort());
	return limits.map((limit) => answered[limit] ?? NaN);
}

function lifeDifference(answer: ComputeAnswer, expected: Case['expected']): number {
	const shares = relative(answer.usedFractionAtReading, expected.usedFractionAtReading);
	const keys = ['usedFraction', 'usedHours', 'lowUsedFraction', 'highUsedFraction'] as const;
	const totals = relative(
		keys.map((key) => answer[key]),
		keys.map((key) => expected[key])
	);
	return Math.max(shares, totals);
}

describe.each(kinds)('at the edges, life by %s', (kind) => {
	const answered = cases
		.filter(({ question }) => question.model.kind === kind)
		.map((one) => ({ ...one, answer: computeLifeOf(one.question) }));

	it('is the closed form to one part in a thousand million, however small, in the order sent', () => {
		expect(answered.length).toBeGreaterThanOrEqual(20);
		for (const { answer, expected, question } of answered)
			expect(lifeDifference(answer, expected), JSON.stringify(question)).toBeLessThan(promised);
	});

	it('stands so long beyond limits that are readings, and outside its range', () => {
		for (const { answer, expected, question } of answered) {
			const ours = [
				...byLimit(answer.secondsAbove, question.limits.above),
				...byLimit(answer.secondsBelow, question.limits.below),
				answer.secondsOutsideModel
			];
			const theirs = [...expected.secondsAbove, ...expected.secondsBelow, expected.secondsOutsideModel];
			expect(relative(ours, theirs), JSON.stringify(question)).toBeLessThan(promised);
		}
	});

	it('has the same means, and ends in the same millisecond', () => {
		for (const { answer, expected, question } of answered) {
			// Kelvin are what the formula works with; 1e-9 of them is 3e-7 °C.
			expect(Math.abs(answer.mktCelsius - expected.mktCelsius)).toBeLessThan(3e-7);
			expect(Math.abs(answer.meanCelsius - expected.meanCelsius)).toBeLessThan(1e-9 * 40);
			const endsAt = answer.exhaustedAt === null ? null : Date.parse(answer.exhaustedAt) / 1000;
			expect(endsAt === null, JSON.stringify(question)).toBe(expected.exhaustedAtEpochSeconds === null);
			const apart = Math.abs((endsAt ?? 0) - (expected.exhaustedAtEpochSeconds ?? 0));
			expect(apart).toBeLessThanOrEqual(0.000_51);
		}
	});
});

describe('the odd cases', () => {
	it('hold what is hard: one reading, one time, fractions of a second, disorder, ends of life', () => {
		const count = (isSuch: (one: Case) => boolean) => cases.filter(isSuch).length;
		const timesOf = ({ question }: Case) => question.readings.map(([time]) => time);
		expect(count((one) => timesOf(one).length === 1)).toBeGreaterThan(10);
		expect(count((one) => new Set(timesOf(one)).size < timesOf(one).length)).toBeGreaterThan(30);
		expect(count((one) => timesOf(one).some((time) => !Number.isInteger(time)))).toBeGreaterThan(30);
		const isSorted = (times: number[]) => times.every((time, i) => i === 0 || time >= (times[i - 1] ?? 0));
		expect(count((one) => !isSorted(timesOf(one)))).toBeGreaterThan(50);
		expect(count(({ expected }) => expected.exhaustedAtEpochSeconds !== null)).toBeGreaterThan(15);
		expect(count(({ expected }) => expected.secondsOutsideModel > 0)).toBeGreaterThan(10);
	});
});
