import type { Context } from '../context';
import { Hold } from '../db/models/hold';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { lockDocket, refuseClosed } from '../shipments/lock-docket';

/** Lifts the hold of a docket without deciding on it. */
export async function liftHold(ctx: Context, number: string): Promise<{ id: string }> {
	return inTransaction(ctx, async ({ transaction, record }) => {
		const shipment = await lockDocket(ctx, 'hold.lift', number, transaction);
		refuseClosed(shipment);
		const open = await Hold.findOne({ where: { shipmentId: shipment.id, liftedAt: null }, transaction });
		if (!open) throw new Refusal('not-on-hold');
		await open.update({ liftedBy: ctx.actor.id, liftedAt: ctx.now }, { transaction });
		record('hold.lifted', { scope: 'shipment', id: shipment.id }, { holdId: open.id });
		return { id: open.id };
	});
}
