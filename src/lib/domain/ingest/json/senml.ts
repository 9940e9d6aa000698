import type { RefusalCode } from '../ingestion';
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

function resolve(root: JsonNode): Resolved[] {
	const base: Base = { name: '', seconds: 0, unit: '', value: 0 };
	const resolved: Resolved[] = [];
	for (const record of isArray(root) ? root.items : []) {
		if (!isObject(record)) continue;
		takeBase(base, record);
		const own = memberOf(record, 'v');
		if (own === undefined) continue;
		const time = numberOf(record, 't');
		resolved.push({
			seconds: base.seconds + (Number.isNaN(time) ? 0 : time),
			time: '',
			channel: base.name + (textOfScalar(memberOf(record, 'n')) ?? ''),
			unit: temperatureUnitOnly(textOfScalar(memberOf(record, 'u')) ?? base.unit),
			value: sumOf(base, textOfScalar(own) ?? ''),
			at: record.at
		});
	}
	return resolved;
}

type Refused = { readonly code: RefusalCode; readonly line: null; readonly found: string };

/** RFC 8428 §4.4: a label that ends in `_` and is not understood makes the whole pack unreadable. */
function unknownDuty(root: JsonNode): string | null {
	for (const record of isArray(root) ? root.items : []) {
		const found = isObject(record) ? record.keys.find((key) => key.endsWith('_')) : undefined;
		if (found !== undefined) return found;
	}
	return null;
}

function refusalOf(root: JsonNode, resolved: readonly Resolved[]): Refused | null {
	const duty = unknownDuty(root);
	if (duty !== null) return { code: 'no-readings', line: null, found: duty };
	const [first] = resolved;
	if (first === undefined) return { code: 'no-readings', line: null, found: 'SenML' };
	if (resolved.length === 1) return { code: 'one-reading', line: null, found: first.value };
	const wild = resolved.find(({ seconds }) => Math.abs(seconds) > latestSeconds);
	return wild === undefined ? null : { code: 'implausible-dates', line: null, found: `t ${wild.seconds}` };
}

/** SenML records to a table; times relative to now stay relative, because nobody knows when "now" was. */
export function tableFromSenml(root: JsonNode, text: string): Table | Refused {
	const resolved = resolve(root);
	const refusal = refusalOf(root, resolved);
	if (refusal !== null) return refusal;
	const isRelative = resolved.every(({ seconds }) => seconds < relativeBelowSeconds);
	const timeOf = (seconds: number): string => {
		if (isRelative) return String(seconds);
		// Beside instants a time relative to now has no place on the axis: it stays blank and is told.
		return seconds < relativeBelowSeconds ? '' : new Date(Math.round(seconds * 1000)).toISOString();
	};
	const records = resolved.map((record) => ({ ...record, time: timeOf(record.seconds) }));
	const name = resolved[0]?.channel.replace(/[:/]$/, '') ?? '';
	const entries = name === '' ? [] : [{ key: 'device', value: name, line: 1 }];
	return tableOfRecords('senml', isRelative ? 'elapsed (s)' : 'time', records, entries, text);
}
