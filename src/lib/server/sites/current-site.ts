import { Site } from '../db/models/site';
import type { Context } from '../context';
import type { SiteView } from '../../schemas/docket';
import { Refusal } from '../refusals';

/** The cookie that remembers at which of their sites somebody works just now. */
export const siteCookie = 'site';

export function siteView(site: Site): SiteView {
	return {
		id: site.id,
		code: site.code,
		name: site.name,
		gln: site.gln,
		zone: site.zone,
		temperatureUnit: site.temperatureUnit,
		address: site.address
	};
}

/** The actor's sites, the oldest first. */
export async function listOwnSites({ actor }: Context): Promise<SiteView[]> {
	const sites = await Site.findAll({
		where: { id: [...actor.siteIds] },
		order: [
			['createdAt', 'ASC'],
			['name', 'ASC']
		]
	});
	return sites.map(siteView);
}

/** The preferred site where it is one of the actor's, else the first. @throws Refusal `not-allowed` for a user of no site */
export async function getCurrentSite(ctx: Context, preferredId: string | undefined): Promise<SiteView> {
	const sites = await listOwnSites(ctx);
	const site = sites.find((candidate) => candidate.id === preferredId) ?? sites[0];
	if (!site) throw new Refusal('not-allowed', 'You belong to no site yet. An admin can add you to one.');
	return site;
}
