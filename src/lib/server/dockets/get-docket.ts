import type { Transaction } from 'sequelize';
import type { DocketView } from '../../schemas/docket';
import type { Context } from '../context';
import { Shipment } from '../db/models/shipment';
import { authorizeShipment } from '../policies';
import { siteView } from '../sites/current-site';
import { findSpecInForce } from '../specs/find-spec-in-force';
import { assessmentViews } from './assessments-view';
import {
	arrivalView,
	handoverViews,
	holdView,
	noteViews,
	partyView,
	photoViews,
	pulpViews,
	trimViews,
	clockCorrectionViews
} from './door-view';
import { lineView } from './lines-view';
import { loadDocketRows, type DocketRows } from './load-rows';
import { loggerViews } from './loggers-view';
import { recordViews } from './record-view';
import { clockViews, noticeViews, signatureViews } from './signatures-view';
import { stageOf } from './stage';

/** The specs in force for lines that nothing was assessed for yet. */
async function specFinder(rows: DocketRows, now: Date, transaction?: Transaction) {
	const found = new Map<string, Awaited<ReturnType<typeof findSpecInForce>>>();
	for (const line of rows.lines) {
		const key = `${line.productId} ${line.varietyId}`;
		if (!found.has(key))
			found.set(key, await findSpecInForce(line, rows.shipment.arrivedAt ?? now, transaction));
	}
	return (productId: string, varietyId: string | null) =>
		found.get(`${productId} ${varietyId}`)?.figures ?? null;
}

/** The whole docket as it stands, drawn from its rows. No policy is asked: callers have. */
export async function docketView(
	shipment: Shipment,
	now: Date,
	transaction?: Transaction
): Promise<DocketView> {
	const rows = await loadDocketRows(shipment, transaction);
	const findSpec = await specFinder(rows, now, transaction);
	const hold = holdView(rows);
	const supplier = partyView(rows, shipment.supplierId);
	if (!supplier) throw new Error(`The supplier of ${shipment.number} is missing.`);
	return {
		id: shipment.id,
		number: shipment.number,
		title: shipment.title,
		stage: stageOf({ arrivedAt: shipment.arrivedAt, decidedAt: shipment.decidedAt, isHeld: hold !== null }),
		verdict: shipment.verdict,
		site: siteView(rows.site),
		dock: shipment.dock,
		supplier,
		carrier: partyView(rows, shipment.carrierId),
		lane: rows.lane?.name,
		mode: shipment.mode,
		vehicle: shipment.vehicle,
		seal: shipment.seal,
		purchaseOrder: shipment.purchaseOrder,
		billOfLading: shipment.billOfLading,
		dueAt: shipment.dueAt?.toISOString() ?? null,
		hold,
		arrival: arrivalView(rows),
		lines: rows.lines.map((line) => lineView(rows, line, findSpec)),
		loggers: loggerViews(rows),
		assessments: assessmentViews(rows),
		handovers: handoverViews(rows),
		pulp: pulpViews(rows),
		trims: trimViews(rows),
		clockCorrections: clockCorrectionViews(rows),
		photos: photoViews(rows),
		notes: noteViews(rows),
		clocks: clockViews(rows),
		signatures: signatureViews(rows),
		notices: noticeViews(rows),
		claimId: rows.claim?.id ?? null,
		record: await recordViews(shipment.id)
	};
}

/** A docket by its number, for staff of its site. @throws Refusal `not-found`, `not-allowed` */
export async function getDocket(ctx: Context, number: string): Promise<DocketView> {
	const shipment = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, 'docket.view', shipment);
	return docketView(shipment as Shipment, ctx.now);
}
