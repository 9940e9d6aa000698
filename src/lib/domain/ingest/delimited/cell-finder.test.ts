import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cellFinderOf } from './cell-finder';
import { splitRow } from './split-row';

function found(row: string, cells: number): string[] | null {
	const text = `before\n${row}\nafter`;
	const bounds = { startOf: () => 7, endOf: () => 7 + row.length };
	const finder = cellFinderOf({ text, delimiter: 59, ...bounds }, cells);
	if (!finder.find(0)) return null;
	return Array.from({ length: cells }, (_, i) => text.slice(finder.from[i], finder.to[i]));
}

describe('the bounds of cells', () => {
	it.each([
		['a;b;c', 3, ['a', 'b', 'c']],
		['a;b;c', 2, ['a', 'b']],
		[' a ;; c', 3, [' a ', '', ' c']],
		['"a;1";"b"', 2, ['a;1', 'b']],
		[' "a" ;b', 2, ['a', 'b']],
		['a;', 2, ['a', '']]
	])('of %j are found', (row, cells, expected) => {
		expect(found(row, cells)).toEqual(expected);
	});

	it.each([
		['fewer cells', 'a;b', 3],
		['a doubled quote', '"a""b";c', 2],
		['an open quote', '"a;b', 1],
		['text behind a quote', '"a"b;c', 2],
		['nothing', '', 2]
	])('are not given for %s', (_, row, cells) => {
		expect(found(row, cells)).toBeNull();
	});

	it('hold what splitting the row gives', () => {
		const piece = fc.constantFrom(';', '"', '""', ' ', 'a', '4,5', '";"');
		fc.assert(
			fc.property(fc.array(piece, { maxLength: 10 }), fc.integer({ min: 1, max: 4 }), (pieces, cells) => {
				const row = pieces.join('');
				const mine = found(row, cells);
				if (mine !== null) expect(splitRow(row, ';').slice(0, cells)).toEqual(mine);
			}),
			{ numRuns: 5000, seed: 13 }
		);
	});
});
