import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, inject } from 'vitest';
import { migrate } from '../../src/lib/server/db/migrate';
import { closeDatabase, connect, openDatabase } from '../../src/lib/server/db/sequelize';

function withDatabase(url: string, name: string): string {
	const changed = new URL(url);
	changed.pathname = `/${name}`;
	return changed.href;
}

/** Gives this test file a migrated database and a data folder of its own. Call at the top of the file. */
export function useTestDatabase(): { appUrl: () => string; ownerUrl: () => string } {
	const name = `wharfinger_${randomBytes(6).toString('hex')}`;
	const ownerUrl = withDatabase(inject('ownerUrl'), name);
	const appUrl = withDatabase(inject('appUrl'), name);
	const dataFolder = mkdtempSync(join(tmpdir(), 'wharfinger-data-'));
	Object.assign(process.env, {
		DATABASE_URL: appUrl,
		DATABASE_OWNER_URL: ownerUrl,
		WHARFINGER_DATA: dataFolder,
		LOG_LEVEL: 'silent',
		AUTH_SECRET: 'a-secret-for-tests-that-is-long-enough'
	});

	beforeAll(async () => {
		const owner = connect(inject('ownerUrl'), 1);
		await owner.query(`CREATE DATABASE ${name} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
		await owner.close();
		await migrate(ownerUrl, appUrl);
		openDatabase(appUrl);
	});
	afterAll(async () => {
		await closeDatabase();
		const owner = connect(inject('ownerUrl'), 1);
		await owner.query(`DROP DATABASE ${name}`);
		await owner.close();
		rmSync(dataFolder, { recursive: true, force: true });
	});
	return { appUrl: () => appUrl, ownerUrl: () => ownerUrl };
}
