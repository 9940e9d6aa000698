import { v7 as uuid } from 'uuid';
import type { HoldInput } from '../../schemas/note';
import type { Context } from '../context';
import { Hold } from '../db/models/hold';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { lockDocket, refuseClosed } from '../shipments/lock-docket';

/** Puts a load that is here on hold until QA lifts it or a disposition ends it. */
export async function putHold(ctx: Context, number: string, input: HoldInput): Promise<{ id: string }> {
	const id = input.id ?? uuid();
	return inTransaction(ctx, async ({ transaction, record }) => {
		const shipment = await lockDocket(ctx, 'hold.put', number, transaction);
		refuseClosed(shipment);
		if (!shipment.arrivedAt) throw new Refusal('not-arrived');
		const open = await Hold.findOne({ where: { shipmentId: shipment.id, liftedAt: null }, transaction });
		if (open?.id === id) return { id };
		if (open) throw new Refusal('already-on-hold');
		await Hold.create(
			{ id, shipmentId: shipment.id, putBy: ctx.actor.id, putAt: ctx.now, reason: input.reason },
			{ transaction }
		);
		record('hold.put', { scope: 'shipment', id: shipment.id }, { reason: input.reason });
		return { id };
	});
}
