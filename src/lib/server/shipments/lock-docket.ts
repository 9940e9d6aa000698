import type { Transaction } from 'sequelize';
import type { Context } from '../context';
import { Shipment } from '../db/models/shipment';
import { authorizeShipment, type Act } from '../policies';
import { Refusal } from '../refusals';

/** The docket, locked first of all rows and checked by policy under that lock. */
export async function lockDocket(
	ctx: Context,
	act: Act,
	number: string,
	transaction: Transaction
): Promise<Shipment> {
	const found = await Shipment.findOne({ where: { number }, transaction, lock: transaction.LOCK.UPDATE });
	authorizeShipment(ctx, act, found);
	return found;
}

/** Refuses what may not be done to a signed or cancelled docket. */
export function refuseClosed(shipment: Shipment): void {
	if (shipment.cancelledAt) throw new Refusal('cancelled');
	if (shipment.decidedAt) throw new Refusal('already-signed');
}
