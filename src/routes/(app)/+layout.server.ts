import { may } from '$lib/server/policies';
import { contextOf, orError } from '$lib/server/request';
import { getCurrentSite, listOwnSites, siteCookie } from '$lib/server/sites/current-site';
import { env } from '$lib/server/env';
import type { LayoutServerLoad } from './$types';

export const load: LayoutServerLoad = async ({ locals, cookies, params }) => {
	const ctx = contextOf(locals);
	const { actor } = ctx;
	const site = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));

	const sites = await listOwnSites(ctx);
	// A docket of another of one's sites is read in that site's unit.
	const inView = sites.find(({ code }) => params.docket?.startsWith(`${code}-`)) ?? site;

	return {
		viewer: { name: actor.name, title: actor.title, email: actor.email, roles: [...actor.roles] },
		site,
		sites,
		/** The reader's own choice, where they made one; a docket else speaks in its site's unit. */
		preferredUnit: actor.temperatureUnit,
		temperatureUnit: actor.temperatureUnit ?? inView.temperatureUnit,
		mayReadRecord: may(actor, 'audit.view'),
		mayWorkClaims: may(actor, 'claim.view'),
		hasMailbox: env().isLocalMailbox,
		nowAt: ctx.now.toISOString()
	};
};
