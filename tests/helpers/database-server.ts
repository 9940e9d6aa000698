import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { TestProject } from 'vitest/node';
import { fastAndForgetful, startDatabase } from '../../src/cli/setup/mariadb.mjs';

declare module 'vitest' {
	interface ProvidedContext {
		ownerUrl: string;
		appUrl: string;
	}
}

/** One private server for all projects of a run: that of `npm test`, else one of its own. */
export default async function setup(project: TestProject) {
	const given = process.env.TEST_DATABASE_OWNER_URL;
	if (given && process.env.TEST_DATABASE_URL) {
		project.provide('ownerUrl', given);
		project.provide('appUrl', process.env.TEST_DATABASE_URL);
		return;
	}
	const folder = mkdtempSync(join(tmpdir(), 'wharfinger-test-'));
	const server = await startDatabase(folder, fastAndForgetful);
	project.provide('ownerUrl', server.ownerUrl);
	project.provide('appUrl', server.appUrl);
	return async () => {
		await server.stop();
		rmSync(folder, { recursive: true, force: true });
	};
}
