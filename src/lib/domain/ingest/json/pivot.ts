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

/** Records to a table: one row a moment and one column a channel. A moment seen twice in a channel keeps both rows. */
export function tableOfRecords(
	kind: 'senml' | 'epcis',
	timeHead: string,
	records: readonly SensorRecord[],
	entries: readonly Entry[],
	text: string
): Table {
	const channels = new Map<string, { column: number; unit: string }>();
	for (const { channel, unit } of records) {
		if (!channels.has(channel)) channels.set(channel, { column: channels.size + 1, unit });
	}
	const width = channels.size + 1;
	const rows: { cells: string[]; at: number }[] = [];
	const open = new Map<string, { cells: string[]; at: number }>();
	for (const { time, channel, value, at } of records) {
		const column = channels.get(channel)?.column ?? 0;
		let row = open.get(time);
		if (row === undefined || row.cells[column] !== '') {
			const cells = new Array<string>(width).fill('');
			cells[0] = time;
			row = { cells, at };
			rows.push(row);
			open.set(time, row);
		}
		// A fault has no value and was due; a blank cell was not.
		row.cells[column] = value === '' ? 'null' : value;
	}
	const lineAt = lineFinder(text);
	return {
		kind,
		delimiter: null,
		header: [timeHead, ...channels.keys()],
		headerLine: null,
		makeHeader: [timeHead],
		units: ['', ...[...channels.values()].map(({ unit }) => unit)],
		entries,
		freeText: '',
		rowCount: rows.length,
		cells: (row) => rows[row]?.cells ?? [],
		lineOf: (row) => lineAt((rows[row]?.at ?? 0) + 1),
		textOf: (row) => (rows[row]?.cells ?? []).join(', '),
		isUnterminated: false,
		isSparse: true
	};
}
