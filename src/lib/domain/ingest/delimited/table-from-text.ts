import { maxColumns, maxLineChars, maxReadings } from '../bounds';
import type { RefusalCode } from '../ingestion';
import { reshaped } from '../layout/reshape';
import type { Sections, Table } from '../layout/table';
import { findBody } from './body';
import { findDelimiter, sampleIndexes } from './delimiter';
import { mergeDecimalCommas } from './decimal-commas';
import { findLines, type Lines } from './lines';
import { hasOpenQuote, splitRow, type Delimiter } from './split-row';
import { tablesOf } from './tables';
import { withoutBody } from './without-body';

export type TableOrRefusal =
	| Table
	| Sections
	| { readonly code: RefusalCode; readonly line: number | null; readonly found: string | null };

/** Rows of a delimited file as stretches of its text. */
export interface Rows {
	readonly text: string;
	readonly delimiter: Delimiter | null;
	readonly count: number;
	readonly starts: Int32Array;
	readonly ends: Int32Array;
	/** Physical line (0-based) on which each row starts; null when rows and lines are the same. */
	readonly lines: Int32Array | null;
	readonly isUnterminated: boolean;
	/** Whether cells are what stands between the delimiters, and not made of several. */
	readonly isPlain: boolean;
	cells(row: number): readonly string[];
	textOf(row: number): string;
}

const sampledLines = 300;
/** Of long lines fewer are sampled; they hold more cells each. */
const sampledChars = 400_000;
const fewestSampled = 24;
/** Preamble, heads and footer stand beside as many readings as are taken. */
const mostLinesBeside = 1000;
/** A quoted cell that runs over more lines than this was never closed. */
const mostLinesInCell = 100;

function longLine(lines: Lines): number {
	for (let i = 0; i < lines.count; i++)
		if ((lines.ends[i] ?? 0) - (lines.starts[i] ?? 0) > maxLineChars) return i;
	return -1;
}

type Spans = Pick<Rows, 'count' | 'starts' | 'ends' | 'lines'>;

/** Joins lines whose quoted cell goes on; null with the line where a quote stays open. */
function joinQuoted(text: string, lines: Lines, delimiter: Delimiter): Spans | { openAt: number } {
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

function sampleSize(text: string, lines: Lines): number {
	const usualChars = Math.max(1, text.length / Math.max(1, lines.count));
	return Math.round(Math.min(sampledLines, Math.max(fewestSampled, sampledChars / usualChars)));
}

/** The first of a few rows that is wider than any table; −1 where none is. */
function wideRow({ count }: Spans, split: (row: number) => readonly string[]): number {
	return sampleIndexes(count, fewestSampled).find((row) => split(row).length > maxColumns) ?? -1;
}

/** Some programs quote with apostrophes, or whole rows: for splitting both are read as others write it. */
function withPlainQuotes(text: string, sample: readonly string[]): string {
	const most = (pattern: RegExp): boolean =>
		sample.filter((line) => pattern.test(line)).length > sample.length * 0.8;
	if (most(/^'[^']*'\s*[,;|\t]/)) return text.replaceAll("'", '"');
	// Rows that were quoted as a whole, as one cell each, are read without those quotes.
	return most(/^"[^"]*[,;|\t][^"]*"\s*$/) ? text.replaceAll('"', ' ') : text;
}

/** Delimited text to a table: lines, delimiter, body, heads, and what stands around them. */
export function tableFromText(original: string): TableOrRefusal {
	const lines = findLines(original);
	const tooLong = longLine(lines);
	if (tooLong >= 0)
		return {
			code: 'line-too-long',
			line: tooLong + 1,
			found: String((lines.ends[tooLong] ?? 0) - (lines.starts[tooLong] ?? 0))
		};
	if (lines.count > maxReadings + mostLinesBeside)
		return { code: 'too-many-readings', line: null, found: String(lines.count) };
	const wanted = sampleSize(original, lines);
	const sampled = (from: string): string[] =>
		sampleIndexes(lines.count, wanted)
			.map((i) => from.slice(lines.starts[i], lines.ends[i]))
			.filter((line) => line.trim() !== '');
	const text = withPlainQuotes(original, sampled(original));
	const filled = sampled(text);
	const delimiter = findDelimiter(filled);
	const spans = delimiter === null ? { ...lines, lines: null } : joinQuoted(text, lines, delimiter);
	if ('openAt' in spans) {
		const open = original.slice(lines.starts[spans.openAt], lines.ends[spans.openAt]);
		return { code: 'unclosed-quote', line: spans.openAt + 1, found: open.slice(0, 80) };
	}
	const { starts, ends } = spans;
	const spanOf = (from: string, row: number): string => from.slice(starts[row], ends[row]);
	const split = (row: number): string[] =>
		delimiter === null ? [spanOf(text, row)] : splitRow(spanOf(text, row), delimiter);
	const wide = wideRow(spans, split);
	if (wide >= 0) return { code: 'too-many-columns', line: (spans.lines?.[wide] ?? wide) + 1, found: null };
	const body = findBody({ count: spans.count, cells: split });
	if (body === null) return withoutBody(filled);
	const merged = mergeDecimalCommas({ count: spans.count, cells: split }, body, delimiter);
	if (merged === 'ambiguous')
		return { code: 'no-readings', line: body.first + 1, found: spanOf(original, body.first).slice(0, 80) };
	const rows: Rows = {
		...spans,
		text,
		delimiter,
		isUnterminated: lines.isUnterminated,
		isPlain: merged === null,
		cells: merged ?? split,
		textOf: (row) => spanOf(original, row)
	};
	const found = tablesOf(rows, body);
	return 'tables' in found ? found : reshaped(found);
}
