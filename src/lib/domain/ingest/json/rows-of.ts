import type { Entry } from '../layout/table';
import { hasMoment, type RowSource } from './find-rows';
import { isArray, isObject, textOfScalar, type JsonNode } from './json-node';

const mostColumns = 256;
const mostItems = 64;
const deepest = 6;
/** Objects before the first reading that describe what follows. */
const mostMetadata = 20;

/** The rows of one list, split on demand. */
export interface JsonRows {
	readonly header: readonly string[];
	readonly count: number;
	/** What stood in the list before its first reading. */
	readonly metadata: readonly Entry[];
	cells(row: number): string[];
	/** Place of a row in the text. */
	at(row: number): number;
}

/** Walks the scalars of a row with their dotted paths. */
function eachLeaf(
	node: JsonNode,
	path: string,
	depth: number,
	visit: (path: string, text: string) => void
): void {
	if (depth > deepest) return;
	if (isObject(node)) {
		node.values.forEach((value, i) =>
			eachLeaf(value, path === '' ? (node.keys[i] ?? '') : `${path}.${node.keys[i]}`, depth + 1, visit)
		);
	} else if (isArray(node)) {
		node.items
			.slice(0, mostItems)
			.forEach((value, i) => eachLeaf(value, path === '' ? String(i) : `${path}.${i}`, depth + 1, visit));
	} else visit(path, textOfScalar(node) ?? '');
}

/** Columns kept side by side become rows: the n-th of each list belong together. */
function sideBySide({ node, rows }: RowSource): JsonRows {
	const lists = isObject(node) ? node.values.map((value, i) => ({ key: node.keys[i] ?? '', value })) : [];
	const used = lists.flatMap(({ key, value }) =>
		isArray(value) && value.items.length === rows ? [{ key, items: value.items }] : []
	);
	return {
		header: used.map(({ key }) => key),
		count: rows,
		metadata: [],
		cells: (row) => used.map(({ items }) => textOfScalar(items[row]) ?? ''),
		at: () => node.at
	};
}

function metadataIn(items: readonly JsonNode[]): { skip: number; entries: Entry[] } {
	const entries: Entry[] = [];
	let skip = 0;
	while (
		skip < Math.min(items.length, mostMetadata) &&
		isObject(items[skip]) &&
		!hasMoment(items[skip] ?? null)
	) {
		eachLeaf(items[skip] ?? null, '', 0, (path, value) =>
			entries.push({ key: path.replaceAll('.', ' '), value, line: skip + 1 })
		);
		skip++;
	}
	return skip < items.length ? { skip, entries } : { skip: 0, entries: [] };
}

/** The rows of a list of readings, whatever it keeps them as. */
export function rowsOf(source: RowSource): JsonRows {
	if (source.kind === 'columns') return sideBySide(source);
	const { node } = source;
	const { skip, entries } =
		source.kind === 'objects' && isArray(node) ? metadataIn(node.items) : { skip: 0, entries: [] };
	const children = isArray(node) ? node.items : node.values;
	const count = children.length - skip;
	const child = (row: number): JsonNode => children[row + skip] ?? null;
	// Where moments are keys, the key is a cell of the row.
	const keys = isObject(node) ? node.keys : null;
	const columns = new Map<string, number>();
	if (keys !== null) columns.set('time', 0);
	for (let row = 0; row < count; row++) {
		eachLeaf(child(row), '', 0, (path) => {
			if (!columns.has(path) && columns.size < mostColumns) columns.set(path, columns.size);
		});
	}
	const cells = (row: number): string[] => {
		const out = new Array<string>(columns.size).fill('');
		if (keys !== null) out[0] = keys[row] ?? '';
		eachLeaf(child(row), '', 0, (path, text) => {
			const at = columns.get(path);
			if (at !== undefined && !(keys !== null && at === 0)) out[at] = text;
		});
		return out;
	};
	const at = (row: number): number => {
		const item = child(row);
		return isObject(item) || isArray(item) ? item.at : node.at;
	};
	return { header: [...columns.keys()], count, metadata: entries, cells, at };
}
