import { describe, expect, it } from 'vitest';
import { buildSpec, buildTrace, hourMs, minuteMs, startMs, traceAt } from '../../../../tests/accuracy/build';
import { courseOf, observed, trimmed, unobserved } from './course';
import { hoursAbove, hoursBelow, lifeUsed, readingBefore, usedUntil } from './life-used';
import { rateCurve } from './rate-curve';

const spec = buildSpec();
const curve = rateCurve(spec);
const at = (minutes: number) => startMs + minutes * minuteMs;

describe('a course', () => {
	const trace = buildTrace([20, 4, 4.5, 5, 4, 21]);

	it('has every reading where nothing says otherwise', () => {
		const course = courseOf(trace, null, []);
		expect([...course.times]).toEqual([...trace.times]);
		expect([...course.celsius]).toEqual([20, 4, 4.5, 5, 4, 21]);
		expect([...course.steps]).toEqual(new Array(5).fill(observed));
		expect([...course.levels]).toEqual([4, 4.5, 5, 20, 21]);
		expect([...course.levelOf]).toEqual([3, 0, 1, 2, 0, 4]);
	});

	it('has only readings within custody, both ends included', () => {
		const course = courseOf(trace, { fromMs: at(10), toMs: at(40) }, []);
		expect([...course.celsius]).toEqual([4, 4.5, 5, 4]);
		expect([...courseOf(trace, { fromMs: at(10) + 1, toMs: at(39) }, []).celsius]).toEqual([4.5, 5]);
	});

	it('leaves trimmed readings out and marks the step across them', () => {
		const course = courseOf(trace, null, [{ fromMs: at(20), toMs: at(30) }]);
		expect([...course.celsius]).toEqual([20, 4, 4, 21]);
		expect([...course.steps]).toEqual([observed, trimmed, observed]);
	});

	it('knows a trim between two readings', () => {
		const course = courseOf(trace, null, [{ fromMs: at(12), toMs: at(18) }]);
		expect([...course.steps]).toEqual([observed, trimmed, observed, observed, observed]);
	});

	it('marks what nobody watched by the usual interval of the whole trace', () => {
		const gapped = traceAt([at(0), at(10), at(20), at(60), at(70)], [4, 4, 4, 4, 4]);
		expect([...courseOf(gapped, null, []).steps]).toEqual([observed, observed, unobserved, observed]);
		expect(courseOf(gapped, { fromMs: at(20), toMs: at(60) }, []).usualIntervalMs).toBe(10 * minuteMs);
		expect([...courseOf(gapped, { fromMs: at(20), toMs: at(60) }, []).steps]).toEqual([unobserved]);
	});
});

describe('life used', () => {
	const course = courseOf(buildTrace([0, 0, 10, 10], 60), null, []);
	const used = lifeUsed(course, curve, 0.5, 'value');

	it('is kept at every reading', () => {
		// An hour at 1, an hour from 1 to 3 (2/ln 3), an hour at 3.
		const ramp = 2 / Math.log(3);
		const expected = [0, 1, 1 + ramp, 4 + ramp];
		used.usedHours.forEach((hours, i) => expect(hours).toBeCloseTo(expected[i] ?? NaN, 12));
	});

	it('is bounded by readings moved by the accuracy', () => {
		const low = lifeUsed(course, curve, 0.5, 'low');
		const high = lifeUsed(course, curve, 0.5, 'high');
		// Source: by Q10 of 3 every rate moves by the factor 3^±0.05.
		expect(low.usedHours[3]).toBeCloseTo((used.usedHours[3] ?? NaN) * Math.pow(3, -0.05), 12);
		expect(high.usedHours[3]).toBeCloseTo((used.usedHours[3] ?? NaN) * Math.pow(3, 0.05), 12);
	});

	it('across a gap is bridged, and bracketed by the neighbours', () => {
		const gapped = courseOf(traceAt([at(0), at(10), at(20), at(140)], [0, 0, 0, 10]), null, []);
		const across = (side: 'value' | 'low' | 'high') => {
			const { usedHours } = lifeUsed(gapped, curve, 0, side);
			return (usedHours[3] ?? NaN) - (usedHours[2] ?? NaN);
		};
		expect(across('low')).toBeCloseTo(2, 12);
		expect(across('value')).toBeCloseTo(4 / Math.log(3), 12);
		expect(across('high')).toBeCloseTo(6, 12);
	});

	it('stands still across a trim', () => {
		const cut = courseOf(buildTrace([0, 10, 10, 0], 60), null, [{ fromMs: at(60), toMs: at(120) }]);
		expect([...lifeUsed(cut, curve, 0, 'value').usedHours]).toEqual([0, 0]);
	});

	it('can be asked for at any instant', () => {
		expect(usedUntil(course, curve, used, at(-5))).toBe(0);
		expect(usedUntil(course, curve, used, at(30))).toBeCloseTo(0.5, 12);
		expect(usedUntil(course, curve, used, at(60))).toBe(used.usedHours[1]);
		// Half the ramp: (3^½ − 1)/ln 3.
		expect(usedUntil(course, curve, used, at(90))).toBeCloseTo(1 + (Math.sqrt(3) - 1) / Math.log(3), 12);
		expect(usedUntil(course, curve, used, at(900))).toBe(used.usedHours[3]);
	});
});

describe('time beyond a temperature', () => {
	const course = courseOf(buildTrace([0, 10, 10, 0, 0], 60), null, []);

	it('is counted from crossing to crossing', () => {
		expect(hoursAbove(course, 4)).toBeCloseTo(0.6 + 1 + 0.6, 12);
		expect(hoursBelow(course, 4)).toBeCloseTo(0.4 + 0.4 + 1, 12);
	});

	it('is none at the temperature itself', () => {
		expect(hoursAbove(course, 10)).toBe(0);
		expect(hoursBelow(course, 0)).toBe(0);
	});

	it('is all beyond a temperature never reached', () => {
		expect(hoursAbove(course, -1)).toBe(4);
		expect(hoursBelow(course, 11)).toBe(4);
	});
});

describe('the reading before an instant', () => {
	it('is found at both ends and between', () => {
		const times = Float64Array.of(0, hourMs, 2 * hourMs);
		expect([-1, 0, 1, hourMs, 3 * hourMs].map((ms) => readingBefore(times, ms))).toEqual([-1, 0, 0, 1, 2]);
		expect(readingBefore(new Float64Array(), 5)).toBe(-1);
	});
});
