import type { ClaimChange } from '../../schemas/claim';
import type { Context } from '../context';
import { Claim } from '../db/models/claim';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { getClaimFor } from './find-claim';

const ended = new Set(['settled', 'declined', 'closed']);

/** Changes a claim's figures or status. @throws Refusal `changed-meanwhile` where another was quicker */
export async function changeClaim(ctx: Context, claimId: string, input: ClaimChange): Promise<void> {
	const { shipment } = await getClaimFor(ctx, claimId, 'claim.work');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const claim = await Claim.findByPk(claimId, {
			transaction,
			lock: transaction.LOCK.UPDATE,
			rejectOnEmpty: true
		});
		if (claim.version !== input.version)
			throw new Refusal(
				'changed-meanwhile',
				'Somebody changed this claim while you were looking at it. Look again, then save.'
			);
		const { againstId, amountMinor, currency, basis, status } = input;
		const before = {
			againstId: claim.againstId,
			amountMinor: claim.amountMinor,
			currency: claim.currency,
			basis: claim.basis,
			status: claim.status
		};
		const after = { againstId, amountMinor, currency, basis, status };
		await claim.update(
			{
				...after,
				version: claim.version + 1,
				closedAt: ended.has(status) ? (claim.closedAt ?? ctx.now) : null
			},
			{ transaction }
		);
		record('claim.changed', { scope: 'shipment', id: shipment.id }, { claimId, before, after });
	});
}
