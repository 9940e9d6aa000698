import { describe, expect, it } from 'vitest';
import { q10FromTwoRates } from '../shelf-life/rate-q10';
import { rateAt } from '../shelf-life/rate-curve';
import { validateSpec } from '../shelf-life/validate';
import { findStartingSpec, listStartingSpecs } from './list-starting-specs';
import { specFromStarting } from './starting-spec';

const own = { neededHours: 1, openingDefaultHours: 1, upper: null, lower: null };
const all = listStartingSpecs();
const monthHours = (365.25 / 12) * 24;

function specOf(key: string) {
	const starting = findStartingSpec(key);
	if (!starting) throw new Error(`no starting spec ${key}`);
	return specFromStarting(starting, own);
}
/** Life at a temperature, by the spec itself. */
function lifeHoursAt(key: string, celsius: number): number {
	const spec = specOf(key);
	return spec.fullLifeHours / rateAt(spec, celsius);
}
const near = (ours: number, printed: number, within: number) =>
	expect(Math.abs(ours - printed)).toBeLessThanOrEqual(within);

describe('the starting specs', () => {
	it('are about thirty, each once, by name', () => {
		expect(all.length).toBeGreaterThanOrEqual(30);
		const keys = all.map(({ key }) => key);
		expect(new Set(keys).size).toBe(keys.length);
		expect(keys).toEqual([...keys].sort());
		for (const key of keys) expect(key).toMatch(/^[a-z]+(-[a-z]+)*$/);
		expect(findStartingSpec('moon-cheese')).toBeNull();
	});

	it.each(all)('$key is a spec without a fault once the receiver’s figures are in', (starting) => {
		expect(validateSpec(specFromStarting(starting, own))).toEqual([]);
	});

	it.each(all)('$key names its sources and its caution, and no need or limit of anybody’s', ({ figures }) => {
		expect(figures.sources.length).toBeGreaterThanOrEqual(2);
		for (const { text } of figures.sources) expect(text.length).toBeGreaterThan(10);
		expect(figures.caution).toMatch(/does not assess safety\./);
		for (const field of ['neededHours', 'openingDefaultHours', 'upper', 'lower'])
			expect(figures).not.toHaveProperty(field);
		expect(figures.freezingCelsius ?? -Infinity).toBeLessThan(figures.referenceCelsius);
	});

	it.each(all)('$key gives its own published lives back', ({ key, figures }) => {
		for (const { point, lifeHoursHigh } of figures.sources) {
			if (!point || figures.model.kind === 'square-root') continue;
			const [low, high] = [point.lifeHours, lifeHoursHigh ?? point.lifeHours];
			const life = lifeHoursAt(key, point.celsius);
			expect(life).toBeGreaterThanOrEqual(low * (1 - 1e-12));
			expect(life).toBeLessThanOrEqual(high * (1 + 1e-12));
		}
	});
});

describe('produce', () => {
	// Source: USDA Agriculture Handbook 66, Respiratory metabolism, summary table, Q10 of 0–10 and 10–20 °C; the lives
	// from the handbook's and UC Davis's storage tables, days at the reference.
	it.each([
		['apples-fall', 3.0, 2.22, 61, 122, -1.5],
		['asparagus', 3.58, 1.26, 14, 21, -0.6],
		['blueberries', 4.83, 2.41, 7, 14, -1.3],
		['cabbage', 3.6, 2.33, 91, 183, -0.9],
		['cauliflower', 2.0, 2.32, 21, 21, -0.8],
		['table-grapes', 4.33, 2.08, 7, 28, -2.7],
		['mushrooms', 2.69, 2.72, 7, 14, -0.9],
		['raspberries', 2.06, 3.57, 2, 5, -0.9],
		['snap-beans', 2.9, 2.24, 8, 12, -0.7],
		['spinach', 5.24, 2.09, 10, 14, -0.3],
		['strawberries', 4.69, 2.0, 7, 7, -0.8],
		['sweet-corn', 2.56, 2.49, 4, 6, -0.6]
	])(
		'%s ages by the published Q10 and keeps as long as printed',
		(key, lower, upper, least, most, freezing) => {
			const spec = { ...specOf(key), chillingCelsius: null };
			near(rateAt(spec, 10) / rateAt(spec, 0), lower, 0.0051);
			near(rateAt(spec, 20) / rateAt(spec, 10), upper, 0.0051);
			near((spec.fullLifeHours - spec.fullLifeUncertaintyHours) / 24, least, 0.5);
			near((spec.fullLifeHours + spec.fullLifeUncertaintyHours) / 24, most, 0.5);
			expect(spec.freezingCelsius).toBe(freezing);
		}
	);

	it.each([
		['broccoli', [28, 14, 5], [19.799, 8.3666]],
		['lettuce-crisphead', [28, 14], [19.799]]
	] as const)('%s has its fact sheet’s table, log-linear between', (key, lives, between) => {
		// Source: UC Davis Postharvest Center: 0, 5 and 10 °C; between, 28 (14/28)^½ and 14 (5/14)^½.
		lives.forEach((days, i) => near(lifeHoursAt(key, i * 5) / 24, days, 1e-9));
		between.forEach((days, i) => near(lifeHoursAt(key, i * 5 + 2.5) / 24, days, 5e-4));
	});

	it('earns no credit below a chilling threshold', () => {
		expect(lifeHoursAt('snap-beans', 1)).toBe(lifeHoursAt('snap-beans', 7));
		expect(lifeHoursAt('asparagus', 0)).toBe(lifeHoursAt('asparagus', 2));
	});
});

describe('fish', () => {
	// Source: FAO Fisheries Technical Paper 348, 6.1: days at 0 °C, and the general ratios 2.25 at 5 and 4 at 10 °C.
	it.each([
		['cod-packed', 14],
		['salmon-fresh', 11.8],
		['sea-bream', 32],
		['crab-claws', 10.1]
	])('%s keeps %d days in ice, by the general ratio beyond', (key, days) => {
		near(lifeHoursAt(key, 0) / 24, days, 1e-9);
		near(days / (lifeHoursAt(key, 5) / 24), 2.25, 1e-9);
		near(days / (lifeHoursAt(key, 10) / 24), 4, 1e-9);
		expect(lifeHoursAt(key, -3)).toBe(lifeHoursAt(key, -1));
	});

	it.each([
		['cod-packed', 5, 6],
		['cod-packed', 10, 3],
		['salmon-fresh', 10, 3],
		['sea-bream', 10, 8],
		['crab-claws', 10, 2.6]
	])('%s at %d °C is within a fifth of its own measured %d days', (key, celsius, days) => {
		near(lifeHoursAt(key, celsius) / 24 / days, 1, 0.2);
	});

	it('cold-smoked salmon has the published rates', () => {
		// Source: Dalgaard, Murillo & Jørgensen 2004: ln of the relative rate is 0.089 T: e^0.445 and e^1.335.
		const rate = (celsius: number) =>
			rateAt({ ...specOf('salmon-cold-smoked'), referenceCelsius: 0 }, celsius);
		near(rate(5), 1.5605, 5e-5);
		near(rate(15), 3.8, 5e-5);
	});
});

describe('frozen goods', () => {
	// Source: International Institute of Refrigeration, Recommendations, 3rd ed. 1986: months at −24, −18 and −12 °C;
	// what is printed as "more than" is null here and no point there.
	it.each([
		['beef-cuts-frozen', 24, 18, 8],
		['ground-beef-frozen', 15, 10, 6],
		['lamb-cuts-frozen', 24, 18, 12],
		['pork-cuts-frozen', 15, 10, 6],
		['chicken-frozen', null, 18, 9],
		['turkey-frozen', null, 15, 8],
		['fatty-fish-glazed-frozen', null, 5, 3],
		['lean-fish-frozen', null, 9, 4],
		['shrimp-cooked-and-peeled-frozen', null, 5, 2],
		['green-beans-frozen', null, 15, 4],
		['peas-frozen', null, 24, 6],
		['broccoli-frozen', 24, 15, null],
		['spinach-frozen', null, 18, 4],
		['strawberries-and-raspberries-frozen', null, 24, 5],
		['ice-cream', 24, 6, 1]
	])('%s keeps as long as printed', (key, at24, at18, at12) => {
		near(lifeHoursAt(key, -18) / monthHours, at18, 1e-9);
		if (at24 !== null) near(lifeHoursAt(key, -24) / monthHours, at24, 1e-9);
		if (at12 !== null) near(lifeHoursAt(key, -12) / monthHours, at12, 1e-9);
		const { validFromCelsius, validToCelsius } = specOf(key);
		expect([validFromCelsius, validToCelsius]).toEqual([
			at24 === null ? -18 : -24,
			at12 === null ? -18 : -12
		]);
	});

	it.each([
		['beef-cuts-frozen', 3.86, 1.62],
		['pork-cuts-frozen', 2.34, 1.97],
		['ice-cream', 19.8, 10.1]
	])('%s has the implied Q10 of its table', (key, upper, lower) => {
		near(q10FromTwoRates(-18, 1 / lifeHoursAt(key, -18), -12, 1 / lifeHoursAt(key, -12)), upper, 0.06);
		near(q10FromTwoRates(-24, 1 / lifeHoursAt(key, -24), -18, 1 / lifeHoursAt(key, -18)), lower, 0.06);
	});
});
