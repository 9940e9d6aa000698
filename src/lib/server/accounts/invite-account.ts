import { v7 as uuid } from 'uuid';
import type { InviteForm } from '../../schemas/account';
import { orDuplicate } from '../catalogue/duplicate';
import type { Context } from '../context';
import { Token } from '../db/models/token';
import { User } from '../db/models/user';
import { inTransaction, type Writing } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { rolesOf } from './load-actor';
import { assertPlaces, setSites } from './standing';

const taken = 'Somebody with that e-mail address has an account already.';

/** Staff choose a password; a supplier's user gets a first link, since theirs need none. */
function enqueueInvitation(ctx: Context, { enqueue }: Writing, user: User): void {
	const kind = rolesOf(user).includes('supplier') ? 'welcome' : 'invitation';
	enqueue('mail-link', { kind, userId: user.id, by: ctx.actor.name });
}

/** Makes an account and mails its invitation. @returns its id. @throws Refusal `not-allowed`, `duplicate`, `not-found` */
export async function inviteAccount(ctx: Context, form: InviteForm): Promise<string> {
	authorize(ctx, 'account.manage');
	const { revision: _, siteIds, ...fields } = form;
	const id = uuid();
	const writing = inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		await assertPlaces(w, siteIds, fields.partnerId);
		const user = await User.create(
			{ id, ...fields, passwordHash: null, createdAt: ctx.now, invitedAt: ctx.now },
			{ transaction }
		);
		await setSites(w, id, siteIds);
		const { email, roles } = fields;
		record('account.invited', { scope: 'account', id }, { userId: id, email, roles });
		enqueueInvitation(ctx, w, user);
	});
	await orDuplicate(writing, taken);
	return id;
}

/**
 * Mails a new invitation and ends earlier ones: for one that was lost, and for a forgotten password.
 * @throws Refusal `not-found`, `not-allowed`, `in-use`
 */
export async function resendInvitation(ctx: Context, userId: string): Promise<void> {
	authorize(ctx, 'account.manage');
	await inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		const user = await User.findByPk(userId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!user) throw new Refusal('not-found');
		if (user.switchedOffAt)
			throw new Refusal('in-use', 'The account is switched off. Switch it on, then send the invitation.');
		await Token.update({ usedAt: ctx.now }, { where: { userId, usedAt: null }, transaction });
		await user.update({ invitedAt: ctx.now }, { transaction });
		const chain = { scope: 'account', id: userId } as const;
		record('account.invited', chain, { userId, email: user.email, roles: rolesOf(user) });
		enqueueInvitation(ctx, w, user);
	});
}
