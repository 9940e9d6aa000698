import { maxLineChars, maxReadings } from '../bounds';
import type { RefusalCode } from '../ingestion';
import { entryOf } from '../layout/entries';
import type { Entry, RowText, Table } from '../layout/table';
import { findBody, isHeaderOnly, type Body } from './body';
import { findDelimiter, sampleIndexes } from './delimiter';
import { findLines, type Lines } from './lines';
import { delimiters, hasOpenQuote, splitRow, type Delimiter } from './split-row';

export type TableOrRefusal =
	Table | { readonly code: RefusalCode; readonly line: number | null; readonly found: string | null };

interface Rows {
	readonly count: number;
	readonly starts: Int32Array;
	readonly ends: Int32Array;
	/** Physical line (0-based) on which each row starts; null when rows and lines are the same. */
	readonly lines: Int32Array | null;
}

const sampledLines = 300;
/** A quoted cell that runs over more lines than this was never closed. */
const mostLinesInCell = 100;

function longLine(lines: Lines): number {
	for (let i = 0; i < lines.count; i++)
		if ((lines.ends[i] ?? 0) - (lines.starts[i] ?? 0) > maxLineChars) return i;
	return -1;
}

/** Joins lines whose quoted cell goes on; null with the line where a quote stays open. */
function joinQuoted(text: string, lines: Lines, delimiter: Delimiter): Rows | { openAt: number } {
	if (!text.includes('"')) return { ...lines, lines: null };
	const starts = new Int32Array(lines.count);
	const ends = new Int32Array(lines.count);
	const first = new Int32Array(lines.count);
	let count = 0;
	for (let i = 0; i < lines.count; i++) {
		const start = lines.starts[i] ?? 0;
		let last = i;
		while (hasOpenQuote(text.slice(start, lines.ends[last]), delimiter)) {
			if (last + 1 >= lines.count || last - i >= mostLinesInCell) return { openAt: i };
			last++;
		}
		starts[count] = start;
		ends[count] = lines.ends[last] ?? 0;
		first[count++] = i;
		i = last;
	}
	return { count, starts: starts.subarray(0, count), ends: ends.subarray(0, count), lines: first };
}

/** Delimited text to a table: lines, delimiter, body, heads, and what stands around them. */
export function tableFromText(text: string): TableOrRefusal {
	const lines = findLines(text);
	const tooLong = longLine(lines);
	if (tooLong >= 0)
		return {
			code: 'line-too-long',
			line: tooLong + 1,
			found: String((lines.ends[tooLong] ?? 0) - (lines.starts[tooLong] ?? 0))
		};
	if (lines.count > maxReadings) return { code: 'too-many-readings', line: null, found: String(lines.count) };
	const lineText = (i: number): string => text.slice(lines.starts[i], lines.ends[i]);
	const filled = sampleIndexes(lines.count, sampledLines)
		.map(lineText)
		.filter((line) => line.trim() !== '');
	const delimiter = findDelimiter(filled);
	const rows = delimiter === null ? { ...lines, lines: null } : joinQuoted(text, lines, delimiter);
	if ('openAt' in rows)
		return { code: 'unclosed-quote', line: rows.openAt + 1, found: lineText(rows.openAt).slice(0, 80) };
	const textOf = (row: number): string => text.slice(rows.starts[row], rows.ends[row]);
	const cells = (row: number): string[] =>
		delimiter === null ? [textOf(row)] : splitRow(textOf(row), delimiter);
	const body = findBody({ count: rows.count, cells });
	if (body === null) return withoutBody(filled);
	return {
		...tableOf(rows, body, delimiter, textOf, cells, lines.isUnterminated),
		rowText: rowTextOf(text, rows, body.first, delimiter)
	};
}

function rowTextOf(text: string, rows: Rows, first: number, delimiter: Delimiter | null): RowText | null {
	if (delimiter?.length !== 1) return null;
	return {
		text,
		delimiter: delimiter.charCodeAt(0),
		startOf: (row) => rows.starts[row + first] ?? 0,
		endOf: (row) => rows.ends[row + first] ?? 0
	};
}

function withoutBody(lines: readonly string[]): TableOrRefusal {
	for (const line of lines) {
		for (const delimiter of delimiters) {
			const cells = splitRow(line, delimiter);
			if (cells.length > 1 && isHeaderOnly(cells))
				return { code: 'header-only', line: null, found: line.slice(0, 80) };
		}
	}
	return { code: 'no-readings', line: null, found: (lines[0] ?? '').trim().slice(0, 80) };
}

function tableOf(
	rows: Rows,
	body: Body,
	delimiter: Delimiter | null,
	textOf: (row: number) => string,
	cells: (row: number) => string[],
	isUnterminated: boolean
): Table {
	const lineOf = (row: number): number => (rows.lines === null ? row : (rows.lines[row] ?? 0)) + 1;
	const trimmed = (row: number | null): string[] =>
		row === null ? [] : cells(row).map((cell) => cell.trim());
	const entries: Entry[] = [];
	const free: string[] = [];
	const outside = (row: number): void => {
		const line = textOf(row);
		if (line.trim() === '') return;
		free.push(line);
		const entry = entryOf(line, cells(row), lineOf(row));
		if (entry !== null) entries.push(entry);
	};
	const preambleEnd = body.header ?? body.units ?? body.first;
	for (let row = Math.max(0, preambleEnd - 500); row < preambleEnd; row++) outside(row);
	return {
		kind: 'delimited',
		delimiter,
		header: trimmed(body.header),
		headerLine: body.header === null ? null : lineOf(body.header),
		units: trimmed(body.units),
		entries,
		freeText: free.join('\n'),
		rowCount: rows.count - body.first,
		cells: (row) => cells(row + body.first),
		lineOf: (row) => lineOf(row + body.first),
		textOf: (row) => textOf(row + body.first),
		isUnterminated
	};
}
