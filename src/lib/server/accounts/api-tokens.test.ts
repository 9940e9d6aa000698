import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import { buildSite, buildUser, contextFor, testNow } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { systemContext } from '../context';
import { ApiToken } from '../db/models/api-token';
import { AuditEntry } from '../db/models/audit-entry';
import type { User } from '../db/models/user';
import { findTokenActor, listApiTokens, makeApiToken, newApiSecret, revokeApiToken } from './api-tokens';

useTestDatabase();

const scope = (now = testNow) => ({ requestId: 'test', address: '127.0.0.1', now });
const later = (seconds: number) => new Date(testNow.getTime() + seconds * 1000);

async function makeFor(user: User) {
	const secret = newApiSecret();
	const { id } = await makeApiToken(systemContext(testNow), user.email.toUpperCase(), secret);
	return { id, secret };
}

describe('an API token', () => {
	it('speaks for its user, is kept as a hash only, and its making is in the audit trail', async () => {
		const site = await buildSite();
		const user = await buildUser(['qa'], { sites: [site] });
		const { id, secret } = await makeFor(user);
		expect(await findTokenActor(secret, scope())).toMatchObject({
			kind: 'user',
			id: user.id,
			roles: ['qa'],
			siteIds: [site.id]
		});
		const row = await ApiToken.findByPk(id, { rejectOnEmpty: true });
		expect(JSON.stringify(row)).not.toContain(secret);
		expect(row.tokenSha256).toMatch(/^[0-9a-f]{64}$/);
		expect(await AuditEntry.count({ where: { type: 'account.token-made' } })).toBe(1);
	});

	it('is unknown with any letter changed', async () => {
		const { secret } = await makeFor(await buildUser(['dock']));
		expect(await findTokenActor(`${secret}x`, scope())).toBeNull();
		expect(await findTokenActor(secret.toUpperCase(), scope())).toBeNull();
		expect(await findTokenActor('', scope())).toBeNull();
	});

	it('ends when its owner revokes it, and nobody else can', async () => {
		const owner = await buildUser(['qa']);
		const { id, secret } = await makeFor(owner);
		const stranger = await contextFor(await buildUser(['admin']));
		await expect(revokeApiToken(stranger, id)).rejects.toMatchObject({ code: 'not-found' });
		expect(await findTokenActor(secret, scope())).not.toBeNull();
		const ctx = await contextFor(owner);
		await revokeApiToken(ctx, id);
		await revokeApiToken(ctx, id);
		expect(await findTokenActor(secret, scope())).toBeNull();
		expect((await listApiTokens(ctx)).total).toBe(0);
		expect(await AuditEntry.count({ where: { type: 'account.token-revoked' } })).toBe(1);
		await expect(revokeApiToken(ctx, uuid())).rejects.toMatchObject({ code: 'not-found' });
	});

	it('ends with its user, switched off or locked', async () => {
		const user = await buildUser(['qa']);
		const { secret } = await makeFor(user);
		await user.update({ lockedAt: testNow });
		expect(await findTokenActor(secret, scope())).toBeNull();
		await user.update({ lockedAt: null, switchedOffAt: testNow });
		expect(await findTokenActor(secret, scope())).toBeNull();
		await expect(makeFor(user)).rejects.toMatchObject({ code: 'switched-off' });
	});

	it('is made for nobody unknown and for no supplier', async () => {
		await expect(makeApiToken(systemContext(testNow), 'no@body.example', 'x')).rejects.toMatchObject({
			code: 'not-found'
		});
		await expect(makeFor(await buildUser(['supplier']))).rejects.toMatchObject({ code: 'not-allowed' });
	});

	it('notes its last use once a minute, not at every call', async () => {
		const user = await buildUser(['dock']);
		const { secret } = await makeFor(user);
		const usedAt = async () => (await listApiTokens(await contextFor(user))).items[0]?.lastUsedAt;
		expect(await usedAt()).toBeNull();
		for (const [at, noted] of [
			[0, 0],
			[59, 0],
			[61, 61]
		] as const) {
			await findTokenActor(secret, scope(later(at)));
			expect(await usedAt()).toBe(later(noted).toISOString());
		}
	});
});
