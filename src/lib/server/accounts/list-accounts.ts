import { Op, col, fn, where as compare, type WhereOptions } from 'sequelize';
import type { AccountQuery } from '../../schemas/account';
import { inState, pageOf, searchIn } from '../catalogue/search';
import type { Context } from '../context';
import { Partner } from '../db/models/partner';
import { Site } from '../db/models/site';
import { User } from '../db/models/user';
import { UserSite } from '../db/models/user-site';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { accountView, type AccountView } from './views';

const sortColumns = { name: 'name', email: 'email', seen: 'lastSignInAt' } as const;

function stateWhere(state: AccountQuery['state']): WhereOptions {
	if (state === 'locked') return { switchedOffAt: null, lockedAt: { [Op.ne]: null } };
	if (state === 'invited')
		return { switchedOffAt: null, lockedAt: null, passwordHash: null, lastSignInAt: null };
	return inState(state);
}

async function viewsOf(users: readonly User[]): Promise<AccountView[]> {
	const memberships = await UserSite.findAll({ where: { userId: users.map(({ id }) => id) } });
	const sites = await Site.findAll({ attributes: ['id', 'name'] });
	const partners = await Partner.findAll({
		attributes: ['id', 'name'],
		where: { id: users.flatMap(({ partnerId }) => partnerId ?? []) }
	});
	const partnerNames = new Map(partners.map(({ id, name }) => [id, name]));
	return users.map((user) => {
		const own = new Set(memberships.filter(({ userId }) => userId === user.id).map(({ siteId }) => siteId));
		return accountView(
			user,
			sites.filter(({ id }) => own.has(id)),
			partnerNames.get(user.partnerId ?? '') ?? null
		);
	});
}

/** Everybody who can sign in or could. @throws Refusal `not-allowed` */
export async function listAccounts(
	ctx: Context,
	query: AccountQuery
): Promise<{ items: AccountView[]; total: number }> {
	authorize(ctx, 'account.manage');
	const hasRole = compare(fn('JSON_CONTAINS', col('roles'), JSON.stringify(query.role)), 1);
	const parts: WhereOptions[] = [
		searchIn<User>(['name', 'email', 'title'], query.q),
		stateWhere(query.state)
	];
	const { rows, count } = await User.findAndCountAll({
		where: { [Op.and]: query.role === 'any' ? parts : [...parts, hasRole] } as WhereOptions<User>,
		order: [
			[sortColumns[query.sort], query.dir],
			['id', 'asc']
		],
		...pageOf(query)
	});
	return { items: await viewsOf(rows), total: count };
}

/** One account. @throws Refusal `not-found`, `not-allowed` */
export async function getAccount(ctx: Context, userId: string): Promise<AccountView> {
	authorize(ctx, 'account.manage');
	const user = await User.findByPk(userId);
	const [view] = user ? await viewsOf([user]) : [];
	if (!view) throw new Refusal('not-found');
	return view;
}
