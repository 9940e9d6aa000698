import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { computeLifeOf } from '../../src/lib/server/specs/compute-life';
import { makeApiToken, newApiSecret } from '../../src/lib/server/accounts/api-tokens';
import { systemContext } from '../../src/lib/server/context';
import { AuditEntry } from '../../src/lib/server/db/models/audit-entry';
import { startProduct, Visitor, type Product } from '../helpers/product';
import { useTestDatabase } from '../helpers/test-database';
import { buildSeenLoad } from './signed-load';
import { signInAs } from './sign-in-as';

useTestDatabase();

const path = '/api/v1/shelf-life/compute';
const question = {
	model: { kind: 'arrhenius', activationEnergyKjPerMol: 83.144, referenceCelsius: 5, lifeHours: 1000 },
	readings: [
		['2026-04-03T06:00:00Z', 4],
		['2026-04-03T07:00:00Z', 9],
		['2026-04-05T06:00:00Z', 6]
	],
	limits: { above: [8], below: [2] },
	accuracyCelsius: 0.5
};
let product: Product;
let emailOfDock = '';
let visitors: Record<'dock' | 'qa' | 'supplier' | 'nobody', Visitor>;

beforeAll(async () => {
	const { people } = await buildSeenLoad();
	emailOfDock = people.dock.email;
	product = await startProduct();
	visitors = {
		dock: await signInAs(product, people.dock),
		qa: await signInAs(product, people.qa),
		supplier: await signInAs(product, people.supplier),
		nobody: new Visitor(product.address)
	};
}, 90_000);
afterAll(() => product.stop());

function ask(who: keyof typeof visitors, body: string, headers: Record<string, string> = {}) {
	return visitors[who].request(path, {
		method: 'POST',
		headers: { 'content-type': 'application/json', ...headers },
		body
	});
}

describe('POST shelf-life/compute', () => {
	it('answers 401 without a session', async () => {
		const answer = await ask('nobody', JSON.stringify(question));
		expect(answer.status).toBe(401);
		expect(await answer.json()).toEqual({ code: 'no-session', message: 'Sign in first.' });
	});

	it('answers a supplier 403', async () => {
		expect((await ask('supplier', JSON.stringify(question))).status).toBe(403);
	});

	it('answers staff with the engine’s figures, and keeps nothing', async () => {
		const before = await AuditEntry.count();
		for (const who of ['dock', 'qa'] as const) {
			const answer = await ask(who, JSON.stringify(question));
			expect(answer.status).toBe(200);
			expect(await answer.json()).toEqual(computeLifeOf(question));
		}
		expect(await AuditEntry.count()).toBe(before);
	});

	it('answers a program by its token, without cookie or origin', async () => {
		const secret = newApiSecret();
		await makeApiToken(systemContext(new Date()), emailOfDock, secret);
		const send = (token: string) =>
			fetch(new URL(path, product.address), {
				method: 'POST',
				headers: { authorization: `Bearer ${token}`, 'content-type': 'application/json' },
				body: JSON.stringify(question)
			});
		const answer = await send(secret);
		expect(answer.status).toBe(200);
		expect(await answer.json()).toEqual(computeLifeOf(question));
		expect((await send(`${secret}x`)).status).toBe(401);
	});

	it.each([
		['a faulty figure', JSON.stringify({ ...question, readings: [['now', 4]] }), ['readings.0.0']],
		['a body that is no JSON', 'model=q10', undefined],
		['an empty body', '', undefined]
	])('answers 422 for %s, naming the field', async (_, body, fields) => {
		const answer = await ask('qa', body);
		expect(answer.status).toBe(422);
		const refusal: { code: string; message: string; issues?: Record<string, string> } = await answer.json();
		expect(refusal.code).toBe('invalid');
		expect(refusal.message).toMatch(/\.$/);
		expect(refusal.issues && Object.keys(refusal.issues)).toEqual(fields);
	});

	it('takes a hundred thousand readings with dates in one go', async () => {
		const readings = Array.from({ length: 100_000 }, (_, i) => [
			new Date(Date.UTC(2026, 3, 3) + i * 60_000).toISOString(),
			(i % 90) / 10
		]);
		const answer = await ask('qa', JSON.stringify({ ...question, readings }));
		expect(answer.status).toBe(200);
		const { usedFractionAtReading } = (await answer.json()) as { usedFractionAtReading: number[] };
		expect(usedFractionAtReading).toHaveLength(100_000);
	});

	it('refuses a change that comes from elsewhere', async () => {
		const answer = await ask('qa', JSON.stringify(question), { origin: 'https://elsewhere.example' });
		expect(answer.status).toBe(403);
	});
});
