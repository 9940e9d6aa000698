import type { AssessedBasis, TraceBasis } from '../../schemas/trace-basis';
import { parseFigures } from '../assessments/stored-figures';
import type { Context } from '../context';
import { AssessmentRow } from '../db/models/assessment-row';
import { ShipmentLine } from '../db/models/shipment-line';
import { findSpecVersion } from '../specs/find-spec-in-force';
import { getTraceFor } from './find-trace';

/**
 * A trace whole, with what each line's assessment by it rests on: QA's browser shows every reading with its life, and
 * tries a trim before it is sent. @throws Refusal `not-found`, `not-allowed`
 */
export async function getTraceBasis(ctx: Context, traceId: string): Promise<TraceBasis> {
	const { trace } = await getTraceFor(ctx, traceId, 'docket.view');
	const rows = await AssessmentRow.findAll({
		where: { traceId, isCurrent: true },
		order: [
			['isGoverning', 'DESC'],
			['remainingLowHours', 'ASC']
		]
	});
	const assessed: AssessedBasis[] = [];
	for (const row of rows) assessed.push(await basisOf(row));
	return {
		traceId,
		packed: Buffer.from(trace.packed).toString('base64'),
		clockShiftMs: Number(trace.clockShiftMs),
		assessed
	};
}

async function basisOf(row: AssessmentRow): Promise<AssessedBasis> {
	const { inputs } = parseFigures(row.figures);
	const { accuracyCelsius, placement, opening, handovers, trims, neededHours } = inputs;
	const line = await ShipmentLine.findByPk(row.lineId, { rejectOnEmpty: true });
	const spec = await findSpecVersion(inputs.specVersionId);
	if (!spec) throw new Error(`The spec version ${inputs.specVersionId} of an assessment is missing.`);
	return {
		assessmentId: row.id,
		lineId: row.lineId,
		line: line.ordinal,
		lot: line.lot,
		isGoverning: row.isGoverning,
		spec: spec.figures,
		accuracyCelsius,
		placement,
		opening,
		handovers,
		trims,
		neededHours
	};
}
