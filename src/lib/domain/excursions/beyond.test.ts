import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildTrace, minuteMs, startMs } from '../../../../tests/accuracy/build';
import { courseOf, type Stretch } from '../shelf-life/course';
import { hoursAbove, hoursBelow } from '../shelf-life/life-used';
import { stretchesBeyond } from './beyond';

const courseAt = (celsius: readonly number[], trims: readonly Stretch[] = []) =>
	courseOf(buildTrace(celsius), null, trims);
const minutesFrom = (ms: number) => (ms - startMs) / minuteMs;

describe('a time above a limit', () => {
	it('runs from crossing to crossing', () => {
		const [beyond, ...others] = stretchesBeyond(courseAt([4, 6, 6, 4]), 5, 'above', 5);
		expect(others).toEqual([]);
		expect(minutesFrom(beyond?.fromMs ?? NaN)).toBeCloseTo(5, 6);
		expect(minutesFrom(beyond?.toMs ?? NaN)).toBeCloseTo(25, 6);
		expect((beyond?.degreeMs ?? NaN) / minuteMs).toBeCloseTo(2.5 + 10 + 2.5, 6);
		expect(beyond).toMatchObject({ extremeCelsius: 6, isSettled: true, isOpen: false });
		expect(minutesFrom(beyond?.extremeAtMs ?? NaN)).toBe(10);
	});

	it('begins at a reading that stands on the limit', () => {
		const [beyond] = stretchesBeyond(courseAt([5, 6, 5]), 5, 'above', 5);
		expect(minutesFrom(beyond?.fromMs ?? NaN)).toBe(0);
		expect(minutesFrom(beyond?.toMs ?? NaN)).toBe(20);
	});

	it('is none on the limit, unless the limit is included', () => {
		expect(stretchesBeyond(courseAt([5, 5, 5]), 5, 'above', 5)).toEqual([]);
		const [touch] = stretchesBeyond(courseAt([4, 5, 5, 4]), 5, 'above', 5, true);
		expect(minutesFrom(touch?.fromMs ?? NaN)).toBe(10);
		expect(minutesFrom(touch?.toMs ?? NaN)).toBe(20);
		expect(touch?.degreeMs).toBe(0);
	});

	it('is two where it comes back between, settled only past the hysteresis', () => {
		const stretches = stretchesBeyond(courseAt([4, 6, 4.8, 6, 4]), 5, 'above', 4.5);
		expect(stretches.map((stretch) => stretch.isSettled)).toEqual([false, true]);
	});

	it('is open where the readings end', () => {
		expect(stretchesBeyond(courseAt([4, 6]), 5, 'above', 5)).toMatchObject([
			{ isOpen: true, isSettled: false }
		]);
	});

	it('is cut by a trim, and settled there', () => {
		const trims = [{ fromMs: startMs + 12 * minuteMs, toMs: startMs + 18 * minuteMs }];
		const stretches = stretchesBeyond(courseAt([6, 6, 6, 6], trims), 5, 'above', 5);
		expect(stretches.map(({ fromMs, toMs }) => [minutesFrom(fromMs), minutesFrom(toMs)])).toEqual([
			[0, 10],
			[20, 30]
		]);
		expect(stretches.map((stretch) => stretch.isSettled)).toEqual([true, false]);
	});
});

describe('a time below a limit', () => {
	it('is the mirror of one above', () => {
		const log = [4, 6, 6.5, 4, 5, 7, 3];
		const above = stretchesBeyond(courseAt(log), 5, 'above', 4.7);
		const below = stretchesBeyond(courseAt(log.map((celsius) => -celsius)), -5, 'below', -4.7);
		expect(below.map((stretch) => ({ ...stretch, extremeCelsius: -stretch.extremeCelsius }))).toEqual(above);
	});
});

describe('all times beyond a limit', () => {
	const logs = fc.array(
		fc.integer({ min: -50, max: 100 }).map((tenths) => tenths / 10),
		{ minLength: 2, maxLength: 50 }
	);

	it('add up to the hours the course spends there', () => {
		fc.assert(
			fc.property(logs, fc.integer({ min: -20, max: 60 }), (log, tenths) => {
				const course = courseAt(log);
				const limit = tenths / 10 + 0.05;
				const total = (side: 'above' | 'below') =>
					stretchesBeyond(course, limit, side, limit).reduce(
						(sum, { fromMs, toMs }) => sum + toMs - fromMs,
						0
					);
				expect(total('above') / 3_600_000).toBeCloseTo(hoursAbove(course, limit), 6);
				expect(total('below') / 3_600_000).toBeCloseTo(hoursBelow(course, limit), 6);
			})
		);
	});

	it('are in order and do not overlap', () => {
		fc.assert(
			fc.property(logs, (log) => {
				const stretches = stretchesBeyond(courseAt(log), 2, 'above', 1.5);
				stretches.forEach((stretch, i) => {
					expect(stretch.toMs).toBeGreaterThan(stretch.fromMs);
					expect(stretch.fromMs).toBeGreaterThanOrEqual(stretches[i - 1]?.toMs ?? -Infinity);
					expect(stretch.extremeCelsius).toBeGreaterThan(2);
				});
			})
		);
	});
});
