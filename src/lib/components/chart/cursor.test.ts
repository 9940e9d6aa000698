import { describe, expect, it } from 'vitest';
import { nearestIndex, panTo, stepLeg, zoomAround } from './cursor';

const minute = 60_000;
const whole = { fromMs: 0, toMs: 1000 * minute };

describe('the crosshair', () => {
	it('goes to the nearest reading, the earlier of two as near', () => {
		expect(nearestIndex([0, 10, 20], 14)).toBe(1);
		expect(nearestIndex([0, 10, 20], 15)).toBe(1);
		expect(nearestIndex([0, 10, 20], 16)).toBe(2);
		expect(nearestIndex([0, 10, 20], -99)).toBe(0);
		expect(nearestIndex([0, 10, 20], 99)).toBe(2);
		expect(nearestIndex([5], 99)).toBe(0);
	});

	it('steps from leg to leg and stops at the last', () => {
		expect(stepLeg([0, 50, 90], 60, 1)).toBe(90);
		expect(stepLeg([0, 50, 90], 60, -1)).toBe(50);
		expect(stepLeg([0, 50, 90], 50, -1)).toBe(0);
		expect(stepLeg([0, 50, 90], 90, 1)).toBeNull();
	});
});

describe('the zoom', () => {
	it('keeps the instant under the crosshair in its place', () => {
		expect(zoomAround(whole, whole, 250 * minute, 0.5)).toEqual({ fromMs: 125 * minute, toMs: 625 * minute });
	});

	it('never leaves the whole and never goes under ten minutes', () => {
		expect(zoomAround({ fromMs: 0, toMs: 500 * minute }, whole, 0, 4)).toEqual(whole);
		expect(zoomAround({ fromMs: 0, toMs: 100 * minute }, whole, 100 * minute, 2)).toEqual({
			fromMs: 0,
			toMs: 200 * minute
		});
		const least = zoomAround({ fromMs: 0, toMs: 12 * minute }, whole, 6 * minute, 0.1);
		expect(least.toMs - least.fromMs).toBe(10 * minute);
	});

	it('follows the crosshair out of view', () => {
		const view = { fromMs: 100 * minute, toMs: 200 * minute };
		expect(panTo(view, whole, 150 * minute)).toBe(view);
		expect(panTo(view, whole, 220 * minute)).toEqual({ fromMs: 120 * minute, toMs: 220 * minute });
		expect(panTo(view, whole, 0)).toEqual({ fromMs: 0, toMs: 100 * minute });
	});
});
