import { describe, expect, it } from 'vitest';
import type { ChartModel } from './chart-model';
import { layoutOf } from './drawing';
import { lifeScale, pointHeights, temperatureScale } from './heights';

const model: ChartModel = {
	traces: [[0], [4]],
	styles: [],
	labels: ['L1'],
	life: [[0], [9], [8], [10]],
	limits: [],
	excursions: [],
	legs: [],
	gaps: [],
	window: null,
	temperatures: { least: 0, most: 8 },
	fullDays: 18,
	neededDays: 11,
	openingHours: null
};

describe('points of the crosshair', () => {
	const layout = layoutOf(860);

	it('stand at the top of their panel for the top of the scale and halfway for the middle', () => {
		const [top] = pointHeights(model, layout, { temperature: temperatureScale(model).to, lifeDays: null });
		expect(top).toBe(layout.topPx);
		const [middle] = pointHeights(model, layout, { temperature: null, lifeDays: 9 });
		expect(middle).toBe(layout.temperaturePx + layout.lifePx / 2);
	});

	it('leave out what was not read', () => {
		expect(pointHeights(model, layout, { temperature: null, lifeDays: null })).toEqual([]);
		expect(pointHeights({ ...model, life: null }, layout, { temperature: 4, lifeDays: 9 })).toHaveLength(1);
	});
});

describe('the scale of the life panel', () => {
	it('reaches the full life, and further where the high does', () => {
		expect(lifeScale(model).to).toBe(18);
		expect(lifeScale({ ...model, life: [[0], [17], [13], [21]] }).to).toBe(21);
	});

	it('goes below zero for a life that is over-used', () => {
		expect(lifeScale({ ...model, life: [[0], [-1], [-2], [0]] }).from).toBeLessThanOrEqual(-2);
	});
});
