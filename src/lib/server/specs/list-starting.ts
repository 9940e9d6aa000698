import { findStartingSpec, listStartingSpecs } from '../../domain/starting-specs/list-starting-specs';
import type { StartingSpec } from '../../domain/starting-specs/starting-spec';
import type { Context } from '../context';
import { Product } from '../db/models/product';
import { Variety } from '../db/models/variety';
import { authorize } from '../policies';
import { Refusal } from '../refusals';

/** The library's starting specs in which every word looked for stands. @throws Refusal `not-allowed` */
export async function listStarting(
	ctx: Context,
	q: string
): Promise<{ items: readonly StartingSpec[]; total: number }> {
	authorize(ctx, 'catalogue.view');
	const all = listStartingSpecs();
	const words = q.toLowerCase().split(/\s+/).filter(Boolean);
	const items = all.filter((starting) => {
		const text = textOf(starting);
		return words.every((word) => text.includes(word));
	});
	return { items, total: all.length };
}

function textOf({ product, family, figures }: StartingSpec): string {
	return [product, family, ...figures.sources.map(({ text }) => text)].join(' ').toLowerCase();
}

/** One of the library. @throws Refusal `not-allowed`, `not-found` */
export async function getStarting(ctx: Context, key: string): Promise<StartingSpec> {
	authorize(ctx, 'catalogue.view');
	const starting = findStartingSpec(key);
	if (!starting) throw new Refusal('not-found');
	return starting;
}

/** A product, or one of its varieties, whose spec a starting spec may be copied into. */
export interface CopyPlace {
	productId: string;
	varietyId: string | null;
	name: string;
}

/** Where a copy may go: products in use with their varieties, by name. @throws Refusal `not-allowed` */
export async function listCopyPlaces(ctx: Context): Promise<CopyPlace[]> {
	authorize(ctx, 'catalogue.change');
	const products = await Product.findAll({ where: { switchedOffAt: null }, order: ['name', 'id'] });
	const varieties = await Variety.findAll({
		where: { productId: products.map(({ id }) => id) },
		order: ['name']
	});
	return products.flatMap(({ id, name }) => [
		{ productId: id, varietyId: null, name },
		...varieties
			.filter((variety) => variety.productId === id)
			.map((variety) => ({ productId: id, varietyId: variety.id, name: `${name}, ${variety.name}` }))
	]);
}
