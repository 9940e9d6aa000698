import { col, fn, type WhereOptions } from 'sequelize';
import type { PartnerQuery } from '../../schemas/partner';
import { inState, pageOf, searchIn } from '../catalogue/search';
import type { Context } from '../context';
import { Contact } from '../db/models/contact';
import { Partner } from '../db/models/partner';
import { authorize } from '../policies';
import { dutyColumn, partnerView, type PartnerView } from './views';

export interface PartnerRow extends PartnerView {
	contacts: number;
	notified: number;
}

const sortColumns = { name: 'name', country: 'countryCode', since: 'createdAt' } as const;

async function contactCounts(
	partnerIds: string[]
): Promise<Map<string, { contacts: number; notified: number }>> {
	const contacts = await Contact.findAll({
		attributes: ['partnerId', 'isNotified', [fn('COUNT', col('id')), 'duty']],
		where: { partnerId: partnerIds, switchedOffAt: null },
		group: ['partnerId', 'isNotified'],
		raw: true
	});
	const counts = new Map<string, { contacts: number; notified: number }>();
	for (const row of contacts) {
		const known = counts.get(row.partnerId) ?? { contacts: 0, notified: 0 };
		const more = Number(row.duty);
		counts.set(row.partnerId, {
			contacts: known.contacts + more,
			notified: known.notified + (row.isNotified ? more : 0)
		});
	}
	return counts;
}

/** The firms that send, carry or receive, as staff look them up. @throws Refusal `not-allowed` */
export async function listPartners(
	ctx: Context,
	query: PartnerQuery
): Promise<{ items: PartnerRow[]; total: number }> {
	authorize(ctx, 'catalogue.view');
	const duty: WhereOptions<Partner> = query.duty === 'any' ? {} : { [dutyColumn(query.duty)]: true };
	const { rows, count } = await Partner.findAndCountAll({
		where: {
			...searchIn<Partner>(['name', 'address', 'gln'], query.q),
			...duty,
			...inState(query.state)
		} as WhereOptions<Partner>,
		order: [
			[sortColumns[query.sort], query.dir],
			['name', 'asc'],
			['id', 'asc']
		],
		...pageOf(query)
	});
	const counts = await contactCounts(rows.map((partner) => partner.id));
	const items = rows.map((partner) => ({
		...partnerView(partner),
		...(counts.get(partner.id) ?? { contacts: 0, notified: 0 })
	}));
	return { items, total: count };
}

/** Firms of one duty for a form's choice, by name. @throws Refusal `not-allowed` */
export async function listPartnerChoices(
	ctx: Context,
	duty: PartnerQuery['duty']
): Promise<{ id: string; name: string }[]> {
	authorize(ctx, 'catalogue.view');
	const where: WhereOptions<Partner> = duty === 'any' ? {} : { [dutyColumn(duty)]: true };
	const partners = await Partner.findAll({
		attributes: ['id', 'name'],
		where: { ...where, switchedOffAt: null },
		order: [['name', 'asc']]
	});
	return partners.map(({ id, name }) => ({ id, name }));
}
