import { wholeUnitOf } from '../cells/unit-words';
import { profileColumns, type Column } from './columns';
import type { Table } from './table';

const isUnitText = (text: string): boolean =>
	/\p{L}|[°℃℉]/u.test(text) && !/\d/.test(text) && wholeUnitOf(text) !== null;

const parentOf = (name: string): string => name.split('.').slice(0, -1).join('.');

/** The figures a column of units speaks of: of the same parent in JSON, else to its left, else to its right. */
function valueBeside(columns: readonly Column[], unit: Column, table: Table): Column | undefined {
	const figures = columns.filter((c) => c.share.number > 0.3 && c.epochUnit === null && !c.meaning.isIndex);
	if (table.kind !== 'delimited') {
		const siblings = figures.filter((c) => parentOf(c.name) === parentOf(unit.name));
		return siblings.find((c) => c.meaning.quantity === 'temperature') ?? siblings[0];
	}
	return figures.filter((c) => c.index < unit.index).at(-1) ?? figures.find((c) => c.index > unit.index);
}

/** Puts the unit that stands in a column of its own beside each value, so that one that changes on the way is seen. */
export function withUnitsBeside(table: Table): Table {
	if (table.kind !== 'delimited' && table.kind !== 'json') return table;
	const heads = Array.from({ length: Math.min(5, table.rowCount) }, (_, row) => table.cells(row));
	if (!heads.some((cells) => cells.some(isUnitText))) return table;
	const columns = profileColumns(table);
	const pairs = columns.flatMap((column) => {
		if (!heads.some((cells) => isUnitText(cells[column.index] ?? ''))) return [];
		const value = valueBeside(columns, column, table);
		return value === undefined ? [] : [{ value: value.index, unit: column.index }];
	});
	if (pairs.length === 0) return table;
	return {
		...table,
		rowText: null,
		cells: (row) => {
			const cells = [...table.cells(row)];
			for (const { value, unit } of pairs) {
				const [figure, sign] = [cells[value] ?? '', (cells[unit] ?? '').trim()];
				if (figure.trim() !== '' && isUnitText(sign)) cells[value] = `${figure} ${sign}`;
			}
			return cells;
		}
	};
}
