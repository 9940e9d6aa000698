import { QueryTypes } from 'sequelize';
import type { Range } from '../../domain/receiving/assessment';
import type { Recommended } from '../../domain/receiving/recommendation';
import type { Context } from '../context';
import { Shipment } from '../db/models/shipment';
import { SpecVersion } from '../db/models/spec-version';
import { database } from '../db/sequelize';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { figuresFrom } from './figures';
import { loadTrialBatch, tryDocket } from './try-docket';

/** What a line came to: life left where a trace told, and what was recommended. */
export interface Judgement {
	recommended: Recommended;
	remainingHours: Range | null;
	neededHours: number;
	fullLifeHours: number;
}

/** A line that a version would have had decided otherwise. */
export interface TriedLine {
	docket: string;
	arrivedAt: string;
	zone: string;
	line: number;
	lot: string;
	specNumber: number;
	isSigned: boolean;
	then: Judgement;
	now: Judgement;
}

/** A version held against the past. */
export interface Trial {
	number: number;
	/** Lines judged again, the newest first; there may be more. */
	tried: number;
	isCapped: boolean;
	/** Lines whose stored figures could not be made again, because what they rest on is gone. */
	untold: number;
	differing: TriedLine[];
}

/** As many lines as one trial looks back at. */
export const mostTried = 300;
/** Dockets whose traces are in memory at once. */
const batchDockets = 15;

/**
 * Judges past loads of a product, or of a variety, again with a version that is not in force yet, by the evidence that
 * is stored. Nothing is changed. @throws Refusal `not-allowed`, `not-found`
 */
export async function tryVersion(ctx: Context, productId: string, specVersionId: string): Promise<Trial> {
	authorize(ctx, 'catalogue.change');
	const version = await SpecVersion.findOne({ where: { id: specVersionId, productId } });
	if (!version) throw new Refusal('not-found');
	const draft = {
		id: version.id,
		number: version.number,
		figuresSha256: version.figuresSha256,
		figures: figuresFrom(version.figures)
	};
	const found = await pastLines(ctx, version);
	const lineIds = new Set(found.slice(0, mostTried).map(({ lineId }) => lineId));
	const shipmentIds = [...new Set(found.slice(0, mostTried).map(({ shipmentId }) => shipmentId))];
	const trial: Trial = {
		number: version.number,
		tried: 0,
		isCapped: found.length > mostTried,
		untold: 0,
		differing: []
	};
	for (let at = 0; at < shipmentIds.length; at += batchDockets) {
		const ids = shipmentIds.slice(at, at + batchDockets);
		const shipments = await Shipment.findAll({ where: { id: ids } });
		const batch = await loadTrialBatch(ids, { lineIds, draft, now: ctx.now });
		const found = await Promise.all(shipments.map((shipment) => tryDocket(shipment, batch)));
		for (const { tried, untold, differing } of found) {
			trial.tried += tried;
			trial.untold += untold;
			trial.differing.push(...differing);
		}
	}
	trial.differing.sort((a, b) => (a.arrivedAt < b.arrivedAt ? 1 : -1));
	return trial;
}

/**
 * Lines this version would have judged: its variety's, or those of the product whose variety has no spec of its own;
 * arrived, recommended on, and within the caller's sight. One more than are tried, to know whether there are more.
 */
function pastLines(
	{ actor }: Context,
	{ productId, varietyId }: SpecVersion
): Promise<{ lineId: string; shipmentId: string }[]> {
	if (actor.siteIds.length === 0) return Promise.resolve([]);
	const ofVersion = varietyId
		? 'l.variety_id = :varietyId'
		: `(l.variety_id IS NULL OR NOT EXISTS (
			SELECT 1 FROM spec_versions v WHERE v.product_id = l.product_id AND v.variety_id = l.variety_id
				AND v.state = 'signed'))`;
	return database().query(
		`SELECT l.id AS lineId, l.shipment_id AS shipmentId
		FROM shipment_lines l JOIN shipments s ON s.id = l.shipment_id
			JOIN line_recommendations r ON r.line_id = l.id
		WHERE l.product_id = :productId AND ${ofVersion} AND s.site_id IN (:siteIds)
			AND s.arrived_at IS NOT NULL AND s.cancelled_at IS NULL
		ORDER BY s.arrived_at DESC, s.id, l.ordinal LIMIT ${mostTried + 1}`,
		{
			replacements: { productId, varietyId, siteIds: [...actor.siteIds] },
			type: QueryTypes.SELECT
		}
	);
}
