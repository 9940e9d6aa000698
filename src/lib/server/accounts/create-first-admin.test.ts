import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { contextFor, testNow } from '../../../../tests/helpers/factories';
import { User } from '../db/models/user';
import { createFirstAdmin } from './create-first-admin';

useTestDatabase();

const first = {
	email: 'You@example.org',
	name: 'You',
	organisation: 'Pell',
	countryCode: 'NL',
	zone: 'Europe/Amsterdam',
	now: testNow
};

describe('setting up an empty installation', () => {
	it('gives it an organisation, a site and an admin who belongs to it', async () => {
		const userId = uuid();
		await createFirstAdmin({ ...first, userId });
		const ctx = await contextFor(await User.findByPk(userId, { rejectOnEmpty: true }));
		expect(ctx.actor).toMatchObject({ email: 'you@example.org', roles: ['admin'] });
		expect(ctx.actor.siteIds).toHaveLength(1);
	});

	it('refuses an address that has an account, and changes nothing', async () => {
		await expect(createFirstAdmin({ ...first, userId: uuid() })).rejects.toThrow('has an account already');
		expect(await User.count()).toBe(1);
	});
});
