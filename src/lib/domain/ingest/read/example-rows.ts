import type { ExampleRow } from '../ingestion';
import type { Table } from '../layout/table';

const longest = 200;

function markedIn(text: string, subject: string): ExampleRow['marks'] {
	const at = subject === '' ? -1 : text.indexOf(subject);
	return at < 0 ? [] : [{ from: at, to: at + subject.length }];
}

function exampleOf(table: Table, row: number, subject: string): ExampleRow {
	const text = table.textOf(row).slice(0, longest);
	return { line: table.lineOf(row), text, marks: markedIn(text, subject) };
}

/** The first two and the last of the rows kept, as they stand in the file. */
export function exampleRows(
	table: Table,
	rows: Int32Array,
	count: number,
	subjectOf: (row: number) => string
): ExampleRow[] {
	const picked = count <= 3 ? Array.from({ length: count }, (_, k) => k) : [0, 1, count - 1];
	return picked.map((k) => exampleOf(table, rows[k] ?? 0, subjectOf(rows[k] ?? 0)));
}
