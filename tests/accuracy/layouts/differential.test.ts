import { spawnSync } from 'node:child_process';
import { parse } from 'csv-parse/sync';
import { describe, expect, it } from 'vitest';
import { tableFromText } from '../../../src/lib/domain/ingest/delimited/table-from-text';
import { encodings } from './encodings';
import { headers } from './headers';
import { shapes } from './shapes';
import { values } from './values';

/** Rows of the odd files that are cut at one character and read as they stand. */
const files = [encodings, headers, shapes, values].flat().flatMap(({ name, file, expected }) => {
	if (typeof file !== 'string' || 'refused' in expected) return [];
	const text = file.replace(/^\ufeff/, '');
	const table = tableFromText(text);
	if ('code' in table || 'tables' in table || !table.rowText || table.delimiter === null) return [];
	// A file quoted with apostrophes is another dialect than either library is told of.
	if (/^'/.test(text)) return [];
	const rows = Array.from({ length: table.rowCount }, (_, row) =>
		table.cells(row).map((cell) => cell.trim())
	);
	return [{ name, text, delimiter: table.delimiter, rows }];
});

/** Ours begin at the first reading and may end before another table: theirs are laid beside them from that row on. */
function beside(all: readonly (readonly string[])[], ours: readonly (readonly string[])[]): string[][] {
	const trimmed = all.map((cells) => (cells.length === 0 ? [''] : cells.map((cell) => cell.trim())));
	const key = JSON.stringify(ours[0]);
	const from = trimmed.findIndex((cells) => JSON.stringify(cells) === key);
	return trimmed.slice(from, from + ours.length);
}

const script = `
import csv, io, json, sys
csv.field_size_limit(10**7)
out = []
for f in json.load(sys.stdin):
    out.append(list(csv.reader(io.StringIO(f['text'], newline=''), delimiter=f['delimiter'])))
json.dump(out, sys.stdout)
`;

describe('cells of the odd files', () => {
	it('come from enough files to mean something', () => {
		expect(files.length).toBeGreaterThan(150);
	});

	it.each(files)('are what csv-parse sees: $name', ({ text, delimiter, rows }) => {
		const theirs = parse(text, {
			delimiter,
			relax_column_count: true,
			relax_quotes: true,
			record_delimiter: ['\r\n', '\n', '\r']
		}) as string[][];
		expect(rows).toEqual(beside(theirs, rows));
	});

	it('are what Python 3 sees with its csv module', () => {
		const input = JSON.stringify(files.map(({ text, delimiter }) => ({ text, delimiter })));
		const { stdout, stderr } = spawnSync('python3', ['-c', script], {
			input,
			maxBuffer: 1e8,
			encoding: 'utf8'
		});
		expect(stderr).toBe('');
		const theirs = JSON.parse(stdout) as string[][][];
		files.forEach(({ name, rows }, i) => {
			expect([name, rows]).toEqual([name, beside(theirs[i] ?? [], rows)]);
		});
	});
});
