import type { RowText } from '../layout/table';

const quote = 34;
const space = 32;

/** Bounds of the first cells of a row, found without cutting anything out; filled anew by each `find`. */
export interface CellFinder {
	readonly from: Int32Array;
	readonly to: Int32Array;
	/** False where the row has fewer cells or quotes that need more than taking off. */
	find(row: number): boolean;
}

/** Finds the bounds of so many cells of each row, as splitting the row would cut them. */
export function cellFinderOf({ text, delimiter, startOf, endOf }: RowText, cells: number): CellFinder {
	const from = new Int32Array(cells);
	const to = new Int32Array(cells);

	/** Bounds of the quoted text that opens at `open`, or -1; the end of the cell otherwise. */
	function quoted(cell: number, open: number, end: number): number {
		let i = open + 1;
		while (i < end && text.charCodeAt(i) !== quote) i++;
		if (i >= end) return -1;
		from[cell] = open + 1;
		to[cell] = i++;
		while (i < end && text.charCodeAt(i) === space) i++;
		return i === end || text.charCodeAt(i) === delimiter ? i : -1;
	}

	function find(row: number): boolean {
		const end = endOf(row);
		let i = startOf(row);
		for (let cell = 0; cell < cells; cell++) {
			if (i > end) return false;
			const start = i;
			while (i < end && text.charCodeAt(i) === space) i++;
			if (i < end && text.charCodeAt(i) === quote) {
				i = quoted(cell, i, end);
				if (i < 0) return false;
			} else {
				while (i < end && text.charCodeAt(i) !== delimiter) i++;
				from[cell] = start;
				to[cell] = i;
			}
			i++;
		}
		return true;
	}

	return { from, to, find };
}
