import type { Entry } from '../layout/table';
import type { RowSource } from './find-rows';
import { isArray, isObject, textOfScalar, type JsonNode } from './json-node';

const mostEntries = 500;

/** Keys and values that stand outside the readings of a list, and in no branch of another list. */
export function entriesOutside(root: JsonNode, source: RowSource, others: readonly RowSource[]): Entry[] {
	const entries: Entry[] = [];
	const startsWith = (path: readonly string[], start: readonly string[]): boolean =>
		start.every((key, i) => path[i] === key);
	const isForeign = (path: readonly string[]): boolean =>
		!startsWith(source.path, path) &&
		others.some((other) => other !== source && startsWith(other.path, path));
	const add = (names: readonly string[], value: string | null): void => {
		if (value !== null && entries.length < mostEntries)
			entries.push({ key: names.join(' '), value, line: 1 });
	};
	const walk = (node: JsonNode, path: readonly string[], names: readonly string[]): void => {
		if (entries.length >= mostEntries || isForeign(path)) return;
		if (node === source.node && source.kind !== 'columns') return;
		if (isObject(node)) {
			// What an object says of itself counts before what its parts say.
			node.values.forEach((value, i) => add([...names, node.keys[i] ?? ''], textOfScalar(value)));
			node.values.forEach((value, i) => {
				if (!isObject(value) && !isArray(value)) return;
				walk(value, [...path, node.keys[i] ?? ''], [...names, node.keys[i] ?? '']);
			});
		} else if (isArray(node)) {
			const own = source.path[path.length];
			node.items.forEach((value, i) => {
				if (i < 50 || String(i) === own) {
					if (isObject(value) || isArray(value)) walk(value, [...path, String(i)], names);
					else add(names, textOfScalar(value));
				}
			});
		}
	};
	walk(root, [], []);
	// The nearest frame first: a device's own serial counts before the document's.
	const depth = (key: string): number => source.path.filter((part) => key.split(' ').includes(part)).length;
	return entries
		.map((entry, i) => ({ entry, i, depth: depth(entry.key) }))
		.sort((a, b) => b.depth - a.depth || a.i - b.i)
		.map(({ entry }) => entry);
}
