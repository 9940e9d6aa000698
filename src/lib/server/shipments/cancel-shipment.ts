import type { Context } from '../context';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import type { DocketName } from './create-shipment';
import { lockDocket, refuseClosed } from './lock-docket';

/** Cancels a load that will not come. Its number is never given again. @throws Refusal `already-arrived` */
export async function cancelShipment(ctx: Context, number: string, reason: string): Promise<DocketName> {
	return inTransaction(ctx, async ({ transaction, record }) => {
		const shipment = await lockDocket(ctx, 'shipment.change', number, transaction);
		refuseClosed(shipment);
		if (shipment.arrivedAt)
			throw new Refusal('already-arrived', 'This load is here. Reject it with a disposition instead.');
		await shipment.update({ cancelledAt: ctx.now, version: shipment.version + 1 }, { transaction });
		record('shipment.cancelled', { scope: 'shipment', id: shipment.id }, { reason });
		return { id: shipment.id, number };
	});
}
