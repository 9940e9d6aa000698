import { maxColumns } from '../bounds';
import type { RefusalCode } from '../ingestion';
import type { Entry, Table } from '../layout/table';
import { lineFinder } from './line-finder';

/** One measured value of a file that keeps each in a record of its own. */
export interface SensorRecord {
	/** Text of the time, as a table's cell holds it. */
	readonly time: string;
	readonly channel: string;
	readonly unit: string;
	/** A word for no value where the sensor reported a fault. */
	readonly value: string;
	readonly at: number;
}

/** Records as columns: a file of two million holds no object for each. */
export interface SensorRecords {
	readonly count: number;
	/** What records of one moment have in common. */
	keyOf(record: number): string | number;
	timeOf(record: number): string;
	channelOf(record: number): string;
	unitOf(record: number): string;
	valueOf(record: number): string;
	at(record: number): number;
}

/** Records that are objects each, where there are few. */
export function recordsOf(records: readonly SensorRecord[]): SensorRecords {
	return {
		count: records.length,
		keyOf: (i) => records[i]?.time ?? '',
		timeOf: (i) => records[i]?.time ?? '',
		channelOf: (i) => records[i]?.channel ?? '',
		unitOf: (i) => records[i]?.unit ?? '',
		valueOf: (i) => records[i]?.value ?? '',
		at: (i) => records[i]?.at ?? 0
	};
}

interface Channels {
	readonly names: readonly string[];
	readonly units: readonly string[];
	/** By record, the column of its channel. */
	readonly columns: Uint16Array;
}

function channelsIn(records: SensorRecords): Channels | null {
	const known = new Map<string, number>();
	const units: string[] = [];
	const columns = new Uint16Array(records.count);
	for (let i = 0; i < records.count; i++) {
		const name = records.channelOf(i);
		let column = known.get(name);
		if (column === undefined) {
			if (known.size >= maxColumns) return null;
			column = known.size;
			known.set(name, column);
			units.push(records.unitOf(i));
		}
		columns[i] = column;
	}
	return { names: [...known.keys()], units, columns };
}

interface Moments {
	readonly count: number;
	/** First record of each row, and for each record the one of its row that comes next, or −1. */
	readonly first: Int32Array;
	readonly next: Int32Array;
}

/** Records of one moment as one row; a channel that comes twice begins another. */
function momentsIn(records: SensorRecords, { names, columns }: Channels): Moments {
	const first = new Int32Array(records.count);
	const next = new Int32Array(records.count).fill(-1);
	const last = new Int32Array(records.count);
	const isSingle = names.length === 1;
	const open = new Map<string | number, number>();
	let count = 0;
	const holds = (row: number, column: number | undefined): boolean => {
		for (let i = first[row] ?? -1; i >= 0; i = next[i] ?? -1) if (columns[i] === column) return true;
		return false;
	};
	for (let i = 0; i < records.count; i++) {
		const row = isSingle ? undefined : open.get(records.keyOf(i));
		if (row !== undefined && !holds(row, columns[i])) {
			next[last[row] ?? 0] = i;
			last[row] = i;
			continue;
		}
		first[count] = last[count] = i;
		if (!isSingle) open.set(records.keyOf(i), count);
		count++;
	}
	return { count, first, next };
}

/** Records to a table: one row a moment and one column a channel. A moment seen twice in a channel keeps both rows. */
export function tableOfRecords(
	kind: 'senml' | 'epcis',
	timeHead: string,
	records: SensorRecords,
	entries: readonly Entry[],
	text: string
): Table | { readonly code: RefusalCode; readonly line: null; readonly found: null } {
	const channels = channelsIn(records);
	if (channels === null) return { code: 'too-many-columns', line: null, found: null };
	const { count, first, next } = momentsIn(records, channels);
	const width = channels.names.length + 1;
	const lineAt = lineFinder(text);
	const cells = (row: number): string[] => {
		const from = first[row] ?? -1;
		const out = new Array<string>(width).fill('');
		if (from >= 0) out[0] = records.timeOf(from);
		// A fault has no value and was due; a blank cell was not.
		for (let i = from; i >= 0; i = next[i] ?? -1)
			out[(channels.columns[i] ?? 0) + 1] = records.valueOf(i) || 'null';
		return out;
	};
	return {
		kind,
		delimiter: null,
		header: [timeHead, ...channels.names],
		headerLine: null,
		makeHeader: [timeHead],
		units: ['', ...channels.units],
		entries,
		freeText: '',
		rowCount: count,
		cells,
		lineOf: (row) => lineAt(records.at(first[row] ?? 0) + 1),
		textOf: (row) => cells(row).join(', '),
		isUnterminated: false,
		isSparse: true
	};
}
