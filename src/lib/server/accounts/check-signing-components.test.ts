import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import { buildSite, buildUser, contextFor, testNow, testPassword } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import type { Context } from '../context';
import { Job } from '../db/models/job';
import { User } from '../db/models/user';
import { checkSigningComponents, componentsAsked } from './check-signing-components';
import { totpOf } from './second-factor/check-code';
import { beginSecondFactor, confirmSecondFactor, viewSecondFactor } from './second-factor/set-up';

useTestDatabase();

async function inSession(minutes = 0, user?: User): Promise<{ user: User; ctx: Context }> {
	const one = user ?? (await buildUser(['qa'], { sites: [await buildSite()] }));
	const ctx = await contextFor(one);
	const now = new Date(testNow.getTime() + minutes * 60_000);
	return { user: one, ctx: { ...ctx, now, actor: { ...ctx.actor, sessionId: uuid() } } };
}

const later = (ctx: Context, minutes: number): Context => ({
	...ctx,
	now: new Date(ctx.now.getTime() + minutes * 60_000)
});

// Source of the rule: 21 CFR 11.200(a)(1)(i) and (ii).
describe('a series of signatures', () => {
	it('begins with e-mail and password; those after it need the password alone', async () => {
		const { user, ctx } = await inSession();
		expect(await componentsAsked(ctx)).toEqual({ email: true, code: false });
		await expect(checkSigningComponents(ctx, { password: testPassword })).rejects.toMatchObject({
			code: 'wrong-password'
		});
		await checkSigningComponents(ctx, { password: testPassword, email: ` ${user.email.toUpperCase()} ` });
		expect(await componentsAsked(later(ctx, 5))).toEqual({ email: false, code: false });
		await checkSigningComponents(later(ctx, 5), { password: testPassword });
	});

	it('ends with the session, and with half an hour without a signature', async () => {
		const { user, ctx } = await inSession();
		const all = { password: testPassword, email: user.email };
		await checkSigningComponents(ctx, all);
		await checkSigningComponents(later(ctx, 29), { password: testPassword });
		expect((await componentsAsked(later(ctx, 58))).email).toBe(false);
		expect((await componentsAsked(later(ctx, 60))).email).toBe(true);
		const next = await inSession(1, user);
		expect((await componentsAsked(next.ctx)).email).toBe(true);
	});

	it('begins with the code too where a second factor is set up', async () => {
		const { user, ctx } = await inSession();
		await beginSecondFactor(ctx, testPassword);
		const secret = (await viewSecondFactor(ctx)).begun?.secret ?? '';
		const codeAt = (now: Date) => totpOf(secret, '').generate({ timestamp: now.getTime() });
		await confirmSecondFactor(ctx, codeAt(ctx.now));
		const soon = later(ctx, 2);
		const pair = { password: testPassword, email: user.email };
		expect(await componentsAsked(soon)).toEqual({ email: true, code: true });
		await expect(checkSigningComponents(soon, pair)).rejects.toMatchObject({ code: 'code-needed' });
		await expect(checkSigningComponents(soon, { ...pair, code: '000000' })).rejects.toMatchObject({
			code: 'wrong-code'
		});
		await checkSigningComponents(soon, { ...pair, code: codeAt(soon.now) });
		expect((await componentsAsked(later(soon, 1))).code).toBe(false);
	});
});

describe('wrong tries at signing', () => {
	it('lock the account at the fifth and mail every admin once', async () => {
		const { user, ctx } = await inSession();
		const admins = [await buildUser(['admin']), await buildUser(['admin', 'qa'])];
		await buildUser(['admin'], { switchedOffAt: testNow });
		const wrong = { password: 'wrong', email: user.email };
		for (let i = 0; i < 5; i++)
			await expect(checkSigningComponents(ctx, wrong)).rejects.toMatchObject({ code: 'wrong-password' });
		await expect(
			checkSigningComponents(ctx, { password: testPassword, email: user.email })
		).rejects.toMatchObject({ code: 'locked' });
		const jobs = await Job.findAll({ where: { kind: 'lock-mail' } });
		const told = jobs.map((job): unknown => JSON.parse(String(job.payload)));
		for (const admin of admins)
			expect(told).toContainEqual({ adminId: admin.id, userId: user.id, lockedAt: testNow.toISOString() });
		expect(told).toHaveLength(admins.length);
	});

	it('count together however many arrive at once', async () => {
		const { user, ctx } = await inSession();
		const tries = Array.from({ length: 8 }, () =>
			checkSigningComponents(ctx, { password: 'wrong', email: user.email }).catch(() => null)
		);
		await Promise.all(tries);
		const after = await User.findByPk(user.id);
		expect(after?.lockedAt).not.toBeNull();
		expect(after?.failedPasswords).toBeGreaterThanOrEqual(5);
	});

	it('are forgotten with a right one', async () => {
		const { user, ctx } = await inSession();
		await expect(checkSigningComponents(ctx, { password: 'wrong', email: user.email })).rejects.toMatchObject(
			{ code: 'wrong-password' }
		);
		await checkSigningComponents(ctx, { password: testPassword, email: user.email });
		expect((await User.findByPk(user.id))?.failedPasswords).toBe(0);
	});
});
