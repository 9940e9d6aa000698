import { queryOf } from '$lib/schemas/list';
import { shipmentListQuery } from '$lib/schemas/shipment-list';
import { may } from '$lib/server/policies';
import { contextOf, orError } from '$lib/server/request';
import { getListChoices } from '$lib/server/shipments/get-list-choices';
import { listShipments } from '$lib/server/shipments/list-shipments';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, cookies, url }) => {
	const ctx = contextOf(locals);

	const query = shipmentListQuery.parse(queryOf(url.searchParams));

	const site = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));
	const { items, total } = await orError(listShipments(ctx, site.id, query));

	return {
		query,
		items,
		total,
		choices: await getListChoices(ctx),
		mayCreate: may(ctx.actor, 'shipment.create'),
		mayDecide: may(ctx.actor, 'disposition.sign')
	};
};
