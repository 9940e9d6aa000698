import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildTrace, hourMs, minuteMs, startMs, traceAt } from '../../../../tests/accuracy/build';
import { courseOf } from '../shelf-life/course';
import { passagesOf } from '../shelf-life/passages';
import { meanKineticCelsius, worstWindowMeanKinetic } from '../shelf-life/mean-kinetic';
import { timeWeightedMean } from '../trace/statistics';
import { levelTimes, meanOverTime } from './level-times';
import { worstWindowOf } from './rolling-kinetic';

describe('the worst window', () => {
	it('is that of every window tried one by one, on an even log', () => {
		fc.assert(
			fc.property(
				fc.array(fc.integer({ min: -200, max: 300 }), { minLength: 2, maxLength: 80 }),
				fc.integer({ min: 1, max: 30 }),
				(tenths, readings) => {
					const celsius = tenths.map((tenth) => tenth / 10);
					const course = courseOf(buildTrace(celsius), null, []);
					const windows = celsius.length <= readings ? 1 : celsius.length - readings + 1;
					const all = Array.from({ length: windows }, (_, from) => celsius.slice(from, from + readings));
					const each = all.map(
						(part) =>
							meanKineticCelsius(
								part,
								part.map(() => 1),
								null
							) ?? NaN
					);
					const worst = worstWindowOf(course, readings * 10 * minuteMs, null);
					expect(worst).toBeCloseTo(Math.max(...each), 9);
				}
			)
		);
	});

	it('is found by edges where the steps are uneven or do not divide it', () => {
		const uneven = traceAt(
			[0, 10, 20, 50, 60].map((at) => startMs + at * minuteMs),
			[2, 8, 8, 3, 2]
		);
		const course = courseOf(uneven, null, []);
		const weights = [10, 10, 30, 10, 10].map((minutes) => minutes * minuteMs);
		const expected = worstWindowMeanKinetic(course.celsius, weights, hourMs / 2, null);
		expect(worstWindowOf(course, hourMs / 2, null)).toBe(expected);
		const even = courseOf(buildTrace([2, 8, 8, 2]), null, []);
		const odd = worstWindowMeanKinetic(
			even.celsius,
			[1, 1, 1, 1].map((n) => n * 10 * minuteMs),
			25 * minuteMs,
			null
		);
		expect(worstWindowOf(even, 25 * minuteMs, null)).toBe(odd);
	});

	it('is the whole of a journey that is shorter', () => {
		const course = courseOf(buildTrace([2, 4, 6]), null, []);
		expect(worstWindowOf(course, 24 * hourMs, null)).toBe(meanKineticCelsius([2, 4, 6], [1, 1, 1], null));
	});
});

describe('how long each level was held', () => {
	it('gives the mean along the lines and the textbook weights, even or not', () => {
		fc.assert(
			fc.property(
				fc.array(fc.tuple(fc.constantFrom(5, 5, 7), fc.integer({ min: -30, max: 30 })), {
					minLength: 2,
					maxLength: 40
				}),
				fc.boolean(),
				(rows, isEven) => {
					let minutes = 0;
					const times = rows.map(([step]) => startMs + (minutes += isEven ? 5 : step) * minuteMs);
					const trace = traceAt(
						times,
						rows.map(([, tenths]) => tenths / 10)
					);
					const course = courseOf(trace, null, []);
					const held = levelTimes(course, passagesOf(course));
					const mean = timeWeightedMean(course.times, course.celsius) ?? NaN;
					expect(meanOverTime(course.levels, held)).toBeCloseTo(mean, 10);
					const lengthMs = (times[times.length - 1] as number) - (times[0] as number);
					const sum = held.standsForMs.reduce((total, ms) => total + ms, 0);
					expect(sum).toBe(lengthMs + course.usualIntervalMs);
				}
			)
		);
	});

	it('counts no trimmed time, and before a trim the usual interval', () => {
		const trims = [{ fromMs: startMs + 15 * minuteMs, toMs: startMs + 35 * minuteMs }];
		const course = courseOf(buildTrace([1, 1, 9, 9, 3, 3]), null, trims);
		const held = levelTimes(course, passagesOf(course));
		expect([...course.levels]).toEqual([1, 3]);
		expect([...held.standsForMs].map((ms) => ms / minuteMs)).toEqual([20, 20]);
		expect([...held.besideMs].map((ms) => ms / minuteMs)).toEqual([20, 20]);
		expect(meanOverTime(course.levels, held)).toBe(2);
	});
});
