import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { minuteMs, startMs, traceAt } from '../../../../tests/accuracy/build';
import { SharedRoom } from '../trace/room';
import type { Trace } from '../trace/trace';
import { courseOf, observed, unobserved, type Course, type Stretch } from './course';
import { eachPassage, passageAt, passagesOf } from './passages';

const at = (minutes: number) => startMs + minutes * minuteMs;
const evenly = (celsius: readonly number[]): Trace =>
	traceAt(
		celsius.map((_, i) => at(i * 5)),
		celsius
	);

/** Minutes from one temperature to the other, by the table. */
function tableOf(course: Course): Record<string, number> {
	const found: Record<string, number> = {};
	eachPassage(passagesOf(course), (_, from, to, ms) => {
		found[`${course.levels[from]} to ${course.levels[to]}`] = ms / minuteMs;
	});
	return found;
}

/** The same, counted reading by reading; steps that are told apart are left out. */
function countedOf(course: Course, leftOut: ReadonlySet<number>): Record<string, number> {
	const found: Record<string, number> = {};
	course.steps.forEach((step, i) => {
		if (step !== observed || leftOut.has(i)) return;
		const name = `${course.celsius[i]} to ${course.celsius[i + 1]}`;
		const ms = (course.times[i + 1] as number) - (course.times[i] as number);
		found[name] = (found[name] ?? 0) + ms / minuteMs;
	});
	return found;
}

describe('the passages of a course', () => {
	it('hold how long the temperature took from each level to each', () => {
		expect(tableOf(courseOf(evenly([2, 2, 2, 3, 2, 3]), null, []))).toEqual({
			'2 to 2': 10,
			'2 to 3': 10,
			'3 to 2': 5
		});
		const uneven = traceAt([0, 5, 12, 15].map(at), [2, 2, 3, 2]);
		expect(tableOf(courseOf(uneven, null, []))).toEqual({ '2 to 2': 5, '2 to 3': 7, '3 to 2': 3 });
	});

	it.each([
		['one reading', [4]],
		['two', [4, 5]],
		['three', [4, 5, 4]],
		['four', [4, 5, 4, 4]]
	])('leave out no step of %s', (_, celsius) => {
		const total = Object.values(tableOf(courseOf(evenly(celsius), null, []))).reduce((a, b) => a + b, 0);
		expect(total).toBe((celsius.length - 1) * 5);
	});

	it('are told reading by reading beyond the reach of the table', () => {
		// So many levels that the table holds the nearest eight alone.
		const celsius = Array.from({ length: 400 }, (_, i) => (i % 2 === 0 ? i / 100 : 80 + i / 100));
		const course = courseOf(evenly(celsius), null, []);
		const { reach, far, ms } = passagesOf(course);
		expect(reach).toBe(8);
		expect(ms.every((passing) => passing === 0)).toBe(true);
		expect(far).toEqual(Array.from({ length: 399 }, (_, i) => i));
	});

	it('reach no further than is of use', () => {
		const calm = Array.from({ length: 20_000 }, (_, i) => (i % 3) / 10);
		expect(passagesOf(courseOf(evenly(calm), null, [])).reach).toBe(64);
		expect(passageAt({ reach: 2 }, 3, 5)).toBe(3 * 5 + 4);
		expect(passageAt({ reach: 2 }, 3, 1)).toBe(3 * 5);
		expect(passageAt({ reach: 2 }, 3, 6)).toBe(-1);
		expect(passageAt({ reach: 2 }, 3, 0)).toBe(-1);
	});

	it('tell gaps apart, and pass nowhere where it was trimmed', () => {
		const trace = traceAt([0, 5, 10, 15, 20, 25, 145, 150].map(at), [1, 1, 1, 1, 1, 1, 4, 4]);
		const trims: Stretch[] = [{ fromMs: at(4), toMs: at(6) }];
		const course = courseOf(trace, null, trims);
		expect(tableOf(course)).toEqual({ '1 to 1': 15, '4 to 4': 5 });
		const { silent, far } = passagesOf(course);
		expect([silent, far]).toEqual([[4], []]);
		expect(course.steps[4]).toBe(unobserved);
	});

	it('in shared room are the same, whatever lay there before', () => {
		const course = courseOf(evenly([2, 2.5, 3, 2, 2]), null, []);
		const room = new SharedRoom();
		room.floats('passages', 10_000).fill(7);
		room.wholes('counts', 10_000).fill(7);
		expect(passagesOf(course, room)).toEqual(passagesOf(course));
	});

	it('are what a plain count finds, evenly spaced or not', () => {
		const moves = fc.array(
			fc.tuple(fc.constantFrom(5, 5, 5, 6, 240), fc.constantFrom(0, 0, 0.01, -0.02, 0.5, -7, 8)),
			{ minLength: 1, maxLength: 300 }
		);
		fc.assert(
			fc.property(moves, fc.boolean(), fc.boolean(), (steps, isEven, isTrimmed) => {
				const times = [startMs];
				const celsius = [3];
				for (const [minutes, change] of steps) {
					times.push((times[times.length - 1] as number) + (isEven ? 5 : minutes) * minuteMs);
					celsius.push((celsius[celsius.length - 1] as number) + change);
				}
				const trims = isTrimmed ? [{ fromMs: at(7), toMs: at(19) }] : [];
				const course = courseOf(traceAt(times, celsius), null, trims);
				const { far, silent } = passagesOf(course);
				expect(tableOf(course)).toEqual(countedOf(course, new Set(far)));
				expect(silent).toEqual([...course.steps.keys()].filter((i) => course.steps[i] === unobserved));
			})
		);
	});
});
