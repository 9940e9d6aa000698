import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { withLock } from './lock.mjs';
import { run } from './run.mjs';
import { SetupFault, step } from './say.mjs';

export const projectFolder = join(import.meta.dirname, '../../..');

/** @param {string} path */
function filesBelow(path) {
	if (!statSync(path).isDirectory()) return [path];
	/** @type {string[]} */
	const found = [];
	for (const name of readdirSync(path).sort()) found.push(...filesBelow(join(path, name)));
	return found;
}

/** @param {string[]} names files and folders of the project */
function digestOf(names) {
	const hash = createHash('sha256');
	for (const name of names) {
		for (const path of filesBelow(join(projectFolder, name)))
			hash.update(path.slice(projectFolder.length)).update(readFileSync(path));
	}
	return hash.digest('hex');
}

/** @param {string} path @param {string} digest */
function isStamped(path, digest) {
	return existsSync(path) && readFileSync(path, 'utf8') === digest;
}

/** Refuses a Node that the dependencies do not run on. */
export function checkNode() {
	const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
	if (major < 20 || (major === 20 && minor < 19))
		throw new SetupFault(`Node ${process.versions.node} is too old. Install Node 20.19 or newer.`);
}

async function installDependencies() {
	const stamp = join(projectFolder, 'node_modules/.lockfile-sha256');
	const digest = digestOf(['package-lock.json']);
	if (isStamped(stamp, digest)) return;
	await step('Installing the packages named in package-lock.json', () =>
		run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], {
			cwd: projectFolder,
			whatToDo: 'Check that the npm registry can be reached, then run the command again.'
		})
	);
	writeFileSync(stamp, digest);
}

const productStamp = join(projectFolder, 'build/.sources-sha256');
const programsStamp = join(projectFolder, 'build/.programs-sha256');

function digestOfSources() {
	return digestOf([
		'src',
		'static',
		'package-lock.json',
		'svelte.config.js',
		'vite.config.ts',
		'tailwind.config.ts',
		'tsconfig.json'
	]);
}

/** @param {string[]} options */
function viteBuild(options) {
	const vite = join(projectFolder, 'node_modules/vite/bin/vite.js');
	return run(process.execPath, [vite, 'build', ...options], { cwd: projectFolder });
}

async function build() {
	const digest = digestOfSources();
	if (isStamped(productStamp, digest)) return;
	await step('Building', async () => {
		await viteBuild([]);
		await viteBuild(['--mode', 'node']);
	});
	writeFileSync(productStamp, digest);
	writeFileSync(programsStamp, digest);
}

/** Only what runs outside the server, for a program that needs no more: seconds instead of a minute. */
export async function preparePrograms() {
	checkNode();
	await withLock(join(projectFolder, '.preparing.lock'), async () => {
		if (!existsSync(join(projectFolder, 'node_modules/vite'))) await installDependencies();
		const digest = digestOfSources();
		if (isStamped(programsStamp, digest)) return;
		await step('Building', () => viteBuild(['--mode', 'node']));
		writeFileSync(programsStamp, digest);
	});
}

/** Packages installed and the product built, each only when something changed since. */
export async function prepareProject() {
	checkNode();
	await withLock(join(projectFolder, '.preparing.lock'), async () => {
		await installDependencies();
		await build();
	});
}
