import { col, fn, type WhereOptions } from 'sequelize';
import type { SiteQuery } from '../../schemas/site';
import { inState, pageOf, searchIn } from '../catalogue/search';
import type { Context } from '../context';
import { Site } from '../db/models/site';
import { UserSite } from '../db/models/user-site';
import { authorize } from '../policies';
import { siteRecordView, type SiteRecordView } from './views';

export interface SiteRow extends SiteRecordView {
	people: number;
}

/** Every site, for those who keep them. @throws Refusal `not-allowed` */
export async function listSites(
	ctx: Context,
	query: SiteQuery
): Promise<{ items: SiteRow[]; total: number }> {
	authorize(ctx, 'catalogue.change');
	const { rows, count } = await Site.findAndCountAll({
		where: {
			...searchIn<Site>(['name', 'code', 'address', 'gln', 'zone'], query.q),
			...inState(query.state)
		} as WhereOptions<Site>,
		order: [
			[query.sort, query.dir],
			['id', 'asc']
		],
		...pageOf(query)
	});
	const members = await UserSite.findAll({
		attributes: ['siteId', [fn('COUNT', col('user_id')), 'userId']],
		where: { siteId: rows.map((site) => site.id) },
		group: ['siteId'],
		raw: true
	});
	const people = new Map(members.map((row) => [row.siteId, Number(row.userId)]));
	return {
		items: rows.map((site) => ({ ...siteRecordView(site), people: people.get(site.id) ?? 0 })),
		total: count
	};
}

/** Sites in use for a form's choice, by name. @throws Refusal `not-allowed` */
export async function listSiteChoices(ctx: Context): Promise<{ id: string; code: string; name: string }[]> {
	authorize(ctx, 'account.manage');
	const sites = await Site.findAll({ where: { switchedOffAt: null }, order: [['name', 'asc']] });
	return sites.map(({ id, code, name }) => ({ id, code, name }));
}
