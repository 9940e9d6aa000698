import { describe, expect, it } from 'vitest';
import { compensatedSum, RunningSum } from './sum';

describe('compensated sum', () => {
	it('keeps what plain addition drops', () => {
		// Source: the example of Neumaier (1974), where Kahan's sum still gives 0.
		expect(compensatedSum([1, 1e100, 1, -1e100])).toBe(2);
		expect(compensatedSum([])).toBe(0);
	});

	it('adds a million tenths to the last place', () => {
		const sum = new RunningSum();
		for (let i = 0; i < 1_000_000; i++) sum.add(0.1);
		expect(sum.total).toBe(100_000);
	});

	it('gives the running total at any time', () => {
		const sum = new RunningSum();
		expect(sum.total).toBe(0);
		sum.add(0.25);
		expect(sum.total).toBe(0.25);
		sum.add(0.5);
		expect(sum.total).toBe(0.75);
	});
});
