/** `npm run token -- --email <user>`: on the configured database, else on the private one that `npm start` keeps. */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { isRunning, startDatabase } from './setup/mariadb.mjs';
import { preparePrograms, projectFolder } from './setup/project.mjs';
import { runProgram } from './setup/run-child.mjs';
import { SetupFault, endWith, sayOnStandardError } from './setup/say.mjs';
import { dataFolder, readDotEnv } from './setup/settings.mjs';

async function main() {
	sayOnStandardError();
	readDotEnv();
	await preparePrograms();
	const program = join(projectFolder, 'build/node/token.js');
	const env = { ...process.env, WHARFINGER_DATA: dataFolder() };
	if (process.env.DATABASE_URL) return runProgram(program, env);
	const folder = join(dataFolder(), 'database');
	if (!existsSync(join(folder, 'data/mysql')))
		throw new SetupFault('There is no database yet. Run npm start once, or set DATABASE_URL.');
	const wasRunning = isRunning(folder);
	const database = await startDatabase(folder);
	try {
		await runProgram(program, { ...env, DATABASE_URL: database.appUrl });
	} finally {
		if (!wasRunning) await database.stop();
	}
}

main().catch(endWith);
