import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
	buildContact,
	buildPartner,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testPassword
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { systemContext } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { Job } from '../db/models/job';
import { LinkSession } from '../db/models/link-session';
import { Token } from '../db/models/token';
import { User } from '../db/models/user';
import { env } from '../env';
import { findMailboxMail, listMailbox, startMailbox, type MailboxMail } from '../mail/local-mailbox';
import { acceptInvitation, findInvitation } from './accept-invitation';
import { findLink, maskedEmail } from './find-link';
import { loadActor } from './load-actor';
import { mailLink } from './mail-link';
import { changeOwnAccount, changePassword } from './own-account';
import { requestFreshLink, requestLink } from './request-link';
import { signInByLink } from './sign-in-by-link';
import { signInByPassword } from './sign-in';
import { saveToken } from './tokens';

useTestDatabase();
const port = 20_000 + (process.pid % 20_000);
process.env.LOCAL_MAILBOX_PORT = String(port);
process.env.ORIGIN = 'https://pell.example';

let counter = 0;
/** Another caller each time, so that limits by address stay out of the way. */
const scope = (now = testNow) => ({ requestId: `r${++counter}`, address: `10.0.0.${counter % 250}`, now });

let mailbox: { stop: () => Promise<void> };
beforeAll(async () => {
	mailbox = await startMailbox(env().mailFolder, port);
});
afterAll(() => mailbox.stop());

/** Runs one job as the worker would and gives the mail it sent, or null. */
async function mailed(
	payload: Record<string, string>,
	jobId = `job-${++counter}`
): Promise<MailboxMail | null> {
	rmSync(join(env().mailFolder), { recursive: true, force: true });
	await mailLink(systemContext(testNow, jobId), payload);
	const [entry] = await listMailbox(env().mailFolder);
	return entry ? findMailboxMail(env().mailFolder, entry.id) : null;
}

function secretIn(mail: MailboxMail | null): string {
	return /https:\/\/pell\.example\/(?:link|invitation)\/([\w-]+)/.exec(mail?.text ?? '')?.[1] ?? '';
}

const lastJob = async () => {
	const job = await Job.findOne({ order: [['id', 'desc']] });
	return JSON.parse(job?.payload ?? 'null');
};

describe('an invitation', () => {
	it('is mailed, sets name and password once, and lets that pair sign in', async () => {
		const site = await buildSite();
		const user = await buildUser(['dock'], { sites: [site], passwordHash: null });
		const mail = await mailed({ kind: 'invitation', userId: user.id, by: 'Hanneke Pryce' });
		expect(mail?.to).toContain(user.email);
		expect(mail?.text).toContain('Hanneke Pryce has made an account for you');
		expect(mail?.html).toContain('Set a password');
		const secret = secretIn(mail);
		expect(await findInvitation(secret, testNow)).toEqual({ name: user.name, email: user.email });

		const answer = { name: 'Dora Marsh', password: 'four words are enough' };
		const both = await Promise.allSettled([
			acceptInvitation(secret, answer, scope()),
			acceptInvitation(secret, answer, scope())
		]);
		expect(both.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
		expect(await findInvitation(secret, testNow)).toBeNull();
		const claims = await signInByPassword(user.email, answer.password, scope());
		expect(
			await loadActor(claims ?? { kind: 'user', subjectId: '', tokenVersion: 0 }, testNow)
		).toMatchObject({
			name: 'Dora Marsh'
		});
		const entries = await AuditEntry.findAll({ where: { chainId: user.id }, order: ['seq'] });
		expect(entries.map(({ type }) => type)).toEqual([
			'link.sent',
			'link.used',
			'account.password-set',
			'account.changed',
			'session.opened'
		]);
	});

	it('runs out after a week, and is refused like an unknown one', async () => {
		const user = await buildUser(['dock'], { sites: [await buildSite()], passwordHash: null });
		const secret = secretIn(await mailed({ kind: 'invitation', userId: user.id, by: 'A' }));
		const late = new Date(testNow.getTime() + 7 * 24 * 3_600_000);
		const answer = { name: 'A', password: 'four words are enough' };
		await expect(acceptInvitation(secret, answer, scope(late))).rejects.toMatchObject({ code: 'link-used' });
		await expect(acceptInvitation('guessed', answer, scope())).rejects.toMatchObject({ code: 'link-used' });
	});

	it('is the same mail with the same link when a crash makes the job run twice', async () => {
		const user = await buildUser(['dock'], { sites: [await buildSite()], passwordHash: null });
		const payload = { kind: 'invitation', userId: user.id, by: 'A' };
		const first = secretIn(await mailed(payload, 'job-once'));
		const again = secretIn(await mailed(payload, 'job-once'));
		expect(again).toBe(first);
		expect(await Token.count({ where: { userId: user.id } })).toBe(1);
	});

	it('is not sent to an account that was switched off meanwhile', async () => {
		const user = await buildUser(['dock'], { switchedOffAt: testNow });
		expect(await mailed({ kind: 'invitation', userId: user.id, by: 'A' })).toBeNull();
	});
});

describe('a link asked for on the sign-in page', () => {
	it('is asked for in the same way by known and unknown addresses', async () => {
		const supplier = await buildUser(['supplier'], { partner: await buildPartner() });
		await requestLink(supplier.email, scope());
		expect(await lastJob()).toEqual({ kind: 'sign-in', email: supplier.email });
		await requestLink('nobody@nowhere.example', scope());
		expect(await lastJob()).toEqual({ kind: 'sign-in', email: 'nobody@nowhere.example' });
	});

	it('is mailed to a supplier’s user, and to nobody else', async () => {
		const supplier = await buildUser(['supplier'], { partner: await buildPartner() });
		const mail = await mailed({ kind: 'sign-in', email: supplier.email });
		const claims = await signInByLink(secretIn(mail), scope());
		expect(claims).toMatchObject({ kind: 'user', subjectId: supplier.id });
		expect(await signInByLink(secretIn(mail), scope())).toBeNull();

		const staff = await buildUser(['qa'], { sites: [await buildSite()] });
		expect(await mailed({ kind: 'sign-in', email: staff.email })).toBeNull();
		expect(await mailed({ kind: 'sign-in', email: 'nobody@nowhere.example' })).toBeNull();
	});

	it('is limited by the address asked for, known or not', async () => {
		for (let i = 0; i < 3; i++) await requestLink('often@nowhere.example', scope());
		const refused = requestLink('often@nowhere.example', scope());
		await expect(refused).rejects.toMatchObject({ code: 'too-many-attempts' });
		const later = new Date(testNow.getTime() + 16 * 60_000);
		await expect(requestLink('often@nowhere.example', scope(later))).resolves.toBeUndefined();
	});
});

describe('a notice’s link', () => {
	async function noticed(secret: string) {
		const { shipment, supplier } = await buildShipment();
		const contact = await buildContact(supplier, { email: 'quality@olmarisa.example' });
		await saveToken(
			secret,
			{ kind: 'notice', contactId: contact.id, shipmentId: shipment.id, validMs: 3_600_000 },
			testNow
		);
		return { shipment, supplier, contact };
	}

	it('says before its use what it opens, and is not used up by looking', async () => {
		const { shipment } = await noticed('look');
		for (let i = 0; i < 2; i++)
			expect(await findLink('look', testNow)).toEqual({
				state: 'open',
				kind: 'notice',
				maskedEmail: 'q…y@olmarisa.example',
				docket: shipment.number,
				shipmentId: shipment.id
			});
		expect(await findLink('guess', testNow)).toBeNull();
	});

	it('opens one docket once; a used or forwarded one has a fresh one mailed to its owner only', async () => {
		const { shipment, contact } = await noticed('use');
		const claims = await signInByLink('use', scope());
		expect(await LinkSession.findByPk(claims?.subjectId)).toMatchObject({ shipmentId: shipment.id });
		expect((await findLink('use', testNow))?.state).toBe('spent');

		await requestFreshLink('use', scope());
		const payload = await lastJob();
		expect(payload).toEqual({ kind: 'notice', contactId: contact.id, shipmentId: shipment.id });
		const mail = await mailed(payload);
		expect(mail?.to).toContain('quality@olmarisa.example');
		expect(mail?.subject).toContain(shipment.number);
		expect(await signInByLink(secretIn(mail), scope())).toMatchObject({ kind: 'link' });
		await expect(requestFreshLink('guess', scope())).rejects.toMatchObject({ code: 'not-found' });
	});

	it('is not renewed for a contact who was switched off, nor for another firm’s docket', async () => {
		const { contact } = await noticed('off');
		const { shipment: foreign } = await buildShipment();
		const payload = { kind: 'notice', contactId: contact.id, shipmentId: foreign.id };
		expect(await mailed(payload)).toBeNull();
		await contact.update({ switchedOffAt: testNow });
		expect(await findLink('off', testNow)).toBeNull();
	});

	it('shows too little of an address to write to it', () => {
		expect(maskedEmail('quality@olmarisa.example')).toBe('q…y@olmarisa.example');
		expect(maskedEmail('ab@olmarisa.example')).toBe('a…@olmarisa.example');
	});
});

describe('one’s own account', () => {
	it('changes name and unit, once per difference', async () => {
		const user = await buildUser(['dock'], { sites: [await buildSite()] });
		const ctx = await contextFor(user);
		const own = { name: 'D. Marsh', temperatureUnit: 'fahrenheit' } as const;
		await changeOwnAccount(ctx, own);
		await changeOwnAccount(ctx, own);
		expect(await User.findByPk(user.id)).toMatchObject(own);
		expect(await AuditEntry.count({ where: { chainId: user.id } })).toBe(1);
	});

	it('changes its password against the old one only, and ends every session', async () => {
		const user = await buildUser(['dock'], { sites: [await buildSite()] });
		const ctx = await contextFor(user);
		const wrong = changePassword(ctx, { oldPassword: 'not it at all', newPassword: 'a new long password' });
		await expect(wrong).rejects.toMatchObject({ code: 'wrong-password' });
		await changePassword(ctx, { oldPassword: testPassword, newPassword: 'a new long password' });
		const before = { kind: 'user', subjectId: user.id, tokenVersion: user.tokenVersion } as const;
		expect(await loadActor(before, testNow)).toBeNull();
		expect(await signInByPassword(user.email, testPassword, scope())).toBeNull();
		expect(await signInByPassword(user.email, 'a new long password', scope())).not.toBeNull();
	});

	it('does not exist for a mailed link', async () => {
		const { shipment, supplier } = await buildShipment();
		const contact = await buildContact(supplier);
		await saveToken(
			'own',
			{ kind: 'notice', contactId: contact.id, shipmentId: shipment.id, validMs: 1e6 },
			testNow
		);
		const claims = await signInByLink('own', scope());
		const actor = claims && (await loadActor(claims, testNow));
		if (!actor) throw new Error('The link did not sign in.');
		const ctx = { actor, ...scope() };
		const change = changeOwnAccount(ctx, { name: 'X', temperatureUnit: null });
		await expect(change).rejects.toMatchObject({ code: 'not-allowed' });
	});
});

describe('signing in with a password', () => {
	it('tells who knows the password that the account is off or locked, and nobody else', async () => {
		const sites = [await buildSite()];
		const off = await buildUser(['dock'], { sites, switchedOffAt: testNow });
		const locked = await buildUser(['qa'], { sites, lockedAt: testNow });
		await expect(signInByPassword(off.email, testPassword, scope())).rejects.toMatchObject({
			code: 'switched-off'
		});
		await expect(signInByPassword(locked.email, testPassword, scope())).rejects.toMatchObject({
			code: 'locked'
		});
		expect(await signInByPassword(off.email, 'wrong', scope())).toBeNull();
		expect(await signInByPassword('nobody@pell.example', testPassword, scope())).toBeNull();
	});

	it('is refused after ten wrong passwords, right or wrong', async () => {
		const user = await buildUser(['dock'], { sites: [await buildSite()] });
		for (let i = 0; i < 10; i++) await signInByPassword(user.email, 'wrong', scope());
		const refused = signInByPassword(user.email, testPassword, scope());
		await expect(refused).rejects.toMatchObject({ code: 'too-many-attempts' });
	});
});
