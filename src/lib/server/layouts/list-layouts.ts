import { Op, type WhereOptions } from 'sequelize';
import type { LayoutQuery, LayoutView } from '../../schemas/layout';
import { pageOf, searchIn } from '../catalogue/search';
import type { Context } from '../context';
import { Partner } from '../db/models/partner';
import { RememberedLayout } from '../db/models/remembered-layout';
import { authorize } from '../policies';
import { layoutViews } from './views';

async function where({ q, state }: LayoutQuery): Promise<WhereOptions<RememberedLayout>> {
	const inState = state === 'any' ? {} : { withdrawnAt: state === 'in-use' ? null : { [Op.ne]: null } };
	if (q === '') return inState;
	const partners = await Partner.findAll({ where: searchIn<Partner>(['name'], q), attributes: ['id'] });
	const words = [
		searchIn<RememberedLayout>(['sourceName', 'fingerprint'], q),
		{ partnerId: partners.map(({ id }) => id) }
	];
	return { ...inState, [Op.or]: words } as WhereOptions<RememberedLayout>;
}

/** How files are read without being asked about again, the newest first. @throws Refusal `not-allowed` */
export async function listLayouts(
	ctx: Context,
	query: LayoutQuery
): Promise<{ items: LayoutView[]; total: number }> {
	authorize(ctx, 'catalogue.view');
	const { rows, count } = await RememberedLayout.findAndCountAll({
		where: await where(query),
		order: [
			['confirmedAt', 'DESC'],
			['id', 'DESC']
		],
		...pageOf(query)
	});
	return { items: await layoutViews(rows), total: count };
}
