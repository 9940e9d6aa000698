import { csvText } from '../traces/readings-csv';
import type { Cell, Row } from './docket-records';

function cell(value: Cell | undefined): string {
	if (value === null || value === undefined) return '';
	if (value instanceof Date) return value.toISOString();
	if (typeof value === 'number' || typeof value === 'boolean') return String(value);
	// DECIMAL and BIGINT come as text; a figure is no formula, so its minus is left alone.
	if (typeof value === 'string') return /^-?\d+(\.\d+)?$/.test(value) ? value : csvText(value);
	return csvText(JSON.stringify(value));
}

/** Rows as RFC 4180 has them, a column for every name any row has. */
export function recordsCsv(rows: readonly Row[]): string {
	const names = [...new Set(rows.flatMap((row) => Object.keys(row)))];
	const lines = rows.map((row) => names.map((name) => cell(row[name])).join(','));
	return [names.map(csvText).join(','), ...lines, ''].join('\r\n');
}
