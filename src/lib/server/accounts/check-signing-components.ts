import type { Context } from '../context';
import { User } from '../db/models/user';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { isPassword } from './password';

const wrongPasswordsAllowed = 5;

/** Counts under a lock: two wrong passwords at the same moment are two. */
async function countWrong(ctx: Context, userId: string): Promise<void> {
	await inTransaction(ctx, async ({ transaction, record }) => {
		const lock = transaction.LOCK.UPDATE;
		const user = await User.findByPk(userId, { transaction, lock, rejectOnEmpty: true });
		const failedPasswords = user.failedPasswords + 1;
		const isLocked = failedPasswords >= wrongPasswordsAllowed;
		await user.update(
			{ failedPasswords, lockedAt: isLocked ? (user.lockedAt ?? ctx.now) : user.lockedAt },
			{ transaction }
		);
		const chain = { scope: 'account', id: user.id } as const;
		record('disposition.refused', chain, { why: 'wrong-password' });
		if (failedPasswords === wrongPasswordsAllowed)
			record('account.locked', chain, { userId: user.id, failedPasswords });
	});
}

async function recordLocked(ctx: Context, userId: string): Promise<void> {
	await inTransaction(ctx, async ({ record }) =>
		record('disposition.refused', { scope: 'account', id: userId }, { why: 'locked' })
	);
}

/**
 * Holds a re-entered password against the signer's own; after five wrong ones the account may not sign until an admin
 * unlocks it. @throws Refusal `wrong-password`, `locked`
 */
export async function checkSigningPassword(ctx: Context, password: string): Promise<User> {
	const user = await User.findByPk(ctx.actor.id);
	if (!user || ctx.actor.kind !== 'user') throw new Refusal('not-allowed');
	if (user.lockedAt) {
		await recordLocked(ctx, user.id);
		throw new Refusal('locked');
	}
	if (!(await isPassword(password, user.passwordHash))) {
		await countWrong(ctx, user.id);
		throw new Refusal('wrong-password');
	}
	if (user.failedPasswords > 0) await user.update({ failedPasswords: 0 });
	return user;
}
