import { auditQuery } from '$lib/schemas/audit-list';
import { queryOf } from '$lib/schemas/list';
import { listAuditActors, listAuditEntries } from '$lib/server/audit/list-entries';
import { contextOf, orError } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url, cookies }) => {
	const ctx = contextOf(locals);

	const query = auditQuery.parse(queryOf(url.searchParams));

	const { zone } = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));
	const { items, total } = await orError(listAuditEntries(ctx, query, zone));
	const actors = await orError(listAuditActors(ctx));

	return { query, items, total, actors };
};
