import { describe, expect, it } from 'vitest';
import { assess } from '../../src/lib/domain/receiving/assess';
import { forecastAt } from '../../src/lib/domain/receiving/forecast';
import { rateAt } from '../../src/lib/domain/shelf-life/rate-curve';
import { buildInput, buildSpec, buildTrace, dayHours, startMs } from './build';

// Relative rate of spoilage of fresh fish, (1 + 0.1 T)². Source: FAO Fisheries Technical Paper 348 (Huss 1995), 6.1.
const fish = buildSpec({ model: { kind: 'square-root', minCelsius: -10 } });

describe('the square-root model of fresh fish', () => {
	const table = [
		[-5, 0.25],
		[-2, 0.64],
		[-1, 0.81],
		[0, 1],
		[1, 1.21],
		[2, 1.44],
		[4, 1.96],
		[5, 2.25],
		[8, 3.24],
		[10, 4],
		[15, 6.25],
		[20, 9]
	] as const;

	it.each(table)('runs at %d °C at %d times the rate in ice', (celsius, rate) => {
		expect(rateAt(fish, celsius)).toBeCloseTo(rate, 12);
	});

	it('stands still at and below −10 °C instead of rising again', () => {
		expect(rateAt(fish, -10)).toBe(0);
		expect(rateAt(fish, -15)).toBe(0);
		expect(rateAt(fish, -40)).toBe(0);
	});

	it('uses nothing while it is colder than that, and its exact part of a line that crosses it', () => {
		expect(assess(buildInput(buildTrace([-20, -12], 600), fish)).usedHours.value).toBe(0);
		// From −20 to 0 °C in 20 h: ten hours at nothing, then ∫u² over u 0…1 for 10 h.
		expect(assess(buildInput(buildTrace([-20, 0], 1200), fish)).usedHours.value).toBeCloseTo(10 / 3, 12);
	});

	it('prints the lives of fish in ice', () => {
		// Source: FAO 348, table of life in ice against 5 and 10 °C: ÷ 2.25 and ÷ 4.
		const lives = [
			[6, 2.67, 1.5],
			[10, 4.44, 2.5],
			[14, 6.22, 3.5],
			[18, 8, 4.5]
		] as const;
		for (const [inIce, atFive, atTen] of lives) {
			expect(inIce / rateAt(fish, 5)).toBeCloseTo(atFive, 2);
			expect(inIce / rateAt(fish, 10)).toBeCloseTo(atTen, 2);
		}
	});
});

describe('published predictions', () => {
	it('turns 21 d at 5 °C into 47.2 d at 0 °C by the square root and 46.4 d by Arrhenius', () => {
		// Source: Technical University of Denmark, relative-rate-of-spoilage help, generic models (Ea 100 kJ/mol).
		const arrhenius = buildSpec({ model: { kind: 'arrhenius', activationEnergyKilojoulesPerMole: 100 } });
		expect(Math.abs(21 * rateAt(fish, 5) - 47.2)).toBeLessThan(0.1);
		expect(Math.abs(21 * rateAt(arrhenius, 5) - 46.4)).toBeLessThan(0.1);
		// The same page: at 15 °C Arrhenius is considerably shorter.
		expect((21 * rateAt(fish, 5)) / rateAt(fish, 15)).toBeCloseTo(7.56, 2);
		expect((21 * rateAt(arrhenius, 5)) / rateAt(arrhenius, 15)).toBeCloseTo(4.68, 2);
	});

	it('predicts what is left of cold-smoked salmon after a change of temperature', () => {
		// Source: Dalgaard, Murillo, Jørgensen 2004: ln rate = 0.089 T, 36.5 d at 5 °C; 8.9 d at one temperature, then the
		// other. Observed 20.0 and 25 d in all, predicted 20 and 24.
		const model = { kind: 'constant-q10', q10: 2.435129651289 } as const;
		const salmon = buildSpec({ model, referenceCelsius: 5, fullLifeHours: 36.5 * dayHours });
		const totalDays = (firstCelsius: number, thenCelsius: number) => {
			const spent = assess(buildInput(buildTrace([firstCelsius, firstCelsius], 8.9 * 24 * 60), salmon));
			const rest = forecastAt(salmon, spent.remainingHours, startMs, thenCelsius);
			return 8.9 + (rest?.lastsHours.value ?? NaN) / dayHours;
		};
		expect(totalDays(5, 15)).toBeCloseTo(20.23, 1);
		expect(Math.abs(totalDays(5, 15) - 20)).toBeLessThan(0.5);
		expect(totalDays(15, 5)).toBeCloseTo(23.73, 1);
		expect(Math.abs(totalDays(15, 5) - 24)).toBeLessThan(0.5);
	});

	it('agrees with the ratios of crab, salmon, bream and cod at 5 and 10 °C', () => {
		// Source: FAO 348, 6.1: 0 °C life over 5 and 10 °C life; a band, for the model is one line for all fish.
		for (const ratio of [10.1 / 5.5, 11.8 / 8, 14 / 6])
			expect(Math.abs(ratio - rateAt(fish, 5))).toBeLessThan(0.8);
		for (const ratio of [10.1 / 2.6, 11.8 / 3, 32 / 8, 14 / 3]) {
			expect(Math.abs(ratio - rateAt(fish, 10))).toBeLessThan(0.7);
		}
	});
});
