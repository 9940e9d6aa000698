import { describe, expect, it } from 'vitest';
import { spreadLabels } from './spread-labels';

describe('labels in the gutter', () => {
	it('stay where they are when there is room', () => {
		expect(spreadLabels([10, 40, 80], 14)).toEqual([10, 40, 80]);
	});

	it('give way to each other by the same amount', () => {
		expect(spreadLabels([50, 54], 14)).toEqual([45, 59]);
	});

	it('keep their order and their place in the list', () => {
		const placed = spreadLabels([54, 50, 52], 14);
		expect(placed[1]).toBeLessThan(placed[2] ?? 0);
		expect(placed[2]).toBeLessThan(placed[0] ?? 0);
		expect((placed[0] ?? 0) - (placed[1] ?? 0)).toBeGreaterThanOrEqual(27.9);
	});
});
