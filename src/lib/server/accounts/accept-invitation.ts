import { Token } from '../db/models/token';
import { User } from '../db/models/user';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import type { RequestScope } from '../request-scope';
import { hashPassword } from './password';
import { personContext } from './person-context';
import { isWithinLimit } from './rate-limit';
import { findToken, useToken } from './tokens';

const guesses = { attempts: 30, windowMs: 15 * 60_000 };

/** Whom an open invitation is for; null when it was used, ran out or never was. */
export async function findInvitation(
	secret: string,
	now: Date
): Promise<{ name: string; email: string } | null> {
	const token = await findToken(secret);
	if (token?.kind !== 'invitation' || token.usedAt || token.expiresAt <= now || !token.userId) return null;
	const user = await User.findByPk(token.userId);
	return user && !user.switchedOffAt ? { name: user.name, email: user.email } : null;
}

/**
 * Uses an invitation up: sets name and password and ends every earlier session.
 * @returns the e-mail address to sign in with. @throws Refusal `link-used`, `too-many-attempts`
 */
export async function acceptInvitation(
	secret: string,
	{ name, password }: { name: string; password: string },
	scope: RequestScope
): Promise<string> {
	if (!(await isWithinLimit(`invitation from ${scope.address}`, guesses, scope.now)))
		throw new Refusal('too-many-attempts');
	const passwordHash = await hashPassword(password);
	const userId = (await findToken(secret))?.userId;
	if (!userId) throw new Refusal('link-used');
	return inTransaction(personContext(scope, 'user', userId), async ({ transaction, record }) => {
		const token = await useToken(secret, ['invitation'], scope.now, transaction);
		const user = token && (await User.findByPk(userId, { transaction, lock: transaction.LOCK.UPDATE }));
		if (!user || user.switchedOffAt) throw new Refusal('link-used');
		const before = { name: user.name };
		await user.update(
			{ name, passwordHash, tokenVersion: user.tokenVersion + 1, failedPasswords: 0, lockedAt: null },
			{ transaction }
		);
		await Token.update({ usedAt: scope.now }, { where: { userId, usedAt: null }, transaction });
		const chain = { scope: 'account', id: userId } as const;
		record('link.used', chain, { kind: 'invitation', contactId: null, userId });
		record('account.password-set', chain, { userId });
		if (before.name !== name) record('account.changed', chain, { userId, before, after: { name } });
		return user.email;
	});
}
