import { v7 as uuid } from 'uuid';
import type { Context } from '../context';
import { ClaimFile } from '../db/models/claim-file';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { safeFileName } from '../reports/safe-file-name';
import { keepBytes } from '../storage/store';
import { getClaimFor } from './find-claim';

const bytesAtMost = 25_000_000;

/** Attaches a paper to a claim: an invoice, a credit note, a surveyor's letter. @throws Refusal `too-large`, `not-multipart` */
export async function attachFile(ctx: Context, claimId: string, file: File, what: string): Promise<void> {
	const { shipment } = await getClaimFor(ctx, claimId, 'claim.work');
	if (file.size === 0) throw new Refusal('not-multipart');
	if (file.size > bytesAtMost)
		throw new Refusal(
			'too-large',
			'A paper on a claim may have at most 25 MB. Scan it smaller, or attach its parts.'
		);
	const kept = await keepBytes(new Uint8Array(await file.arrayBuffer()), 'application/octet-stream', ctx.now);
	const id = uuid();
	await inTransaction(ctx, async ({ transaction, record }) => {
		await ClaimFile.create(
			{
				id,
				claimId,
				fileId: kept.id,
				what: what.slice(0, 200) || 'paper',
				fileName: safeFileName(file.name),
				attachedBy: ctx.actor.id,
				attachedAt: ctx.now
			},
			{ transaction }
		);
		record(
			'claim.changed',
			{ scope: 'shipment', id: shipment.id },
			{ claimId, before: {}, after: { attached: kept.sha256, what } }
		);
	});
}
