import { QueryTypes } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { Context } from '../context';
import { RetentionHold } from '../db/models/retention-hold';
import { Shipment } from '../db/models/shipment';
import { database } from '../db/sequelize';
import { inTransaction } from '../db/transaction';
import { authorize, authorizeShipment } from '../policies';
import { Refusal } from '../refusals';

/** Keeps a docket beyond every period until somebody says otherwise. @throws Refusal `not-found`, `not-allowed` */
export async function putRetentionHold(
	ctx: Context,
	{ docket, reason }: { docket: string; reason: string }
): Promise<{ id: string }> {
	const id = uuid();
	return inTransaction(ctx, async ({ transaction, record }) => {
		const shipment = await Shipment.findOne({
			where: { number: docket },
			transaction,
			lock: transaction.LOCK.UPDATE
		});
		authorizeShipment(ctx, 'retention.manage', shipment);
		await RetentionHold.create(
			{ id, shipmentId: shipment.id, reason, putBy: ctx.actor.id, putAt: ctx.now },
			{ transaction }
		);
		record('retention.held', { scope: 'shipment', id: shipment.id }, { reason });
		return { id };
	});
}

/** Ends a hold by hand. A docket under an open claim stays held. @throws Refusal `not-found`, `not-allowed` */
export async function liftRetentionHold(
	ctx: Context,
	{ holdId, reason }: { holdId: string; reason: string }
): Promise<void> {
	await inTransaction(ctx, async ({ transaction, record }) => {
		const hold = await RetentionHold.findByPk(holdId, { transaction, lock: transaction.LOCK.UPDATE });
		const shipment = hold && (await Shipment.findByPk(hold.shipmentId, { transaction }));
		authorizeShipment(ctx, 'retention.manage', shipment);
		if (!hold || hold.liftedAt) throw new Refusal('not-found');
		await hold.update({ liftedAt: ctx.now, liftedBy: ctx.actor.id, liftReason: reason }, { transaction });
		record('retention.released', { scope: 'shipment', id: shipment.id }, { holdId, reason });
	});
}

export interface RetentionHoldView {
	id: string | null;
	docket: string;
	by: string;
	since: string;
	reason: string;
}

/** What is held just now: by hand, and by claims that are open, oldest first. */
export async function listRetentionHolds(ctx: Context): Promise<RetentionHoldView[]> {
	authorize(ctx, 'retention.manage');
	const rows = await database().query<Omit<RetentionHoldView, 'since'> & { since: Date | string }>(
		`SELECT h.id, s.number AS docket, u.name AS \`by\`, h.put_at AS since, h.reason
			FROM retention_holds h JOIN shipments s ON s.id = h.shipment_id JOIN users u ON u.id = h.put_by
			WHERE h.lifted_at IS NULL
		UNION ALL SELECT NULL, s.number, u.name, c.opened_at, CONCAT('Claim ', c.number, ' is open')
			FROM claims c JOIN shipments s ON s.id = c.shipment_id JOIN users u ON u.id = c.opened_by
			WHERE c.closed_at IS NULL
		ORDER BY since, docket`,
		{ type: QueryTypes.SELECT }
	);
	return rows.map((row) => ({ ...row, since: new Date(row.since).toISOString() }));
}
