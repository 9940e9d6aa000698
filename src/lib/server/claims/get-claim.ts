import type { ClaimView } from '../../schemas/claim';
import type { DocketView } from '../../schemas/docket';
import type { Context } from '../context';
import { ClaimFile } from '../db/models/claim-file';
import { Partner } from '../db/models/partner';
import { StoredFile } from '../db/models/stored-file';
import { User } from '../db/models/user';
import { docketView } from '../dockets/get-docket';
import type { OutgoingFile } from '../reports/open-report';
import { fileStore } from '../storage/store';
import { Refusal } from '../refusals';
import { evidenceFiles } from './evidence';
import { getClaimFor } from './find-claim';

async function attachedFiles(claimId: string): Promise<ClaimView['files']> {
	const rows = await ClaimFile.findAll({ where: { claimId }, order: ['attachedAt'] });
	return Promise.all(
		rows.map(async (row) => {
			const file = await StoredFile.findByPk(row.fileId, { rejectOnEmpty: true });
			const by = await User.findByPk(row.attachedBy, { attributes: ['name'] });
			return {
				id: row.id,
				what: row.what,
				fileName: row.fileName,
				bytes: file.bytes,
				sha256: file.sha256,
				at: row.attachedAt.toISOString(),
				by: by?.name ?? ''
			};
		})
	);
}

/** A claim with its docket and evidence. @throws Refusal `not-found`, `not-allowed` */
export async function getClaim(
	ctx: Context,
	claimId: string
): Promise<{ claim: ClaimView; docket: DocketView }> {
	const { claim, shipment } = await getClaimFor(ctx, claimId, 'claim.view');
	const carriers = await Partner.findAll({
		where: { isCarrier: true, switchedOffAt: null },
		order: ['name'],
		attributes: ['id', 'name']
	});
	const against = claim.againstId ? await Partner.findByPk(claim.againstId, { attributes: ['name'] }) : null;
	const openedBy = await User.findByPk(claim.openedBy, { attributes: ['name'] });
	const evidence = await evidenceFiles(shipment);
	return {
		claim: {
			id: claim.id,
			number: claim.number,
			status: claim.status,
			version: claim.version,
			againstId: claim.againstId,
			against: against?.name ?? null,
			amountMinor: claim.amountMinor === null ? null : Number(claim.amountMinor),
			currency: claim.currency,
			basis: claim.basis,
			openedBy: openedBy?.name ?? '',
			openedAt: claim.openedAt.toISOString(),
			files: await attachedFiles(claim.id),
			evidence: evidence.map(({ what, fileName, bytes, sha256 }) => ({ what, fileName, bytes, sha256 })),
			carriers: carriers.map(({ id, name }) => ({ id, name }))
		},
		docket: await docketView(shipment, ctx.now)
	};
}

/** A paper attached to a claim. @throws Refusal `not-found`, `not-allowed` */
export async function openClaimFile(
	ctx: Context,
	claimId: string,
	claimFileId: string
): Promise<OutgoingFile> {
	await getClaimFor(ctx, claimId, 'claim.view');
	const row = await ClaimFile.findOne({ where: { id: claimFileId, claimId } });
	const file = row ? await StoredFile.findByPk(row.fileId) : null;
	if (!row || !file) throw new Refusal('not-found');
	return {
		fileName: row.fileName,
		mediaType: file.mediaType,
		bytes: file.bytes,
		sha256: file.sha256,
		open: async () => (await fileStore()).open(file.sha256)
	};
}
