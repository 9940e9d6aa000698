import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { minuteMs, startMs, traceAt } from '../../../../tests/accuracy/build';
import { courseOf, trimmed, type Course, type Stretch } from '../shelf-life/course';
import { passagesOf } from '../shelf-life/passages';
import { levelTimes, meanOverTime } from './level-times';

const at = (minutes: number) => startMs + minutes * minuteMs;
function heldOf(minutes: readonly number[], celsius: readonly number[], trims: readonly Stretch[] = []) {
	const course = courseOf(traceAt(minutes.map(at), celsius), null, trims);
	const held = levelTimes(course, passagesOf(course));
	const byLevel = (ms: Float64Array) =>
		Object.fromEntries(
			[...course.levels].flatMap((level, i) => (ms[i] ? [[level, (ms[i] as number) / minuteMs]] : []))
		);
	return { course, held, byLevel };
}

describe('how long each level was held', () => {
	it('is the interval after each reading, and the usual one after the last', () => {
		const { held, byLevel } = heldOf([0, 10, 20, 30], [2, 3, 3, 2]);
		// 2 °C: the first reading's 10 min and the last one's; 3 °C: two of 10 min.
		expect(byLevel(held.standsForMs)).toEqual({ 2: 20, 3: 20 });
	});

	it('is twice the weight in a mean along straight lines, on both sides of each reading', () => {
		const { held, byLevel, course } = heldOf([0, 10, 20, 30], [2, 3, 3, 2]);
		// The ends have one side of 10 min each, the others two.
		expect(byLevel(held.besideMs)).toEqual({ 2: 20, 3: 40 });
		// By the trapezoid: (25 + 30 + 25)/30.
		expect(meanOverTime(course.levels, held)).toBeCloseTo(80 / 30, 12);
	});

	it('is rest where two readings in a row stand on a level', () => {
		const { held, byLevel } = heldOf([0, 10, 20, 25, 45], [2, 3, 3, 3, 2]);
		expect(byLevel(held.restingMs)).toEqual({ 3: 15 });
	});

	it('counts gaps by their whole length, and rest within them', () => {
		const { held, byLevel } = heldOf([0, 10, 20, 30, 150, 160], [2, 2, 2, 2, 2, 5]);
		expect(byLevel(held.restingMs)).toEqual({ 2: 150 });
		expect(byLevel(held.standsForMs)).toEqual({ 2: 160, 5: 10 });
	});

	it('lets a reading before a trim stand for the usual interval, and no time pass across it', () => {
		const trims = [{ fromMs: at(14), toMs: at(26) }];
		const { held, byLevel, course } = heldOf([0, 10, 20, 30, 40], [2, 3, 9, 4, 4], trims);
		expect([...course.steps]).toContain(trimmed);
		expect(byLevel(held.standsForMs)).toEqual({ 2: 10, 3: 10, 4: 20 });
		expect(byLevel(held.besideMs)).toEqual({ 2: 10, 3: 10, 4: 20 });
	});

	it('falls back on what readings stand for where no time passes that counts', () => {
		const trims = [{ fromMs: at(1), toMs: at(9) }];
		const { held, course } = heldOf([0, 10], [2, 4], trims);
		expect(meanOverTime(course.levels, held)).toBeCloseTo(3, 12);
	});

	it('is what a plain sum over the readings is, even or not', () => {
		const moves = fc.array(
			fc.tuple(fc.constantFrom(5, 5, 5, 7, 200), fc.constantFrom(0, 0, 0.1, -0.1, 6, -6)),
			{ minLength: 1, maxLength: 200 }
		);
		fc.assert(
			fc.property(moves, fc.boolean(), (steps, isEven) => {
				const minutes = [0];
				const celsius = [3];
				for (const [step, change] of steps) {
					minutes.push((minutes.at(-1) as number) + (isEven ? 5 : step));
					celsius.push((celsius.at(-1) as number) + change);
				}
				const { course, held } = heldOf(minutes, celsius);
				const [stands, beside] = plainly(course);
				expect([...held.standsForMs]).toEqual(stands);
				expect([...held.besideMs]).toEqual(beside);
			})
		);
	});
});

/** Reading by reading, by the words of the rule. */
function plainly({ times, levels, levelOf, usualIntervalMs }: Course): [number[], number[]] {
	const stands = new Array<number>(levels.length).fill(0);
	const beside = new Array<number>(levels.length).fill(0);
	levelOf.forEach((level, i) => {
		const after = i + 1 < times.length ? (times[i + 1] as number) - (times[i] as number) : null;
		const before = i > 0 ? (times[i] as number) - (times[i - 1] as number) : 0;
		stands[level] = (stands[level] as number) + (after ?? usualIntervalMs);
		beside[level] = (beside[level] as number) + (after ?? 0) + before;
	});
	return [stands, beside];
}
