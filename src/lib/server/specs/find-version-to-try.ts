import type { Context } from '../context';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { getSpecSheet } from './get-spec-sheet';

/** The version of an address: the numbered one, else the draft. @throws Refusal `not-allowed`, `not-found` */
export async function findVersionToTry(
	ctx: Context,
	productId: string,
	varietyId: string | null,
	number: number | null
): Promise<{ versionId: string; name: string; isDraft: boolean }> {
	authorize(ctx, 'catalogue.change');
	const { product, versions, draft } = await getSpecSheet(ctx, productId, varietyId);
	const version = number === null ? draft : versions.find((one) => one.number === number);
	if (!version) throw new Refusal('not-found');
	const variety = product.varieties.find(({ id }) => id === varietyId);
	return {
		versionId: version.id,
		name: [product.name, variety?.name].filter(Boolean).join(', '),
		isDraft: version.standing === 'draft'
	};
}
