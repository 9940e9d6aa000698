import { describe, expect, it } from 'vitest';
import { assess } from '../../src/lib/domain/receiving/assess';
import { activationEnergyFromLives } from '../../src/lib/domain/shelf-life/rate-arrhenius';
import { rateAt } from '../../src/lib/domain/shelf-life/rate-curve';
import { buildInput, buildSpec, buildTrace, dayHours } from './build';

const days = (celsius: number, count: number) => ({ celsius, lifeHours: count * dayHours });

describe('vaccine vial monitor categories', () => {
	// Source: WHO specification E6/IN5: end points in days at 37 and at 25 °C (VVM2: 37 and 5 °C).
	it.each([
		['VVM30', days(25, 193), days(37, 30), 119.27],
		['VVM14', days(25, 90), days(37, 14), 119.22],
		['VVM7', days(25, 45), days(37, 7), 119.22],
		['VVM2', days(5, 225), days(37, 2), 105.86]
	] as const)('%s has the activation energy of its two end points', (_, lower, upper, expected) => {
		expect(Math.abs(activationEnergyFromLives(lower, upper) - expected)).toBeLessThan(0.05);
	});

	it('keep at 5 °C for longer than they promise', () => {
		// Source: the same table, 5 °C: VVM30 over 4 years, VVM14 over 3, VVM7 over 2.
		for (const [at25, at37, years] of [
			[193, 30, 4],
			[90, 14, 3],
			[45, 7, 2]
		] as const) {
			const energy = activationEnergyFromLives(days(25, at25), days(37, at37));
			const model = { kind: 'arrhenius', activationEnergyKilojoulesPerMole: energy } as const;
			expect(at37 / rateAt(buildSpec({ model, referenceCelsius: 37 }), 5) / 365).toBeGreaterThan(years);
			expect(at37 / rateAt(buildSpec({ model, referenceCelsius: 37 }), 25)).toBeCloseTo(at25, 9);
		}
	});
});

describe('Arrhenius rates', () => {
	const arrhenius = (energy: number, referenceCelsius: number) =>
		buildSpec({ model: { kind: 'arrhenius', activationEnergyKilojoulesPerMole: energy }, referenceCelsius });

	it('rise from 5 to 25 °C as the equation says', () => {
		// Source: k = A e^(−Ea/RT) with R 8.314462618 J/(mol·K) (CODATA 2018) and 273.15.
		expect(rateAt(arrhenius(50, 5), 25)).toBeCloseTo(4.2643, 4);
		expect(rateAt(arrhenius(83.144, 5), 25)).toBeCloseTo(11.1523, 3);
		expect(rateAt(arrhenius(100, 5), 25)).toBeCloseTo(18.1843, 3);
		expect(rateAt(arrhenius(83.144, 25), 40)).toBeCloseTo(4.9857, 3);
	});

	it('have the Q10 of their band and no other', () => {
		// Source: Ea = R·T1·T2·ln(Q10)/10: Q10 of 2 is 44.574 kJ/mol over 0–10 °C and 51.216 over 20–30 °C.
		expect(rateAt(arrhenius(44.574, 0), 10)).toBeCloseTo(2, 4);
		expect(rateAt(arrhenius(51.216, 20), 30)).toBeCloseTo(2, 4);
		expect(rateAt(arrhenius(70.647, 0), 10)).toBeCloseTo(3, 4);
	});

	it('give 84 kJ/mol for the fruit that keeps 60 weeks at 33 °F and 4 at 72 °F', () => {
		expect(activationEnergyFromLives(days(5 / 9, 420), days(200 / 9, 28))).toBeCloseTo(84.01, 1);
	});

	it('are integrated to 1e-9 over lines of any length', () => {
		for (const energy of [30, 83.144, 119.27, 200]) {
			for (const [from, to] of [
				[4, 4.1],
				[0, 10],
				[-20, 25],
				[40, -40],
				[2, 8]
			] as const) {
				const spec = arrhenius(energy, 5);
				const { usedHours } = assess(buildInput(buildTrace([from, to], 60), spec));
				const reference = simpson((celsius) => rateAt(spec, celsius), from, to);
				expect(Math.abs(usedHours.value / reference - 1)).toBeLessThan(1e-9);
			}
		}
	});
});

/** Mean of f between a and b by Simpson's rule on so many parts that its own error is under 1e-12. */
function simpson(f: (celsius: number) => number, a: number, b: number): number {
	const parts = 4000;
	let sum = f(a) + f(b);
	for (let i = 1; i < parts; i++) sum += f(a + ((b - a) * i) / parts) * (i % 2 === 0 ? 2 : 4);
	return sum / (3 * parts);
}
