import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildSpec, minuteMs, startMs, traceAt } from '../../../../tests/accuracy/build';
import { courseOf, type Course } from '../shelf-life/course';
import { lifeUsed } from '../shelf-life/life-used';
import { passagesOf } from '../shelf-life/passages';
import { rateBounds } from '../shelf-life/rate-bounds';
import { rateCurve } from '../shelf-life/rate-curve';
import type { RateModel, Spec } from '../shelf-life/spec';
import { SharedRoom, type Room } from '../trace/room';
import { lifeSides } from './life-sides';

/** The sides of a course by a spec, as an assessment asks for them. */
function sidesOf(course: Course, spec: Spec, accuracyCelsius: number, room?: Room) {
	const given = { curve: rateCurve(spec), bounds: rateBounds(spec), accuracyCelsius };
	return lifeSides(course, passagesOf(course, room), given, room);
}

const models: RateModel[] = [
	{ kind: 'constant-q10', q10: 3 },
	{ kind: 'arrhenius', activationEnergyKilojoulesPerMole: 83.144 },
	{ kind: 'square-root', minCelsius: -10 },
	{
		kind: 'life-table',
		points: [
			{ celsius: -2, lifeHours: 900 },
			{ celsius: 4, lifeHours: 336 },
			{ celsius: 12, lifeHours: 60 }
		]
	}
];

/** Steps of some minutes with a gap now and then, readings that stay, drift and leap. */
const journeys = fc
	.array(fc.tuple(fc.constantFrom(5, 5, 5, 10, 200), fc.constantFrom(0, 0, 0.1, -0.1, 0.3, -0.2, 9, -8)), {
		minLength: 1,
		maxLength: 700
	})
	.map((moves) => {
		const times = [startMs];
		const celsius = [3];
		for (const [minutes, change] of moves) {
			times.push((times[times.length - 1] as number) + minutes * minuteMs);
			celsius.push(Math.max(-20, Math.min(30, (celsius[celsius.length - 1] as number) + change)));
		}
		return traceAt(times, celsius);
	});

describe('the three sides of life used', () => {
	it('are those of the plain integration, step by step, whatever the model and the journey', () => {
		fc.assert(
			fc.property(fc.constantFrom(...models), journeys, fc.boolean(), (model, trace, isTrimmed) => {
				const trims = isTrimmed ? [{ fromMs: startMs + 12 * minuteMs, toMs: startMs + 40 * minuteMs }] : [];
				const course = courseOf(trace, null, trims);
				if (course.times.length === 0) return;
				const spec = buildSpec({ model });
				const curve = rateCurve(spec);
				const sides = sidesOf(course, spec, 0.5);
				for (const side of ['value', 'low', 'high'] as const) {
					const plain = lifeUsed(course, curve, 0.5, side).usedHours;
					const quick = side === 'value' ? sides.value.usedHours : sides.seriesOf(side);
					quick.forEach((hours, i) => {
						const expected = plain[i] as number;
						// Two orders of summation: a thousand readings agree to 1e-13.
						expect(Math.abs(hours - expected)).toBeLessThanOrEqual(1e-13 * expected);
					});
				}
			}),
			{ numRuns: 60 }
		);
	});

	it('end their series on their totals', () => {
		fc.assert(
			fc.property(fc.constantFrom(...models), journeys, (model, trace) => {
				const sides = sidesOf(courseOf(trace, null, []), buildSpec({ model }), 0.5);
				const last = trace.times.length - 1;
				for (const [side, hours] of [['low', sides.lowHours] as const, ['high', sides.highHours] as const])
					// The total is added up by passage, the series by time: two orders of summation.
					expect(Math.abs((sides.seriesOf(side)[last] as number) - hours)).toBeLessThanOrEqual(1e-13 * hours);
			}),
			{ numRuns: 60 }
		);
	});

	it('are one to the last digit where instrument and model are exact and nothing is hidden', () => {
		const tenths = Array.from({ length: 1000 }, (_, i) => 2 + ((i * 37) % 11) / 10);
		const trace = traceAt(
			tenths.map((_, i) => startMs + i * 5 * minuteMs),
			tenths
		);
		const { value, lowHours, highHours, watchedHours } = sidesOf(courseOf(trace, null, []), buildSpec(), 0);
		expect([lowHours, highHours]).toEqual([value.usedHours[999], value.usedHours[999]]);
		expect(watchedHours).toEqual({ low: 0, high: 0 });
	});

	it('take the same bounds from the same readings in another order', () => {
		// There and back at one step: the passages are the same, so is how far the bounds lie from the figure.
		const celsius = [2, 2.5, 3, 9, 3, 3, 2.1, 2];
		const watchedOf = (readings: readonly number[]) => {
			const times = readings.map((_, i) => startMs + i * 5 * minuteMs);
			return sidesOf(courseOf(traceAt(times, readings), null, []), buildSpec(), 0.5).watchedHours;
		};
		const there = watchedOf(celsius);
		const back = watchedOf(celsius.toReversed());
		expect(back.low).toBeCloseTo(there.low, 14);
		expect(back.high).toBeCloseTo(there.high, 14);
		expect(there.low).toBeLessThan(0);
		expect(there.high).toBeGreaterThan(0);
	});

	it('are the same digits in shared room, whatever lay there before', () => {
		const trace = traceAt(
			[0, 5, 10, 300].map((at) => startMs + at * minuteMs),
			[1, 2, 2, 4]
		);
		const room = new SharedRoom();
		room.floats('used', 50).fill(99);
		room.bytes('steps', 50).fill(2);
		const shared = sidesOf(courseOf(trace, null, [], room), buildSpec(), 0.5, room);
		const own = sidesOf(courseOf(trace, null, []), buildSpec(), 0.5);
		expect([...shared.value.usedHours]).toEqual([...own.value.usedHours]);
		expect([shared.lowHours, shared.highHours]).toEqual([own.lowHours, own.highHours]);
		expect(shared.acrossGap(2)).toEqual(own.acrossGap(2));
	});

	it('hold a gap at its colder and its warmer neighbour', () => {
		const trace = traceAt(
			[0, 5, 10, 130].map((at) => startMs + at * minuteMs),
			[0, 0, 0, 10]
		);
		const { acrossGap } = sidesOf(courseOf(trace, null, []), buildSpec(), 0);
		// Q10 3 by its definition: two hours at 1 and at 3, and 2 × (3 − 1)/ln 3 along the line.
		expect(acrossGap(2).low).toBeCloseTo(2, 12);
		expect(acrossGap(2).high).toBeCloseTo(6, 12);
		expect(acrossGap(2).value).toBeCloseTo(4 / Math.log(3), 12);
	});
});
