/** `npm test`: everything on a clean clone, ending with "N passed, N failed". No dependencies: it installs them. */
import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { databasePrograms, ensurePrograms, testPrograms } from './setup/debian.mjs';
import { fastAndForgetful, freePort, startDatabase } from './setup/mariadb.mjs';
import { prepareProject, projectFolder } from './setup/project.mjs';
import { run } from './setup/run.mjs';
import { SetupFault, endWith, say, step } from './setup/say.mjs';

const folder = mkdtempSync(join(tmpdir(), 'wharfinger-tests-'));
/** @type {(() => Promise<void> | void)[]} */
const ends = [() => rmSync(folder, { recursive: true, force: true })];
let isEnding = false;

async function endAll() {
	if (isEnding) return;
	isEnding = true;
	for (const end of ends.reverse()) await end();
}
for (const signal of ['SIGINT', 'SIGTERM'])
	process.on(signal, () => void endAll().then(() => process.exit(130)));

/**
 * Runs a test runner to its end, showing what it prints.
 * @param {string[]} args
 * @param {NodeJS.ProcessEnv} env
 * @returns {Promise<number>}
 */
function runner(args, env) {
	return new Promise((resolve) => {
		const child = spawn(process.execPath, args, {
			cwd: projectFolder,
			env,
			stdio: ['ignore', 'inherit', 'inherit']
		});
		child.on('close', (code) => resolve(code ?? 1));
	});
}

/** @typedef {{ passed: number, failed: number }} Counts */

/** @param {string} path @param {(report: any) => Counts} read @param {number} code @returns {Counts} */
function countsOf(path, read, code) {
	// A runner that died before it could report has failed, whatever it had counted.
	if (!existsSync(path)) return { passed: 0, failed: 1 };
	const counts = read(JSON.parse(readFileSync(path, 'utf8')));
	return code !== 0 && counts.failed === 0 ? { ...counts, failed: 1 } : counts;
}

/** @param {NodeJS.ProcessEnv} env */
async function unitServerAndHandlerTests(env) {
	const report = join(folder, 'vitest.json');
	const vitest = join(projectFolder, 'node_modules/vitest/vitest.mjs');
	const code = await runner(
		[vitest, 'run', '--reporter=dot', '--reporter=json', `--outputFile.json=${report}`],
		env
	);
	return countsOf(
		report,
		(r) => ({
			passed: r.numPassedTests,
			failed: r.numFailedTests + r.numFailedTestSuites * (r.numFailedTests === 0 ? 1 : 0)
		}),
		code
	);
}

/** @param {NodeJS.ProcessEnv} env @param {string} address */
async function serve(env, address) {
	const server = spawn(process.execPath, [join(projectFolder, 'src/cli/serve.mjs')], {
		cwd: projectFolder,
		env,
		stdio: ['ignore', 'inherit', 'inherit']
	});
	ends.push(
		() =>
			new Promise((ended) => {
				if (server.exitCode !== null) return ended();
				server.once('exit', () => ended());
				server.kill('SIGTERM');
			})
	);
	const deadline = Date.now() + 60_000;
	while (
		!(await fetch(`${address}/api/v1/health`).then(
			(answer) => answer.ok,
			() => false
		))
	) {
		if (server.exitCode !== null || Date.now() > deadline)
			throw new SetupFault('The product did not start for the browser tests.');
		await wait(100);
	}
}

/** @param {NodeJS.ProcessEnv} env */
async function browserTests(env) {
	const port = await freePort();
	const address = `http://localhost:${port}`;
	const product = {
		...env,
		PORT: String(port),
		ORIGIN: address,
		LOCAL_MAILBOX_PORT: String(await freePort()),
		WHARFINGER_DATA: join(folder, 'data'),
		IS_DEMO: 'true',
		LOG_LEVEL: 'warn'
	};
	const program = (/** @type {string} */ name) => join(projectFolder, `build/node/${name}.js`);
	await step('Migrating', () =>
		run(process.execPath, [program('migrate')], { cwd: projectFolder, env: product })
	);
	await step('Loading the demo', () =>
		run(process.execPath, [program('seed')], { cwd: projectFolder, env: product })
	);
	await step('Serving', () => serve(product, address));
	const report = join(folder, 'playwright.json');
	const playwright = join(projectFolder, 'node_modules/@playwright/test/cli.js');
	const code = await runner([playwright, 'test', '--config', 'tests/e2e/playwright.config.ts'], {
		...product,
		E2E_ADDRESS: address,
		PLAYWRIGHT_JSON_OUTPUT_NAME: report,
		E2E_OUTPUT: join(folder, 'browser')
	});
	return countsOf(
		report,
		(r) => ({ passed: r.stats.expected, failed: r.stats.unexpected + r.stats.flaky + r.stats.skipped }),
		code
	);
}

async function main() {
	const startedMs = performance.now();
	await ensurePrograms({ ...databasePrograms, ...testPrograms });
	await prepareProject();
	const database = await step('Starting a database for the tests', () =>
		startDatabase(join(folder, 'database'), fastAndForgetful)
	);
	ends.push(() => database.stop());
	const env = {
		...process.env,
		TEST_DATABASE_OWNER_URL: database.ownerUrl,
		TEST_DATABASE_URL: database.appUrl,
		DATABASE_URL: database.appUrl,
		DATABASE_OWNER_URL: database.ownerUrl
	};
	const first = await unitServerAndHandlerTests(env);
	const second = await browserTests(env);
	const [passed, failed] = [first.passed + second.passed, first.failed + second.failed];
	await endAll();
	say(`\nTook ${((performance.now() - startedMs) / 60_000).toFixed(1)} min`);
	say(`${passed} passed, ${failed} failed`);
	process.exit(failed === 0 ? 0 : 1);
}

main().catch(async (error) => {
	await endAll();
	endWith(error);
});
