import { CsvError, parse } from 'csv-parse/sync';
import { importColumns, maxImportRows, type ImportColumn } from '../../schemas/import';

/** One row of the file, by column, with its number as the file counts it. */
export interface NoticeRow {
	row: number;
	cells: Partial<Record<ImportColumn, string>>;
}

export type ReadNotices = { ok: true; rows: NoticeRow[] } | { ok: false; fault: string };

const known = new Map<string, ImportColumn>(importColumns.map(({ name }) => [name, name]));

function plain(head: string): string {
	return head
		.trim()
		.toLowerCase()
		.replace(/[_\s]+/g, ' ');
}

/** The sign that cuts the head into the most columns we know. */
function delimiterOf(head: string): string {
	const hits = (sign: string) =>
		head.split(sign).filter((cell) => known.has(plain(cell.replace(/"/g, '')))).length;
	return [',', ';', '\t', '|'].reduce((best, sign) => (hits(sign) > hits(best) ? sign : best));
}

function faultOf(error: unknown): string {
	if (!(error instanceof CsvError)) throw error;
	const line = 'lines' in error && typeof error.lines === 'number' ? ` near line ${error.lines}` : '';
	return `The file is no whole table: a quote stays open or stands in the wrong place${line}.`;
}

/** The rows of an advance notice, whatever its delimiter, with or without a byte order mark. */
export function readNotices(text: string): ReadNotices {
	const bare = text.replace(/^\uFEFF/, '');
	if (bare.trim() === '') return { ok: false, fault: 'The file is empty.' };
	if (bare.includes('\0')) return { ok: false, fault: 'This is no text file. Save the sheet as CSV, UTF-8.' };
	let table: { record: string[]; info: { lines: number } }[];
	try {
		table = parse(bare, {
			delimiter: delimiterOf(bare.split(/\r?\n/, 1)[0] ?? ''),
			relax_column_count: true,
			skip_empty_lines: true,
			info: true,
			trim: true,
			max_record_size: 100_000
		}) as unknown as typeof table;
	} catch (error) {
		return { ok: false, fault: faultOf(error) };
	}
	const [head, ...body] = table;
	const columns = (head?.record ?? []).map((cell) => known.get(plain(cell)) ?? null);
	const missing = importColumns.filter(({ isNeeded, name }) => isNeeded && !columns.includes(name));
	if (missing.length > 0)
		return { ok: false, fault: `The head row lacks ${missing.map(({ name }) => name).join(', ')}.` };
	const twice = columns.find((name, at) => name !== null && columns.indexOf(name) !== at);
	if (twice) return { ok: false, fault: `The column ${twice} stands there twice.` };
	if (body.length === 0) return { ok: false, fault: 'There is a head row, and nothing under it.' };
	if (body.length > maxImportRows)
		return { ok: false, fault: `${body.length} rows are more than 2,000. Send the file in parts.` };
	const rows = body.map(({ record, info }) => ({
		row: info.lines,
		cells: Object.fromEntries(columns.flatMap((name, at) => (name ? [[name, record[at] ?? '']] : [])))
	}));
	return { ok: true, rows };
}
