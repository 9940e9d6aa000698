import { linesPerPage, type FileLinesView, type LineQuery, type LineView } from '../../schemas/file-lines';
import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { Site } from '../db/models/site';
import { TraceRow } from '../db/models/trace-row';
import { Refusal } from '../refusals';
import { getTraceFor } from '../traces/find-trace';
import { getReadFor } from './find-read';
import type { LinesFound, LinesWish } from './lines-of-file';
import { readAgain } from './read-again';
import { parseUnderstanding } from './stored-understanding';

/** A page of a file's lines beside the readings that were made of them. @throws Refusal `not-found`, `not-allowed` */
export async function getFileLines(ctx: Context, readId: string, fromLine: number): Promise<FileLinesView> {
	const { read, shipment } = await getReadFor(ctx, readId, 'raw-line.view');
	const found = await linesFound(read, { fromLine, count: linesPerPage });
	const site = await Site.findByPk(shipment.siteId);
	const trace = await TraceRow.findOne({ where: { readId, isAssessed: true } });
	const clockShiftMs = Number(trace?.clockShiftMs ?? 0);
	const lines = found?.lines ?? [];
	return {
		fileName: read.fileName,
		docket: { number: shipment.number, title: shipment.title },
		zone: site?.zone ?? 'UTC',
		clockShiftMs,
		total: found?.total ?? null,
		lines: lines.map((line) => ({ ...line, atMs: line.atMs === null ? null : line.atMs + clockShiftMs }))
	};
}

/** The line of the file that one reading of a trace was made of. @throws Refusal `not-found`, `not-allowed` */
export async function getReadingLine(ctx: Context, traceId: string, { at }: LineQuery): Promise<LineView> {
	const { trace } = await getTraceFor(ctx, traceId, 'raw-line.view');
	const read = await LoggerRead.findByPk(trace.readId);
	if (!read) throw new Error(`The read of trace ${traceId} is missing.`);
	// The file knows nothing of a correction of its clock.
	const atMs = Date.parse(at) - Number(trace.clockShiftMs);
	const found = await linesFound(read, { channel: trace.ordinal, atMs });
	const line = found?.lines[0];
	if (!line) throw new Refusal('not-found', 'This trace has no reading at that moment.');
	return { fileName: read.fileName, line: line.line, text: line.text, isCut: line.isCut };
}

async function linesFound(read: LoggerRead, lines: LinesWish): Promise<LinesFound | null> {
	const context = parseUnderstanding(read.understanding)?.context;
	if (!context) return null;
	return (await readAgain(read, context, false, lines)).lines ?? null;
}
