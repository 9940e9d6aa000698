import type { Transaction } from 'sequelize';
import type { Context } from '../context';
import { Disposition } from '../db/models/disposition';
import { LoggerRead } from '../db/models/logger-read';
import { Shipment } from '../db/models/shipment';
import { authorizeShipment, type Act } from '../policies';
import { Refusal } from '../refusals';

/** A read with its docket, both as the caller may see them. */
export interface ReadOnDocket {
	read: LoggerRead;
	shipment: Shipment;
}

/** A read by its id, for an act on its docket. @throws Refusal `not-found`, `not-allowed` */
export async function getReadFor(ctx: Context, readId: string, act: Act): Promise<ReadOnDocket> {
	const read = await LoggerRead.findByPk(readId);
	const shipment = read ? await Shipment.findByPk(read.shipmentId) : null;
	authorizeShipment(ctx, act, shipment);
	if (!read || !shipment) throw new Refusal('not-found');
	return { read, shipment };
}

/** A docket by its number, for an act. @throws Refusal `not-found`, `not-allowed` */
export async function getShipmentFor(ctx: Context, number: string, act: Act): Promise<Shipment> {
	const shipment = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, act, shipment);
	if (!shipment) throw new Refusal('not-found');
	return shipment;
}

/** Locks a docket's row, first of all rows. @throws Refusal `already-signed`: what was signed is not added to. */
export async function lockUnsigned(shipmentId: string, transaction: Transaction): Promise<Shipment> {
	const shipment = await Shipment.findByPk(shipmentId, { transaction, lock: transaction.LOCK.UPDATE });
	if (!shipment) throw new Refusal('not-found');
	if (shipment.decidedAt || (await isSigned(shipmentId, transaction))) throw new Refusal('already-signed');
	return shipment;
}

/** Whether anything has been signed on the docket. */
export async function isSigned(shipmentId: string, transaction?: Transaction): Promise<boolean> {
	return (await Disposition.count({ where: { shipmentId }, transaction })) > 0;
}
