import { maxColumns } from '../bounds';
import type { RefusalCode } from '../ingestion';
import type { Table } from '../layout/table';
import { isArray, isObject, memberOf, textOfScalar, type JsonNode, type JsonObject } from './json-node';
import { tableOfRecords, type SensorRecords } from './pivot';

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

const isText = (node: JsonNode | undefined): boolean => node === undefined || typeof node === 'string';
const isFigure = (node: JsonNode | undefined): boolean =>
	node === undefined || (isObject(node) === false && textOfScalar(node) !== null && typeof node !== 'string');
const valueLabels = ['v', 'vs', 'vb', 'vd', 's'];

/** A record has names as text and times as numbers; labels of its own may stand beside those of the standard. */
function isRecord(node: JsonNode): boolean {
	if (!isObject(node) || !node.keys.some((key) => labels.has(key))) return false;
	const areTexts = ['bn', 'n', 'bu', 'u'].every((key) => isText(memberOf(node, key)));
	return areTexts && ['bt', 't', 'bv'].every((key) => isFigure(memberOf(node, key)));
}

/** True for a list of records as RFC 8428 has them. */
export function isSenml(root: JsonNode): boolean {
	if (!isArray(root) || root.items.length === 0) return false;
	const sample = root.items.slice(0, 50);
	const hasLabel = (wanted: readonly string[]): boolean =>
		sample.some((node) => isObject(node) && node.keys.some((key) => wanted.includes(key)));
	const isNamed = hasLabel(['bn', 'n']) && hasLabel(['bn', 'bt', 'bu', 'bver', 'u', 't', 'vs', 'vb', 'vd']);
	return sample.every(isRecord) && isNamed && hasLabel([...valueLabels, 'bv']);
}

interface Base {
	name: string;
	seconds: number;
	unit: string;
	value: number;
}

const read = ['bn', 'bt', 'bu', 'bv', 'n', 't', 'u', 'v'] as const;
type Places = Readonly<Record<(typeof read)[number], number>>;

/** Where each label stands among the keys of a record; −1 where it does not. The last of two counts. */
function placesIn(keys: readonly string[]): Places {
	const at = (label: string): number => keys.lastIndexOf(label);
	const [bn, bt, bu, bv, n, t, u, v] = read;
	return { bn: at(bn), bt: at(bt), bu: at(bu), bv: at(bv), n: at(n), t: at(t), u: at(u), v: at(v) };
}

const textAt = (record: JsonObject, place: number): string | null =>
	place < 0 ? null : textOfScalar(record.values[place]);

function numberAt(record: JsonObject, place: number): number {
	const text = textAt(record, place);
	return text === null ? NaN : Number(text);
}

function takeBase(base: Base, record: JsonObject, { bn, bt, bu, bv }: Places): void {
	base.name = textAt(record, bn) ?? base.name;
	base.unit = textAt(record, bu) ?? base.unit;
	if (!Number.isNaN(numberAt(record, bt))) base.seconds = numberAt(record, bt);
	if (!Number.isNaN(numberAt(record, bv))) base.value = numberAt(record, bv);
}

/** What records say once base values are applied, as columns: objects of two million would outweigh the file. */
interface Resolved {
	count: number;
	readonly seconds: Float64Array;
	readonly at: Int32Array;
	readonly values: string[];
	readonly channels: string[];
	readonly units: string[];
}

const decimalsOf = (text: string): number => /^-?\d+\.(\d+)$/.exec(text)?.[1]?.length ?? 0;

/** Base value and value added, with no more decimals than they were written with. */
function sumOf(base: Base, text: string): string {
	if (base.value === 0) return text;
	const decimals = Math.max(decimalsOf(text), decimalsOf(String(base.value)));
	return (base.value + Number(text)).toFixed(Math.min(decimals, 12));
}

/** SenML knows °C and kelvin; `F` is the farad, and what a maker means by `degF` is for a person to say. */
function temperatureUnitOnly(unit: string): string {
	return /^\W*(?:deg)?\W*F(?:ahrenheit)?\W*$/i.test(unit) ? '' : unit;
}

/** A channel's name is put together once, not in each of its records. */
function joinedNames(): (base: string, own: string) => string {
	const known = new Map<string, string>();
	let from = '';
	return (base, own) => {
		if (base !== from) known.clear();
		from = base;
		const name = known.get(own) ?? base + own;
		if (known.size < maxColumns) known.set(own, name);
		return name;
	};
}

function resolve(root: JsonNode): Resolved {
	const base: Base = { name: '', seconds: 0, unit: '', value: 0 };
	const items = isArray(root) ? root.items : [];
	const resolved: Resolved = {
		count: 0,
		seconds: new Float64Array(items.length),
		at: new Int32Array(items.length),
		values: [],
		channels: [],
		units: []
	};
	const nameOf = joinedNames();
	let [keys, places] = [[] as readonly string[], placesIn([])];
	for (const record of items) {
		if (!isObject(record)) continue;
		// Records alike share their list of keys.
		if (record.keys !== keys) [keys, places] = [record.keys, placesIn(record.keys)];
		takeBase(base, record, places);
		if (places.v < 0) continue;
		const seconds = numberAt(record, places.t);
		resolved.seconds[resolved.count] = base.seconds + (Number.isNaN(seconds) ? 0 : seconds);
		resolved.at[resolved.count++] = record.at;
		resolved.channels.push(nameOf(base.name, textAt(record, places.n) ?? ''));
		resolved.units.push(textAt(record, places.u) ?? base.unit);
		resolved.values.push(sumOf(base, textAt(record, places.v) ?? ''));
	}
	return resolved;
}

type Refused = { readonly code: RefusalCode; readonly line: null; readonly found: string | null };

/** RFC 8428 §4.4: a label that ends in `_` and is not understood makes the whole pack unreadable. */
function unknownDuty(root: JsonNode): string | null {
	let keys: readonly string[] = [];
	for (const record of isArray(root) ? root.items : []) {
		if (!isObject(record) || record.keys === keys) continue;
		keys = record.keys;
		const found = keys.find((key) => key.endsWith('_'));
		if (found !== undefined) return found;
	}
	return null;
}

function refusalOf(root: JsonNode, { count, values, seconds }: Resolved): Refused | null {
	const duty = unknownDuty(root);
	if (duty !== null) return { code: 'no-readings', line: null, found: duty };
	if (count === 0) return { code: 'no-readings', line: null, found: 'SenML' };
	if (count === 1) return { code: 'one-reading', line: null, found: values[0] ?? '' };
	const wild = seconds.find((at) => Math.abs(at) > latestSeconds);
	return wild === undefined ? null : { code: 'implausible-dates', line: null, found: `t ${wild}` };
}

/** SenML records to a table; times relative to now stay relative, because nobody knows when "now" was. */
export function tableFromSenml(root: JsonNode, text: string): Table | Refused {
	const resolved = resolve(root);
	const refusal = refusalOf(root, resolved);
	if (refusal !== null) return refusal;
	const { count, channels, units, values, at } = resolved;
	const seconds = resolved.seconds.subarray(0, count);
	const isRelative = seconds.every((second) => second < relativeBelowSeconds);
	// Beside instants a time relative to now has no place on the axis: it stays blank and is told.
	const isPlaceless = (second: number): boolean => !isRelative && second < relativeBelowSeconds;
	const timeOf = (second: number): string =>
		isRelative
			? String(second)
			: isPlaceless(second)
				? ''
				: new Date(Math.round(second * 1000)).toISOString();
	const records: SensorRecords = {
		count,
		keyOf: (i) =>
			isPlaceless(seconds[i] ?? 0)
				? ''
				: isRelative
					? (seconds[i] ?? 0)
					: Math.round((seconds[i] ?? 0) * 1000),
		timeOf: (i) => timeOf(seconds[i] ?? 0),
		channelOf: (i) => channels[i] ?? '',
		unitOf: (i) => temperatureUnitOnly(units[i] ?? ''),
		valueOf: (i) => values[i] ?? '',
		at: (i) => at[i] ?? 0
	};
	const name = channels[0]?.replace(/[:/]$/, '') ?? '';
	const entries = name === '' ? [] : [{ key: 'device', value: name, line: 1 }];
	return tableOfRecords('senml', isRelative ? 'elapsed (s)' : 'time', records, entries, text);
}
