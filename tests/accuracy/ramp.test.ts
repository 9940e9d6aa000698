import { describe, expect, it } from 'vitest';
import { assess } from '../../src/lib/domain/receiving/assess';
import type { RateModel } from '../../src/lib/domain/shelf-life/spec';
import { buildInput, buildSpec, buildTrace } from './build';

// A straight ramp from 0 to 10 °C in 10 h, in hours at 0 °C.
// Source: calculus; ∫(1+0.1T)² dt = 70/3, ∫3^(T/10) dt = 20/ln 3, ∫2^(T/10) dt = 10/ln 2, ∫e^(0.12T) dt = (e^1.2−1)/0.12.
const ramps: readonly { readonly model: RateModel; readonly name: string; readonly hours: number }[] = [
	{ name: 'square root', model: { kind: 'square-root', minCelsius: -10 }, hours: 70 / 3 },
	{ name: 'Q10 of 3', model: { kind: 'constant-q10', q10: 3 }, hours: 20 / 1.0986122886681098 },
	{ name: 'Q10 of 2', model: { kind: 'constant-q10', q10: 2 }, hours: 10 / 0.6931471805599453 },
	// Tropical fish, e^(0.12 T). Source: Dalgaard & Huss 1997. Q10 = e^1.2.
	{ name: 'e^(0.12T)', model: { kind: 'constant-q10', q10: 3.3201169227365472 }, hours: 19.334307689 }
];

describe('a straight ramp', () => {
	for (const { name, model, hours } of ramps) {
		for (const everyMinutes of [6, 12, 60, 600]) {
			it(`uses its exact integral by ${name}, read every ${everyMinutes} min`, () => {
				const count = 600 / everyMinutes + 1;
				const celsius = Array.from({ length: count }, (_, i) => (10 * i) / (count - 1));
				const { usedHours } = assess(buildInput(buildTrace(celsius, everyMinutes), buildSpec({ model })));
				expect(Math.abs(usedHours.value - hours)).toBeLessThan(1e-8);
			});
		}
	}

	it('uses the same falling as rising', () => {
		for (const { model } of ramps) {
			const rising = assess(buildInput(buildTrace([0, 10], 600), buildSpec({ model })));
			const falling = assess(buildInput(buildTrace([10, 0], 600), buildSpec({ model })));
			expect(falling.usedHours.value).toBe(rising.usedHours.value);
		}
	});
});
