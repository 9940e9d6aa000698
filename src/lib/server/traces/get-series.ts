import { assess } from '../../domain/receiving/assess';
import type { Assessment } from '../../domain/receiving/assessment';
import { unpackTrace } from '../../domain/trace/pack';
import { thinSeries } from '../../domain/trace/thin';
import { celsiusOf } from '../../domain/trace/trace';
import type { SeriesView } from '../../schemas/docket';
import type { SeriesQuery } from '../../schemas/series';
import { assessInputOf, shifted } from '../assessments/assessment-inputs';
import { findSpecVersion } from '../specs/find-spec-in-force';
import { parseFigures } from '../assessments/stored-figures';
import type { Context } from '../context';
import { AssessmentRow } from '../db/models/assessment-row';
import { LoggerTrip } from '../db/models/logger-trip';
import { TraceRow } from '../db/models/trace-row';
import { getTraceFor } from './find-trace';

/** What to draw of a trace. */
export interface SeriesWish {
	fromMs: number | null;
	toMs: number | null;
	points: number;
}

/** A trace at the zoom in view, for whoever may see its docket. @throws Refusal `not-found` */
export async function getSeries(
	ctx: Context,
	traceId: string,
	{ from, to, points }: SeriesQuery
): Promise<SeriesView> {
	const { trace } = await getTraceFor(ctx, traceId, 'shipment.view');
	const fromMs = from ? Date.parse(from) : null;
	const toMs = to ? Date.parse(to) : null;
	return seriesView(trace, { fromMs, toMs, points });
}

/**
 * A trace thinned to the points asked for, with the life left at each. Life is worked out again from what the stored
 * assessment rests on, so a signed docket shows what was signed. No policy is asked: callers have.
 */
export async function seriesView(row: TraceRow, wish: SeriesWish): Promise<SeriesView> {
	const trace = shifted(unpackTrace(row.packed), Number(row.clockShiftMs));
	const governing = await findAssessment(row.id);
	const life = governing ? lifeByTime(await assessedAgain(governing, row)) : null;
	const part = within(trace.times, wish);
	const times = trace.times.subarray(part.from, part.to);
	const celsius = celsiusOf(trace).subarray(part.from, part.to);
	const drawn = thinSeries(times, celsius, wish.points);
	const leftAt = (side: keyof LifeLeft) =>
		life
			? drawn.times.map((ms, at) => (drawn.celsius[at] === null ? null : (life.get(ms)?.[side] ?? null)))
			: null;
	return {
		traceId: row.id,
		label: await labelOf(row),
		isGoverning: governing?.isGoverning ?? false,
		fromAt: new Date(wish.fromMs ?? times[0] ?? 0).toISOString(),
		toAt: new Date(wish.toMs ?? times[times.length - 1] ?? 0).toISOString(),
		times: drawn.times,
		celsius: drawn.celsius,
		remainingHours: leftAt('value'),
		remainingLowHours: leftAt('low'),
		remainingHighHours: leftAt('high'),
		totalReadings: row.readings
	};
}

interface LifeLeft {
	value: number;
	low: number;
	high: number;
}

/** The assessment a trace is shown by: where it governs, the line with the least life left. */
async function findAssessment(traceId: string): Promise<AssessmentRow | null> {
	return AssessmentRow.findOne({
		where: { traceId, isCurrent: true },
		order: [
			['isGoverning', 'DESC'],
			['remainingLowHours', 'ASC']
		]
	});
}

async function assessedAgain(
	stored: AssessmentRow,
	row: TraceRow
): Promise<Assessment & { plusMinusHours: number }> {
	const { inputs } = parseFigures(stored.figures);
	const spec = await findSpecVersion(inputs.specVersionId);
	if (!spec) throw new Error(`The spec version ${inputs.specVersionId} of an assessment is missing.`);
	const assessment = assess(assessInputOf(inputs, spec.figures, unpackTrace(row.packed)));
	return { ...assessment, plusMinusHours: spec.figures.fullLifeUncertaintyHours };
}

function lifeByTime(assessment: Assessment & { plusMinusHours: number }): Map<number, LifeLeft> {
	const { series, openingHours, fullLifeHours, plusMinusHours } = assessment;
	const left = new Map<number, LifeLeft>();
	series.times.forEach((ms, i) => {
		left.set(ms, {
			value: fullLifeHours - openingHours.value - (series.usedHours[i] ?? 0),
			low: fullLifeHours - plusMinusHours - openingHours.high - (series.usedHighHours[i] ?? 0),
			high: fullLifeHours + plusMinusHours - openingHours.low - (series.usedLowHours[i] ?? 0)
		});
	});
	return left;
}

/** The readings in view and one neighbour on either side, so that lines run to the edge. */
function within(times: Float64Array, { fromMs, toMs }: SeriesWish): { from: number; to: number } {
	const first = fromMs === null ? 0 : times.findIndex((ms) => ms >= fromMs);
	const last = toMs === null ? times.length - 1 : times.findLastIndex((ms) => ms <= toMs);
	if (first < 0 || last < 0) return { from: 0, to: 0 };
	return { from: Math.max(0, first - 1), to: Math.min(times.length, last + 2) };
}

/** L1, L2 … in the order of the docket's loggers. */
async function labelOf(row: TraceRow): Promise<string> {
	const trips = await LoggerTrip.findAll({ where: { shipmentId: row.shipmentId }, order: ['ordinal'] });
	const index = trips.findIndex(({ id }) => id === row.tripId);
	return index < 0 ? row.name : `L${index + 1}`;
}
