import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ApiToken } from '../../src/lib/server/db/models/api-token';
import { buildSite, buildUser, testPassword } from '../helpers/factories';
import { startProduct, Visitor, type Product } from '../helpers/product';
import { useTestDatabase } from '../helpers/test-database';
import { signInAs } from './sign-in-as';

useTestDatabase();

let product: Product;
let dock: Visitor;
let other: Visitor;

beforeAll(async () => {
	const site = await buildSite();
	const people = [await buildUser(['dock'], { sites: [site] }), await buildUser(['qa'], { sites: [site] })];
	product = await startProduct();
	const visitors = await Promise.all(people.map((user) => signInAs(product, user)));
	[dock, other] = visitors as [Visitor, Visitor];
}, 90_000);

afterAll(() => product.stop());

const byToken = (secret: string) =>
	new Visitor(product.address).request('/api/v1/shipments', {
		headers: { authorization: `Bearer ${secret}` }
	});

describe('the page of API tokens', () => {
	it('asks for a session', async () => {
		const answer = await new Visitor(product.address).request('/settings/tokens');
		expect(answer.status).toBe(303);
	});

	it('shows a new token once, lists it by name, and ends it for its owner alone', async () => {
		const made = await dock.post('/settings/tokens?/make', {
			name: 'Scales at dock 2',
			password: testPassword
		});
		expect(made.status).toBe(200);
		expect(made.headers.get('cache-control')).toBe('no-store');
		const secret = /whf_[\w-]{40}/.exec(await made.text())?.[0] ?? '';
		expect((await byToken(secret)).status).toBe(200);

		const listed = await (await dock.request('/settings/tokens')).text();
		expect(listed).toContain('Scales at dock 2');
		expect(listed).not.toContain(secret);
		expect(await (await other.request('/settings/tokens')).text()).not.toContain('Scales at dock 2');

		const { id } = await ApiToken.findOne({ rejectOnEmpty: true });
		expect((await other.post('/settings/tokens?/revoke', { tokenId: id })).status).toBe(404);
		expect((await byToken(secret)).status).toBe(200);
		expect((await dock.post('/settings/tokens?/revoke', { tokenId: id })).status).toBe(303);
		expect((await byToken(secret)).status).toBe(401);
	});

	it('makes none with a wrong password, and keeps what was typed but the password', async () => {
		const before = await ApiToken.count();
		const refused = await dock.post('/settings/tokens?/make', { name: 'Gate printer', password: 'guess-it' });
		expect(refused.status).toBe(422);
		const page = await refused.text();
		expect(page).toContain('Gate printer');
		expect(page).not.toContain('guess-it');
		expect(await ApiToken.count()).toBe(before);
	});
});
