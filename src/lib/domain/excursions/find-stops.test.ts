import { describe, expect, it } from 'vitest';
import { buildLimit, buildSpec, buildTrace, minuteMs, startMs } from '../../../../tests/accuracy/build';
import { courseOf } from '../shelf-life/course';
import type { Spec } from '../shelf-life/spec';
import type { Placement } from '../trace/trace';
import { findStops } from './find-stops';

function stops(
	celsius: readonly number[],
	spec: Partial<Spec>,
	accuracyCelsius = 0,
	placement: Placement = 'in-product'
) {
	const course = courseOf(buildTrace(celsius), null, []);
	return findStops({ spec: buildSpec(spec), course, accuracyCelsius, placement });
}

describe('the freezing stop', () => {
	// Source: UC Davis Postharvest Center, lettuce, crisphead: freezes below −0.2 °C (highest freezing point).
	const lettuce = { freezingCelsius: -0.2, lower: buildLimit(0) };

	it('is reached at the freezing point itself', () => {
		expect(stops([1, -0.2, 1], lettuce)).toMatchObject([{ kind: 'freezing', isInDoubt: false, minutes: 0 }]);
		expect(stops([1, -0.19, 1], lettuce)).toEqual([]);
	});

	it('tells when it was first reached and for how long', () => {
		const [hit] = stops([1, -1, -1, 1], { freezingCelsius: -0.5 });
		expect((hit?.firstAtMs ?? NaN) - startMs).toBeCloseTo(7.5 * minuteMs, 3);
		expect(hit?.minutes).toBeCloseTo(15, 6);
		expect(hit?.extremeCelsius).toBe(-1);
	});

	it('is in doubt where only the accuracy reaches it, beyond the spec’s own limit', () => {
		const [hit, ...others] = stops([1, -0.1, 1], lettuce, 0.5);
		expect(others).toEqual([]);
		expect(hit).toMatchObject({ isInDoubt: true, extremeCelsius: -0.1, stopCelsius: -0.2 });
		expect(hit?.minutes).toBeGreaterThan(0);
	});

	it('is not doubted within the limits, or every load of greens at 0 °C would be held', () => {
		expect(stops([0, 0, 0.1], lettuce, 0.5)).toEqual([]);
		expect(stops([0, 0, 0.1], { freezingCelsius: -0.2 }, 0.5)).toHaveLength(1);
	});

	it('cannot be proved by air', () => {
		expect(stops([1, -5, 1], lettuce, 0, 'air')).toMatchObject([{ isInDoubt: true }]);
		expect(stops([1, -5, 1], lettuce, 0, 'between-cases')).toMatchObject([{ isInDoubt: false }]);
	});
});

describe('the food-safety ceiling', () => {
	const spec = { ceilingCelsius: 5, upper: buildLimit(4) };

	it('is passed strictly above it', () => {
		// Source: FDA Food Code 3-202.11(A): received at 41 °F (5 °C) or below.
		expect(stops([3, 5, 3], spec)).toEqual([]);
		expect(stops([3, 5.01, 3], spec)).toMatchObject([{ kind: 'ceiling', isInDoubt: false }]);
	});

	it('is passed by air as by anything else', () => {
		expect(stops([3, 6, 3], spec, 0.5, 'air')).toMatchObject([{ isInDoubt: false }]);
	});

	it('is in doubt within the accuracy', () => {
		expect(stops([3, 4.6, 3], spec, 0.5)).toMatchObject([{ isInDoubt: true, extremeCelsius: 4.6 }]);
		expect(stops([3, 4.4, 3], spec, 0.5)).toEqual([]);
	});
});

describe('stops', () => {
	it('are none where the spec sets none', () => {
		expect(stops([-40, 60], {})).toEqual([]);
	});

	it('may both be reached', () => {
		expect(stops([-1, 9], { freezingCelsius: -0.5, ceilingCelsius: 8 }).map((hit) => hit.kind)).toEqual([
			'freezing',
			'ceiling'
		]);
	});
});
