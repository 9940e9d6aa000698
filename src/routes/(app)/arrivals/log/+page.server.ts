import { listExpected } from '$lib/server/arrivals/list-expected';
import { contextOf, orError } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, cookies, url }) => {
	const ctx = contextOf(locals);

	const q = (url.searchParams.get('q') ?? '').trim().slice(0, 100);

	const site = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));

	return {
		q,
		found: await orError(listExpected(ctx, site.id, q)),
		back: { href: '/arrivals', word: 'Arrivals', title: 'Log an arrival' }
	};
};
