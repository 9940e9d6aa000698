import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { databasePrograms, ensurePrograms } from './debian.mjs';
import { isRunning, startDatabase } from './mariadb.mjs';
import { prepareProject, projectFolder } from './project.mjs';
import { dataFolder, readDotEnv } from './settings.mjs';

/** @param {string} path @param {string[]} args @param {NodeJS.ProcessEnv} env @returns {Promise<number>} */
function exitCodeOf(path, args, env) {
	return new Promise((resolve, reject) => {
		const child = spawn(process.execPath, [path, ...args], { cwd: projectFolder, env, stdio: 'inherit' });
		child.once('error', reject);
		child.once('close', (code) => resolve(code ?? 1));
	});
}

/**
 * Runs a built program where the product runs: on DATABASE_URL, else on the private server, which is started for it
 * where it does not run already.
 * @param {string} program
 * @param {string[]} args
 * @param {Record<string, string[]>} [needs] Debian programs it calls
 * @returns {Promise<number>} the program's own exit code
 */
export async function runInPlace(program, args, needs = {}) {
	readDotEnv();
	const data = dataFolder();
	const isPrivate = !process.env.DATABASE_URL;
	await ensurePrograms({ ...needs, ...(isPrivate ? databasePrograms : {}) });
	const path = join(projectFolder, `build/node/${program}.js`);
	// Where a server runs its build is left alone.
	if (!existsSync(path)) await prepareProject();
	/** @type {NodeJS.ProcessEnv} */
	const env = { ...process.env, WHARFINGER_DATA: data };
	const wasRunning = isPrivate && isRunning(join(data, 'database'));
	const database = isPrivate ? await startDatabase(join(data, 'database')) : null;
	if (database) Object.assign(env, { DATABASE_URL: database.appUrl, DATABASE_OWNER_URL: database.ownerUrl });
	try {
		return await exitCodeOf(path, args, env);
	} finally {
		if (database && !wasRunning) await database.stop();
	}
}
