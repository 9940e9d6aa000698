import { z } from 'zod';
import type { Range } from '../../domain/receiving/assessment';
import type { Reason } from '../../domain/receiving/recommendation';
import type { Spec } from '../../domain/shelf-life/spec';
import type { DocketLineView, LineOutcomeView } from '../../schemas/docket';
import type { ShipmentLine } from '../db/models/shipment-line';
import { outcomeOf } from '../dispositions/decide-groups';
import type { DocketRows } from './load-rows';
import { labelsOf } from './loggers-view';

/** Life figures of a line that no trace was assessed for come from the spec in force. */
export type SpecFinder = (productId: string, varietyId: string | null) => Spec | null;

function reasonsOf(text: string): Reason[] {
	const reasons: unknown = JSON.parse(text);
	z.array(z.object({ code: z.string(), grade: z.string() })).parse(reasons);
	return reasons as Reason[];
}

function groupViews(rows: DocketRows, line: ShipmentLine): LineOutcomeView[] {
	const current = rows.dispositions.at(-1);
	return rows.outcomes
		.filter((row) => row.dispositionId === current?.id && row.lineId === line.id)
		.sort((a, b) => a.ordinal - b.ordinal)
		.map((row) => ({
			...{ outcome: row.outcome, condition: row.conditionText, reason: row.reason },
			...{ cases: row.cases, pallets: row.pallets, name: row.name },
			...{ conditionKind: row.conditionKind, awaited: row.awaited },
			...{ untilAt: row.untilAt?.toISOString() ?? null, whereabouts: row.whereabouts, place: row.place }
		}));
}

export function lineView(rows: DocketRows, line: ShipmentLine, findSpec: SpecFinder): DocketLineView {
	const product = rows.products.find((candidate) => candidate.id === line.productId);
	const pallets = rows.pallets.filter((pallet) => pallet.lineId === line.id);
	const own = rows.assessments.filter((row) => row.lineId === line.id);
	const governing = own.find((row) => row.isGoverning);
	const pinned = rows.specs.find((spec) => spec.id === governing?.specVersionId);
	const spec = pinned ? (JSON.parse(pinned.figures) as Spec) : findSpec(line.productId, line.varietyId);
	const labels = labelsOf(rows);
	const recommendation = rows.recommendations.find((row) => row.lineId === line.id);
	const remainingHours: Range | null = governing
		? {
				value: governing.remainingHours,
				low: governing.remainingLowHours,
				high: governing.remainingHighHours
			}
		: null;
	return {
		id: line.id,
		ordinal: line.ordinal,
		product: line.description || product?.name || '',
		variety: rows.varieties.find((candidate) => candidate.id === line.varietyId)?.name ?? null,
		lot: line.lot,
		gtin: line.gtin,
		firstSscc: pallets.find((pallet) => pallet.sscc)?.sscc ?? null,
		pallets: Math.max(line.palletsAdvised, pallets.length),
		casesAdvised: line.casesAdvised,
		casesReceived: line.casesReceived,
		valueMinor: line.valueMinor,
		currency: line.currency,
		bestBeforeOn: line.bestBeforeOn,
		neededHours: governing?.neededHours ?? line.neededHours ?? spec?.neededHours ?? 0,
		fullLifeHours: spec?.fullLifeHours ?? 0,
		referenceCelsius: spec?.referenceCelsius ?? 0,
		loggers: [...own]
			.sort((a, b) => Number(b.isGoverning) - Number(a.isGoverning))
			.map((row) => labels.get(row.traceId) ?? '?'),
		remainingHours,
		recommendation: recommendation
			? { recommended: recommendation.recommended, reasons: reasonsOf(recommendation.reasons) }
			: null,
		...outcomeOf(groupViews(rows, line))
	};
}
