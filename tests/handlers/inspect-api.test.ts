import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeApiToken, newApiSecret, revokeApiToken } from '../../src/lib/server/accounts/api-tokens';
import { systemContext } from '../../src/lib/server/context';
import { LoggerRead } from '../../src/lib/server/db/models/logger-read';
import { StoredFile } from '../../src/lib/server/db/models/stored-file';
import type { User } from '../../src/lib/server/db/models/user';
import { buildPartner, buildSite, buildUser, contextFor } from '../helpers/factories';
import { startProduct, Visitor, type Product } from '../helpers/product';
import { useTestDatabase } from '../helpers/test-database';
import { signInAs } from './sign-in-as';

useTestDatabase();

let product: Product;
let users: Record<'dock' | 'claims' | 'admin' | 'supplier', User>;

async function tokenOf(user: User): Promise<{ id: string; secret: string }> {
	const secret = newApiSecret();
	const { id } = await makeApiToken(systemContext(new Date()), user.email, secret);
	return { id, secret };
}

beforeAll(async () => {
	const sites = [await buildSite({ zone: 'Europe/Amsterdam' })];
	users = {
		dock: await buildUser(['dock'], { sites }),
		claims: await buildUser(['claims'], { sites }),
		admin: await buildUser(['admin']),
		supplier: await buildUser(['supplier'], { partner: await buildPartner() })
	};
	product = await startProduct();
}, 90_000);
afterAll(() => product.stop());

const local = 'time;temperature °C\n2026-04-03 10:00;4.5\n2026-04-03 10:10;4.7\n2026-04-03 10:40;\n';

function formOf(file: string | null, fields: Record<string, string> = {}, name = 'file'): FormData {
	const form = new FormData();
	if (file !== null) form.append(name, new File([file], 'trip.csv', { type: 'text/csv' }));
	for (const [field, value] of Object.entries(fields)) form.append(field, value);
	return form;
}

function send(body: FormData | string, headers: Record<string, string> = {}): Promise<Response> {
	return fetch(new URL('/api/v1/reads/inspect', product.address), { method: 'POST', body, headers });
}

async function inspect(user: User, body: FormData | string): Promise<{ status: number; answer: unknown }> {
	const { secret } = await tokenOf(user);
	const response = await send(body, { authorization: `Bearer ${secret}` });
	return { status: response.status, answer: await response.json() };
}

describe('who may inspect', () => {
	it('is nobody without session or token, and no browser from elsewhere', async () => {
		expect((await send(formOf(local), { origin: product.address })).status).toBe(401);
		expect((await send(formOf(local))).status).toBe(403);
	});

	it('is nobody with a wrong or revoked token, whatever cookie comes with it', async () => {
		const { id, secret } = await tokenOf(users.dock);
		const visitor = await signInAs(product, users.dock);
		await revokeApiToken(await contextFor(users.dock), id);
		for (const wrong of ['whf_nothing', secret]) {
			const headers = { authorization: `Bearer ${wrong}` };
			expect((await send(formOf(local), headers)).status).toBe(401);
			const withCookie = await visitor.request('/api/v1/reads/inspect', {
				method: 'POST',
				body: formOf(local),
				headers
			});
			expect(withCookie.status).toBe(401);
		}
	});

	it('is no supplier, and is all staff by session or token', async () => {
		const supplier = await signInAs(product, users.supplier);
		const asked = { method: 'POST', body: formOf(local) };
		expect((await supplier.request('/api/v1/reads/inspect', asked)).status).toBe(403);
		const claims = await signInAs(product, users.claims);
		expect((await claims.request('/api/v1/reads/inspect', asked)).status).toBe(200);
		expect((await inspect(users.claims, formOf(local))).status).toBe(200);
	});

	it('sees no page with a token', async () => {
		const { secret } = await tokenOf(users.dock);
		const page = await new Visitor(product.address).request('/arrivals', {
			headers: { authorization: `Bearer ${secret}` }
		});
		expect(page.status).toBe(303);
	});
});

describe('an inspection', () => {
	it('answers what was understood, assumes the zone of the caller’s site aloud, and keeps nothing', async () => {
		const { status, answer } = await inspect(users.dock, formOf(local));
		expect(status).toBe(200);
		expect(answer).toMatchObject({
			outcome: 'ok',
			questions: [],
			refusal: null,
			warnings: [
				{ code: 'missing-value', count: 1, lines: [4] },
				{ code: 'zone-assumed', count: 1 }
			],
			channels: [
				{ readings: 2, missing: 1, firstAt: '2026-04-03T08:00:00.000Z', lastAt: '2026-04-03T08:10:00.000Z' }
			]
		});
		expect([await StoredFile.count(), await LoggerRead.count()]).toEqual([0, 0]);
	});

	it('assumes UTC for a caller of no site', async () => {
		const { answer } = await inspect(users.admin, formOf(local));
		expect(answer).toMatchObject({ channels: [{ firstAt: '2026-04-03T10:00:00.000Z' }] });
	});

	it('takes answers beside the file, before or after it', async () => {
		const form = new FormData();
		form.append('zone', '+05:30');
		form.append('file', new File([local], 'a.csv'));
		form.append('unit', '[degF]');
		const { answer } = await inspect(users.dock, form);
		expect(answer).toMatchObject({
			decisions: expect.arrayContaining([
				{ field: 'zone', value: '+05:30', because: 'answer' },
				{ field: 'unit', value: '[degF]', because: 'answer' }
			]),
			channels: [{ firstAt: '2026-04-03T04:30:00.000Z' }]
		});
	});

	it('answers 200 for a question, a refusal and a file too large', async () => {
		const unitless = local.replace(' °C', '');
		expect(await inspect(users.dock, formOf(unitless))).toMatchObject({
			status: 200,
			answer: { outcome: 'question', questions: [{ field: 'unit' }] }
		});
		expect(await inspect(users.dock, formOf('%PDF-1.7'))).toMatchObject({
			status: 200,
			answer: { outcome: 'refused', refusal: { code: 'not-text' } }
		});
		const large = 'x'.repeat(53 * 1024 * 1024);
		expect(await inspect(users.dock, formOf(large))).toMatchObject({
			status: 200,
			answer: { outcome: 'refused', refusal: { code: 'too-large', line: null } }
		});
	});

	it.each([
		['no file', () => formOf(null, { zone: 'UTC' }), 'file'],
		['a file of another name', () => formOf(local, {}, 'export'), 'file'],
		['no such unit', () => formOf(local, { unit: 'C' }), 'unit'],
		['no such zone', () => formOf(local, { zone: 'Mars/Base' }), 'zone'],
		['no such order', () => formOf(local, { dateOrder: 'YDM' }), 'dateOrder'],
		['no instant', () => formOf(local, { start: '3 April' }), 'start'],
		['no length', () => formOf(local, { intervalSeconds: '-5' }), 'intervalSeconds'],
		['no such part', () => formOf(local, { part: 'last' }), 'part']
	])('names the field of a request with %s', async (_, form, field) => {
		const { status, answer } = await inspect(users.dock, form());
		expect(status).toBe(422);
		expect(answer).toMatchObject({ code: 'invalid', issues: { [field]: expect.stringContaining(field) } });
	});

	it('declines a body that is no form', async () => {
		expect(await inspect(users.dock, 'time,temp')).toMatchObject({
			status: 422,
			answer: { code: 'not-multipart' }
		});
	});
});
