import { wholeUnitOf } from '../cells/unit-words';
import type { RefusalCode } from '../ingestion';
import type { Entry, Table } from '../layout/table';
import { findRowSources, type RowSource } from './find-rows';
import { isArray, isObject, textOfScalar, type JsonNode } from './json-node';
import { lineFinder } from './line-finder';

type Refused = { readonly code: RefusalCode; readonly line: number | null; readonly found: string | null };

const mostColumns = 256;

/** Walks the scalars of a row with their dotted paths. */
function eachLeaf(
	node: JsonNode,
	path: string,
	depth: number,
	visit: (path: string, text: string) => void
): void {
	if (depth > 6) return;
	if (isObject(node)) {
		node.values.forEach((value, i) =>
			eachLeaf(value, path === '' ? (node.keys[i] ?? '') : `${path}.${node.keys[i]}`, depth + 1, visit)
		);
	} else if (isArray(node)) {
		node.items
			.slice(0, 64)
			.forEach((value, i) => eachLeaf(value, path === '' ? String(i) : `${path}.${i}`, depth + 1, visit));
	} else visit(path, textOfScalar(node) ?? '');
}

interface RowList {
	readonly count: number;
	node(row: number): JsonNode;
	at(row: number): number;
	/** Key of the row itself, where moments are keys. */
	key: ((row: number) => string) | null;
}

function rowListOf(source: RowSource): RowList {
	const { node } = source;
	if (isArray(node)) {
		const atOf = (item: JsonNode | undefined): number =>
			isObject(item) || isArray(item) ? item.at : node.at;
		return {
			count: node.items.length,
			node: (row) => node.items[row] ?? null,
			at: (row) => atOf(node.items[row]),
			key: null
		};
	}
	const child = (row: number): JsonNode => node.values[row] ?? null;
	const atOf = (item: JsonNode): number => (isObject(item) || isArray(item) ? item.at : node.at);
	return {
		count: node.keys.length,
		node: child,
		at: (row) => atOf(child(row)),
		key: (row) => node.keys[row] ?? ''
	};
}

/** Columns kept side by side become rows: the n-th of each list belong together. */
function columnsTable(source: RowSource): {
	header: string[];
	count: number;
	cells: (row: number) => string[];
} {
	const { node } = source;
	const lists = isObject(node) ? node.values.map((value, i) => ({ key: node.keys[i] ?? '', value })) : [];
	const used = lists.flatMap(({ key, value }) =>
		isArray(value) && value.items.length === source.rows ? [{ key, items: value.items }] : []
	);
	return {
		header: used.map(({ key }) => key),
		count: source.rows,
		cells: (row) => used.map(({ items }) => textOfScalar(items[row]) ?? '')
	};
}

function rowsTable(list: RowList): { header: string[]; count: number; cells: (row: number) => string[] } {
	const columns = new Map<string, number>();
	if (list.key !== null) columns.set('time', 0);
	for (let row = 0; row < list.count; row++) {
		eachLeaf(list.node(row), '', 0, (path) => {
			if (!columns.has(path) && columns.size < mostColumns) columns.set(path, columns.size);
		});
	}
	const header = [...columns.keys()];
	const cells = (row: number): string[] => {
		const out = new Array<string>(header.length).fill('');
		if (list.key !== null) out[0] = list.key(row);
		eachLeaf(list.node(row), '', 0, (path, text) => {
			const at = columns.get(path);
			if (at !== undefined && !(list.key !== null && at === 0)) out[at] = text;
		});
		return out;
	};
	return { header, count: list.count, cells };
}

function entriesOutside(root: JsonNode, source: RowSource): Entry[] {
	const entries: Entry[] = [];
	const walk = (node: JsonNode, path: string): void => {
		if (entries.length > 500) return;
		if (node === source.node && source.kind !== 'columns') return;
		if (isObject(node)) node.values.forEach((value, i) => walk(value, `${path} ${node.keys[i]}`.trim()));
		else if (isArray(node)) node.items.slice(0, 50).forEach((value) => walk(value, path));
		else {
			const value = textOfScalar(node);
			if (value !== null) entries.push({ key: path, value, line: 1 });
		}
	};
	walk(root, '');
	return entries;
}

/** A column that holds only a unit names it for its neighbours under the same parent. */
function unitsOf(header: readonly string[], count: number, cells: (row: number) => string[]): string[] {
	const units = header.map(() => '');
	const first = count > 0 ? cells(0) : [];
	const last = count > 0 ? cells(count - 1) : [];
	first.forEach((cell, i) => {
		if (wholeUnitOf(cell) === null || /^[\d.-]/.test(cell) || last[i] !== cell) return;
		const parent = (header[i] ?? '').split('.').slice(0, -1).join('.');
		header.forEach((path, k) => {
			if (k !== i && path.split('.').slice(0, -1).join('.') === parent) units[k] = cell;
		});
	});
	return units;
}

/** A JSON document to a table, wherever in it the readings stand. Several recordings are refused, not mixed. */
export function tableFromJson(root: JsonNode, text: string): Table | Refused {
	const sources = findRowSources(root);
	const [source, second] = sources;
	if (source === undefined)
		return { code: 'no-readings', line: null, found: text.slice(0, 80).replace(/\s+/g, ' ').trim() };
	if (second !== undefined && second.rows >= 2 && second.rows * 10 >= source.rows) {
		return {
			code: 'two-recordings',
			line: null,
			found: [source, second].map(({ path }) => path.join('.')).join(', ')
		};
	}
	const list = rowListOf(source);
	const { header, count, cells } = source.kind === 'columns' ? columnsTable(source) : rowsTable(list);
	const lineAt = lineFinder(text);
	const place = (row: number): number => (source.kind === 'columns' ? source.node.at : list.at(row));
	const entries = entriesOutside(root, source);
	const named = source.kind === 'values' ? [source.path.at(-1) ?? ''] : source.kind === 'pairs' ? [] : header;
	return {
		kind: 'json',
		delimiter: null,
		header: named,
		headerLine: null,
		units: unitsOf(header, Math.min(count, 1_000_000), cells),
		entries,
		freeText: entries.map(({ key, value }) => `${key}: ${value}`).join('\n'),
		rowCount: count,
		cells,
		lineOf: (row) => lineAt(place(row) + 1),
		textOf: (row) =>
			source.kind === 'columns' || source.kind === 'values'
				? cells(row).join(', ')
				: JSON.stringify(cells(row).filter((cell) => cell !== '')).slice(1, -1),
		isUnterminated: false
	};
}
