import { Op, type Transaction } from 'sequelize';
import { validateSpec } from '../../domain/shelf-life/validate';
import { checkSigningComponents, type SigningComponents } from '../accounts/check-signing-components';
import { organisationChain } from '../catalogue/organisation-chain';
import type { Context } from '../context';
import { SpecVersion } from '../db/models/spec-version';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { figuresFrom } from './figures';
import { lockProduct, savedMeanwhile } from './save-draft';

export interface SpecSignature extends SigningComponents {
	specVersionId: string;
	/** Hash of the figures the signer was shown. */
	figuresSha256: string;
	reason: string;
	/** Null: from the moment it is signed. */
	inForceFrom: Date | null;
}

/**
 * Puts a draft in force under the quality manager's signature; from then on it never changes. Whatever was in force,
 * or was to come, ends where this one begins.
 * @throws Refusal `not-allowed`, `wrong-password`, `wrong-code`, `code-needed`, `locked`, `not-found`, `spec-signed`, `changed-meanwhile`, `invalid`
 */
export async function signSpec(ctx: Context, input: SpecSignature): Promise<{ number: number }> {
	authorize(ctx, 'spec.sign');
	const inForceFrom = input.inForceFrom ?? ctx.now;
	if (inForceFrom < ctx.now)
		throw new Refusal('invalid', 'A version cannot be in force before it is signed.');
	const signer = await checkSigningComponents(ctx, input);
	return inTransaction(ctx, async ({ transaction, record }) => {
		const version = await lockDraft(input, transaction);
		const { id, productId, varietyId, number, figuresSha256 } = version;
		await SpecVersion.update(
			{ supersededAt: inForceFrom },
			{
				where: {
					productId,
					varietyId,
					state: 'signed',
					supersededAt: { [Op.or]: [null, { [Op.gt]: inForceFrom }] }
				},
				transaction
			}
		);
		await version.update(
			{ state: 'signed', reason: input.reason, signedBy: signer.id, signedAt: ctx.now, inForceFrom },
			{ transaction }
		);
		record('spec.signed', await organisationChain(transaction), {
			specVersionId: id,
			productId,
			number,
			figuresSha256,
			reason: input.reason
		});
		return { number };
	});
}

async function lockDraft(
	{ specVersionId, figuresSha256 }: SpecSignature,
	transaction: Transaction
): Promise<SpecVersion> {
	const seen = await SpecVersion.findByPk(specVersionId, { transaction });
	// A draft saved again is a new row: who signs the old one has not seen what would be signed.
	if (!seen) throw new Refusal('changed-meanwhile', savedMeanwhile);
	await lockProduct(seen.productId, transaction);
	const version = await SpecVersion.findByPk(specVersionId, { transaction });
	if (!version) throw new Refusal('changed-meanwhile', savedMeanwhile);
	if (version.state === 'signed') throw new Refusal('spec-signed');
	if (version.figuresSha256 !== figuresSha256) throw new Refusal('changed-meanwhile', savedMeanwhile);
	if (validateSpec(figuresFrom(version.figures)).length > 0) throw new Refusal('invalid');
	return version;
}
