import { isoDay } from '$lib/format-time';
import { queryOf } from '$lib/schemas/list';
import { loggerQuery } from '$lib/schemas/logger';
import { listLoggers } from '$lib/server/loggers/list-loggers';
import { may } from '$lib/server/policies';
import { contextOf, orError } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url, cookies }) => {
	const ctx = contextOf(locals);

	const query = loggerQuery.parse(queryOf(url.searchParams));

	const { zone } = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));
	const { items, total, overdue } = await orError(listLoggers(ctx, query, isoDay(ctx.now, zone)));

	return {
		query,
		items,
		total,
		overdue,
		mayChange: may(ctx.actor, 'catalogue.change'),
		back: { href: '/settings', word: 'Settings', title: 'Loggers' }
	};
};
