import type { Entry, Table } from '../layout/table';
import { isArray, isObject, memberOf, textOfScalar, type JsonNode, type JsonObject } from './json-node';
import { tableOfRecords, type SensorRecord } from './pivot';

const textIn = (object: JsonObject | undefined, key: string): string | null =>
	object === undefined ? null : textOfScalar(memberOf(object, key));

/** Last part of `gs1:Temperature`, `https://gs1.org/voc/Temperature`, `gs1:MT-Temperature`. */
function typeName(type: string): string {
	return (/[^/:#]*$/.exec(type)?.[0] ?? type).replace(/^MT-/, '');
}

function reportsOf(element: JsonObject, eventTime: string | null): SensorRecord[] {
	const metadata = memberOf(element, 'sensorMetadata');
	const shared = isObject(metadata) ? metadata : undefined;
	const reports = memberOf(element, 'sensorReport');
	const list = isArray(reports) ? reports.items : [];
	return list.flatMap((report) => {
		const type = isObject(report) ? textIn(report, 'type') : null;
		if (!isObject(report) || type === null) return [];
		const time = textIn(report, 'time') ?? textIn(shared, 'time') ?? eventTime;
		if (time === null) return [];
		const device = textIn(report, 'deviceID') ?? textIn(shared, 'deviceID') ?? '';
		const channel = [typeName(type), typeName(textIn(report, 'component') ?? ''), device]
			.filter((part) => part !== '')
			.join(' ');
		// A report of an error without a value is no reading, and never a zero.
		const value = textIn(report, 'value') ?? '';
		if (value === '' && textIn(report, 'exception') === null) return [];
		return [{ time, channel, unit: textIn(report, 'uom') ?? '', value, at: report.at }];
	});
}

/** Sensor reports of every event of a GS1 EPCIS 2.0 document, in the order of the file; null when it holds none. */
export function tableFromEpcis(root: JsonNode, text: string): Table | null {
	const records: SensorRecord[] = [];
	const walk = (node: JsonNode): void => {
		if (isArray(node)) node.items.forEach(walk);
		if (!isObject(node)) return;
		const elements = memberOf(node, 'sensorElementList');
		if (!isArray(elements)) {
			node.values.forEach(walk);
			return;
		}
		for (const element of elements.items)
			if (isObject(element)) records.push(...reportsOf(element, textIn(node, 'eventTime')));
	};
	walk(root);
	if (records.length === 0) return null;
	const devices = new Set(records.map(({ channel }) => channel.split(' ').at(-1) ?? ''));
	const [device] = devices;
	const entries: Entry[] =
		devices.size === 1 && device?.includes(':') === true ? [{ key: 'device', value: device, line: 1 }] : [];
	// One device needs no naming in every channel.
	const plain =
		entries.length === 0
			? records
			: records.map((record) => ({ ...record, channel: record.channel.split(' ').slice(0, -1).join(' ') }));
	return tableOfRecords('epcis', 'time', plain, entries, text);
}
