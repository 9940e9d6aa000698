import { afterAll, beforeAll, expect, it } from 'vitest';
import { buildSite, buildUser } from '../helpers/factories';
import { startProduct, Visitor, type Product } from '../helpers/product';
import { useTestDatabase } from '../helpers/test-database';
import { signInAs } from './sign-in-as';

useTestDatabase();

let product: Product;

beforeAll(async () => {
	await buildSite();
	product = await startProduct();
}, 60_000);
afterAll(() => product.stop());

it('tells anybody whether it is well: database, queue and version', async () => {
	const answer = await new Visitor(product.address).request('/api/v1/health');
	expect(answer.status).toBe(200);
	expect(await answer.json()).toEqual({
		version: expect.stringMatching(/^\d+\.\d+\.\d+/),
		database: 'up',
		queue: { waiting: expect.any(Number), failed: expect.any(Number) }
	});
});

it.each(['/sign-in', '/verify', '/api/v1/health', '/no/such/page'])(
	'guards the answer of %s',
	async (path) => {
		const { headers } = await new Visitor(product.address).request(path);
		expect(headers.get('x-content-type-options')).toBe('nosniff');
		expect(headers.get('x-frame-options')).toBe('DENY');
		expect(headers.get('referrer-policy')).toBe('same-origin');
		expect(headers.get('cross-origin-opener-policy')).toBe('same-origin');
	}
);

it('lets a page run its own scripts and nobody else’s', async () => {
	const answer = await new Visitor(product.address).request('/sign-in');
	const policy = answer.headers.get('content-security-policy') ?? '';
	expect(policy).toMatch(/script-src 'self' 'nonce-[\w+/=-]{16,}'(;|$)/);
	expect(policy).not.toMatch(/script-src[^;]*unsafe/);
	for (const rule of [
		"default-src 'self'",
		"object-src 'none'",
		"base-uri 'none'",
		"frame-ancestors 'none'",
		"form-action 'self'"
	])
		expect(policy).toContain(rule);
});

it('refuses a change that comes from another site, by form or by fetch, and does nothing', async () => {
	const visitor = new Visitor(product.address);
	for (const origin of ['https://elsewhere.example', 'null']) {
		const answer = await visitor.request('/sign-in?/signIn', {
			method: 'POST',
			headers: { origin, 'content-type': 'application/x-www-form-urlencoded' },
			body: 'email=a&password=b'
		});
		expect(answer.status).toBe(403);
		expect(answer.headers.getSetCookie()).toEqual([]);
	}
});

it('keeps the session in a cookie no script can read and no other site sends', async () => {
	const user = await buildUser(['dock'], { sites: [await buildSite()] });
	const visitor = new Visitor(product.address);
	const answer = await visitor.post('/sign-in?/signIn', {
		email: user.email,
		password: 'a-long-test-password'
	});
	const cookie = answer.headers.getSetCookie().find((one) => /session-token/.test(one)) ?? '';
	expect(cookie).toMatch(/HttpOnly/i);
	expect(cookie).toMatch(/SameSite=Lax/i);
});

it('sends nobody elsewhere after signing in', async () => {
	const user = await buildUser(['dock'], { sites: [await buildSite()] });
	for (const to of ['https://elsewhere.example', '//elsewhere.example', '/\\elsewhere.example']) {
		const visitor = new Visitor(product.address);
		const path = `/sign-in?to=${encodeURIComponent(to)}&/signIn`;
		const answer = await visitor.post(path, { email: user.email, password: 'a-long-test-password' });
		expect(answer.status).toBe(303);
		expect(answer.headers.get('location')).toBe('/');
	}
});

it('gives a page nobody has as a plain page, and never a stack', async () => {
	const visitor = await signInAs(product, await buildUser(['dock'], { sites: [await buildSite()] }));
	for (const path of ['/no/such/page', '/shipments/ZZ-26-9999', '/claims/0190-not-an-id']) {
		const answer = await visitor.request(path, { headers: { accept: 'text/html' } });
		expect([403, 404]).toContain(answer.status);
		expect(await answer.text()).not.toMatch(/node_modules|\.js:\d+/);
	}
	expect(product.log()).not.toMatch(/"level":(50|60)/);
});
