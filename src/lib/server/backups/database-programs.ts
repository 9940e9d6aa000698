import { spawn, type ChildProcess } from 'node:child_process';
import { createReadStream, createWriteStream } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import { createGunzip, createGzip } from 'node:zlib';
import { BackupFault } from './manifest';

/** Where a program finds its database; the password goes by the environment, never by the list of processes. */
function accessOf(url: string): { args: string[]; env: NodeJS.ProcessEnv; database: string } {
	const { hostname, port, username, password, pathname } = new URL(url);
	return {
		args: [
			'--no-defaults',
			`--host=${hostname}`,
			`--port=${port || '3306'}`,
			`--user=${decodeURIComponent(username)}`
		],
		env: { ...process.env, MYSQL_PWD: decodeURIComponent(password) },
		database: decodeURIComponent(pathname.slice(1))
	};
}

function ended(child: ChildProcess, program: string): Promise<void> {
	let said = '';
	child.stderr?.on('data', (chunk) => (said += chunk));
	return new Promise((resolve, reject) => {
		child.once('error', (error) =>
			reject(
				new BackupFault(
					`${program} could not be started: ${error.message}. It is in Debian's mariadb-client.`
				)
			)
		);
		child.once('close', (code) =>
			code === 0 ? resolve() : reject(new BackupFault(`${program} ended with ${code}: ${said.trim()}`))
		);
	});
}

/** Writes a whole database as it is at one moment, while others go on working, packed. */
export async function dumpDatabase(url: string, path: string): Promise<void> {
	const { args, env, database } = accessOf(url);
	const options = [
		'--single-transaction',
		'--quick',
		'--skip-lock-tables',
		'--no-tablespaces',
		'--skip-triggers'
	];
	const exact = [
		'--hex-blob',
		'--default-character-set=utf8mb4',
		'--skip-dump-date',
		'--max-allowed-packet=256M'
	];
	const child = spawn('mariadb-dump', [...args, ...options, ...exact, database], {
		env,
		stdio: ['ignore', 'pipe', 'pipe']
	});
	const end = ended(child, 'mariadb-dump');
	await Promise.all([end, pipeline(child.stdout, createGzip(), createWriteStream(path, { mode: 0o600 }))]);
}

/** Runs a packed dump against an empty database. */
export async function loadDatabase(url: string, path: string): Promise<void> {
	const { args, env, database } = accessOf(url);
	const child = spawn('mariadb', [...args, '--max-allowed-packet=256M', database], {
		env,
		stdio: ['pipe', 'ignore', 'pipe']
	});
	const end = ended(child, 'mariadb');
	// A program that ends early says why itself; the broken pipe says nothing.
	await Promise.all([end, pipeline(createReadStream(path), createGunzip(), child.stdin).catch(() => end)]);
}
