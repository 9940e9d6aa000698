import type { Context } from '../context';
import { User } from '../db/models/user';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { isPassword } from './password';

const wrongPasswordsAllowed = 5;

async function countWrong(ctx: Context, user: User): Promise<void> {
	await inTransaction(ctx, async ({ transaction, record }) => {
		const failedPasswords = user.failedPasswords + 1;
		const isLocked = failedPasswords >= wrongPasswordsAllowed;
		await user.update({ failedPasswords, lockedAt: isLocked ? ctx.now : null }, { transaction });
		const chain = { scope: 'account', id: user.id } as const;
		record('disposition.refused', chain, { why: 'wrong-password' });
		if (isLocked) record('account.locked', chain, { userId: user.id, failedPasswords });
	});
}

/**
 * Holds a re-entered password against the signer's own; after five wrong ones the account may not sign until an admin
 * unlocks it. @throws Refusal `wrong-password`, `locked`
 */
export async function checkSigningPassword(ctx: Context, password: string): Promise<User> {
	const user = await User.findByPk(ctx.actor.id);
	if (!user || ctx.actor.kind !== 'user') throw new Refusal('not-allowed');
	if (user.lockedAt) throw new Refusal('locked');
	if (!(await isPassword(password, user.passwordHash))) {
		await countWrong(ctx, user);
		throw new Refusal('wrong-password');
	}
	if (user.failedPasswords > 0) await user.update({ failedPasswords: 0 });
	return user;
}
