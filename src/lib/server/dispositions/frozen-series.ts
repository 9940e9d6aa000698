import type { Transaction } from 'sequelize';
import { assess } from '../../domain/receiving/assess';
import type { Assessment } from '../../domain/receiving/assessment';
import { thinSeries } from '../../domain/trace/thin';
import { unpackTrace } from '../../domain/trace/pack';
import { specSchema } from '../../schemas/spec';
import type { DocketView, SeriesView } from '../../schemas/docket';
import { assessInputOf } from '../assessments/assessment-inputs';
import { parseFigures } from '../assessments/stored-figures';
import { AssessmentRow } from '../db/models/assessment-row';
import { SpecVersion } from '../db/models/spec-version';
import { TraceRow } from '../db/models/trace-row';

/** More than the printed chart resolves at 300 dpi. */
const printedPoints = 1200;

function drawn(assessment: Assessment, traceId: string, label: string, isGoverning: boolean): SeriesView {
	const { series, fullLifeHours, openingHours, remainingHours } = assessment;
	const thin = thinSeries(series.times, series.celsius, printedPoints);
	const left = (used: Float64Array, opening: number, index: number) =>
		index < 0 ? null : fullLifeHours - opening - (used[index] ?? 0);
	const indexes = [...thin.indexes];
	// The bounds at the end include the spec's own uncertainty; the course carries the same distance all along.
	const last = series.times.length - 1;
	const lowShift =
		remainingHours.low - (fullLifeHours - openingHours.high - (series.usedHighHours[last] ?? 0));
	const highShift =
		remainingHours.high - (fullLifeHours - openingHours.low - (series.usedLowHours[last] ?? 0));
	const shift = (value: number | null, by: number) => (value === null ? null : value + by);
	return {
		traceId,
		label,
		isGoverning,
		fromAt: new Date(series.times[0] ?? 0).toISOString(),
		toAt: new Date(series.times[last] ?? 0).toISOString(),
		times: thin.times,
		celsius: thin.celsius,
		remainingHours: indexes.map((index) => left(series.usedHours, openingHours.value, index)),
		remainingLowHours: indexes.map((index) =>
			shift(left(series.usedHighHours, openingHours.high, index), lowShift)
		),
		remainingHighHours: indexes.map((index) =>
			shift(left(series.usedLowHours, openingHours.low, index), highShift)
		),
		totalReadings: assessment.readings
	};
}

/** The courses a signed record keeps: one per logger, the governing ones by the line they govern. */
export async function frozenSeries(docket: DocketView, transaction?: Transaction): Promise<SeriesView[]> {
	const series: SeriesView[] = [];
	for (const view of docket.assessments) {
		if (series.some((known) => known.traceId === view.traceId)) continue;
		const row = await AssessmentRow.findByPk(view.id, { transaction, rejectOnEmpty: true });
		const trace = await TraceRow.findByPk(row.traceId, { transaction, rejectOnEmpty: true });
		const spec = await SpecVersion.findByPk(row.specVersionId, { transaction, rejectOnEmpty: true });
		const input = assessInputOf(
			parseFigures(row.figures).inputs,
			specSchema.parse(JSON.parse(spec.figures)),
			unpackTrace(trace.packed)
		);
		series.push(drawn(assess(input), view.traceId, view.logger, view.isGoverning));
	}
	return series;
}
