import type { Table } from '../layout/table';
import { isArray, isObject, memberOf, textOfScalar, type JsonNode, type JsonObject } from './json-node';
import { tableOfRecords, type SensorRecord } from './pivot';

/** Labels of RFC 8428 §4.3 tables 1 and 4; others may follow, those ending in `_` must be understood. */
const labels = new Set([
	'bn',
	'bt',
	'bu',
	'bv',
	'bs',
	'bver',
	'n',
	'u',
	'v',
	'vs',
	'vb',
	'vd',
	's',
	't',
	'ut',
	'blo',
	'l'
]);

/** RFC 8428 §4.5.3: a time below 2^28 seconds is relative to now. */
const relativeBelowSeconds = 2 ** 28;
/** Seconds of the year 2200: more is a time in milliseconds, which the standard does not know. */
const latestSeconds = 7_258_118_400;

function numberOf(object: JsonObject, key: string): number {
	const text = textOfScalar(memberOf(object, key));
	return text === null ? NaN : Number(text);
}

/** True for a list of records as RFC 8428 has them. */
export function isSenml(root: JsonNode): boolean {
	if (!isArray(root) || root.items.length === 0) return false;
	const sample = root.items.slice(0, 50);
	const isRecord = (node: JsonNode): boolean =>
		isObject(node) && node.keys.length > 0 && node.keys.every((key) => labels.has(key));
	const hasLabel = (wanted: readonly string[]): boolean =>
		sample.some((node) => isObject(node) && node.keys.some((key) => wanted.includes(key)));
	return sample.every(isRecord) && hasLabel(['bn', 'n']) && hasLabel(['v', 'bv', 'vs', 'vb', 'vd']);
}

interface Base {
	name: string;
	seconds: number;
	unit: string;
	value: number;
}

function takeBase(base: Base, record: JsonObject): void {
	const [name, unit] = [textOfScalar(memberOf(record, 'bn')), textOfScalar(memberOf(record, 'bu'))];
	if (name !== null) base.name = name;
	if (unit !== null) base.unit = unit;
	if (!Number.isNaN(numberOf(record, 'bt'))) base.seconds = numberOf(record, 'bt');
	if (!Number.isNaN(numberOf(record, 'bv'))) base.value = numberOf(record, 'bv');
}

interface Resolved extends SensorRecord {
	readonly seconds: number;
}

function resolve(root: JsonNode): Resolved[] {
	const base: Base = { name: '', seconds: 0, unit: '', value: 0 };
	const resolved: Resolved[] = [];
	for (const record of isArray(root) ? root.items : []) {
		if (!isObject(record)) continue;
		takeBase(base, record);
		const own = memberOf(record, 'v');
		if (own === undefined) continue;
		const text = textOfScalar(own) ?? '';
		const time = numberOf(record, 't');
		const unit = textOfScalar(memberOf(record, 'u')) ?? base.unit;
		const seconds = base.seconds + (Number.isNaN(time) ? 0 : time);
		const value = base.value === 0 ? text : String(base.value + Number(text));
		resolved.push({
			seconds,
			time: '',
			channel: base.name + (textOfScalar(memberOf(record, 'n')) ?? ''),
			unit,
			value,
			at: record.at
		});
	}
	return resolved;
}

/** SenML records to a table; times relative to now stay relative, because nobody knows when "now" was. */
export function tableFromSenml(
	root: JsonNode,
	text: string
): Table | { code: 'no-time'; line: null; found: string } {
	const resolved = resolve(root);
	const wild = resolved.find(({ seconds }) => Math.abs(seconds) > latestSeconds);
	if (wild !== undefined) return { code: 'no-time', line: null, found: `t ${wild.seconds}` };
	const isRelative = resolved.every(({ seconds }) => seconds < relativeBelowSeconds);
	const records = resolved
		.filter(({ seconds }) => isRelative || seconds >= relativeBelowSeconds)
		.map((record) => ({
			...record,
			time: isRelative ? String(record.seconds) : new Date(Math.round(record.seconds * 1000)).toISOString()
		}));
	const [first] = resolved;
	const name = first?.channel.replace(/[:/]$/, '') ?? '';
	const entries = name === '' ? [] : [{ key: 'device', value: name, line: 1 }];
	return tableOfRecords('senml', isRelative ? 'elapsed (s)' : 'time', records, entries, text);
}
