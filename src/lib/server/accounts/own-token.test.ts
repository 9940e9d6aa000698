import { describe, expect, it } from 'vitest';
import { buildUser, contextFor, testNow, testPassword } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { apiTokenForm } from '../../schemas/api-token';
import { ApiToken } from '../db/models/api-token';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { findTokenActor, listApiTokens, revokeApiToken } from './api-tokens';
import { makeOwnToken } from './own-token';

useTestDatabase();

const scope = { requestId: 'test', address: '127.0.0.1', now: testNow };

describe('a token of one’s own', () => {
	it('is made by password, named, listed without its secret, and ends when it is revoked', async () => {
		const user = await buildUser(['dock']);
		const ctx = await contextFor(user);
		const secret = await makeOwnToken(ctx, { name: 'Scales at dock 2', password: testPassword });
		expect(await findTokenActor(secret, scope)).toMatchObject({ id: user.id });
		const { items } = await listApiTokens(ctx);
		expect(items).toMatchObject([{ name: 'Scales at dock 2', createdAt: testNow.toISOString() }]);
		expect(JSON.stringify(items)).not.toContain(secret);
		await revokeApiToken(ctx, items[0]?.id ?? '');
		expect(await findTokenActor(secret, scope)).toBeNull();
		expect((await listApiTokens(ctx)).items).toEqual([]);
	});

	it('is in the trail of its account by name, never with its secret', async () => {
		const user = await buildUser(['qa']);
		const secret = await makeOwnToken(await contextFor(user), { name: 'ERP', password: testPassword });
		const entries = await AuditEntry.findAll({ where: { chainId: user.id, type: 'account.token-made' } });
		const payloads = await AuditPayload.findAll({ where: { entryId: entries.map(({ id }) => id) } });
		expect(payloads.map(({ text }) => JSON.parse(text ?? ''))).toMatchObject([{ name: 'ERP' }]);
		expect(JSON.stringify(payloads)).not.toContain(secret);
	});

	it('is not made with another password, nor after ten guesses, nor for a supplier', async () => {
		const user = await buildUser(['qa']);
		const ctx = await contextFor(user);
		const wrong = () => makeOwnToken(ctx, { name: 'ERP', password: 'guess' });
		for (let i = 0; i < 10; i++) await expect(wrong()).rejects.toMatchObject({ code: 'wrong-password' });
		const right = makeOwnToken(ctx, { name: 'ERP', password: testPassword });
		await expect(right).rejects.toMatchObject({ code: 'too-many-attempts' });
		expect(await ApiToken.count({ where: { userId: user.id } })).toBe(0);
		const supplier = await contextFor(await buildUser(['supplier']));
		await expect(makeOwnToken(supplier, { name: 'x', password: '' })).rejects.toMatchObject({
			code: 'not-allowed'
		});
	});

	it('needs a name', () => {
		expect(apiTokenForm.safeParse({ name: ' ', password: 'x' }).error?.issues[0]?.message).toBe(
			'Say which program it is for.'
		);
	});
});
