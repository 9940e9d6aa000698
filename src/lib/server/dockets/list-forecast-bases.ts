import type { RateSpec } from '../../domain/shelf-life/rate-curve';
import type { Range } from '../../domain/receiving/assessment';
import type { LifeNeed, Spec } from '../../domain/shelf-life/spec';
import { parseFigures } from '../assessments/stored-figures';
import type { Context } from '../context';
import { AssessmentRow } from '../db/models/assessment-row';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { authorizeShipment } from '../policies';
import { findSpecVersion } from '../specs/find-spec-in-force';

/** What the browser needs to look ahead for one line, with no more questions to the server. */
export interface ForecastBasis {
	lineId: string;
	line: number;
	lot: string;
	fromMs: number;
	remainingHours: Range;
	rates: RateSpec & Pick<Spec, 'validFromCelsius' | 'validToCelsius'>;
	neededAtCustomer: LifeNeed | null;
}

/** The governing assessment of each line with the rates of the version it pinned. @throws Refusal `not-allowed`, `not-found` */
export async function listForecastBases(ctx: Context, shipmentId: string): Promise<ForecastBasis[]> {
	const shipment = await Shipment.findByPk(shipmentId);
	authorizeShipment(ctx, 'docket.view', shipment);
	const rows = await AssessmentRow.findAll({ where: { shipmentId, isCurrent: true, isGoverning: true } });
	const lines = await ShipmentLine.findAll({ where: { shipmentId }, order: ['ordinal'] });
	const bases: ForecastBasis[] = [];
	for (const line of lines) {
		const row = rows.find(({ lineId }) => lineId === line.id);
		const spec = row ? await findSpecVersion(row.specVersionId) : null;
		if (!row || !spec) continue;
		const { windowToMs, remainingHours } = parseFigures(row.figures);
		const { referenceCelsius, model, validFromCelsius, validToCelsius, chillingCelsius, neededAtCustomer } =
			spec.figures;
		bases.push({
			lineId: line.id,
			line: line.ordinal,
			lot: line.lot,
			fromMs: windowToMs,
			remainingHours,
			rates: { referenceCelsius, model, validFromCelsius, validToCelsius, chillingCelsius },
			neededAtCustomer: neededAtCustomer ?? null
		});
	}
	return bases;
}
