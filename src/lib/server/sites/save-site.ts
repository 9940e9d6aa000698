import { v7 as uuid } from 'uuid';
import type { SiteForm } from '../../schemas/site';
import { orDuplicate } from '../catalogue/duplicate';
import { assertUnchanged } from '../catalogue/revision';
import type { Context } from '../context';
import { Organisation } from '../db/models/organisation';
import { Shipment } from '../db/models/shipment';
import { Site } from '../db/models/site';
import { UserSite } from '../db/models/user-site';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { siteFields } from './views';

const taken = 'Another site has that number prefix. Docket numbers would collide.';

/** Opens a site; whoever opens it works there too. @returns its id. @throws Refusal `not-allowed`, `duplicate` */
export async function addSite(ctx: Context, form: SiteForm): Promise<string> {
	authorize(ctx, 'catalogue.change');
	const { revision: _, ...fields } = form;
	const id = uuid();
	const writing = inTransaction(ctx, async ({ transaction, record }) => {
		const organisation = await Organisation.findOne({ transaction });
		if (!organisation) throw new Error('This database has no organisation yet.');
		const site = await Site.create(
			{ id, organisationId: organisation.id, ...fields, createdAt: ctx.now },
			{ transaction }
		);
		await UserSite.create({ userId: ctx.actor.id, siteId: id }, { transaction });
		record('site.saved', { scope: 'site', id }, { siteId: id, before: null, after: siteFields(site) });
	});
	await orDuplicate(writing, taken);
	return id;
}

/** Changes a site. @throws Refusal `not-found`, `not-allowed`, `duplicate`, `in-use`, `changed-meanwhile` */
export async function changeSite(ctx: Context, siteId: string, form: SiteForm): Promise<void> {
	authorize(ctx, 'catalogue.change');
	const { revision, ...fields } = form;
	const writing = inTransaction(ctx, async ({ transaction, record }) => {
		const site = await Site.findByPk(siteId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!site) throw new Refusal('not-found');
		const before = siteFields(site);
		assertUnchanged(revision, before);
		if (site.code !== fields.code && (await Shipment.findOne({ where: { siteId }, transaction })))
			throw new Refusal('in-use', `Dockets carry the prefix ${site.code} already, so it stays.`);
		await site.update(fields, { transaction });
		record('site.saved', { scope: 'site', id: siteId }, { siteId, before, after: siteFields(site) });
	});
	await orDuplicate(writing, taken);
}

/** Closes a site to new people, or opens it again; its dockets stay. @throws Refusal `not-found`, `not-allowed`, `in-use` */
export async function switchSite(ctx: Context, siteId: string, isOn: boolean): Promise<void> {
	authorize(ctx, 'catalogue.change');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const sites = await Site.findAll({ transaction, lock: transaction.LOCK.UPDATE });
		const site = sites.find((candidate) => candidate.id === siteId);
		if (!site) throw new Refusal('not-found');
		if ((site.switchedOffAt === null) === isOn) return;
		const isLast = sites.filter((candidate) => !candidate.switchedOffAt).length === 1;
		if (!isOn && isLast) throw new Refusal('in-use', 'This is the last site in use. Open another first.');
		await site.update({ switchedOffAt: isOn ? null : ctx.now }, { transaction });
		const chain = { scope: 'site', id: siteId } as const;
		record('site.saved', chain, { siteId, before: { isInUse: !isOn }, after: { isInUse: isOn } });
	});
}
