import { describe, expect, it } from 'vitest';
import { bareCourse } from './bare-course';
import { lifeRunsOutMs } from './life-runs-out';
import { lifeUsed } from './life-used';
import { rateCurve } from './rate-curve';
import type { RateModel } from './spec';

const hourMs = 3_600_000;
const constant: RateModel = { kind: 'constant-q10', q10: 3 };
const root: RateModel = { kind: 'square-root', minCelsius: -10 };

/** Hours after the first reading at which a life ends; null while some is left. */
function endsAt(
	readings: readonly (readonly [hours: number, celsius: number])[],
	lifeHours: number,
	model: RateModel = constant
): number | null {
	const curve = rateCurve({
		model,
		referenceCelsius: 0,
		validFromCelsius: -Infinity,
		validToCelsius: Infinity,
		chillingCelsius: null
	});
	const course = bareCourse(
		Float64Array.from(readings, ([hours]) => hours * hourMs),
		Float64Array.from(readings, ([, celsius]) => celsius)
	);
	const ms = lifeRunsOutMs(course, curve, lifeUsed(course, curve, 0, 'value'), lifeHours);
	return ms === null ? null : ms / hourMs;
}

describe('the end of a life', () => {
	it.each([
		// Held at the reference an hour is an hour, at 10 °C three by a Q10 of 3.
		[
			[
				[0, 0],
				[48, 0]
			],
			24,
			24
		],
		[
			[
				[0, 10],
				[48, 10]
			],
			24,
			8
		],
		// Two readings at one time are a jump: twelve hours, then three times as fast.
		[
			[
				[0, 0],
				[12, 0],
				[12, 10],
				[48, 10]
			],
			24,
			16
		]
	] as const)('of %j with %d h is after %d h', (readings, lifeHours, expected) => {
		expect(endsAt(readings, lifeHours)).toBeCloseTo(expected, 9);
	});

	it('lies on the line by the closed form of an exponential', () => {
		// ∫3^(T/10) dt with T = t: (3^(x/10) − 1) · 10/ln 3 = 12, so x = 10 · ln(1 + 1.2 ln 3)/ln 3.
		const expected = (10 * Math.log(1 + 1.2 * Math.log(3))) / Math.log(3);
		expect(
			endsAt(
				[
					[0, 0],
					[20, 20]
				],
				12
			)
		).toBeCloseTo(expected, 9);
		// The same line downwards: (9 − 3^((20 − x)/10)) · 10/ln 3 = 12.
		const down = 20 - (10 * Math.log(9 - 1.2 * Math.log(3))) / Math.log(3);
		expect(
			endsAt(
				[
					[0, 20],
					[20, 0]
				],
				12
			)
		).toBeCloseTo(down, 9);
	});

	it('lies on the line by the closed form of a square root', () => {
		// ∫(1 + t/10)² dt = ((1 + x/10)³ − 1) · 10/3 = 70/3 at x = 10.
		expect(
			endsAt(
				[
					[0, 0],
					[20, 20]
				],
				70 / 3,
				root
			)
		).toBeCloseTo(10, 9);
	});

	it('is none while some is left, and with the last reading where that is when it ends', () => {
		expect(
			endsAt(
				[
					[0, 0],
					[24, 0]
				],
				24.001
			)
		).toBeNull();
		expect(
			endsAt(
				[
					[0, 0],
					[24, 0]
				],
				24
			)
		).toBeCloseTo(24, 9);
		expect(endsAt([[0, 0]], 24)).toBeNull();
	});

	it('counts a trillionth that rounding left as run out', () => {
		const readings = Array.from({ length: 1001 }, (_, i) => [i * 0.1, 0] as const);
		expect(endsAt(readings, 100)).toBeCloseTo(100, 6);
		expect(endsAt(readings, 100 * (1 + 1e-9))).toBeNull();
	});

	it('is the first such instant where life then stands still', () => {
		// At and below −10 °C the square root is 0.
		const readings = [
			[0, 0],
			[10, 0],
			[10, -20],
			[90, -20]
		] as const;
		expect(endsAt(readings, 10, root)).toBeCloseTo(10, 9);
		expect(endsAt(readings, 10.01, root)).toBeNull();
	});

	it('waits where life stands still before it ends', () => {
		const readings = [
			[0, 0],
			[10, 0],
			[10, -20],
			[90, -20],
			[90, 0],
			[200, 0]
		] as const;
		expect(endsAt(readings, 11, root)).toBeCloseTo(91, 9);
	});
});
