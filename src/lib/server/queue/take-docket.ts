import type { Context } from '../context';
import { inTransaction } from '../db/transaction';
import { Hold } from '../db/models/hold';
import { User } from '../db/models/user';
import { Refusal } from '../refusals';
import { lockDocket, refuseClosed } from '../shipments/lock-docket';

/**
 * Takes a waiting docket on, so that no two people review it side by side. It binds nobody: another may take it over,
 * and anybody who may sign can sign.
 */
export async function takeDocket(ctx: Context, number: string): Promise<void> {
	await inTransaction(ctx, async ({ transaction, record }) => {
		const shipment = await lockDocket(ctx, 'disposition.sign', number, transaction);
		// A load signed in part is still reviewed for what is held.
		const where = { shipmentId: shipment.id, liftedAt: null };
		if ((await Hold.count({ where, transaction })) === 0) refuseClosed(shipment);
		if (shipment.cancelledAt) throw new Refusal('cancelled');
		if (!shipment.arrivedAt) throw new Refusal('not-arrived');
		if (shipment.takenBy === ctx.actor.id) return;
		const before = shipment.takenBy === null ? null : await User.findByPk(shipment.takenBy, { transaction });
		await shipment.update({ takenBy: ctx.actor.id, takenAt: ctx.now }, { transaction });
		record('docket.taken', { scope: 'shipment', id: shipment.id }, { from: before?.name ?? null });
	});
}

/** Hands a docket back to the queue. */
export async function handBackDocket(ctx: Context, number: string): Promise<void> {
	await inTransaction(ctx, async ({ transaction, record }) => {
		const shipment = await lockDocket(ctx, 'disposition.sign', number, transaction);
		if (shipment.takenBy !== ctx.actor.id) return;
		await shipment.update({ takenBy: null, takenAt: null }, { transaction });
		record('docket.handed-back', { scope: 'shipment', id: shipment.id }, {});
	});
}
