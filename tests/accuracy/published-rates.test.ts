import { describe, expect, it } from 'vitest';
import { q10FromTwoLives } from '../../src/lib/domain/shelf-life/rate-q10';
import { rateAt } from '../../src/lib/domain/shelf-life/rate-curve';
import type { RateModel } from '../../src/lib/domain/shelf-life/spec';
import { computeLifeOf } from '../../src/lib/server/specs/compute-life';
import { buildSpec } from './build';

const q10 = (factor: number): RateModel => ({ kind: 'constant-q10', q10: factor });
const near = (ours: number, printed: number, decimals: number) =>
	expect(Math.abs(ours - printed)).toBeLessThanOrEqual(0.51 * 10 ** -decimals);

describe('relative rates of spoilage', () => {
	it('of tropical fish are e^(0.12 T)', () => {
		// Source: Dalgaard & Huss 1997; from memory, but for the formula, which gives the figures.
		const spec = buildSpec({ model: q10(Math.exp(1.2)) });
		const printed = [
			[-5, 0.549],
			[-2, 0.787],
			[-1, 0.887],
			[0, 1],
			[1, 1.127],
			[2, 1.271],
			[4, 1.616],
			[5, 1.822],
			[8, 2.612],
			[10, 3.32],
			[15, 6.05],
			[20, 11.023]
		] as const;
		for (const [celsius, rate] of printed) near(rateAt(spec, celsius), rate, 3);
	});

	it('of cold-smoked salmon in vacuum are e^(0.089 T)', () => {
		// Source: Dalgaard, Murillo & Jørgensen 2004, valid 0 to 25 °C.
		const spec = buildSpec({ model: q10(Math.exp(0.89)) });
		const printed = [
			[0, 1],
			[1, 1.093],
			[2, 1.195],
			[4, 1.428],
			[8, 2.038],
			[10, 2.435],
			[15, 3.8],
			[20, 5.93]
		] as const;
		for (const [celsius, rate] of printed) near(rateAt(spec, celsius), rate, 3);
	});

	it('of the cardinal form follow from its least temperature', () => {
		// Source: Mejlholm & Dalgaard (from memory): 0.419 h⁻¹ at 25 °C, Tmin −2.83 °C. Arithmetic, never a verdict.
		const spec = buildSpec({ model: { kind: 'square-root', minCelsius: -2.83 }, referenceCelsius: 25 });
		const printed = [
			[0, 0.004333],
			[4, 0.025236],
			[5, 0.033167],
			[8, 0.063452],
			[10, 0.089051],
			[25, 0.419]
		] as const;
		for (const [celsius, perHour] of printed) near(0.419 * rateAt(spec, celsius), perHour, 6);
	});
});

describe('accelerated ageing', () => {
	// Source: ASTM F1980, AAF = Q10^((TAA − TRT)/10); days for one year of 365.
	it.each([
		[55, 22, 2, 9.8492, 37.06],
		[55, 23, 2, 9.1896, 39.72],
		[55, 25, 2, 8, 45.63],
		[60, 22, 2, 13.9288, 26.2],
		[50, 25, 2, 5.6569, 64.52],
		[55, 22, 1.8, 6.9566, 52.47]
	])('at %d °C for %d °C by a Q10 of %d is %d-fold', (aged, room, factor, times, days) => {
		const spec = buildSpec({ model: q10(factor), referenceCelsius: room });
		near(rateAt(spec, aged), times, 4);
		near(365 / rateAt(spec, aged), days, 2);
	});
});

describe('Q10 and activation energy', () => {
	// Source: Ea = R·T1·T2·ln(Q10)/10 with R 8.314462618 J/(mol·K) (CODATA 2018) and 273.15.
	it.each([
		[1.5, 26.074, 29.96],
		[2, 44.574, 51.216],
		[2.5, 58.923, 67.704],
		[3, 70.647, 81.176],
		[4, 89.147, 102.432]
	])('of %d are the same over their own ten degrees only', (factor, energyAt0, energyAt20) => {
		const ratio = (energy: number, from: number) =>
			rateAt(
				buildSpec({
					model: { kind: 'arrhenius', activationEnergyKilojoulesPerMole: energy },
					referenceCelsius: from
				}),
				from + 10
			);
		expect(ratio(energyAt0, 0)).toBeCloseTo(factor, 4);
		expect(ratio(energyAt20, 20)).toBeCloseTo(factor, 4);
		expect(Math.abs(ratio(energyAt0, 20) - factor)).toBeGreaterThan(0.01);
	});
});

describe('Q10 implied by printed lives', () => {
	it.each([
		// Source: UC Davis Postharvest Center fact sheets, with the short end of 21 to 28 d.
		['broccoli, 21 d at 0 and 5 d at 10 °C', 0, 21, 10, 5, 4.2],
		['crisphead lettuce, 21 d at 0 and 14 d at 5 °C', 0, 21, 5, 14, 2.25],
		// Source: International Institute of Refrigeration, 3rd ed. 1986, months at −18 and −12 °C.
		['lean fish', -18, 9, -12, 4, 3.86],
		['peas', -18, 24, -12, 6, 10.08],
		// Source: university extension rule, weeks at 33 and 72 °F.
		['60 weeks at 33 °F and 4 at 72 °F', 5 / 9, 60, 200 / 9, 4, 3.49]
	])('%s', (_, cold, long, warm, short, printed) => {
		const found = q10FromTwoLives({ celsius: cold, lifeHours: long }, { celsius: warm, lifeHours: short });
		near(found, printed, 2);
	});
});

describe('a load through four hands, asked for by another program', () => {
	// Source: FAO Fisheries Technical Paper 348, 6.1: cod, 14 d at 0 °C, rate (1 + 0.1 T)²: 24 h at 0, 48 h at 4, 6 h at
	// 10 and 12 h at 2 °C are 1, 3.92, 1 and 0.72 of its days.
	const legs = [
		[24, 0],
		[48, 4],
		[6, 10],
		[12, 2]
	] as const;
	const model = { kind: 'squareRoot', minCelsius: -10, referenceCelsius: 0, lifeHours: 336 };
	const ask = (order: readonly (readonly [number, number])[]) => {
		let seconds = 0;
		const readings = order.flatMap(([hours, celsius]) => [
			[seconds, celsius],
			[(seconds += hours * 3600), celsius]
		]);
		return computeLifeOf({ model, readings, limits: { above: [2], below: [2] } });
	};

	it('uses 6.64 of 14 days exactly, jump for jump', () => {
		const answer = ask(legs);
		expect(answer.usedHours).toBeCloseTo(6.64 * 24, 11);
		expect(answer.usedFraction).toBeCloseTo(6.64 / 14, 13);
		[1, 4.92, 5.92, 6.64].forEach((days, i) =>
			expect(answer.usedFractionAtReading[2 * i + 1]).toBeCloseTo(days / 14, 13)
		);
		expect(answer.secondsAbove).toEqual({ '2': 54 * 3600 });
		expect(answer.secondsBelow).toEqual({ '2': 24 * 3600 });
		expect(answer.meanCelsius).toBeCloseTo((48 * 4 + 60 + 24) / 90, 12);
	});

	it('uses the same whatever the order of its legs', () => {
		expect(ask([...legs].reverse()).usedHours).toBeCloseTo(ask(legs).usedHours, 11);
	});
});
