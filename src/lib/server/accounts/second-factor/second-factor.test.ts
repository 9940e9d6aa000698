import { describe, expect, it } from 'vitest';
import {
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testPassword
} from '../../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../../tests/helpers/test-database';
import { AuditEntry } from '../../db/models/audit-entry';
import { User } from '../../db/models/user';
import { signInByPassword } from '../sign-in';
import { stepOfCode, totpOf } from './check-code';
import { openSecret, sealSecret } from './sealed-secret';
import {
	beginSecondFactor,
	confirmSecondFactor,
	removeSecondFactor,
	resetSecondFactor,
	viewSecondFactor
} from './set-up';

useTestDatabase();

const at = (seconds: number) => new Date(testNow.getTime() + seconds * 1000);
const scopeAt = (now: Date) => ({ requestId: 'test', address: '192.0.2.7', now });
const codeAt = (secret: string, now: Date) => totpOf(secret, '').generate({ timestamp: now.getTime() });

async function withFactor() {
	const user = await buildUser(['qa'], { sites: [await buildSite()] });
	const ctx = await contextFor(user);
	await beginSecondFactor(ctx, testPassword);
	const secret = (await viewSecondFactor(ctx)).begun?.secret ?? '';
	await confirmSecondFactor(ctx, codeAt(secret, ctx.now));
	return { user, ctx, secret };
}

describe('a code', () => {
	// Source: RFC 6238, Appendix B, SHA-1 rows (their last six of eight digits); the secret is "12345678901234567890".
	it.each([
		[59, '287082'],
		[1111111109, '081804'],
		[1111111111, '050471'],
		[1234567890, '005924'],
		[2000000000, '279037']
	])('of second %d is %s', (second, code) => {
		const now = new Date(second * 1000);
		expect(stepOfCode('GEZDGNBVGY3TQOJQGEZDGNBVGY3TQOJQ', code, now)).toBe(Math.floor(second / 30));
	});

	it('may be one period off, no more', () => {
		const secret = 'GEZDGNBVGY3TQOJQGEZDGNBVGY3TQOJQ';
		const code = codeAt(secret, testNow);
		expect(stepOfCode(secret, code, at(30))).toBe(Math.floor(testNow.getTime() / 30_000));
		expect(stepOfCode(secret, code, at(90))).toBeNull();
		expect(stepOfCode(secret, 'abcdef', testNow)).toBeNull();
	});
});

describe('a secret', () => {
	it('is not readable as it is stored, and not usable once touched', () => {
		const sealed = sealSecret('GEZDGNBVGY3TQOJQ');
		expect(sealed).not.toContain('GEZD');
		expect(openSecret(sealed)).toBe('GEZDGNBVGY3TQOJQ');
		const touched = Buffer.from(sealed, 'base64url');
		touched[30] = (touched[30] ?? 0) ^ 1;
		expect(() => openSecret(touched.toString('base64url'))).toThrow();
	});
});

describe('signing in with a second factor', () => {
	it('asks for a code after the right password, and tells nobody else that there is one', async () => {
		const { user, secret } = await withFactor();
		await expect(signInByPassword(user.email, testPassword, scopeAt(at(60)))).rejects.toMatchObject({
			code: 'code-needed'
		});
		expect(await signInByPassword(user.email, 'wrong', scopeAt(at(60)), '000000')).toBeNull();
		const code = codeAt(secret, at(60));
		expect(await signInByPassword(user.email, testPassword, scopeAt(at(60)), code)).toMatchObject({
			subjectId: user.id
		});
	});

	it('takes a code once', async () => {
		const { user, secret } = await withFactor();
		const code = codeAt(secret, at(60));
		await signInByPassword(user.email, testPassword, scopeAt(at(60)), code);
		await expect(signInByPassword(user.email, testPassword, scopeAt(at(61)), code)).rejects.toMatchObject({
			code: 'wrong-code'
		});
	});

	it('bounds guessing, and writes a wrong code down', async () => {
		const { user } = await withFactor();
		const tried = (code: string) => signInByPassword(user.email, testPassword, scopeAt(at(60)), code);
		for (let i = 0; i < 7; i++) await expect(tried('000000')).rejects.toMatchObject({ code: 'wrong-code' });
		await expect(tried('000000')).rejects.toMatchObject({ code: 'too-many-attempts' });
		const refused = await AuditEntry.count({ where: { type: 'session.refused' } });
		expect(refused).toBeGreaterThanOrEqual(7);
	});
});

describe('setting a second factor up', () => {
	it('counts only once a code has shown that the authenticator has the secret', async () => {
		const user = await buildUser(['qa']);
		const ctx = await contextFor(user);
		await expect(beginSecondFactor(ctx, 'wrong')).rejects.toMatchObject({ code: 'wrong-password' });
		await beginSecondFactor(ctx, testPassword);
		expect(await signInByPassword(user.email, testPassword, scopeAt(testNow))).not.toBeNull();
		await expect(confirmSecondFactor(ctx, '000000')).rejects.toMatchObject({ code: 'wrong-code' });
		const view = await viewSecondFactor(ctx);
		expect(view.begun?.qr).toMatch(/^data:image\/svg\+xml;base64,/);
		await confirmSecondFactor(ctx, codeAt(view.begun?.secret ?? '', ctx.now));
		expect(await viewSecondFactor(ctx)).toEqual({ since: testNow.toISOString(), begun: null });
		await expect(beginSecondFactor(ctx, testPassword)).rejects.toMatchObject({ code: 'second-factor-set' });
	});

	it('is undone by password and code, or by an admin, which ends the sessions', async () => {
		const { user, ctx, secret } = await withFactor();
		await expect(removeSecondFactor(ctx, testPassword, null)).rejects.toMatchObject({ code: 'code-needed' });
		await removeSecondFactor({ ...ctx, now: at(60) }, testPassword, codeAt(secret, at(60)));
		expect((await viewSecondFactor(ctx)).since).toBeNull();

		const other = await withFactor();
		await expect(resetSecondFactor(ctx, other.user.id)).rejects.toMatchObject({ code: 'not-allowed' });
		await resetSecondFactor(await contextFor(await buildUser(['admin'])), other.user.id);
		const after = await User.findByPk(other.user.id);
		expect(after?.secondFactorSealed).toBeNull();
		expect(after?.tokenVersion).toBe(other.user.tokenVersion + 1);
		expect(user.id).not.toBe(other.user.id);
	});
});
