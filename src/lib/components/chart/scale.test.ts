import { describe, expect, it } from 'vitest';
import { lifeTicks, scaleTicks } from './scale';

describe('the temperature scale', () => {
	it('ends on named ticks and leaves room below', () => {
		const scale = scaleTicks(-1.3, 11.3, 7);
		expect(scale.ticks).toEqual([-2, 0, 2, 4, 6, 8, 10, 12]);
		expect(scale.to).toBe(12);
		expect(scale.from).toBeLessThanOrEqual(-2);
	});

	it('does not blow up a trace that hardly moves', () => {
		expect(scaleTicks(4, 4.1, 6).ticks.length).toBeLessThanOrEqual(7);
	});
});

describe('the life scale', () => {
	it('starts at zero and steps by whole days', () => {
		expect(lifeTicks(10, 18, 4)).toEqual({ from: 0, to: 18, ticks: [0, 6, 12, 18] });
		expect(lifeTicks(3, 28, 4).ticks).toEqual([0, 7, 14, 21, 28]);
	});

	it('goes below zero for life that is overdrawn', () => {
		expect(lifeTicks(-2, 18, 4).from).toBe(-6);
	});
});
