import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	buildHandover,
	buildInput,
	buildSpec,
	buildTrace,
	hourMs,
	startMs
} from '../../../../tests/accuracy/build';
import { assess } from '../receiving/assess';
import { butFor } from './but-for';

/** Legs of ten planned hours at 0 °C, each held at its own temperature. */
function assessed(celsius: readonly number[]) {
	const handovers = [...celsius, 0].map((_, i) =>
		buildHandover(`H${i}`, startMs + i * 10 * hourMs, { plannedMs: startMs + i * 10 * hourMs })
	);
	const readings = celsius.flatMap((held) => new Array<number>(10).fill(held));
	const trace = buildTrace([...readings, celsius.at(-1) ?? 0], 60);
	return assess(buildInput(trace, buildSpec({ fullLifeHours: 336 }), { handovers }));
}

describe('what would be left but for a leg', () => {
	it('is what is left and the leg’s over-use, on all three sides', () => {
		const { legs, remainingHours } = assessed([0, 0, 10]);
		const [, , third] = butFor(legs, remainingHours, 300);
		// Q10 of 3 by its definition: the last leg's line from 0 to 10 °C takes an hour of the second, so it held 10 °C
		// all through: 30 h where 10 were allowed.
		expect(legs[2]?.overHours).toBeCloseTo(20, 6);
		expect(third?.remainingHours.value).toBeCloseTo(remainingHours.value + 20, 6);
		expect(third?.remainingHours.low).toBeCloseTo(remainingHours.low + 20, 6);
		expect(third?.remainingHours.high).toBeCloseTo(remainingHours.high + 20, 6);
	});

	it('passes where its low meets the need, to the hour', () => {
		const { legs } = assessed([0, 10]);
		const overHours = legs[1]?.overHours ?? NaN;
		const remaining = { value: 100, low: 90, high: 110 };
		const passes = (neededHours: number) => butFor(legs, remaining, neededHours)[1]?.passes;
		expect(passes(90 + overHours)).toBe(true);
		expect(passes(90 + overHours + 1e-6)).toBe(false);
	});

	it('is less than what is left for a leg that used less than it was allowed', () => {
		const { legs, remainingHours } = assessed([-5, 0]);
		expect(legs[0]?.overHours).toBeLessThan(0);
		const [first] = butFor(legs, remainingHours, 0);
		expect(first?.remainingHours.value).toBeLessThan(remainingHours.value);
	});

	it('is not said of a leg without an allowance', () => {
		const { legs, remainingHours } = assessed([0, 10]);
		const bare = legs.map((leg) => ({ ...leg, overHours: null }));
		expect(butFor(bare, remainingHours, 0)).toEqual([]);
		expect(butFor([], remainingHours, 0)).toEqual([]);
	});

	it('of all legs together is the load that kept to its plan', () => {
		const held = fc.array(fc.integer({ min: -5, max: 20 }), { minLength: 1, maxLength: 6 });
		fc.assert(
			fc.property(held, (celsius) => {
				const { legs, remainingHours } = assessed(celsius);
				const all = butFor(legs, remainingHours, 0).reduce(
					(sum, one) => sum + (one.remainingHours.value - remainingHours.value),
					remainingHours.value
				);
				// Each leg was allowed its ten hours at the reference.
				expect(all).toBeCloseTo(336 - celsius.length * 10, 6);
			}),
			{ numRuns: 40 }
		);
	});
});
