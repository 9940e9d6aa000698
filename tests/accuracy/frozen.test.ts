import { describe, expect, it } from 'vitest';
import { assess } from '../../src/lib/domain/receiving/assess';
import { q10FromTwoLives } from '../../src/lib/domain/shelf-life/rate-q10';
import { rateAt } from '../../src/lib/domain/shelf-life/rate-curve';
import { buildInput, buildLimit, buildSpec, buildTrace } from './build';

const monthHours = 730;
const months = (celsius: number, count: number) => ({ celsius, lifeHours: count * monthHours });

describe('practical storage life of frozen food', () => {
	// Source: IIR, Recommendations for the Processing and Handling of Frozen Foods, 3rd ed. 1986: months at −12, −18 and
	// −24 °C. Entries printed with ">" are censored and are no points.
	const table = [
		['beef cuts', 8, 18, 24, 3.86, 1.62],
		['pork cuts', 6, 10, 15, 2.34, 1.97],
		['ice cream', 1, 6, 24, 19.8, 10.1]
	] as const;

	it.each(table)('of %s implies its Q10', (_, at12, at18, at24, upper, lower) => {
		expect(q10FromTwoLives(months(-18, at18), months(-12, at12))).toBeCloseTo(upper, 1);
		expect(q10FromTwoLives(months(-24, at24), months(-18, at18))).toBeCloseTo(lower, 1);
	});

	it.each(table)('of %s is straight in its logarithm between the points', (_, at12, at18, at24) => {
		const points = [months(-24, at24), months(-18, at18), months(-12, at12)];
		const spec = buildSpec({ model: { kind: 'life-table', points }, referenceCelsius: -18 });
		expect(at18 / rateAt(spec, -24)).toBeCloseTo(at24, 9);
		expect(at18 / rateAt(spec, -12)).toBeCloseTo(at12, 9);
		expect(at18 / rateAt(spec, -15)).toBeCloseTo(Math.sqrt(at18 * at12), 9);
		expect(at18 / rateAt(spec, -21)).toBeCloseTo(Math.sqrt(at18 * at24), 9);
	});

	it('of white fish has the Q10 of the table it was read from', () => {
		// Source: Tímarit Verkfræðingafélags Íslands 1967, p. 85 (Reay, Banks & Cutting 1950): good 8, 4 and 1 months at
		// −29, −21 and −9 °C.
		expect(q10FromTwoLives(months(-21, 4), months(-9, 1))).toBeCloseTo(3.17, 2);
		expect(q10FromTwoLives(months(-29, 8), months(-21, 4))).toBeCloseTo(2.38, 2);
		// The same page: cod protein, 15 weeks at −14 °C against about 9 years at −29 °C.
		const weeks = (celsius: number, count: number) => ({ celsius, lifeHours: count * 168 });
		expect(q10FromTwoLives(weeks(-29, (9 * 365.25) / 7), weeks(-14, 15))).toBeCloseTo(9.93, 1);
	});
});

describe('the quick-frozen limit', () => {
	// Source: Directive 89/108/EEC art. 5: −18 °C or lower, brief upward fluctuations of no more than 3 °C in transport.
	const spec = buildSpec({
		referenceCelsius: -18,
		upper: buildLimit(-18, { graceMinutes: 60, graceMinutesInAll: 240 }),
		ceilingCelsius: -15
	});
	const judged = (celsius: readonly number[]) => {
		const { excursions, stops } = assess(buildInput(buildTrace(celsius), spec));
		return { excursions: excursions.length, stops: stops.length };
	};
	const held = (celsius: number) => Array.from({ length: 60 }, () => celsius);

	it('passes −18.0 and fails −17.9 held', () => {
		expect(judged(held(-18))).toEqual({ excursions: 0, stops: 0 });
		expect(judged(held(-17.9))).toEqual({ excursions: 1, stops: 0 });
	});

	it('passes a brief peak of −15.0 and fails one of −14.9', () => {
		expect(judged([...held(-18), -15, ...held(-18)])).toEqual({ excursions: 0, stops: 0 });
		expect(judged([...held(-18), -14.9, ...held(-18)])).toEqual({ excursions: 0, stops: 1 });
	});

	it('does not take 0 °F for −18 °C', () => {
		// 0 °F is −17.78 °C: a load held there is too warm.
		const trace = { ...buildTrace(held(0)), unit: 'fahrenheit' as const };
		expect(assess(buildInput(trace, spec)).excursions).toHaveLength(1);
	});
});
