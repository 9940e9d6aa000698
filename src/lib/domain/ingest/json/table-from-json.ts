import type { RefusalCode } from '../ingestion';
import { statedIn } from '../layout/preamble';
import { reshaped } from '../layout/reshape';
import type { Entry, Sections, Table } from '../layout/table';
import { meaningOf } from '../layout/words';
import { unitWithin } from '../cells/unit-words';
import { entriesOutside } from './entries-outside';
import { findRowSources, type RowSource } from './find-rows';
import { namedColumnsOf } from './named-columns';
import type { JsonNode } from './json-node';
import { lineFinder } from './line-finder';
import { rowsOf } from './rows-of';
import { siblingUnits } from './sibling-units';

type Refused = { readonly code: RefusalCode; readonly line: number | null; readonly found: string | null };

/** A list this much shorter than the longest is a list of alarms or marks. */
const shortestShare = 0.1;
const mostRowsForUnits = 1_000_000;

function tableOf(root: JsonNode, source: RowSource, others: readonly RowSource[], text: string): Table {
	const rows = rowsOf(source);
	const lineAt = lineFinder(text);
	const entries: Entry[] = [...rows.metadata, ...entriesOutside(root, source, others)];
	const { header, skip } = namedColumnsOf(root, source, rows);
	const count = rows.count - skip;
	const cells = (row: number): string[] => rows.cells(row + skip);
	const isFlat = source.kind === 'columns' || source.kind === 'values';
	return {
		kind: 'json',
		delimiter: null,
		header,
		headerLine: null,
		units: siblingUnits(header, Math.min(count, mostRowsForUnits), cells),
		entries,
		freeText: entries.map(({ key, value }) => `${key}: ${value}`).join('\n'),
		rowCount: count,
		cells,
		lineOf: (row) => lineAt(rows.at(row + skip) + 1),
		textOf: (row) =>
			isFlat ? cells(row).join(', ') : JSON.stringify(cells(row).filter((cell) => cell !== '')).slice(1, -1),
		isUnterminated: false
	};
}

function speaksOfTemperature({ header, units }: Table): boolean {
	return [...header, ...units].some(
		(name) => meaningOf(name).quantity === 'temperature' || unitWithin(name) !== null
	);
}

function nameOf(table: Table, { path }: RowSource): string {
	return statedIn(table.entries, '', []).serial ?? path.join('.');
}

/** Lists beside each other: those that speak of temperature where any does, each a recording of its own. */
function recordingsOf(root: JsonNode, sources: readonly RowSource[], text: string): Table | Sections {
	const found = sources.map((source) => ({ source, table: tableOf(root, source, sources, text) }));
	const warm = found.filter(({ table }) => speaksOfTemperature(table));
	// In the order of the document, not of their length.
	const kept = (warm.length > 0 ? warm : found).sort((a, b) => a.source.node.at - b.source.node.at);
	const [only] = kept;
	if (kept.length === 1 && only !== undefined) return reshaped(only.table);
	return {
		tables: kept.map(({ table }) => {
			const upright = reshaped(table);
			return 'tables' in upright ? table : upright;
		}),
		names: kept.map(({ table, source }) => nameOf(table, source))
	};
}

/** A JSON document to a table, wherever in it the readings stand; several recordings are told apart, not mixed. */
export function tableFromJson(root: JsonNode, text: string): Table | Sections | Refused {
	const sources = findRowSources(root);
	const [source] = sources;
	if (source === undefined)
		return { code: 'no-readings', line: null, found: text.slice(0, 80).replace(/\s+/g, ' ').trim() };
	const large = sources.filter(({ rows }) => rows >= 2 && rows >= source.rows * shortestShare);
	return recordingsOf(root, large.length === 0 ? [source] : large, text);
}
