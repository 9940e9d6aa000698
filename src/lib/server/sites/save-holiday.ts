import { v7 as uuid } from 'uuid';
import type { z } from 'zod';
import type { holidayForm } from '../../schemas/site';
import { orDuplicate } from '../catalogue/duplicate';
import type { Context } from '../context';
import { Site } from '../db/models/site';
import { SiteHoliday } from '../db/models/site-holiday';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';

/** Enters a day on which a site does not work. @throws Refusal `not-found`, `not-allowed`, `duplicate` */
export async function addHoliday(
	ctx: Context,
	siteId: string,
	{ heldOn, name }: z.output<typeof holidayForm>
): Promise<void> {
	authorize(ctx, 'catalogue.change');
	const id = uuid();
	const writing = inTransaction(ctx, async ({ transaction, record }) => {
		if (!(await Site.findByPk(siteId, { transaction }))) throw new Refusal('not-found');
		await SiteHoliday.create({ id, siteId, heldOn, name }, { transaction });
		const chain = { scope: 'site', id: siteId } as const;
		record('site.saved', chain, { siteId, before: { holiday: null }, after: { holiday: { heldOn, name } } });
	});
	await orDuplicate(writing, 'That day is entered already.');
}

/** Takes a holiday out again. @throws Refusal `not-found`, `not-allowed` */
export async function dropHoliday(ctx: Context, siteId: string, holidayId: string): Promise<void> {
	authorize(ctx, 'catalogue.change');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const holiday = await SiteHoliday.findOne({ where: { id: holidayId, siteId }, transaction });
		if (!holiday) throw new Refusal('not-found');
		const { heldOn, name } = holiday;
		await holiday.destroy({ transaction });
		const chain = { scope: 'site', id: siteId } as const;
		record('site.saved', chain, { siteId, before: { holiday: { heldOn, name } }, after: { holiday: null } });
	});
}
