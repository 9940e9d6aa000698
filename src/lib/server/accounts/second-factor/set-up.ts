import { Secret } from 'otpauth';
import QRCode from 'qrcode';
import type { Context } from '../../context';
import { User } from '../../db/models/user';
import { inTransaction } from '../../db/transaction';
import { authorize } from '../../policies';
import { Refusal } from '../../refusals';
import { isPassword } from '../password';
import { isWithinLimit } from '../rate-limit';
import { stepOfCode, totpOf, useCode } from './check-code';
import { openSecret, sealSecret } from './sealed-secret';

const guesses = { attempts: 10, windowMs: 15 * 60_000 };

async function getOwn({ actor }: Context): Promise<User> {
	const user = actor.kind === 'user' ? await User.findByPk(actor.id) : null;
	if (!user?.passwordHash)
		throw new Refusal('not-allowed', 'Only an account with a password has a second factor.');
	return user;
}

async function checkPassword(ctx: Context, user: User, password: string): Promise<void> {
	if (!(await isWithinLimit(`password of ${user.id}`, guesses, ctx.now)))
		throw new Refusal('too-many-attempts');
	if (!(await isPassword(password, user.passwordHash)))
		throw new Refusal('wrong-password', 'That is not your password. Nothing was changed.');
}

/** Whether the actor's own account has a second factor, and what a set-up that was begun still has to show. */
export async function viewSecondFactor(
	ctx: Context
): Promise<{ since: string | null; begun: { secret: string; qr: string } | null }> {
	const user = await getOwn(ctx);
	if (user.secondFactorSince) return { since: user.secondFactorSince.toISOString(), begun: null };
	if (!user.secondFactorSealed) return { since: null, begun: null };
	const secret = openSecret(user.secondFactorSealed);
	const qr = await QRCode.toString(totpOf(secret, user.email).toString(), { type: 'svg', margin: 1 });
	return {
		since: null,
		begun: { secret, qr: `data:image/svg+xml;base64,${Buffer.from(qr).toString('base64')}` }
	};
}

/** Begins a set-up: a fresh secret, in force only once a code made from it has been entered. */
export async function beginSecondFactor(ctx: Context, password: string): Promise<void> {
	const own = await getOwn(ctx);
	await checkPassword(ctx, own, password);
	if (own.secondFactorSince) throw new Refusal('second-factor-set');
	const sealed = sealSecret(new Secret({ size: 20 }).base32);
	await inTransaction(ctx, async ({ transaction, record }) => {
		await User.update({ secondFactorSealed: sealed }, { where: { id: own.id }, transaction });
		record('account.second-factor', { scope: 'account', id: own.id }, { userId: own.id, act: 'begun' });
	});
}

/** Ends a set-up: the code shows that the authenticator has the secret. From then on sign-in asks for one. */
export async function confirmSecondFactor(ctx: Context, code: string): Promise<void> {
	const own = await getOwn(ctx);
	if (own.secondFactorSince) throw new Refusal('second-factor-set');
	if (!own.secondFactorSealed) throw new Refusal('not-found', 'Begin the set-up again.');
	if (!(await isWithinLimit(`code of ${own.id}`, guesses, ctx.now))) throw new Refusal('too-many-attempts');
	const step = stepOfCode(openSecret(own.secondFactorSealed), code, ctx.now);
	if (step === null) throw new Refusal('wrong-code');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const changes = { secondFactorSince: ctx.now, secondFactorStep: step };
		await User.update(changes, { where: { id: own.id }, transaction });
		record('account.second-factor', { scope: 'account', id: own.id }, { userId: own.id, act: 'set' });
	});
}

const cleared = { secondFactorSealed: null, secondFactorSince: null, secondFactorStep: null };

/** Takes one's own second factor away, by password and a code; a set-up that was only begun needs no code. */
export async function removeSecondFactor(ctx: Context, password: string, code: string | null): Promise<void> {
	const own = await getOwn(ctx);
	await checkPassword(ctx, own, password);
	await useCode(own, code, ctx.now);
	await inTransaction(ctx, async ({ transaction, record }) => {
		await User.update(cleared, { where: { id: own.id }, transaction });
		record('account.second-factor', { scope: 'account', id: own.id }, { userId: own.id, act: 'removed' });
	});
}

/** Takes away the second factor of somebody who lost their phone, and ends their sessions. For admins. */
export async function resetSecondFactor(ctx: Context, userId: string): Promise<void> {
	authorize(ctx, 'account.manage');
	await inTransaction(ctx, async ({ transaction, record }) => {
		const user = await User.findByPk(userId, { transaction, lock: transaction.LOCK.UPDATE });
		if (!user) throw new Refusal('not-found');
		await user.update({ ...cleared, tokenVersion: user.tokenVersion + 1 }, { transaction });
		record('account.second-factor', { scope: 'account', id: userId }, { userId, act: 'reset' });
	});
}
