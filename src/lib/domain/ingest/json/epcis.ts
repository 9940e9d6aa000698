import type { RefusalCode } from '../ingestion';
import type { Entry, Table } from '../layout/table';
import { isArray, isObject, memberOf, textOfScalar, type JsonNode, type JsonObject } from './json-node';
import { lineFinder } from './line-finder';
import { recordsOf, tableOfRecords, type SensorRecord } from './pivot';

const textIn = (object: JsonObject | undefined, key: string): string | null =>
	object === undefined ? null : textOfScalar(memberOf(object, key));

/** Last part of `gs1:Temperature`, `https://gs1.org/voc/Temperature`, `gs1:MT-Temperature`. */
function typeName(type: string): string {
	return (/[^/:#]*$/.exec(type)?.[0] ?? type).replace(/^MT-/, '');
}

interface Report extends SensorRecord {
	/** Device that measured; else what was observed or where. Empty when the event names nothing. */
	readonly subject: string;
}

/** Fields that stand either in the metadata or in the report, never in both. Source: GS1 EPCIS conformance TCR-53. */
const inlineFields = ['time', 'deviceID', 'deviceMetadata', 'rawData', 'dataProcessingMethod'] as const;

/** What a report may state, with the word that names its column. */
const figures = [
	['value', ''],
	['meanValue', 'mean'],
	['minValue', 'min'],
	['maxValue', 'max']
] as const;

/** An event without a device is told apart by its goods, else by its place. */
function subjectOf(event: JsonObject): string {
	const goods = memberOf(event, 'epcList');
	const first = isArray(goods) ? textOfScalar(goods.items[0]) : null;
	const place = memberOf(event, 'readPoint');
	return first ?? textIn(event, 'parentID') ?? textIn(isObject(place) ? place : undefined, 'id') ?? '';
}

class Reports {
	readonly found: Report[] = [];
	/** A report that states a field its metadata states too. */
	clash: { at: number; field: string } | null = null;

	element(element: JsonObject, event: JsonObject, taken: Map<string, number>): void {
		const metadata = memberOf(element, 'sensorMetadata');
		const shared = isObject(metadata) ? metadata : undefined;
		const reports = memberOf(element, 'sensorReport');
		for (const report of isArray(reports) ? reports.items : []) {
			const type = isObject(report) ? textIn(report, 'type') : null;
			if (isObject(report) && type !== null) this.report(report, type, shared, event, taken);
		}
	}

	report(
		report: JsonObject,
		type: string,
		shared: JsonObject | undefined,
		event: JsonObject,
		taken: Map<string, number>
	): void {
		const field = inlineFields.find(
			(name) =>
				memberOf(report, name) !== undefined && shared !== undefined && memberOf(shared, name) !== undefined
		);
		if (field !== undefined) this.clash ??= { at: report.at, field };
		const time =
			textIn(report, 'time') ??
			textIn(shared, 'time') ??
			textIn(shared, 'endTime') ??
			textIn(event, 'eventTime');
		if (time === null) return;
		const subject = textIn(report, 'deviceID') ?? textIn(shared, 'deviceID') ?? subjectOf(event);
		const component = typeName(textIn(report, 'component') ?? '');
		const name = [typeName(type), component].filter((part) => part !== '').join(' ');
		// Two reports of one type at one moment are two sensors, whatever else they have in common.
		const key = JSON.stringify([name, subject, time]);
		const nth = (taken.get(key) ?? 0) + 1;
		taken.set(key, nth);
		const base = { time, subject, unit: textIn(report, 'uom') ?? '', at: report.at };
		const channel = nth === 1 ? name : `${name} ${nth}`;
		const isFault = textIn(report, 'exception') === 'ERROR_CONDITION';
		const stated = figures.filter(([member]) => textIn(report, member) !== null);
		for (const [member, word] of stated) {
			const value = isFault ? 'error' : (textIn(report, member) ?? '');
			this.found.push({ ...base, channel: word === '' ? channel : `${channel} ${word}`, value });
		}
		// A report of an exception without a figure is no reading, and never a zero.
		if (stated.length === 0 && textIn(report, 'exception') !== null)
			this.found.push({ ...base, channel, value: 'error' });
	}
}

function reportsIn(root: JsonNode): Reports {
	const reports = new Reports();
	const walk = (node: JsonNode): void => {
		if (isArray(node)) node.items.forEach(walk);
		if (!isObject(node)) return;
		const elements = memberOf(node, 'sensorElementList');
		if (!isArray(elements)) {
			node.values.forEach(walk);
			return;
		}
		const taken = new Map<string, number>();
		for (const element of elements.items) if (isObject(element)) reports.element(element, node, taken);
	};
	walk(root);
	return reports;
}

type Refused = { readonly code: RefusalCode; readonly line: number | null; readonly found: string | null };

/** Sensor reports of every event of a GS1 EPCIS 2.0 document, in the order of the file; null when it holds none. */
export function tableFromEpcis(root: JsonNode, text: string): Table | Refused | null {
	const { found, clash } = reportsIn(root);
	if (clash !== null)
		return {
			code: 'broken-json',
			line: lineFinder(text)(clash.at + 1),
			found: `${clash.field}, ${clash.field}`
		};
	if (found.length === 0) return null;
	const subjects = new Set(found.map(({ subject }) => subject));
	const [only] = subjects;
	const entries: Entry[] =
		subjects.size === 1 && only?.includes(':') === true ? [{ key: 'device', value: only, line: 1 }] : [];
	// One device needs no naming in every channel.
	const records = found.map(({ subject, ...record }) =>
		subjects.size === 1 || subject === '' ? record : { ...record, channel: `${record.channel} ${subject}` }
	);
	return tableOfRecords('epcis', 'time', recordsOf(records), entries, text);
}
