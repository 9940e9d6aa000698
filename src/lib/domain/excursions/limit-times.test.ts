import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	buildInput,
	buildLimit,
	buildSpec,
	buildTrace,
	minuteMs,
	startMs
} from '../../../../tests/accuracy/build';
import { assess } from '../receiving/assess';
import { courseOf } from '../shelf-life/course';
import { hoursAbove, hoursBelow } from '../shelf-life/life-used';

const timesOf = (celsius: readonly number[], limit: number) => {
	const spec = buildSpec({ upper: buildLimit(limit) });
	return assess(buildInput(buildTrace(celsius), spec)).limitTimes[0];
};

describe('time above and below a limit', () => {
	it('is read off the straight lines between readings', () => {
		// Worked by hand on 10-min readings with linear crossings at 15 and 50 min: the area beyond is 23.0 °C·min.
		const time = timesOf([4.0, 4.6, 5.4, 6.2, 5.8, 5.0, 4.4], 5);
		expect(time?.minutesAbove).toBeCloseTo(35, 9);
		expect(time?.degreeMinutesAbove).toBeCloseTo(23, 9);
		expect(time?.minutesBelow).toBeCloseTo(25, 9);
		// Mean by the trapezoid: 312 °C·min over the hour, so 300 + 23 − 312 = 11 below.
		expect(time?.degreeMinutesBelow).toBeCloseTo(11, 9);
	});

	it('on the limit is neither', () => {
		expect(timesOf([5, 5, 5], 5)).toMatchObject({ minutesAbove: 0, minutesBelow: 0, degreeMinutesBelow: 0 });
		expect(timesOf([5, 5, 6], 5)?.minutesAbove).toBeCloseTo(10, 9);
		expect(timesOf([5, 5, 6], 5)?.minutesBelow).toBeCloseTo(0, 9);
	});

	it('agrees with the plain count, whichever side is the rarer', () => {
		fc.assert(
			fc.property(
				fc.array(fc.integer({ min: -50, max: 150 }), { minLength: 2, maxLength: 60 }),
				fc.integer({ min: -50, max: 150 }),
				(tenths, limit) => {
					const celsius = tenths.map((tenth) => tenth / 10);
					const course = courseOf(buildTrace(celsius), null, []);
					const time = timesOf(celsius, limit / 10);
					expect(time?.minutesAbove).toBeCloseTo(hoursAbove(course, limit / 10) * 60, 6);
					expect(time?.minutesBelow).toBeCloseTo(hoursBelow(course, limit / 10) * 60, 6);
				}
			)
		);
	});

	it('is told of every limit and stop the spec has, and trims do not count', () => {
		const spec = buildSpec({
			upper: buildLimit(4),
			lower: buildLimit(0),
			ceilingCelsius: 8,
			freezingCelsius: -1
		});
		const trims = [{ fromMs: startMs + 25 * minuteMs, toMs: startMs + 55 * minuteMs }];
		const { limitTimes } = assess(buildInput(buildTrace([5, 5, 5, 20, 20, 20, 5, 5]), spec, { trims }));
		expect(limitTimes.map(({ limit, minutesAbove }) => [limit, minutesAbove])).toEqual([
			['upper', 30],
			['lower', 30],
			['ceiling', 0],
			['freezing', 30]
		]);
	});
});
