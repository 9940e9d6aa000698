import type { SeriesView } from '../../schemas/docket';
import { TraceRow } from '../db/models/trace-row';
import { seriesView } from '../traces/get-series';

/** More than the printed chart resolves at 300 dpi. */
const printedPoints = 1200;

/**
 * The courses a signed record keeps, one per logger. Read before the docket is locked: traces never change, and what
 * they rest on is in the evidence that is compared under the lock.
 */
export async function frozenSeries(shipmentId: string): Promise<SeriesView[]> {
	const traces = await TraceRow.findAll({
		where: { shipmentId, isAssessed: true },
		order: ['firstAt', 'ordinal']
	});
	return Promise.all(
		traces.map((trace) => seriesView(trace, { fromMs: null, toMs: null, points: printedPoints }))
	);
}
