/** `npm start`: from a clean clone to a served product with its demo. No dependencies: it installs them. */
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { databasePrograms, ensurePrograms } from './setup/debian.mjs';
import { startDatabase } from './setup/mariadb.mjs';
import { prepareProject, projectFolder } from './setup/project.mjs';
import { run } from './setup/run.mjs';
import { SetupFault, endWith, say, step } from './setup/say.mjs';
import { dataFolder, readDotEnv } from './setup/settings.mjs';

const startedMs = performance.now();
/** @type {(() => Promise<void> | void)[]} */
const stops = [];
let isStopping = false;

async function stop(code = 0) {
	if (isStopping) return;
	isStopping = true;
	for (const end of stops.reverse()) await end();
	process.exit(code);
}
// Ctrl-C reaches npm and this program both, so the signal can come twice.
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void stop());

/** @param {NodeJS.ProcessEnv} env @param {number} port */
async function serve(env, port) {
	const server = spawn(process.execPath, [join(projectFolder, 'src/cli/serve.mjs')], {
		cwd: projectFolder,
		env,
		stdio: 'inherit',
		detached: true
	});
	stops.push(
		() =>
			new Promise((ended) => {
				if (server.exitCode !== null) return ended();
				server.once('exit', () => ended());
				server.kill('SIGTERM');
			})
	);
	server.once('exit', (code) => void stop(isStopping ? 0 : (code ?? 1)));
	const address = `http://127.0.0.1:${port}/api/v1/health`;
	while (!isStopping) {
		const answer = await fetch(address).catch(() => null);
		if (answer?.ok) return;
		await wait(100);
	}
}

async function main() {
	readDotEnv();
	const isPrivate = !process.env.DATABASE_URL;
	const data = dataFolder();
	const port = Number(process.env.PORT || 3000);
	const inUse = await fetch(`http://127.0.0.1:${port}/`).then(
		() => true,
		() => false
	);
	if (inUse)
		throw new SetupFault(
			`Port ${port} is taken by another program. Stop it, or choose another: PORT=3100 npm start`
		);

	if (isPrivate) await ensurePrograms(databasePrograms);
	await prepareProject();

	/** @type {NodeJS.ProcessEnv} */
	const env = {
		...process.env,
		WHARFINGER_DATA: data,
		PORT: String(port),
		IS_DEMO: isPrivate ? 'true' : 'false'
	};
	if (isPrivate) {
		const database = await step('Starting the private database', () => startDatabase(join(data, 'database')));
		stops.push(() => database.stop());
		env.DATABASE_URL = database.appUrl;
		env.DATABASE_OWNER_URL = database.ownerUrl;
	}
	const program = (/** @type {string} */ name) => join(projectFolder, `build/node/${name}.js`);
	await step('Bringing the schema up to date', () =>
		run(process.execPath, [program('migrate')], { cwd: projectFolder, env })
	);
	if (isPrivate)
		await step('Loading the demo (once)', () =>
			run(process.execPath, [program('seed')], { cwd: projectFolder, env })
		);
	await step('Starting the server', () => serve(env, port));
	if (isStopping) return;

	say(
		`\nWharfinger is at http://localhost:${port}  (${((performance.now() - startedMs) / 1000).toFixed(1)} s)`
	);
	if (isPrivate)
		say('Demo sign-ins: dock@, qa@, claims@, admin@wharfinger.example, password wharfinger-demo');
	say('Ctrl-C stops it.');
}

main().catch(async (error) => {
	for (const end of stops.reverse()) await end();
	endWith(error);
});
