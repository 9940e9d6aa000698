import { queryOf } from '$lib/schemas/list';
import { productQuery } from '$lib/schemas/product';
import { may } from '$lib/server/policies';
import { listProducts } from '$lib/server/products/list-products';
import { contextOf, orError } from '$lib/server/request';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url }) => {
	const ctx = contextOf(locals);

	const query = productQuery.parse(queryOf(url.searchParams));

	const list = await orError(listProducts(ctx, query));

	return { ...list, query, mayChange: may(ctx.actor, 'catalogue.change') };
};
