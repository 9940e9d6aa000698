import { describe, expect, it } from 'vitest';
import { overUseBar } from './over-use';

describe('over-use of a leg', () => {
	it('draws both parts to the scale of the worst leg', () => {
		expect(overUseBar(28, 8, 36).tooWarmPercent + overUseBar(28, 8, 36).tooLatePercent).toBeCloseTo(100, 10);
		expect(overUseBar(9, 0, 36)).toEqual({ tooWarmPercent: 25, tooLatePercent: 0 });
	});

	it('draws nothing for life that was saved, and nothing where no leg overran', () => {
		expect(overUseBar(-3, 1, 4)).toEqual({ tooWarmPercent: 0, tooLatePercent: 25 });
		expect(overUseBar(0, 0, 0)).toEqual({ tooWarmPercent: 0, tooLatePercent: 0 });
	});
});
