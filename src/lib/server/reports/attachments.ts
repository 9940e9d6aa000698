import type { FrozenDocket } from '../../schemas/docket';
import { LoggerRead } from '../db/models/logger-read';
import { Shipment } from '../db/models/shipment';
import { StoredFile } from '../db/models/stored-file';
import { TraceRow } from '../db/models/trace-row';
import { sha256Hex } from '../storage/sha256';
import { fileStore } from '../storage/store';
import { readingsCsv } from '../traces/readings-csv';
import type { ReportAttachment } from './pdf/report-input';
import { safeFileName } from './safe-file-name';

/** What more than this would make a report too heavy to mail; the rest is named by hash and lies in the bundle. */
const embeddedBytesAtMost = 10_000_000;

type Logger = FrozenDocket['docket']['loggers'][number];

/** Each logger's export as received, then its readings as CSV, as far as there is room: exports first. */
export async function attachmentsOf(docket: FrozenDocket['docket']): Promise<ReportAttachment[]> {
	const kept: ReportAttachment[] = [];
	let total = 0;
	const take = (found: ReportAttachment | null) => {
		if (!found || total + found.bytes.byteLength > embeddedBytesAtMost) return;
		if (kept.some(({ name }) => name === found.name)) return;
		total += found.bytes.byteLength;
		kept.push(found);
	};
	for (const logger of docket.loggers) take(await exportOf(logger));
	for (const logger of docket.loggers) take(await readingsOf(docket.id, logger));
	return kept;
}

async function exportOf(logger: Logger): Promise<ReportAttachment | null> {
	const read = logger.readId ? await LoggerRead.findByPk(logger.readId) : null;
	const file = read ? await StoredFile.findByPk(read.fileId) : null;
	if (!read || !file || file.bytes > embeddedBytesAtMost) return null;
	return {
		name: `${logger.label}-${safeFileName(read.fileName)}`,
		bytes: await (await fileStore()).read(file.sha256),
		mediaType: file.mediaType,
		description: `Export of logger ${logger.serial} as received, SHA-256 ${file.sha256}`,
		relationship: 'Source'
	};
}

async function readingsOf(shipmentId: string, logger: Logger): Promise<ReportAttachment | null> {
	const trace = logger.traceId ? await TraceRow.findByPk(logger.traceId) : null;
	const shipment = trace ? await Shipment.findByPk(shipmentId) : null;
	if (!trace || !shipment) return null;
	const pieces: Buffer[] = [];
	for await (const piece of (await readingsCsv(trace, shipment)).open()) pieces.push(piece as Buffer);
	const bytes = Buffer.concat(pieces);
	return {
		name: `${logger.label}-${safeFileName(logger.serial)}-readings.csv`,
		bytes,
		mediaType: 'text/csv',
		description: `Readings of logger ${logger.serial} as read from its export, SHA-256 ${sha256Hex(bytes)}`,
		relationship: 'Data'
	};
}
