import { laneQuery } from '$lib/schemas/lane';
import { queryOf } from '$lib/schemas/list';
import { listLanes } from '$lib/server/lanes/list-lanes';
import { contextOf, orError } from '$lib/server/request';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url }) => {
	const ctx = contextOf(locals);

	const query = laneQuery.parse(queryOf(url.searchParams));

	const { items, total } = await orError(listLanes(ctx, query));

	return { query, items, total, back: { href: '/settings', word: 'Settings', title: 'Lanes' } };
};
