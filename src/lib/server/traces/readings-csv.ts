import { Readable } from 'node:stream';
import { zoneOffsetMinutes } from '../../format-time';
import { unpackTrace } from '../../domain/trace/pack';
import { celsiusOf, type Trace } from '../../domain/trace/trace';
import { shifted } from '../assessments/assessment-inputs';
import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { LoggerTrip } from '../db/models/logger-trip';
import { Site } from '../db/models/site';
import type { Shipment } from '../db/models/shipment';
import type { TraceRow } from '../db/models/trace-row';
import { getTraceFor } from './find-trace';

/** Rows written at once. */
const rowsAtOnce = 2000;

/** A trace's readings as a file, for whoever may see its docket. */
export async function getReadingsCsv(
	ctx: Context,
	traceId: string
): Promise<{ fileName: string; open: () => Readable }> {
	const { trace, shipment } = await getTraceFor(ctx, traceId, 'shipment.view');
	return readingsCsv(trace, shipment);
}

/** The same without asking a policy: callers have. */
export async function readingsCsv(
	row: TraceRow,
	shipment: Shipment
): Promise<{ fileName: string; open: () => Readable }> {
	const site = await Site.findByPk(shipment.siteId);
	const trip = row.tripId ? await LoggerTrip.findByPk(row.tripId) : null;
	const read = await LoggerRead.findByPk(row.readId);
	const serial = trip?.serial ?? row.name;
	const facts = [shipment.number, serial, row.name, read?.fileName ?? ''];
	const trace = shifted(unpackTrace(row.packed), Number(row.clockShiftMs));
	return {
		fileName: `${shipment.number}-${serial}-readings.csv`,
		open: () => Readable.from(csvBytes(trace, site?.zone ?? 'UTC', facts))
	};
}

// Bytes, because a web stream of text is not a response's body.
function* csvBytes(trace: Trace, zone: string, facts: readonly string[]): Generator<Buffer> {
	for (const text of csvRows(trace, zone, facts)) yield Buffer.from(text, 'utf8');
}

/** RFC 4180: a header, CRLF, and quotes where a cell needs them. */
export function* csvRows(trace: Trace, zone: string, facts: readonly string[]): Generator<string> {
	const celsius = celsiusOf(trace);
	const cells = facts.map(csvText).join(',');
	yield `time_utc,time_local,celsius,as_written,unit,docket,logger,channel,file\r\n`;
	for (let from = 0; from < celsius.length; from += rowsAtOnce) {
		let text = '';
		for (let i = from; i < Math.min(from + rowsAtOnce, celsius.length); i++) {
			const ms = trace.times[i] ?? 0;
			const written = ((trace.scaled[i] ?? 0) / 10 ** trace.decimals).toFixed(trace.decimals);
			const degrees = Number((celsius[i] ?? 0).toFixed(4));
			text += `${instant(ms)},${localInstant(ms, zone)},${degrees},${written},${trace.unit},${cells}\r\n`;
		}
		yield text;
	}
}

/** A text cell that a spreadsheet will not take for a formula; figures never come here, so a minus is left alone. */
export function csvText(text: string): string {
	const safe = /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
	return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

function instant(ms: number): string {
	return new Date(ms).toISOString().replace('.000Z', 'Z');
}

const offsets = new Map<string, number>();

/** The zone changes its offset at full quarter hours only, so one look-up serves a quarter of an hour. */
function offsetMinutes(ms: number, zone: string): number {
	const key = `${zone} ${Math.floor(ms / 900_000)}`;
	const known = offsets.get(key);
	if (known !== undefined) return known;
	if (offsets.size > 50_000) offsets.clear();
	const found = zoneOffsetMinutes(ms, zone);
	offsets.set(key, found);
	return found;
}

/** Local time with its offset, as ISO 8601 has it. */
function localInstant(ms: number, zone: string): string {
	const minutes = offsetMinutes(ms, zone);
	const local = new Date(ms + minutes * 60_000).toISOString().replace(/(\.000)?Z$/, '');
	const whole = Math.abs(minutes);
	const part = (n: number) => String(n).padStart(2, '0');
	return `${local}${minutes < 0 ? '-' : '+'}${part(Math.floor(whole / 60))}:${part(whole % 60)}`;
}
