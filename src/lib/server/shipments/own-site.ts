import { isSystem, type Context } from '../context';
import { Site } from '../db/models/site';
import { Refusal } from '../refusals';

/** A site of the actor's. @throws Refusal `not-found` for any other, so that a guess learns nothing */
export async function getOwnSite(ctx: Context, siteId: string): Promise<Site> {
	const isOwn = ctx.actor.siteIds.includes(siteId) || isSystem(ctx.actor);
	const site = isOwn ? await Site.findByPk(siteId) : null;
	if (!site) throw new Refusal('not-found');
	return site;
}
