import type { Context } from '../context';
import { User } from '../db/models/user';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { isPassword } from './password';
import { hasSecondFactor, useCode } from './second-factor/check-code';
import { tellAdminsOfLock } from './tell-admins-of-lock';

const wrongPasswordsAllowed = 5;
/** A pause longer than this ends a series of signatures. Source: 21 CFR 11.200(a)(1) names no length; ours. */
const seriesMs = 30 * 60_000;

/** What a signature is made with. E-mail and code are asked only where a series begins. */
export interface SigningComponents {
	password: string;
	email?: string | null;
	code?: string | null;
}

async function recordLocked(ctx: Context, userId: string): Promise<void> {
	await inTransaction(ctx, async ({ record }) =>
		record('disposition.refused', { scope: 'account', id: userId }, { why: 'locked' })
	);
}

/**
 * Whether the next signature of this session must show every component: the first of a series does, those after it
 * the password alone. Source: 21 CFR 11.200(a)(1)(i) and (ii).
 */
export function beginsSeries(user: User, sessionId: string | null | undefined, now: Date): boolean {
	if (!sessionId) return false;
	const isSame = user.signingSessionId === sessionId && user.signingSessionAt !== null;
	return !isSame || now.getTime() - (user.signingSessionAt?.getTime() ?? 0) > seriesMs;
}

/** What the signing form has to ask of the actor now. */
export async function componentsAsked(ctx: Context): Promise<{ email: boolean; code: boolean }> {
	const user = await User.findByPk(ctx.actor.id);
	if (!user || !beginsSeries(user, ctx.actor.sessionId, ctx.now)) return { email: false, code: false };
	return { email: true, code: hasSecondFactor(user) };
}

async function refuseWrong(ctx: Context, user: User, why: 'wrong-password' | 'wrong-code'): Promise<never> {
	await inTransaction(ctx, async ({ transaction, record, enqueue }) => {
		const fresh = await User.findByPk(user.id, { transaction, lock: transaction.LOCK.UPDATE });
		if (!fresh) return;
		const failedPasswords = fresh.failedPasswords + 1;
		const isLocked = failedPasswords >= wrongPasswordsAllowed && !fresh.lockedAt;
		await fresh.update({ failedPasswords, lockedAt: isLocked ? ctx.now : fresh.lockedAt }, { transaction });
		const chain = { scope: 'account', id: user.id } as const;
		record('disposition.refused', chain, { why });
		if (!isLocked) return;
		record('account.locked', chain, { userId: user.id, failedPasswords });
		await tellAdminsOfLock({ transaction, enqueue }, fresh, ctx.now);
	});
	throw new Refusal(why);
}

/** An e-mail that is not the signer's own counts like a wrong password: both together say who signs. */
function isOwnAddress(user: User, email: string | null | undefined): boolean {
	return (email ?? '').trim().toLowerCase() === user.email;
}

/**
 * Holds what a signature is made with against the signer's own; after five wrong tries the account may not sign until
 * an admin unlocks it, and every admin is mailed. The first signature of a series needs e-mail, password and, where
 * one is set up, the code of the second factor; those after it the password.
 * @throws Refusal `wrong-password`, `wrong-code`, `code-needed`, `locked`, `not-allowed`
 */
export async function checkSigningComponents(ctx: Context, shown: SigningComponents): Promise<User> {
	const user = await User.findByPk(ctx.actor.id);
	if (!user || ctx.actor.kind !== 'user') throw new Refusal('not-allowed');
	if (user.lockedAt) {
		await recordLocked(ctx, user.id);
		throw new Refusal('locked');
	}
	const isFirst = beginsSeries(user, ctx.actor.sessionId, ctx.now);
	const isRight = await isPassword(shown.password, user.passwordHash);
	if (!isRight || (isFirst && !isOwnAddress(user, shown.email)))
		return refuseWrong(ctx, user, 'wrong-password');
	if (isFirst) await showCode(ctx, user, shown.code ?? null);
	const series = ctx.actor.sessionId
		? { signingSessionId: ctx.actor.sessionId, signingSessionAt: ctx.now }
		: {};
	await user.update({ failedPasswords: 0, ...series });
	return user;
}

async function showCode(ctx: Context, user: User, code: string | null): Promise<void> {
	try {
		await useCode(user, code, ctx.now);
	} catch (error) {
		if (error instanceof Refusal && error.code === 'wrong-code') await refuseWrong(ctx, user, 'wrong-code');
		throw error;
	}
}
