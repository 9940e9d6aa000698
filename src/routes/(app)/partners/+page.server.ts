import { listPartners } from '$lib/server/partners/list-partners';
import { may } from '$lib/server/policies';
import { contextOf, orError } from '$lib/server/request';
import { queryOf } from '$lib/schemas/list';
import { partnerQuery } from '$lib/schemas/partner';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url }) => {
	const ctx = contextOf(locals);

	const query = partnerQuery.parse(queryOf(url.searchParams));

	const { items, total } = await orError(listPartners(ctx, query));

	return { query, items, total, mayChange: may(ctx.actor, 'catalogue.change') };
};
