import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditEntry } from '../../src/lib/server/db/models/audit-entry';
import { AuditPayload } from '../../src/lib/server/db/models/audit-payload';
import { verifyAllChains } from '../../src/lib/server/audit/verify';
import type { User } from '../../src/lib/server/db/models/user';
import { buildShipment, buildSite, buildUser, testPassword } from '../helpers/factories';
import { startProduct, Visitor, type Product } from '../helpers/product';
import { useTestDatabase } from '../helpers/test-database';
import { signInAs } from './sign-in-as';

useTestDatabase();

let open: Product;
let behindProxy: Product;
let dock: User;
let far: User;
let number = '';

beforeAll(async () => {
	const site = await buildSite();
	dock = await buildUser(['dock'], { sites: [site] });
	far = await buildUser(['qa'], { sites: [await buildSite()] });
	number = (await buildShipment({ site })).shipment.number;
	open = await startProduct();
	behindProxy = await startProduct({ TRUST_PROXY: 'true' });
}, 90_000);

afterAll(async () => {
	await open.stop();
	await behindProxy.stop();
});

/** The newest entry of somebody's own chain, with what it says. */
async function newestOf(user: User, type: string) {
	const entry = await AuditEntry.findOne({
		where: { chainId: user.id, type },
		order: [['seq', 'DESC']],
		rejectOnEmpty: true
	});
	const payload = await AuditPayload.findByPk(entry.id, { rejectOnEmpty: true });
	return { entry, data: JSON.parse(payload.text ?? 'null') };
}

async function wrongPassword(product: Product, forwarded?: string): Promise<void> {
	const visitor = new Visitor(product.address);
	const answer = await visitor.request('/sign-in?/signIn', {
		method: 'POST',
		headers: {
			'content-type': 'application/x-www-form-urlencoded',
			...(forwarded === undefined ? {} : { 'x-forwarded-for': forwarded, 'x-forwarded-proto': 'http' })
		},
		body: new URLSearchParams({ email: dock.email, password: 'a wrong password' })
	});
	expect(answer.status).toBeLessThan(500);
}

const loopback = /^(127\.0\.0\.1|::1)$/;

describe('the trail says from where', () => {
	it('somebody signed in, and by what', async () => {
		const began = Date.now();
		await signInAs(open, dock);
		const { entry, data } = await newestOf(dock, 'session.opened');
		expect(entry).toMatchObject({ actorId: dock.id, actorKind: 'user', sessionKind: 'password' });
		expect(entry.address).toMatch(loopback);
		expect(data).toEqual({ by: 'password', userId: dock.id });
		// The server's own clock, in UTC.
		expect(Math.abs(entry.occurredAt.getTime() - began)).toBeLessThan(60_000);
	});

	it('a sign-in failed, and believes no forwarded address while no proxy is trusted', async () => {
		await wrongPassword(open, '203.0.113.9');
		const { entry, data } = await newestOf(dock, 'session.refused');
		expect(data).toEqual({ email: dock.email, why: 'wrong-password' });
		expect(entry.address).toMatch(loopback);
		expect(entry.sessionKind).toBeNull();
	});

	it.each([
		['203.0.113.9', '203.0.113.9'],
		['6.6.6.6, 198.51.100.7', '198.51.100.7'],
		['127.0.0.1, 10.0.0.1 , 2001:DB8::9', '2001:db8::9'],
		['6.6.6.6, <script>', 'unknown'],
		["' OR 1=1", 'unknown']
	])('believes of %s only what the trusted proxy added: %s', async (forwarded, address) => {
		await wrongPassword(behindProxy, forwarded);
		expect((await newestOf(dock, 'session.refused')).entry.address).toBe(address);
	});

	it('and that it is unknown where a trusted proxy does not say', async () => {
		await wrongPassword(behindProxy);
		expect((await newestOf(dock, 'session.refused')).entry.address).toBe('unknown');
	});
});

describe('the trail holds refused acts', () => {
	it('of a role that may not, with the docket, the act and the route', async () => {
		const visitor = await signInAs(open, dock);
		expect((await visitor.request('/record')).status).toBe(403);
		const { entry, data } = await newestOf(dock, 'act.refused');
		expect(data).toEqual({
			act: 'audit.view',
			why: 'not-allowed',
			shipmentId: null,
			route: '/(app)/record',
			method: 'GET'
		});
		expect(entry).toMatchObject({ actorId: dock.id, sessionKind: 'password' });
	});

	it('of somebody who reaches for a docket of another site, though the answer does not tell', async () => {
		const visitor = await signInAs(open, far);
		expect((await visitor.request(`/api/v1/shipments/${number}`)).status).toBe(404);
		const { data } = await newestOf(far, 'act.refused');
		expect(data).toMatchObject({ act: 'docket.view', why: 'out-of-sight' });
	});

	it('of a form that was declined', async () => {
		const visitor = await signInAs(open, dock);
		await visitor.post(`/shipments/${number}/sign`, {
			evidenceSha256: 'a'.repeat(64),
			'lines.0.lineId': dock.id,
			'lines.0.outcome': 'reject',
			'lines.0.reason': 'x',
			meaning: 'approval',
			password: testPassword
		});
		const { data } = await newestOf(dock, 'act.refused');
		expect(data).toMatchObject({ act: 'disposition.sign', why: 'not-allowed' });
	});

	it('of a flood of sign-ins, once a window', async () => {
		const visitor = new Visitor(open.address);
		const victim = await buildUser(['dock']);
		for (let i = 0; i < 14; i++)
			await visitor.post('/sign-in?/signIn', { email: victim.email, password: `guess ${i}` });
		const entries = await AuditEntry.findAll({ where: { chainId: victim.id, type: 'session.refused' } });
		expect(entries).toHaveLength(11);
		expect((await newestOf(victim, 'session.refused')).data.why).toBe('too-many-attempts');
	});

	it('and verifies with all of it', async () => {
		expect((await verifyAllChains()).faults).toEqual([]);
	});
});
