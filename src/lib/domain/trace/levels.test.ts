import { describe, expect, it } from 'vitest';
import { blocksOf, levelsOf } from './levels';

describe('the levels of a trace', () => {
	it.each([
		[[], [], []],
		[[7], [7], [0]],
		[
			[20, 4, 5, 4, -3],
			[-3, 4, 5, 20],
			[3, 1, 2, 1, 0]
		],
		[[0, 0, 0], [0], [0, 0, 0]],
		// Too far apart for a table by value.
		[
			[2_000_000_000, -2_000_000_000, 2_000_000_000],
			[-2_000_000_000, 2_000_000_000],
			[1, 0, 1]
		],
		[
			[1_048_575, 0],
			[0, 1_048_575],
			[1, 0]
		],
		[
			[1_048_576, 0],
			[0, 1_048_576],
			[1, 0]
		]
	])('%j are %j, each reading one of them: %j', (scaled, values, levelOf) => {
		const levels = levelsOf(Int32Array.from(scaled));
		expect([...levels.values]).toEqual(values);
		expect([...levels.levelOf]).toEqual(levelOf);
	});

	it('lead back to every reading, whatever the span', () => {
		for (const spread of [1, 10, 1000, 10_000_000]) {
			const scaled = Int32Array.from({ length: 500 }, (_, i) => ((i * 7919) % 201) * spread - 100 * spread);
			const { values, levelOf } = levelsOf(scaled);
			expect([...levelOf].map((level) => values[level])).toEqual([...scaled]);
			expect([...values]).toEqual([...new Set(scaled)].sort((a, b) => a - b));
		}
	});

	it('of a long trace are every value between its ends, read or not', () => {
		const scaled = Int32Array.from({ length: 500 }, (_, i) => [-20, -18, -17, 10][i % 4] as number);
		const { values, levelOf, blocks } = levelsOf(scaled);
		expect([...values]).toEqual(Array.from({ length: 31 }, (_, i) => i - 20));
		expect([...levelOf].map((level) => values[level])).toEqual([...scaled]);
		expect(blocksOf(levelOf)).toEqual(blocks);
		// Eight readings for each value of the span, or only what was read.
		expect(levelsOf(scaled.subarray(0, 240)).values).toHaveLength(4);
		expect(levelsOf(scaled.subarray(0, 241)).values).toHaveLength(31);
	});

	it('have the coldest and the warmest of each block of 64', () => {
		const scaled = Int32Array.from({ length: 130 }, (_, i) => (i === 70 ? 90 : i === 71 ? -5 : 20));
		const { blocks, levelOf } = levelsOf(scaled);
		// The values are −5, 20 and 90.
		expect([...blocks.coldest]).toEqual([1, 0, 1]);
		expect([...blocks.warmest]).toEqual([1, 2, 1]);
		expect(blocksOf(levelOf)).toEqual(blocks);
		expect(blocksOf(new Int32Array(0)).coldest).toHaveLength(0);
	});
});
