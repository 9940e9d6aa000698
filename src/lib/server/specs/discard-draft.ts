import { organisationChain } from '../catalogue/organisation-chain';
import type { Context } from '../context';
import { SpecVersion } from '../db/models/spec-version';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { lockProduct } from './save-draft';

/** Throws a draft away; its number is free again. @throws Refusal `not-allowed`, `not-found`, `spec-signed` */
export async function discardDraft(ctx: Context, specVersionId: string): Promise<void> {
	authorize(ctx, 'catalogue.change');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const seen = await SpecVersion.findByPk(specVersionId, { transaction });
		if (!seen) throw new Refusal('not-found');
		await lockProduct(seen.productId, transaction);
		const version = await SpecVersion.findByPk(specVersionId, { transaction });
		if (!version) throw new Refusal('not-found');
		if (version.state === 'signed') throw new Refusal('spec-signed');
		await version.destroy({ transaction });
		record('spec.discarded', await organisationChain(transaction), {
			specVersionId,
			productId: version.productId,
			number: version.number,
			figuresSha256: version.figuresSha256
		});
	});
}
