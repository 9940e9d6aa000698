import { parse } from 'csv-parse/sync';
import type { Ingestion, ReadContext } from '../../src/lib/domain/ingest/ingestion';
import { decodeBytes } from '../../src/lib/domain/ingest/decode/decode-bytes';
import { tableFromText } from '../../src/lib/domain/ingest/delimited/table-from-text';
import { readExport } from '../../src/lib/domain/ingest/read-export';
import { readTable } from '../../src/lib/domain/ingest/read/read-table';
import { packTrace } from '../../src/lib/domain/trace/pack';

/** What reading one export cost against splitting the same bytes into cells. */
export interface ReaderRatio {
	readonly name: string;
	readonly bytes: number;
	readonly readings: number;
	readonly splitMs: number;
	readonly readMs: number;
	readonly timesSplit: number;
	readonly packedBytesPerReading: number;
}

const startMs = Date.UTC(2024, 0, 1);
export const benchContext: ReadContext = {
	uploadedMs: Date.UTC(2026, 5, 1),
	siteZone: 'Europe/Amsterdam',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};

const two = (n: number): string => String(n).padStart(2, '0');

function tenthsAt(i: number): number {
	// A slow swing with a little unrest, the same every time: a trace as a logger in a reefer writes it.
	return 40 + Math.round(15 * Math.sin(i / 400)) + (Math.imul(i, 2_654_435_761) >>> 29 === 0 ? 1 : 0);
}

/** Exports of one and the same journey as different instruments write it. */
const writers: Readonly<Record<string, (rows: number) => string>> = {
	'ISO, comma': (rows) =>
		written(rows, 'time,temperature °C', (d, c) => `${d.toISOString().slice(0, 19)}Z,${c.toFixed(1)}`),
	'D/M/Y, semicolon, decimal comma, humidity': (rows) =>
		written(
			rows,
			'Nr;Datum;Uhrzeit;Temperatur [°C];Feuchte [%rF]',
			(d, c, i) =>
				`${i + 1};${two(d.getUTCDate())}.${two(d.getUTCMonth() + 1)}.${d.getUTCFullYear()};` +
				`${d.toISOString().slice(11, 19)};${c.toFixed(1).replace('.', ',')};${(90 - c).toFixed(1).replace('.', ',')}`
		),
	'quoted cells': (rows) =>
		written(
			rows,
			'"Time (UTC)","Temperature (°C)"',
			(d, c) => `"${d.toISOString().slice(0, 19).replace('T', ' ')}","${c.toFixed(1)}"`
		)
};
export const benchLayouts = Object.keys(writers);

function written(
	rows: number,
	head: string,
	row: (at: Date, celsius: number, i: number) => string,
	everyMs = 600_000
): string {
	const lines = [head];
	for (let i = 0; i < rows; i++) lines.push(row(new Date(startMs + i * everyMs), tenthsAt(i) / 10, i));
	return `${lines.join('\n')}\n`;
}

/** An export of so many rows in one of the benches' layouts. */
export function benchExport(layout: string, rows: number): Uint8Array {
	return new TextEncoder().encode(writers[layout]?.(rows) ?? '');
}

function traceOf(ingestion: Ingestion) {
	if (ingestion.kind !== 'ok') throw new Error(`The export was not read: ${JSON.stringify(ingestion)}`);
	const trace = ingestion.understanding.channels[ingestion.understanding.temperature]?.trace;
	if (!trace) throw new Error('The export gave no trace.');
	return trace;
}

/** `in place` is the reader as it is; `general` splits every row, as it does with rows that are not alike. */
export type Way = 'in place' | 'general';

function readBy(way: Way, bytes: Uint8Array): Ingestion {
	if (way === 'in place') return readExport(bytes, benchContext);
	const decoded = decodeBytes(bytes);
	if ('code' in decoded) throw new Error(decoded.code);
	const table = tableFromText(decoded.text);
	if (!('rowCount' in table)) throw new Error('The export is no single table.');
	return readTable({ ...table, rowText: null }, decoded.encoding, benchContext);
}

/** Processor time of the quickest of several runs: what one leaves behind is cleared away before the last. */
function quickest(runs: number, nowMs: () => number, run: () => void): number {
	let least = Infinity;
	for (let i = 0; i < runs; i++) {
		const from = nowMs();
		run();
		least = Math.min(least, nowMs() - from);
	}
	return least;
}

/** Reads an export to a packed trace and splits it by csv-parse, twice several times each, and takes the best of each. */
export function measureReader(
	layout: string,
	rows: number,
	nowMs: () => number,
	way: Way = 'in place',
	runs = 6
): ReaderRatio {
	const bytes = benchExport(layout, rows);
	const delimiter = layout.includes('semicolon') ? ';' : ',';
	let [packed, readings] = [0, 0];
	const split = (): void => {
		if (parse(bytes, { delimiter }).length !== rows + 1) throw new Error('csv-parse saw other rows.');
	};
	const read = (): void => {
		const trace = traceOf(readBy(way, bytes));
		packed = packTrace(trace).length;
		readings = trace.times.length;
	};
	let [splitMs, readMs] = [Infinity, Infinity];
	for (let turn = 0; turn < 2; turn++) {
		splitMs = Math.min(splitMs, quickest(runs, nowMs, split));
		readMs = Math.min(readMs, quickest(runs, nowMs, read));
	}
	return {
		name: layout,
		bytes: bytes.length,
		readings,
		splitMs,
		readMs,
		timesSplit: readMs / splitMs,
		packedBytesPerReading: packed / readings
	};
}
