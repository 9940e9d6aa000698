import type { Context } from '../../context';
import { saveProduct } from '../../products/save-product';
import { saveDraft } from '../../specs/save-draft';
import { signSpec } from '../../specs/sign-spec';
import { storedFigures } from '../../specs/figures';
import { demoProducts } from '../products';
import { demoPassword } from './people';

/** Enters the catalogue, every spec signed by the quality manager. @returns the products' ids by name */
export async function enterProducts(ctx: Context): Promise<Map<string, string>> {
	const ids = new Map<string, string>();
	for (const { name, family, countUnit, spec, reason } of demoProducts) {
		const productId = await saveProduct(ctx, null, {
			name,
			family,
			countUnit,
			dockMayAccept: false,
			revision: ''
		});
		const draft = await saveDraft(ctx, { productId, varietyId: null, figures: spec, seenSha256: '' });
		await signSpec(ctx, {
			specVersionId: draft.id,
			figuresSha256: storedFigures(spec).sha256,
			password: demoPassword,
			reason,
			inForceFrom: null
		});
		ids.set(name, productId);
	}
	return ids;
}
