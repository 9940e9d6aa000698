import { describe, expect, it } from 'vitest';
import { arithmeticMean, extremesOf, timeWeightedMean } from './statistics';

describe('extremes', () => {
	it('are where they first stand', () => {
		expect(extremesOf([3, -1, 7, 7, -1])).toEqual({ min: -1, minAt: 1, max: 7, maxAt: 2 });
		expect(extremesOf([5])).toEqual({ min: 5, minAt: 0, max: 5, maxAt: 0 });
	});

	it('are none of nothing', () => {
		expect(extremesOf([])).toBeNull();
	});
});

describe('the arithmetic mean', () => {
	it('is over readings, whatever lies between them', () => {
		// Source: GS1 EPCIS 2.0 repository, JSON/WithSensorData, example 2: 26.0, 26.1, 26.2 have the mean 26.1.
		expect(arithmeticMean([26, 26.1, 26.2])).toBeCloseTo(26.1, 12);
	});

	it('is none of nothing', () => {
		expect(arithmeticMean([])).toBeNull();
	});
});

describe('the mean over time', () => {
	it('is linear between readings', () => {
		expect(timeWeightedMean([0, 10], [0, 10])).toBe(5);
		expect(timeWeightedMean([0, 10, 40], [0, 10, 10])).toBe(8.75);
	});

	it('leaves out the steps it is told to', () => {
		expect(timeWeightedMean([0, 10, 40], [0, 10, 100], (step) => step === 0)).toBe(5);
	});

	it('is the reading itself where there is one', () => {
		expect(timeWeightedMean([0], [4.5])).toBe(4.5);
		expect(timeWeightedMean([], [])).toBeNull();
	});
});
