import { cellKindOf } from '../cells/cell-kind';
import type { Table } from './table';
import { wideHeadsIn, type WideHeads } from './wide-heads';
import { meaningOf } from './words';

const year = /^\s*(?:19|20)\d{2}\s*$/;

/** Column of the day or year that the heads complete; −1 where rows name none. */
function dateColumn(table: Table, { kind, from }: WideHeads): number {
	const rows = Array.from({ length: Math.min(5, table.rowCount) }, (_, row) => table.cells(row));
	const fits = (cell: string): boolean =>
		kind === 'months' ? year.test(cell) : ['date', 'moment'].includes(cellKindOf(cell));
	for (let column = 0; column < from; column++) {
		const filled = rows.map((cells) => cells[column] ?? '').filter((cell) => cell.trim() !== '');
		if (filled.length > 0 && filled.every(fits)) return column;
	}
	return -1;
}

/** What is measured, where a line above the table says so: the columns' own heads are times. */
function measuredIn(table: Table): string {
	const lines = [...table.freeText.split('\n'), ...table.entries.map(({ value }) => value)];
	return lines.find((line) => line.length <= 60 && meaningOf(line).quantity !== null)?.trim() ?? '';
}

/** A table with a row a day and a column an hour, or a row a year and a column a month, as one reading a row. */
export function withoutWideHeads(table: Table): Table {
	const heads = table.kind === 'delimited' ? wideHeadsIn(table.header) : null;
	if (heads === null) return table;
	const date = dateColumn(table, heads);
	if (date < 0) return table;
	const each = heads.texts.length;
	const source = (row: number): number => Math.floor(row / each);
	const dateHead = table.header[date] ?? '';
	let last = { source: -1, cells: [] as readonly string[] };
	const cellsOf = (row: number): readonly string[] => {
		if (source(row) !== last.source) last = { source: source(row), cells: table.cells(source(row)) };
		return last.cells;
	};
	return {
		...table,
		rowText: null,
		header: heads.kind === 'hours' ? [dateHead, 'time', measuredIn(table)] : ['time', measuredIn(table)],
		units: [],
		rowCount: table.rowCount * each,
		cells: (row) => {
			const cells = cellsOf(row);
			const text = heads.texts[row % each] ?? '';
			const day = (cells[date] ?? '').trim();
			const value = cells[heads.from + (row % each)] ?? '';
			if (day === '') return [];
			return heads.kind === 'hours' ? [day, text, value] : [`${day}-${text}-01`, value];
		},
		lineOf: (row) => table.lineOf(source(row)),
		textOf: (row) => table.textOf(source(row)),
		decisions: [
			...(table.decisions ?? []),
			{
				field: 'layout',
				value: heads.kind === 'hours' ? 'hours-as-columns' : 'months-as-columns',
				because: 'found',
				detail: null
			}
		]
	};
}
