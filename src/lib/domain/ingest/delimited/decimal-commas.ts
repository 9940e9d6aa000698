import { meaningOf } from '../layout/words';
import { shapeOf, sampleIndexes } from './delimiter';
import type { Body, RawRows } from './body';
import type { Delimiter } from './split-row';

/** Rows looked at: each must fit. */
const sampledRows = 200;
const whole = /^\s*[-+\u2212\u2013]?\d{1,3}\s*$/;
const fraction = /^\d{1,4}(?:\s?°?[CFK])?\s*$/;

const widthOf = (cells: readonly string[]): number => {
	let width = cells.length;
	while (width > 1 && (cells[width - 1] ?? '').trim() === '') width--;
	return width;
};

/** Ways to put `pairs` merges into `columns` columns. */
function placements(columns: number, pairs: number, from = 0): number[][] {
	if (pairs === 0) return [[]];
	if (from >= columns) return [];
	return [
		...placements(columns, pairs - 1, from + 1).map((rest) => [from, ...rest]),
		...placements(columns, pairs, from + 1)
	];
}

function mergedRow(cells: readonly string[], columns: readonly number[], width: number): string[] {
	const out: string[] = [];
	let at = 0;
	for (let column = 0; at < cells.length; column++) {
		if (column < width && columns.includes(column)) {
			out.push(`${(cells[at] ?? '').trim()},${(cells[at + 1] ?? '').trim()}`);
			at += 2;
		} else out.push(cells[at++] ?? '');
	}
	return out;
}

function fits(cells: readonly string[], columns: readonly number[]): boolean {
	let at = 0;
	for (let column = 0; column <= Math.max(...columns); column++) {
		if (!columns.includes(column)) at++;
		else if (!whole.test(cells[at] ?? '') || !fraction.test(cells[at + 1] ?? '')) return false;
		else at += 2;
	}
	return true;
}

/**
 * A comma both between cells and inside figures: rows are then wider than their heads by one cell a figure. Null where
 * nothing of the kind shows; `ambiguous` where the heads do not tell which cells belong together.
 */
export function mergeDecimalCommas(
	rows: RawRows,
	body: Body,
	delimiter: Delimiter | null
): ((row: number) => readonly string[]) | 'ambiguous' | null {
	if (delimiter !== ',' || body.header === null) return null;
	const header = rows.cells(body.header);
	const heads = widthOf(header);
	const sample = sampleIndexes(rows.count - body.first, sampledRows)
		.map((i) => rows.cells(body.first + i))
		.filter((cells) => shapeOf(cells).hasMoment);
	const surplus = widthOf(sample[0] ?? []) - heads;
	if (heads < 2 || heads > 12 || surplus < 1 || surplus >= heads) return null;
	if (!sample.every((cells) => widthOf(cells) === heads + surplus)) return null;
	const options = placements(heads, surplus).filter((columns) =>
		sample.every((cells) => fits(cells, columns))
	);
	const isMeasured = (column: number): boolean => meaningOf(header[column] ?? '').quantity !== null;
	const likely = options.filter((columns) => columns.every(isMeasured));
	const warm = likely.filter((columns) =>
		header.every((head, i) => meaningOf(head).quantity !== 'temperature' || columns.includes(i))
	);
	const [only, second] = warm.length > 0 ? warm : likely.length > 0 ? likely : options;
	if (only === undefined) return null;
	if (second !== undefined) return 'ambiguous';
	return (row) => {
		const cells = rows.cells(row);
		return widthOf(cells) === heads + surplus ? mergedRow(cells, only, heads) : cells;
	};
}
