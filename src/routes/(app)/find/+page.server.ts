import { contextOf, orError } from '$lib/server/request';
import { searchDockets } from '$lib/server/shipments/search-dockets';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url }) => {
	const ctx = contextOf(locals);

	const q = (url.searchParams.get('q') ?? '').trim().slice(0, 100);

	return {
		q,
		found: await orError(searchDockets(ctx, q, 40)),
		back: { href: '/arrivals', word: 'Arrivals', title: 'Find' }
	};
};
