import type { DispositionInput } from '../../schemas/disposition';
import type { DocketView } from '../../schemas/docket';
import { decisionText } from '../authority/decision-text';
import type { Context } from '../context';
import { DispositionReview } from '../db/models/disposition-review';
import type { User } from '../db/models/user';
import type { Writing } from '../db/transaction';
import { authorize } from '../policies';
import { sha256Hex } from '../storage/sha256';
import { evidenceSha256 } from './freeze';

interface Reviewed {
	docket: DocketView;
	input: DispositionInput;
	signer: User;
	reviewId: string;
}

/**
 * Keeps a signed review: the docket stays open, and another person approves the same decision on the same evidence.
 * @throws Refusal `not-allowed`
 */
export async function keepReview(
	{ transaction, record }: Writing,
	ctx: Context,
	{ docket, input, signer, reviewId }: Reviewed
): Promise<{ version: null }> {
	authorize(ctx, 'disposition.sign');
	const decision = decisionText(input.lines);
	const hashes = { evidenceSha256: evidenceSha256(docket), decisionSha256: sha256Hex(decision) };
	await DispositionReview.create(
		{
			id: reviewId,
			shipmentId: docket.id,
			...hashes,
			decision,
			reasons: input.reasons,
			signedBy: signer.id,
			signedName: signer.name,
			signedTitle: signer.title,
			signedAt: ctx.now,
			zone: docket.site.zone
		},
		{ transaction }
	);
	record('disposition.reviewed', { scope: 'shipment', id: docket.id }, { reviewId, ...hashes });
	return { version: null };
}
