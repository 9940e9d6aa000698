import { queryOf } from '$lib/schemas/list';
import { siteQuery } from '$lib/schemas/site';
import { contextOf, orError } from '$lib/server/request';
import { listSites } from '$lib/server/sites/list-sites';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url }) => {
	const ctx = contextOf(locals);

	const query = siteQuery.parse(queryOf(url.searchParams));

	const { items, total } = await orError(listSites(ctx, query));

	return { query, items, total, back: { href: '/settings', word: 'Settings', title: 'Sites' } };
};
