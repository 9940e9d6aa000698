import type { AccountForm } from '../../schemas/account';
import { assertUnchanged } from '../catalogue/revision';
import type { Context } from '../context';
import { Token } from '../db/models/token';
import { User } from '../db/models/user';
import { UserSite } from '../db/models/user-site';
import { inTransaction, type Writing } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { rolesOf } from './load-actor';
import { assertAdminRemains, assertPlaces, setSites } from './standing';
import { accountFields } from './views';

async function lockUser({ transaction }: Writing, userId: string): Promise<User> {
	const user = await User.findByPk(userId, { transaction, lock: transaction.LOCK.UPDATE });
	if (!user) throw new Refusal('not-found');
	return user;
}

async function siteIdsOf({ transaction }: Writing, userId: string): Promise<string[]> {
	const memberships = await UserSite.findAll({ where: { userId }, transaction });
	return memberships.map(({ siteId }) => siteId);
}

/**
 * Changes name, roles, sites or firm; open sessions have the new roles at their next request.
 * @throws Refusal `not-found`, `not-allowed`, `last-admin`, `in-use`, `changed-meanwhile`
 */
export async function changeAccount(ctx: Context, userId: string, form: AccountForm): Promise<void> {
	authorize(ctx, 'account.manage');
	const { revision, siteIds, ...fields } = form;
	await inTransaction(ctx, async (w) => {
		await assertAdminRemains(w, userId, fields.roles);
		const user = await lockUser(w, userId);
		const before = accountFields(user, await siteIdsOf(w, userId));
		assertUnchanged(revision, before);
		// Somebody inside who becomes somebody outside would keep a password and a past that suppliers must not have.
		if (rolesOf(user).includes('supplier') !== fields.roles.includes('supplier'))
			throw new Refusal(
				'in-use',
				'Staff and suppliers sign in differently. Invite the other address instead.'
			);
		await assertPlaces(w, siteIds, fields.partnerId);
		await user.update(fields, { transaction: w.transaction });
		await setSites(w, userId, siteIds);
		const after = accountFields(user, siteIds);
		w.record('account.changed', { scope: 'account', id: userId }, { userId, before, after });
	});
}

/** Ends an account's sessions and links at once. @throws Refusal `not-found`, `not-allowed`, `last-admin` */
export async function switchAccountOff(ctx: Context, userId: string): Promise<void> {
	authorize(ctx, 'account.manage');
	await inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		await assertAdminRemains(w, userId, null);
		const user = await lockUser(w, userId);
		if (user.switchedOffAt) return;
		const tokenVersion = user.tokenVersion + 1;
		await user.update({ switchedOffAt: ctx.now, tokenVersion }, { transaction });
		await Token.update({ usedAt: ctx.now }, { where: { userId, usedAt: null }, transaction });
		record('account.switched-off', { scope: 'account', id: userId }, { userId });
	});
}

/** Lets somebody sign in again; sessions ended by switching off stay ended. @throws Refusal `not-found`, `not-allowed` */
export async function switchAccountOn(ctx: Context, userId: string): Promise<void> {
	authorize(ctx, 'account.manage');
	await inTransaction(ctx, async (w) => {
		const user = await lockUser(w, userId);
		if (!user.switchedOffAt) return;
		await user.update({ switchedOffAt: null }, { transaction: w.transaction });
		w.record('account.switched-on', { scope: 'account', id: userId }, { userId });
	});
}

/** Opens an account that too many wrong passwords had locked. @throws Refusal `not-found`, `not-allowed` */
export async function unlockAccount(ctx: Context, userId: string): Promise<void> {
	authorize(ctx, 'account.manage');
	await inTransaction(ctx, async (w) => {
		const user = await lockUser(w, userId);
		if (!user.lockedAt) return;
		await user.update({ lockedAt: null, failedPasswords: 0 }, { transaction: w.transaction });
		w.record('account.unlocked', { scope: 'account', id: userId }, { userId });
	});
}
