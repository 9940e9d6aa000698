import { cellKindOf, epochUnitOf } from '../cells/cell-kind';
import { unitWithin } from '../cells/unit-words';
import { meaningOf } from '../layout/words';
import { isArray, isObject, textOfScalar, type JsonArray, type JsonNode, type JsonObject } from './json-node';

/** One place in a JSON file that holds readings, with the shape they are kept in. */
export interface RowSource {
	readonly path: readonly string[];
	readonly kind: 'objects' | 'pairs' | 'columns' | 'keyed' | 'values' | 'untimed';
	readonly node: JsonArray | JsonObject;
	readonly rows: number;
}

function kindsIn(node: JsonNode, depth: number): { moments: number; numbers: number } {
	const text = textOfScalar(node);
	if (text !== null) {
		const kind = cellKindOf(text);
		const isEpoch = kind === 'number' && epochUnitOf(Number(text)) !== null;
		return {
			moments: isEpoch || kind === 'moment' || kind === 'date' || kind === 'time' ? 1 : 0,
			numbers: kind === 'number' && !isEpoch ? 1 : 0
		};
	}
	const inner = isObject(node) ? node.values : isArray(node) ? node.items : [];
	const sum = { moments: 0, numbers: 0 };
	if (depth > 3) return sum;
	for (const child of inner.slice(0, 64)) {
		const found = kindsIn(child, depth + 1);
		sum.moments += found.moments;
		sum.numbers += found.numbers;
	}
	return sum;
}

/** Whether something inside names a moment. */
export const hasMoment = (node: JsonNode): boolean => kindsIn(node, 0).moments > 0;

const isScalar = (node: JsonNode): boolean => !isObject(node) && !isArray(node);

function spread<T>(items: readonly T[], wanted: number): T[] {
	const step = Math.max(1, Math.floor(items.length / wanted));
	return items.filter((_, i) => i % step === 0).slice(0, wanted + 1);
}

/** Readings of a list inside: the object around them is then no row itself. */
function isListOfReadings(node: JsonNode): boolean {
	if (isObject(node)) return node.values.some(isListOfReadings);
	if (!isArray(node) || node.items.length < 2) return false;
	const timed = node.items.slice(0, 3).filter((item) => kindsIn(item, 0).moments > 0);
	return timed.length >= 2;
}

/** A figure under a key that speaks of temperature, with a count or a length of time beside it or nothing. */
function isUntimedReading(node: JsonNode): boolean {
	return (
		isObject(node) &&
		node.keys.some((key, i) => {
			const text = textOfScalar(node.values[i]);
			const isWarm = meaningOf(key).quantity === 'temperature' || unitWithin(key) !== null;
			return isWarm && text !== null && cellKindOf(text) === 'number';
		})
	);
}

function listKind(array: JsonArray): RowSource['kind'] | null {
	const sample = spread(array.items, 20).filter((item) => item !== null);
	if (sample.length === 0) return null;
	const share = (test: (node: JsonNode) => boolean): number => sample.filter(test).length / sample.length;
	if (share((node) => isObject(node)) > 0.8) {
		const isReading = (node: JsonNode): boolean => {
			// A row names its moment itself; a list of moments inside makes it the frame of a recording.
			return kindsIn(node, 0).moments > 0 && isObject(node) && !node.values.some(isListOfReadings);
		};
		if (share(isReading) > 0.5) return 'objects';
		return array.items.length > 2 && share(isUntimedReading) > 0.5 ? 'untimed' : null;
	}
	if (
		share(
			(node) =>
				isArray(node) && node.items.length >= 2 && node.items.length <= 64 && node.items.every(isScalar)
		) > 0.8
	)
		return 'pairs';
	return share((node) => cellKindOf(textOfScalar(node) ?? '') === 'number') > 0.5 && array.items.length > 2
		? 'values'
		: null;
}

function objectKind(object: JsonObject): { kind: RowSource['kind']; rows: number } | null {
	const lists = object.values.filter(
		(value): value is JsonArray =>
			isArray(value) && value.items.length >= 2 && spread(value.items, 10).every(isScalar)
	);
	const longest = Math.max(0, ...lists.map((list) => list.items.length));
	if (lists.filter((list) => list.items.length === longest).length >= 2)
		return { kind: 'columns', rows: longest };
	const moments = spread(object.keys, 10).filter(
		(key) => ['moment', 'date'].includes(cellKindOf(key)) || epochUnitOf(Number(key)) !== null
	);
	if (object.keys.length >= 2 && moments.length > Math.min(object.keys.length, 10) * 0.8)
		return { kind: 'keyed', rows: object.keys.length };
	return null;
}

/** Every list of readings in a JSON document, largest first. */
export function findRowSources(root: JsonNode): RowSource[] {
	const found: RowSource[] = [];
	const walk = (node: JsonNode, path: readonly string[]): void => {
		if (isArray(node)) {
			const kind = listKind(node);
			if (kind !== null) found.push({ path, kind, node, rows: node.items.length });
			else
				node.items.slice(0, 10_000).forEach((item, i) => isScalar(item) || walk(item, [...path, String(i)]));
		} else if (isObject(node)) {
			const hit = objectKind(node);
			if (hit !== null) found.push({ path, node, ...hit });
			else node.values.forEach((value, i) => walk(value, [...path, node.keys[i] ?? '']));
		}
	};
	walk(root, []);
	// A bare list of numbers, or of objects without a moment, is readings only where nothing better is.
	const better = found.filter(({ kind }) => kind !== 'values' && kind !== 'untimed');
	return (better.length > 0 ? better : found).sort((a, b) => b.rows - a.rows);
}
