import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildSpec, hourMs, startMs } from '../../../../tests/accuracy/build';
import { rateBounds } from '../shelf-life/rate-bounds';
import { rateCurve } from '../shelf-life/rate-curve';
import type { OpeningBalance } from './assessment';
import { openingHours } from './opening';

const spec = buildSpec({ openingDefaultHours: 48 });
const curve = rateCurve(spec);
const openingOf = (opening: OpeningBalance, firstReadingMs = startMs) =>
	openingHours(opening, spec, curve, firstReadingMs);
const computed = (hours: number, celsius: number, plusMinusCelsius = 0): OpeningBalance => ({
	kind: 'computed',
	sinceMs: startMs - hours * hourMs,
	celsius,
	plusMinusCelsius,
	basis: 'picked in the morning'
});

describe('the opening balance', () => {
	it.each([
		[12, 0, { value: 12, low: 12, high: 12 }],
		[12, 4, { value: 12, low: 8, high: 16 }],
		[0, 0, { value: 0, low: 0, high: 0 }],
		// Nothing less than nothing was used.
		[2, 6, { value: 2, low: 0, high: 8 }]
	])('declared as %d ± %d h is that', (hours, plusMinusHours, expected) => {
		expect(openingOf({ kind: 'declared', hours, plusMinusHours, basis: 'note' })).toEqual(expected);
	});

	it.each([
		// Q10 of 3, by its definition: ten hours at 0 °C are ten, at 10 °C thirty, at 20 °C ninety.
		[10, 0, 0, { value: 10, low: 10, high: 10 }],
		[10, 10, 0, { value: 30, low: 30, high: 30 }],
		[10, 10, 10, { value: 30, low: 10, high: 90 }],
		[0, 20, 5, { value: 0, low: 0, high: 0 }]
	])('computed over %d h at %d ± %d °C is the life they use', (hours, celsius, plusMinus, expected) => {
		const found = openingOf(computed(hours, celsius, plusMinus));
		expect(found.value).toBeCloseTo(expected.value, 12);
		expect(found.low).toBeCloseTo(expected.low, 12);
		expect(found.high).toBeCloseTo(expected.high, 12);
	});

	it('computed from a time after the first reading is nothing', () => {
		expect(openingOf(computed(-3, 10, 2))).toEqual({ value: 0, low: 0, high: 0 });
	});

	it('computed is wider by the model’s own ±', () => {
		const unsure = buildSpec({ sensitivityPlusMinus: 1 });
		const bounds = rateBounds(unsure);
		const found = openingHours(computed(10, 10), unsure, rateCurve(unsure), startMs, bounds);
		// A Q10 of 2 to 4.
		expect(found.low).toBeCloseTo(20, 12);
		expect(found.value).toBeCloseTo(30, 12);
		expect(found.high).toBeCloseTo(40, 12);
	});

	it('undeclared is the pessimist’s, and nothing on the kind side', () => {
		expect(openingOf({ kind: 'undeclared' })).toEqual({ value: 48, low: 0, high: 48 });
	});

	it('undeclared is never kinder than an honest declaration within the default', () => {
		fc.assert(
			fc.property(fc.double({ min: 0, max: 48, noNaN: true }), (hours) => {
				const declared = openingOf({ kind: 'declared', hours, plusMinusHours: 0, basis: 'note' });
				expect(openingOf({ kind: 'undeclared' }).high).toBeGreaterThanOrEqual(declared.high);
			})
		);
	});

	it('has its low and high on either side of the figure, whatever is assumed', () => {
		const figures = fc.tuple(
			fc.double({ min: 0, max: 500, noNaN: true }),
			fc.double({ min: -20, max: 40, noNaN: true }),
			fc.double({ min: 0, max: 15, noNaN: true })
		);
		fc.assert(
			fc.property(figures, ([hours, celsius, plusMinus]) => {
				const { low, value, high } = openingOf(computed(hours, celsius, plusMinus));
				expect(low).toBeLessThanOrEqual(value);
				expect(value).toBeLessThanOrEqual(high);
			})
		);
	});
});
