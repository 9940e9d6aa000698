import { may } from '$lib/server/policies';
import { contextOf, orError } from '$lib/server/request';
import { getCurrentSite, listOwnSites, siteCookie } from '$lib/server/sites/current-site';
import { env } from '$lib/server/env';
import type { LayoutServerLoad } from './$types';

export const load: LayoutServerLoad = async ({ locals, cookies }) => {
	const ctx = contextOf(locals);
	const { actor } = ctx;
	const site = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));

	return {
		viewer: { name: actor.name, title: actor.title, email: actor.email, roles: [...actor.roles] },
		site,
		sites: await listOwnSites(ctx),
		/** The reader's own choice, where they made one; a docket else speaks in its site's unit. */
		preferredUnit: actor.temperatureUnit,
		temperatureUnit: actor.temperatureUnit ?? site.temperatureUnit,
		mayReadRecord: may(actor, 'audit.view'),
		mayWorkClaims: may(actor, 'claim.view'),
		hasMailbox: env().isLocalMailbox,
		nowAt: ctx.now.toISOString()
	};
};
