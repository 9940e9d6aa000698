import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lineRuns, linesOfRuns } from './line-runs';

describe('the lines of readings', () => {
	it.each([
		['none', [], []],
		['one', [4], [{ line: 4, step: 1, count: 1 }]],
		['a file without a fault', [4, 5, 6, 7], [{ line: 4, step: 1, count: 4 }]],
		['newest first', [203, 202, 201], [{ line: 203, step: -1, count: 3 }]],
		['a blank line after each', [1, 3, 5], [{ line: 1, step: 2, count: 3 }]],
		['many readings on one line of JSON', [1, 1, 1], [{ line: 1, step: 0, count: 3 }]],
		[
			'a row set aside',
			[4, 5, 7, 8, 9],
			[
				{ line: 4, step: 1, count: 2 },
				{ line: 7, step: 1, count: 3 }
			]
		]
	])('%s', (_, lines, runs) => {
		expect(lineRuns(lines)).toEqual(runs);
		expect([...linesOfRuns(runs)]).toEqual(lines);
	});

	it('come back whatever their order', () => {
		fc.assert(
			fc.property(fc.array(fc.integer({ min: 1, max: 9 })), (lines) => {
				expect([...linesOfRuns(lineRuns(lines))]).toEqual(lines);
			})
		);
	});

	it('of fifty thousand readings in order are one run', () => {
		const lines = Int32Array.from({ length: 50_000 }, (_, i) => i + 12);
		expect(lineRuns(lines)).toEqual([{ line: 12, step: 1, count: 50_000 }]);
	});
});
