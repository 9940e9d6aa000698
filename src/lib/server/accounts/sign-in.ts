import { v7 as uuid } from 'uuid';
import { User } from '../db/models/user';
import { inTransaction } from '../db/transaction';
import { systemContext, type Context } from '../context';
import { Refusal } from '../refusals';
import type { RequestScope } from '../request-scope';
import { isPassword } from './password';
import { personContext } from './person-context';
import { clearLimit, countAttempt } from './rate-limit';
import { useCode } from './second-factor/check-code';

const quarterHourMs = 15 * 60_000;
const perAddress = { attempts: 60, windowMs: quarterHourMs };
const perAccount = { attempts: 10, windowMs: quarterHourMs };

/** What a session remembers of who opened it; the rest is looked up anew at every request. */
export interface Claims {
	kind: 'user' | 'link';
	/** How a user came in; absent in sessions from before it was kept, which a password opened. */
	by?: 'password' | 'link';
	subjectId: string;
	tokenVersion: number;
	sessionId?: string;
}

function contextOfScope(scope: RequestScope): Context {
	return { ...systemContext(scope.now, scope.requestId), address: scope.address, sessionKind: undefined };
}

async function recordRefused(
	scope: RequestScope,
	user: User | null,
	email: string,
	why: string
): Promise<void> {
	const chain = user
		? ({ scope: 'account', id: user.id } as const)
		: ({ scope: 'organisation', id: systemContext(scope.now).actor.id } as const);
	await inTransaction(contextOfScope(scope), async ({ record }) =>
		record('session.refused', chain, { email, why })
	);
}

/** Past a limit nothing is checked; the trail is told once a window, or whoever floods us would flood it too. */
async function refuseTooMany(address: string, accountLimit: string, scope: RequestScope): Promise<void> {
	const limits = [
		[`sign-in from ${scope.address}`, perAddress],
		[accountLimit, perAccount]
	] as const;
	for (const [name, limit] of limits) {
		const attempts = await countAttempt(name, limit, scope.now);
		if (attempts <= limit.attempts) continue;
		if (attempts === limit.attempts + 1) {
			const user = await User.findOne({ where: { email: address } });
			await recordRefused(scope, user, address, 'too-many-attempts');
		}
		throw new Refusal('too-many-attempts');
	}
}

/**
 * Checks an e-mail and password. Known and unknown addresses are answered alike and in like time.
 * @returns null for a wrong pair. @throws Refusal `too-many-attempts`; with the right pair `switched-off`, `locked`,
 * `code-needed`, `wrong-code`.
 */
export async function signInByPassword(
	email: string,
	password: string,
	scope: RequestScope,
	code: string | null = null
): Promise<Claims | null> {
	const address = email.trim().toLowerCase();
	const accountLimit = `sign-in ${address.slice(0, 120)}`;
	await refuseTooMany(address, accountLimit, scope);

	const user = await User.findOne({ where: { email: address } });
	const matches = await isPassword(password, user?.passwordHash ?? null);
	if (!user || !matches) {
		await recordRefused(scope, user, address, user ? 'wrong-password' : 'unknown');
		return null;
	}
	// Only who knows the password is told what is wrong with the account.
	if (user.switchedOffAt || user.lockedAt) {
		const why = user.switchedOffAt ? 'switched-off' : 'locked';
		await recordRefused(scope, user, address, why);
		throw new Refusal(why);
	}
	await showSecondFactor(user, code, scope);
	await clearLimit(accountLimit);
	return openSession(user, scope, 'password');
}

/** A wrong or missing code is written down like a wrong password, but said: the password was right. */
async function showSecondFactor(user: User, code: string | null, scope: RequestScope): Promise<void> {
	try {
		await useCode(user, code, scope.now);
	} catch (error) {
		if (error instanceof Refusal && error.code !== 'code-needed')
			await recordRefused(scope, user, user.email, error.code);
		throw error;
	}
}

/** Records that a session began. */
export async function openSession(user: User, scope: RequestScope, by: 'password' | 'link'): Promise<Claims> {
	const ctx = { ...personContext(scope, 'user', user.id), sessionKind: by };
	await inTransaction(ctx, async ({ record, transaction }) => {
		await User.update({ lastSignInAt: scope.now }, { where: { id: user.id }, transaction });
		record('session.opened', { scope: 'account', id: user.id }, { by, userId: user.id });
	});
	return { kind: 'user', by, subjectId: user.id, tokenVersion: user.tokenVersion, sessionId: uuid() };
}
