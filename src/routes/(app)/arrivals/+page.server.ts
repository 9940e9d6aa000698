import { boardQuery } from '$lib/schemas/board';
import { queryOf } from '$lib/schemas/list';
import { listBoard } from '$lib/server/arrivals/list-board';
import { may } from '$lib/server/policies';
import { contextOf, orError } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, cookies, url }) => {
	const ctx = contextOf(locals);

	const query = boardQuery.parse(queryOf(url.searchParams));

	const site = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));
	const board = await orError(listBoard(ctx, site.id, query));

	return {
		query,
		board,
		may: { log: may(ctx.actor, 'arrival.log'), create: may(ctx.actor, 'shipment.create') }
	};
};
