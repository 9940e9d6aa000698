import { describe, expect, it } from 'vitest';
import { buildPartner, buildSite, buildUser, contextFor, testNow } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { accountForm, accountQuery, inviteForm } from '../../schemas/account';
import { verifyAllChains } from '../audit/verify';
import type { Context, Role } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { Job } from '../db/models/job';
import type { Site } from '../db/models/site';
import { User } from '../db/models/user';
import { changeAccount, switchAccountOff, switchAccountOn, unlockAccount } from './change-account';
import { inviteAccount, resendInvitation } from './invite-account';
import { getAccount, listAccounts } from './list-accounts';
import { loadActor } from './load-actor';
import { saveToken, useToken } from './tokens';

useTestDatabase();

async function as(role: Role): Promise<Context> {
	if (role === 'supplier')
		return contextFor(await buildUser(['supplier'], { partner: await buildPartner() }));
	return contextFor(await buildUser([role], { sites: [await buildSite()] }));
}

const invite = (site: Site, more: Record<string, unknown> = {}) =>
	inviteForm.parse({
		email: 'New@Pell.example',
		name: 'New person',
		roles: 'dock',
		siteIds: site.id,
		...more
	});
const change = (site: Site, revision: string, more: Record<string, unknown> = {}) =>
	accountForm.parse({
		name: 'Changed',
		title: 'Lead',
		roles: ['dock', 'qa'],
		siteIds: [site.id],
		revision,
		...more
	});

async function types(userId: string): Promise<string[]> {
	const entries = await AuditEntry.findAll({ where: { chainId: userId }, order: ['seq'] });
	return entries.map(({ type }) => type);
}

const jobsFor = async (userId: string) =>
	(await Job.findAll({ where: { kind: 'mail-link' }, order: ['createdAt'] }))
		.map(({ payload }) => JSON.parse(payload))
		.filter((payload) => payload.userId === userId);

describe('accounts', () => {
	it('are managed by admins only', async () => {
		const site = await buildSite();
		const { id } = await buildUser(['dock'], { sites: [site] });
		for (const role of ['dock', 'qa', 'claims', 'supplier'] as const) {
			const ctx = await as(role);
			const attempts = [
				() => inviteAccount(ctx, invite(site)),
				() => resendInvitation(ctx, id),
				() => changeAccount(ctx, id, change(site, '')),
				() => switchAccountOff(ctx, id),
				() => switchAccountOn(ctx, id),
				() => unlockAccount(ctx, id),
				() => listAccounts(ctx, accountQuery.parse({})),
				() => getAccount(ctx, id)
			];
			for (const attempt of attempts) await expect(attempt()).rejects.toMatchObject({ code: 'not-allowed' });
		}
		expect(await Job.count()).toBe(0);
	});

	it('begin with an invitation that is mailed by a job of the same transaction', async () => {
		const ctx = await as('admin');
		const site = await buildSite();
		const id = await inviteAccount(ctx, invite(site));
		expect(await getAccount(ctx, id)).toMatchObject({
			email: 'new@pell.example',
			state: 'invited',
			siteNames: [site.name]
		});
		expect(await jobsFor(id)).toEqual([{ kind: 'invitation', userId: id, by: ctx.actor.name }]);
		expect(await types(id)).toEqual(['account.invited']);
		await expect(inviteAccount(ctx, invite(site))).rejects.toMatchObject({ code: 'duplicate' });
		expect(await Job.count()).toBe(1);
	});

	it('of a supplier begin with a link, since they need no password', async () => {
		const ctx = await as('admin');
		const partner = await buildPartner();
		const form = inviteForm.parse({
			email: 's@o.example',
			name: 'S',
			roles: 'supplier',
			partnerId: partner.id
		});
		const id = await inviteAccount(ctx, form);
		expect(await jobsFor(id)).toMatchObject([{ kind: 'welcome' }]);
		expect(await getAccount(ctx, id)).toMatchObject({ partnerName: partner.name, siteNames: [] });
	});

	it('cannot be given to a site or firm that is not there', async () => {
		const ctx = await as('admin');
		const site = await buildSite();
		const gone = inviteAccount(ctx, invite(site, { siteIds: [site.id, ctx.actor.id] }));
		await expect(gone).rejects.toMatchObject({ code: 'not-found' });
	});

	it('change roles and sites at the next request, with both states on record', async () => {
		const ctx = await as('admin');
		const [from, to] = [await buildSite(), await buildSite()];
		const user = await buildUser(['dock'], { sites: [from] });
		const { revision } = await getAccount(ctx, user.id);
		await changeAccount(ctx, user.id, change(to, revision));
		const actor = await loadActor({ kind: 'user', subjectId: user.id, tokenVersion: 0 }, testNow);
		expect(actor).toMatchObject({ roles: ['dock', 'qa'], siteIds: [to.id], title: 'Lead' });
		const entry = await AuditEntry.findOne({ where: { chainId: user.id } });
		const payload = await AuditPayload.findByPk(entry?.id ?? '');
		expect(JSON.parse(payload?.text ?? '')).toMatchObject({
			before: { roles: ['dock'], siteIds: [from.id] },
			after: { roles: ['dock', 'qa'], siteIds: [to.id] }
		});
		const late = changeAccount(ctx, user.id, change(from, revision));
		await expect(late).rejects.toMatchObject({ code: 'changed-meanwhile' });
	});

	it('of staff never become a supplier’s', async () => {
		const ctx = await as('admin');
		const user = await buildUser(['dock'], { sites: [await buildSite()] });
		const { revision } = await getAccount(ctx, user.id);
		const partner = await buildPartner();
		const form = accountForm.parse({ name: 'X', roles: 'supplier', partnerId: partner.id, revision });
		await expect(changeAccount(ctx, user.id, form)).rejects.toMatchObject({ code: 'in-use' });
	});

	it('are out at once when switched off, and stay out of old sessions when switched on', async () => {
		const ctx = await as('admin');
		const user = await buildUser(['qa'], { sites: [await buildSite()] });
		const claims = { kind: 'user', subjectId: user.id, tokenVersion: user.tokenVersion } as const;
		await saveToken('open', { kind: 'invitation', userId: user.id, validMs: 1e6 }, testNow);
		expect(await loadActor(claims, testNow)).not.toBeNull();
		await switchAccountOff(ctx, user.id);
		expect(await loadActor(claims, testNow)).toBeNull();
		expect(await useToken('open', ['invitation'], testNow)).toBeNull();
		await expect(resendInvitation(ctx, user.id)).rejects.toMatchObject({ code: 'in-use' });
		await switchAccountOn(ctx, user.id);
		expect(await loadActor(claims, testNow)).toBeNull();
		expect(await types(user.id)).toEqual(['account.switched-off', 'account.switched-on']);
	});

	it('are unlocked, once', async () => {
		const ctx = await as('admin');
		const user = await buildUser(['qa'], {
			sites: [await buildSite()],
			lockedAt: testNow,
			failedPasswords: 5
		});
		expect((await getAccount(ctx, user.id)).state).toBe('locked');
		await unlockAccount(ctx, user.id);
		await unlockAccount(ctx, user.id);
		expect(await User.findByPk(user.id)).toMatchObject({ lockedAt: null, failedPasswords: 0 });
		expect(await types(user.id)).toEqual(['account.unlocked']);
	});

	it('end earlier invitations when a new one is sent', async () => {
		const ctx = await as('admin');
		const site = await buildSite();
		const id = await inviteAccount(ctx, invite(site, { email: 'again@pell.example' }));
		await saveToken('lost', { kind: 'invitation', userId: id, validMs: 1e6 }, testNow);
		await resendInvitation(ctx, id);
		expect(await useToken('lost', ['invitation'], testNow)).toBeNull();
		expect(await jobsFor(id)).toHaveLength(2);
	});

	it('are searched, filtered by role and state, and sorted', async () => {
		const ctx = await as('admin');
		const site = await buildSite();
		await buildUser(['claims', 'qa'], { sites: [site], name: 'Zed Searchable', lastSignInAt: testNow });
		await buildUser(['dock'], { sites: [site], name: 'Amy Searchable', passwordHash: null });
		const names = async (query: Record<string, string>) =>
			(await listAccounts(ctx, accountQuery.parse({ q: 'searchable', ...query }))).items.map((a) => a.name);
		expect(await names({})).toEqual(['Amy Searchable', 'Zed Searchable']);
		expect(await names({ dir: 'desc' })).toEqual(['Zed Searchable', 'Amy Searchable']);
		expect(await names({ role: 'qa' })).toEqual(['Zed Searchable']);
		expect(await names({ state: 'invited' })).toEqual(['Amy Searchable']);
		expect(await names({ state: 'locked' })).toEqual([]);
		expect((await verifyAllChains()).faults).toEqual([]);
	});
});

describe('the last admin', () => {
	it('can neither be switched off nor demoted, by themself or by another at the same moment', async () => {
		const site = await buildSite();
		await User.update({ switchedOffAt: testNow }, { where: {} });
		const first = await buildUser(['admin'], { sites: [site] });
		const ctx = await contextFor(first);
		await buildUser(['admin'], { sites: [site], passwordHash: null });
		await expect(switchAccountOff(ctx, first.id)).rejects.toMatchObject({ code: 'last-admin' });
		const { revision } = await getAccount(ctx, first.id);
		const demoted = changeAccount(ctx, first.id, change(site, revision));
		await expect(demoted).rejects.toMatchObject({ code: 'last-admin' });

		const second = await buildUser(['admin'], { sites: [site] });
		const other = await contextFor(second);
		const both = await Promise.allSettled([
			switchAccountOff(ctx, second.id),
			switchAccountOff(other, first.id)
		]);
		expect(both.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
	});
});

describe('the form of an account', () => {
	const paths = (input: Record<string, unknown>) =>
		inviteForm
			.safeParse({ email: 'a@b.example', name: 'A', ...input })
			.error?.issues.map((issue) => issue.path.join('.'));
	const id = '01890000-0000-7000-8000-000000000001';

	it('keeps suppliers and staff apart', () => {
		expect(paths({ roles: [] })).toEqual(['roles', 'siteIds']);
		expect(paths({ roles: 'dock' })).toEqual(['siteIds']);
		expect(paths({ roles: ['supplier', 'qa'], partnerId: id })).toEqual(['roles']);
		expect(paths({ roles: 'supplier' })).toEqual(['partnerId']);
		expect(paths({ roles: 'supplier', partnerId: id, siteIds: id })).toEqual(['siteIds']);
		expect(paths({ roles: 'qa', siteIds: id, partnerId: id })).toEqual(['partnerId']);
		expect(paths({ roles: ['qa', 'admin'], siteIds: id })).toBeUndefined();
	});
});
