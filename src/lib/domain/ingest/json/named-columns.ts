import { cellKindOf } from '../cells/cell-kind';
import { unitWithin } from '../cells/unit-words';
import { meaningOf } from '../layout/words';
import type { RowSource } from './find-rows';
import { isArray, isObject, memberOf, textOfScalar, type JsonNode } from './json-node';
import type { JsonRows } from './rows-of';

export interface NamedColumns {
	readonly header: readonly string[];
	/** Rows at the start that are no readings but the heads. */
	readonly skip: number;
}

const isHead = (cell: string): boolean => cell === '' || cellKindOf(cell) === 'text';
const namesKey = /^(columns?|fields?|headers?|keys|names|labels|schema|cols)$/i;

/** A list of texts, or of objects with a name each, as wide as the rows: `columns` beside `rows`. */
function namesBeside(root: JsonNode, source: RowSource, width: number): string[] | null {
	let node: JsonNode | undefined = root;
	let found: string[] | null = null;
	const look = (at: JsonNode | undefined): void => {
		if (!isObject(at)) return;
		for (const [i, key] of at.keys.entries()) {
			const list = at.values[i];
			if (!namesKey.test(key) || !isArray(list) || list.items.length !== width) continue;
			const names = list.items.map(
				(item) =>
					textOfScalar(item) ??
					(isObject(item)
						? (textOfScalar(memberOf(item, 'name')) ?? textOfScalar(memberOf(item, 'label')))
						: null) ??
					''
			);
			if (names.every(isHead)) found = names;
		}
	};
	look(node);
	for (const key of source.path) {
		node = isObject(node) ? memberOf(node, key) : isArray(node) ? node.items[Number(key)] : undefined;
		look(node);
	}
	return found;
}

const speaks = (text: string): boolean => meaningOf(text).quantity !== null || unitWithin(text) !== null;
const labelKey =
	/^_*(name|metric|parameter|quantity|variable|type|field|measurement|label|series|title|sensor)_*$/i;

/** What a list of pairs measures, where a key on its way or a label beside it says so. */
function nameOfList(root: JsonNode, source: RowSource): string | null {
	const onWay = [...source.path].reverse().find(speaks);
	if (onWay !== undefined) return onWay;
	const labels: string[] = [];
	const look = (at: JsonNode | undefined, depth: number): void => {
		if (!isObject(at)) return;
		for (const [i, key] of at.keys.entries()) {
			const value = at.values[i];
			const text = typeof value === 'string' ? value : null;
			if (text !== null && labelKey.test(key) && speaks(text)) labels.push(text);
			else if (depth > 0) look(value, depth - 1);
		}
	};
	let node: JsonNode | undefined = root;
	for (const key of source.path) {
		look(node, 1);
		node = isObject(node) ? memberOf(node, key) : isArray(node) ? node.items[Number(key)] : undefined;
	}
	return labels.at(-1) ?? null;
}

/** Pairs of a moment and a figure have the name of their list. */
function pairNamed(first: readonly string[], name: string | null): string[] {
	return name === null || first.length !== 2 ? [] : ['', name];
}

/** A column whose key says nothing (`v`) takes the name of its list (`temperature`). */
function withListName(header: readonly string[], source: RowSource): readonly string[] {
	const name = [...source.path].reverse().find(speaks);
	if (name === undefined || header.some((head) => meaningOf(head).quantity !== null)) return header;
	const open = header.flatMap((head, i) => (/^(v|val|value|y|reading|data|)$/i.test(head) ? [i] : []));
	return header.map((head, i) => (open.length === 1 && open[0] === i ? name : head));
}

/** Names of the columns of a list of rows: keys, a first row of heads, or a list of names beside the rows. */
export function namedColumnsOf(root: JsonNode, source: RowSource, rows: JsonRows): NamedColumns {
	if (source.kind === 'values') return { header: [source.path.at(-1) ?? ''], skip: 0 };
	if (source.kind !== 'pairs') return { header: withListName(rows.header, source), skip: 0 };
	const first = rows.cells(0);
	if (rows.count > 1 && first.every(isHead) && !rows.cells(1).every(isHead))
		return { header: first, skip: 1 };
	const beside = namesBeside(root, source, first.length);
	return { header: beside ?? pairNamed(first, nameOfList(root, source)), skip: 0 };
}
