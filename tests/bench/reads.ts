import type { Context } from '../../src/lib/server/context';
import { keepRead } from '../../src/lib/server/reads/keep-read';
import { receiveUpload } from '../../src/lib/server/reads/receive-upload';
import { TraceRow } from '../../src/lib/server/db/models/trace-row';
import { seriesView } from '../../src/lib/server/traces/get-series';
import { exportText, multipart } from '../helpers/upload';

/** What one long export cost from the wire to the docket's new figures. */
export interface ReadSeconds {
	bytes: number;
	uploadedAndRead: number;
	/** Read again, packed, written, and the docket assessed. */
	kept: number;
	/** One answer of the series at a screen's width. */
	series: number;
	packedBytes: number;
	readings: number;
}

/** Uploads, reads and keeps an export with a reading every three seconds, and draws it once. */
export async function measureReads(
	ctx: Context,
	docket: string,
	readings: number,
	nowMs: () => number
): Promise<ReadSeconds> {
	const content = exportText({ celsius: 2, readings, everyMinutes: 0.05 });
	const { body, contentType, bytes } = await multipart([{ name: 'long.csv', content }]);
	const start = nowMs();
	const { reads } = await receiveUpload(ctx, docket, { body, contentType });
	const read = nowMs();
	const readId = reads[0]?.id ?? '';
	await keepRead(ctx, readId, {
		serial: `BENCH-${readId.slice(-8)}`,
		lineId: null,
		position: null,
		placement: 'between-cases',
		accuracyCelsius: 0.5
	});
	const kept = nowMs();
	const trace = await TraceRow.findOne({ where: { readId } });
	if (!trace) throw new Error('The long export gave no trace.');
	await seriesView(trace, { fromMs: null, toMs: null, points: 2000 });
	return {
		bytes: bytes.length,
		uploadedAndRead: (read - start) / 1000,
		kept: (kept - read) / 1000,
		series: (nowMs() - kept) / 1000,
		packedBytes: trace.packed.length,
		readings: trace.readings
	};
}
