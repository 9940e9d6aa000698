import { describe, expect, it } from 'vitest';
import type { Spec } from '../../domain/shelf-life/spec';
import { drawCurve } from './curve-model';
import { comparedAtCelsius, lifeHoursAt, lifeRows } from './life-at';
import { worstMisfit } from './misfit';
import { modelFigure } from './model-figure';

/** UC Davis Postharvest Center, produce fact sheet, broccoli: 21 to 28 d at 0 °C, 14 at 5 °C, 5 at 10 °C. */
const table: Spec = {
	referenceCelsius: 0,
	fullLifeHours: 672,
	fullLifeUncertaintyHours: 168,
	model: {
		kind: 'life-table',
		points: [
			{ celsius: 0, lifeHours: 672 },
			{ celsius: 5, lifeHours: 336 },
			{ celsius: 10, lifeHours: 120 }
		]
	},
	validFromCelsius: 0,
	validToCelsius: 10,
	chillingCelsius: null,
	freezingCelsius: -0.6,
	ceilingCelsius: null,
	upper: null,
	lower: null,
	neededHours: 240,
	openingDefaultHours: 96,
	mkt: { activationEnergyKilojoulesPerMole: null, windowHours: null, limitCelsius: null },
	sources: [
		{ text: 'a', point: { celsius: 0, lifeHours: 504 }, lifeHoursHigh: 672 },
		{ text: 'b', point: { celsius: 5, lifeHours: 336 }, lifeHoursHigh: null },
		{ text: 'c', point: { celsius: 10, lifeHours: 120 }, lifeHoursHigh: null }
	],
	caution: null
};
const twoLives: Spec = {
	...table,
	model: { kind: 'two-lives', lower: { celsius: 0, lifeHours: 672 }, upper: { celsius: 10, lifeHours: 120 } }
};
const cod: Spec = {
	...table,
	model: { kind: 'square-root', minCelsius: -10 },
	validFromCelsius: -10,
	sources: [],
	fullLifeHours: 336
};
const size = { width: 600, height: 400 };

describe('the curve’s picture', () => {
	it('draws the model between its ends, the held rate before and after, and what is published', () => {
		const drawing = drawCurve(table, twoLives, 'celsius', size);
		expect(drawing.line.startsWith(`M${drawing.x(0).toFixed(1)} ${drawing.y(672).toFixed(1)}`)).toBe(true);
		expect(drawing.line.endsWith(`L${drawing.x(10).toFixed(1)} ${drawing.y(120).toFixed(1)}`)).toBe(true);
		expect(drawing.heldLines.every((path) => path.startsWith('M'))).toBe(true);
		expect(drawing.otherLine).toContain('M');
		expect(drawing.entered).toHaveLength(3);
		expect(drawing.published.map((point) => [point.number, point.bottom > point.top])).toEqual([
			[1, true],
			[2, false],
			[3, false]
		]);
	});

	it('keeps every mark within the plot, warm to the right and long lives on top', () => {
		const { plot, x, y, dayTicks, celsiusTicks } = drawCurve(table, null, 'celsius', size);
		for (const celsius of [-0.6, 0, 10]) {
			expect(x(celsius)).toBeGreaterThan(plot.left);
			expect(x(celsius)).toBeLessThan(plot.right);
		}
		expect(y(672)).toBeLessThan(y(120));
		expect(dayTicks.map((tick) => tick.days)).toContain(28);
		expect(celsiusTicks.map((tick) => tick.degrees)).toContain(0);
	});

	it('is a straight line on its log scale where life is exponential', () => {
		const { x, y } = drawCurve(twoLives, null, 'celsius', size);
		const middle = lifeHoursAt(twoLives, 5) ?? 0;
		expect(y(middle)).toBeCloseTo((y(672) + y(120)) / 2, 6);
		expect(x(5)).toBeCloseTo((x(0) + x(10)) / 2, 6);
	});

	it('names whole degrees of the reader’s unit', () => {
		const { celsiusTicks, x } = drawCurve(table, null, 'fahrenheit', size);
		const freezing = celsiusTicks.find((tick) => tick.degrees === 50);
		expect(freezing?.x).toBeCloseTo(x(10), 6);
	});

	it('leaves out where life has no end', () => {
		expect(drawCurve(cod, null, 'celsius', size).line).not.toMatch(/NaN|Infinity/);
		expect(lifeHoursAt(cod, -10)).toBeNull();
	});
});

describe('life at common temperatures', () => {
	it('holds the ends of the model, the reference and what people ask about', () => {
		const rows = lifeRows(table, 'celsius');
		expect(rows.map((row) => row.celsius)).toEqual([0, 2, 4, 5, 7, 10]);
		expect(rows.map((row) => Number((row.lifeHours / 24).toFixed(1)))).toEqual([28, 21.2, 16.1, 14, 9.3, 5]);
	});

	it('is asked in round degrees of the reader’s unit', () => {
		const degrees = lifeRows(table, 'fahrenheit').map((row) => Math.round((row.celsius * 9) / 5 + 32));
		expect(degrees).toEqual([32, 34, 36, 38, 41, 45, 50]);
	});

	it('is compared at 2 °C, or at the reference where the model does not reach', () => {
		expect(comparedAtCelsius(table)).toBe(2);
		expect(
			comparedAtCelsius({ ...table, chillingCelsius: 0, validFromCelsius: 3, referenceCelsius: 5 })
		).toBe(5);
	});
});

describe('what the curve misses', () => {
	it('is nothing where it passes the published points or their range', () => {
		expect(worstMisfit(table)).toBeNull();
	});

	it('is not blamed where two sources disagree and the curve follows one', () => {
		const rival = { text: 'd', point: { celsius: 0, lifeHours: 336 }, lifeHoursHigh: 504 };
		expect(worstMisfit({ ...table, sources: [...table.sources, rival] })).toBeNull();
		expect(worstMisfit({ ...table, sources: [rival] })).toMatchObject({ source: 1, publishedHours: 504 });
	});

	it('is the published point furthest off: two lives pass 5 °C at 11.8 d where 14 are published', () => {
		const misfit = worstMisfit(twoLives);
		expect(misfit).toMatchObject({ source: 2, celsius: 5, publishedHours: 336 });
		expect(misfit?.curveHours).toBeCloseTo(Math.sqrt(672 * 120), 6);
		expect(misfit?.fraction).toBeCloseTo(-0.155, 3);
	});
});

describe('the figure a model stands on', () => {
	it('is named in the ledger of versions', () => {
		expect(modelFigure(twoLives.model, 'celsius', 'en')).toBe('Q10 5.60');
		expect(modelFigure(table.model, 'celsius', 'en')).toBe('3 points');
		expect(modelFigure(cod.model, 'fahrenheit', 'en')).toBe('Tmin 14.0 °F');
	});
});
