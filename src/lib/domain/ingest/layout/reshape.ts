import { withoutSensorRows } from './long';
import type { Sections, Table } from './table';
import { withUnitsBeside } from './unit-column';
import { withoutWideHeads } from './wide';

/** Brings a table into the one shape that is read: a row a moment, a column a channel. */
export function reshaped(table: Table): Table | Sections {
	const upright = withoutWideHeads(table);
	if (upright !== table) return upright;
	const split = withoutSensorRows(table);
	if (split === null) return withUnitsBeside(table);
	return 'tables' in split ? { ...split, tables: split.tables.map(withUnitsBeside) } : split;
}
