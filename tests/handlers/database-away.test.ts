import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, it, vi } from 'vitest';
import { fastAndForgetful, startDatabase } from '../../src/cli/setup/mariadb.mjs';
import { migrate } from '../../src/lib/server/db/migrate';
import { closeDatabase, openDatabase } from '../../src/lib/server/db/sequelize';
import { buildSite, buildUser } from '../helpers/factories';
import { startProduct, type Product, type Visitor } from '../helpers/product';
import { signInAs } from './sign-in-as';

const folder = mkdtempSync(join(tmpdir(), 'wharfinger-away-'));
const start = () => startDatabase(join(folder, 'database'), fastAndForgetful);
let database: Awaited<ReturnType<typeof start>>;
let product: Product;
let visitor: Visitor;

beforeAll(async () => {
	database = await start();
	const { appUrl, ownerUrl } = database;
	const settings = {
		DATABASE_URL: appUrl,
		DATABASE_OWNER_URL: ownerUrl,
		WHARFINGER_DATA: join(folder, 'data')
	};
	Object.assign(process.env, settings, { AUTH_SECRET: 'a-secret-for-tests-that-is-long-enough' });
	await migrate(ownerUrl, appUrl);
	openDatabase(appUrl);
	const user = await buildUser(['dock'], { sites: [await buildSite()] });
	product = await startProduct(settings);
	visitor = await signInAs(product, user);
}, 120_000);

afterAll(async () => {
	await product.stop();
	await closeDatabase();
	await database.stop();
	rmSync(folder, { recursive: true, force: true });
}, 60_000);

it('says so plainly while its database is away, and goes on by itself once it is back', async () => {
	expect((await visitor.request('/arrivals')).status).toBe(200);

	await database.stop();
	const health = await visitor.request('/api/v1/health');
	expect(health.status).toBe(503);
	expect(await health.json()).toMatchObject({ database: 'away' });
	const page = await visitor.request('/arrivals', { headers: { accept: 'text/html' } });
	expect(page.status).toBeGreaterThanOrEqual(500);
	expect(await page.text()).toContain('The database does not answer.');
	const api = await visitor.request('/api/v1/shipments', { headers: { accept: 'application/json' } });
	expect(api.status).toBeGreaterThanOrEqual(500);
	expect(await api.json()).toMatchObject({ code: 'database-away' });

	database = await start();
	await vi.waitFor(async () => expect((await visitor.request('/api/v1/health')).status).toBe(200), {
		timeout: 30_000,
		interval: 200
	});
	expect((await visitor.request('/arrivals')).status).toBe(200);
}, 120_000);
