import type { OwnAccountForm } from '../../schemas/account';
import type { Context } from '../context';
import { Token } from '../db/models/token';
import { User } from '../db/models/user';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { hashPassword, isPassword } from './password';
import { isWithinLimit } from './rate-limit';

const guesses = { attempts: 10, windowMs: 15 * 60_000 };

async function getOwn(ctx: Context): Promise<User> {
	const user = ctx.actor.kind === 'user' ? await User.findByPk(ctx.actor.id) : null;
	if (!user) throw new Refusal('not-allowed', 'A link has no account of its own to change.');
	return user;
}

/** Changes the actor's own name and the unit they read temperatures in. @throws Refusal `not-allowed` for a link */
export async function changeOwnAccount(
	ctx: Context,
	{ name, temperatureUnit }: OwnAccountForm
): Promise<void> {
	const { id: userId } = await getOwn(ctx);
	await inTransaction(ctx, async ({ transaction, record }) => {
		const user = await User.findByPk(userId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!user) throw new Refusal('not-found');
		const before = { name: user.name, temperatureUnit: user.temperatureUnit };
		const after = { name, temperatureUnit };
		if (before.name === name && before.temperatureUnit === temperatureUnit) return;
		await user.update(after, { transaction });
		record('account.changed', { scope: 'account', id: userId }, { userId, before, after });
	});
}

/**
 * Sets a new password in exchange for the old one and ends every session, this one too: the caller signs in anew.
 * @throws Refusal `wrong-password`, `too-many-attempts`, `not-allowed`
 */
export async function changePassword(
	ctx: Context,
	{ oldPassword, newPassword }: { oldPassword: string; newPassword: string }
): Promise<void> {
	const own = await getOwn(ctx);
	if (!(await isWithinLimit(`password of ${own.id}`, guesses, ctx.now)))
		throw new Refusal('too-many-attempts');
	if (!(await isPassword(oldPassword, own.passwordHash)))
		throw new Refusal('wrong-password', 'That is not the password you have now. Nothing was changed.');
	const passwordHash = await hashPassword(newPassword);
	await inTransaction(ctx, async ({ transaction, record }) => {
		const user = await User.findByPk(own.id, { transaction, lock: transaction.LOCK.UPDATE });
		if (!user) throw new Refusal('not-found');
		await user.update({ passwordHash, tokenVersion: user.tokenVersion + 1 }, { transaction });
		await Token.update({ usedAt: ctx.now }, { where: { userId: own.id, usedAt: null }, transaction });
		record('account.password-set', { scope: 'account', id: own.id }, { userId: own.id });
	});
}
