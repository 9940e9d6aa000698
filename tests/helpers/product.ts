import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { freePort } from '../../src/cli/setup/mariadb.mjs';

/** The built product on a port of its own, on the database and data folder this test file uses. */
export interface Product {
	address: string;
	/** What it wrote to its log so far. */
	log: () => string;
	stop: () => Promise<void>;
}

const root = join(import.meta.dirname, '../..');

const portTaken = 'EADDRINUSE';
const mostTries = 3;

/**
 * Starts the product as it is served, so that a request passes the real hooks. Needs a build. A port that was free may
 * be taken before the product opens it; another is tried then.
 */
export async function startProduct(more: Record<string, string> = {}): Promise<Product> {
	for (let attempt = 1; ; attempt++) {
		try {
			return await startOnce(more);
		} catch (error) {
			if (attempt >= mostTries || !String(error).includes(portTaken)) throw error;
		}
	}
}

async function startOnce(more: Record<string, string>): Promise<Product> {
	const port = await freePort();
	const address = `http://localhost:${port}`;
	const child = spawn(process.execPath, [join(root, 'src/cli/serve.mjs')], {
		cwd: root,
		env: {
			...process.env,
			PORT: String(port),
			ORIGIN: address,
			LOCAL_MAILBOX_PORT: String(await freePort()),
			LOG_LEVEL: 'warn',
			...more
		},
		stdio: ['ignore', 'pipe', 'pipe']
	});
	let log = '';
	let hasEnded = false;
	const ended = new Promise<void>((resolve) =>
		child.once('exit', () => {
			hasEnded = true;
			resolve();
		})
	);
	for (const stream of [child.stdout, child.stderr]) stream.on('data', (chunk) => (log += chunk));
	while (
		!hasEnded &&
		!(await fetch(`${address}/api/v1/health`).then(
			(answer) => answer.ok,
			() => false
		))
	);
	if (hasEnded) throw new Error(`The product did not start:\n${log}`);
	return {
		address,
		log: () => log,
		async stop() {
			child.kill('SIGTERM');
			await ended;
		}
	};
}

/** A browser's worth of state: cookies kept, Origin sent with every change, redirects shown rather than followed. */
export class Visitor {
	private readonly cookies = new Map<string, string>();
	constructor(private readonly address: string) {}

	async request(path: string, init: RequestInit = {}): Promise<Response> {
		const headers = new Headers(init.headers);
		headers.set('cookie', [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; '));
		if (init.method && init.method !== 'GET' && !headers.has('origin')) headers.set('origin', this.address);
		const response = await fetch(new URL(path, this.address), { redirect: 'manual', ...init, headers });
		for (const cookie of response.headers.getSetCookie()) {
			const [pair = ''] = cookie.split(';');
			const at = pair.indexOf('=');
			this.cookies.set(pair.slice(0, at), pair.slice(at + 1));
		}
		return response;
	}

	/** Posts a form as a browser without scripts does. */
	post(path: string, fields: Record<string, string>): Promise<Response> {
		return this.request(path, {
			method: 'POST',
			headers: { 'content-type': 'application/x-www-form-urlencoded', accept: 'text/html' },
			body: new URLSearchParams(fields)
		});
	}
}
