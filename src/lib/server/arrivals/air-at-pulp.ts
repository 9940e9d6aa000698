import { celsiusOf, type Trace } from '../../domain/trace/trace';
import { unpackTrace } from '../../domain/trace/pack';
import type { DocketView } from '../../schemas/docket';
import { shifted } from '../assessments/assessment-inputs';
import { TraceRow } from '../db/models/trace-row';

/** Air older than this says nothing of the moment the probe was in. */
const longestAwayMs = 30 * 60_000;

/** The reading of a trace nearest to a moment; null where none was near. */
export function celsiusNear(trace: Trace, atMs: number): number | null {
	const celsius = celsiusOf(trace);
	let best: { away: number; celsius: number } | null = null;
	for (let i = 0; i < celsius.length; i++) {
		const away = Math.abs((trace.times[i] ?? 0) - atMs);
		if (away <= longestAwayMs && (best === null || away < best.away))
			best = { away, celsius: celsius[i] ?? 0 };
	}
	return best?.celsius ?? null;
}

/** The air when each pulp reading was taken, by the first logger outside the product that was running. */
export async function airAtPulp(docket: DocketView): Promise<Record<string, number | null>> {
	if (docket.pulp.length === 0) return {};
	const traced = docket.loggers.filter((logger) => logger.traceId !== null);
	const inAir = traced.filter((logger) => logger.placement !== 'in-product');
	const ids = inAir.flatMap(({ traceId }) => (traceId === null ? [] : [traceId]));
	const rows = await TraceRow.findAll({ where: { id: ids } });
	const traces = rows.map((row) => shifted(unpackTrace(row.packed), Number(row.clockShiftMs)));
	return Object.fromEntries(
		docket.pulp.map(({ id, takenAt }) => {
			const near = traces.map((trace) => celsiusNear(trace, Date.parse(takenAt)));
			return [id, near.find((celsius) => celsius !== null) ?? null];
		})
	);
}
