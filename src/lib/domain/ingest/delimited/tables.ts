import type { Oddity } from '../ingestion';
import { cellKindOf } from '../cells/cell-kind';
import { entryOf } from '../layout/entries';
import { statedIn } from '../layout/preamble';
import { reshaped } from '../layout/reshape';
import type { Entry, RowText, Sections, Table } from '../layout/table';
import { meaningOf } from '../layout/words';
import type { Body } from './body';
import { shapeOf } from './delimiter';
import { isRecording, overlaps, segmentsOf, type Segment } from './segments';
import type { Rows } from './table-from-text';

/** Lines above a table, and those below it, that are read for what they state. */
const statedAbove = 500;
const statedBelow = 40;
const shownLines = 12;

const lineOf = (rows: Rows, row: number): number => (rows.lines === null ? row : (rows.lines[row] ?? 0)) + 1;

function rowTextOf(rows: Rows, first: number): RowText | null {
	const { delimiter, text, starts, ends } = rows;
	// A spreadsheet's ="…" may hide a delimiter from a reader that knows plain quotes only.
	if (delimiter?.length !== 1 || !rows.isPlain || text.includes('="')) return null;
	return {
		text,
		delimiter: delimiter.charCodeAt(0),
		startOf: (row) => starts[row + first] ?? 0,
		endOf: (row) => ends[row + first] ?? 0
	};
}

interface Outside {
	readonly entries: Entry[];
	readonly free: string[];
}

function outsideOf(rows: Rows, from: number, to: number): Outside {
	const entries: Entry[] = [];
	const free: string[] = [];
	for (let row = from; row < to; row++) {
		const line = rows.textOf(row);
		if (line.trim() === '') continue;
		free.push(line);
		const entry = entryOf(line, rows.cells(row), lineOf(rows, row));
		if (entry !== null) entries.push(entry);
	}
	return { entries, free };
}

/** Rows below the last reading. */
function footerStart(rows: Rows, { body, to }: Segment): number {
	let row = to;
	for (; row > body.first + 1 && to - row < statedBelow; row--) {
		const shape = shapeOf(rows.cells(row - 1));
		if (shape.values > 0 && (shape.hasMoment || !body.isTimed)) return row;
	}
	return to - row < statedBelow ? row : to;
}

/** "Date" and "Time" above one cell that holds both are one head; else every head after them names its neighbour. */
function alignedHeads(heads: readonly string[], cells: readonly string[]): readonly string[] {
	if (heads.length !== cells.length + 1) return heads;
	const at = cells.findIndex((cell) => cellKindOf(cell) === 'moment');
	const [date, time] = [heads[at] ?? '', heads[at + 1] ?? ''];
	if (at < 0 || !meaningOf(date).isTime || !meaningOf(time).isTime) return heads;
	return [...heads.slice(0, at), `${date} ${time}`, ...heads.slice(at + 2)];
}

function tableOf(rows: Rows, segment: Segment, above: Outside, oddities: readonly Oddity[]): Table {
	const { body, to } = segment;
	const trimmed = (row: number | null): string[] =>
		row === null ? [] : rows.cells(row).map((cell) => cell.trim());
	const below = outsideOf(rows, footerStart(rows, segment), to);
	return {
		kind: 'delimited',
		delimiter: rows.delimiter,
		header: alignedHeads(trimmed(body.header), rows.cells(body.first)),
		headerLine: body.header === null ? null : lineOf(rows, body.header),
		units: trimmed(body.units),
		entries: [...above.entries, ...below.entries],
		freeText: [...above.free, ...below.free].join('\n'),
		rowCount: to - body.first,
		cells: (row) => rows.cells(row + body.first),
		lineOf: (row) => lineOf(rows, row + body.first),
		textOf: (row) => rows.textOf(row + body.first),
		rowText: rowTextOf(rows, body.first),
		isUnterminated: rows.isUnterminated && to === rows.count,
		oddities
	};
}

function aboveOf(rows: Rows, { from, body }: Segment): Outside {
	const end = body.header ?? body.units ?? body.first;
	return outsideOf(rows, Math.max(from, end - statedAbove), end);
}

/** Lines of tables that hold no temperatures: they are told, not read. */
function leftOut(rows: Rows, segments: readonly Segment[]): Oddity[] {
	const lines: number[] = [];
	let count = 0;
	for (const { from, to } of segments) {
		for (let row = from; row < to; row++) {
			if (rows.textOf(row).trim() === '') continue;
			count++;
			if (lines.length < shownLines) lines.push(lineOf(rows, row));
		}
	}
	return count === 0 ? [] : [{ code: 'footer-ignored', count, lines, detail: null }];
}

const serialIn = ({ entries, free }: Outside): string | null => statedIn(entries, free.join('\n'), []).serial;

function headingOf(rows: Rows, segment: Segment | undefined): string | null {
	const header = segment?.body.header ?? null;
	return header === null ? null : rows.textOf(header).trim();
}

/** Whether the later table goes on with the recording of the earlier: same heads, same instrument, later times. */
function goesOn(rows: Rows, earlier: Segment, later: Segment, known: string | null): boolean {
	const serial = serialIn(aboveOf(rows, later));
	const isSame =
		headingOf(rows, earlier) === headingOf(rows, later) &&
		(serial === null || known === null || serial === known);
	if (!isSame) return false;
	// The same rows once more are repeats, not another recording.
	const isCopy = rows.textOf(earlier.body.first).trim() === rows.textOf(later.body.first).trim();
	return isCopy || !overlaps(rows, earlier, later);
}

/** Tables that go on with the one before are one; each other is a recording of its own. */
function joined(rows: Rows, recordings: readonly Segment[]): Segment[] {
	const whole: Segment[] = [];
	for (const segment of recordings) {
		const last = whole.at(-1);
		const isNext = last !== undefined && last.to === segment.from;
		if (last === undefined || !isNext || !goesOn(rows, last, segment, serialIn(aboveOf(rows, last))))
			whole.push(segment);
		else whole[whole.length - 1] = { ...last, to: segment.to };
	}
	return whole;
}

function nameOf(above: Outside, shared: Outside): string {
	const own = above.entries.filter((entry) => !shared.entries.includes(entry));
	return statedIn(own, '', []).serial ?? above.free.at(0)?.trim().slice(0, 60) ?? '';
}

/** The table of a file, or its recordings where there are several. */
export function tablesOf(rows: Rows, body: Body): Table | Sections {
	const segments = segmentsOf(rows, rows.textOf, body);
	// A stretch under the same heads is read with the one above, however short.
	const recordings = segments.filter(
		(segment, i) =>
			isRecording(rows, segment) || (i > 0 && headingOf(rows, segment) === headingOf(rows, segments[0]))
	);
	const [only] = recordings.length === 0 ? segments : joined(rows, recordings);
	const several = joined(rows, recordings);
	if (only === undefined || several.length < 2) {
		const used = only ?? { from: 0, to: rows.count, body };
		const rest = segments.filter(({ from }) => from >= used.to);
		const above = outsideOf(
			rows,
			Math.max(0, (used.body.header ?? used.body.first) - statedAbove),
			used.body.header ?? used.body.units ?? used.body.first
		);
		return tableOf(rows, used, above, leftOut(rows, rest));
	}
	const shared = aboveOf(rows, several[0] ?? only);
	const tables = several.map((segment, i) => {
		const own = aboveOf(rows, segment);
		const above =
			i === 0 ? own : { entries: [...own.entries, ...shared.entries], free: [...own.free, ...shared.free] };
		return tableOf(rows, segment, above, []);
	});
	return {
		tables: tables.map((table) => {
			const upright = reshaped(table);
			return 'tables' in upright ? table : upright;
		}),
		names: several.map((segment, i) =>
			nameOf(aboveOf(rows, segment), i === 0 ? { entries: [], free: [] } : shared)
		)
	};
}
