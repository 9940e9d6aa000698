import { describe, expect, it } from 'vitest';
import { areasBeyond } from './beyond-limit';

describe('areas beyond a limit', () => {
	it('begin and end where the trace crosses the limit', () => {
		expect(areasBeyond([0, 10, 20], [2, 6, 2], 4, 'above')).toEqual([
			[
				{ ms: 5, celsius: 4 },
				{ ms: 10, celsius: 6 },
				{ ms: 15, celsius: 4 }
			]
		]);
	});

	it('lie below the limit for too cold', () => {
		const [area] = areasBeyond([0, 10, 20], [0, -1, 0], -0.5, 'below');
		expect(area?.map((point) => point.ms)).toEqual([5, 10, 15]);
	});

	it('stand upright where the trace begins, ends or breaks beyond it', () => {
		const areas = areasBeyond([0, 10, 20, 30, 40], [6, 6, null, 6, 6], 4, 'above');
		expect(areas.map((area) => area.map((point) => [point.ms, point.celsius]))).toEqual([
			[
				[0, 4],
				[0, 6],
				[10, 6],
				[10, 4]
			],
			[
				[30, 4],
				[30, 6],
				[40, 6],
				[40, 4]
			]
		]);
	});

	it('pass over instants at which only another trace was read', () => {
		expect(areasBeyond([0, 5, 10, 20], [2, undefined, 6, 2], 4, 'above')).toHaveLength(1);
	});

	it('do not count a reading on the limit, and there may be none', () => {
		expect(areasBeyond([0, 10], [4, 4], 4, 'above')).toEqual([]);
		expect(areasBeyond([], [], 4, 'above')).toEqual([]);
	});
});
