import { v7 as uuid } from 'uuid';
import type { ClaimOpening } from '../../schemas/claim';
import type { Context } from '../context';
import { Claim } from '../db/models/claim';
import { Disposition } from '../db/models/disposition';
import { Shipment } from '../db/models/shipment';
import { inTransaction } from '../db/transaction';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import { nextNumber } from '../sites/next-number';

/** Opens a claim on a docket; one runs at a time. @throws Refusal `not-found`, `not-allowed`, `duplicate` */
export async function openClaim(ctx: Context, input: ClaimOpening): Promise<{ id: string }> {
	const id = uuid();
	return inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		const shipment = await Shipment.findOne({
			where: { number: input.docket },
			transaction,
			lock: transaction.LOCK.UPDATE
		});
		authorizeShipment(ctx, 'claim.work', shipment);
		const running = await Claim.findOne({ where: { shipmentId: shipment.id }, transaction });
		if (running) throw new Refusal('duplicate', `Claim ${running.number} is on this docket already.`);
		const disposition = await Disposition.findOne({
			where: { shipmentId: shipment.id },
			order: [['version', 'DESC']],
			transaction
		});
		const number = await nextNumber(shipment.siteId, 'claim', ctx.now, transaction);
		const { againstId, amountMinor, currency, basis } = input;
		await Claim.create(
			{
				id,
				number,
				shipmentId: shipment.id,
				dispositionId: disposition?.id ?? null,
				againstId,
				status: 'open',
				amountMinor,
				currency,
				basis,
				openedBy: ctx.actor.id,
				openedAt: ctx.now
			},
			{ transaction }
		);
		record(
			'claim.opened',
			{ scope: 'shipment', id: shipment.id },
			{ claimId: id, number, amountMinor, currency }
		);
		return { id };
	});
}
