import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** How the stand-in behaves: as it should, or in one of the ways a stranger's server fails. */
export type Manner = 'answers' | 'refuses' | 'repeats' | 'fails' | 'babbles' | 'hangs';

export interface TimestampAuthority {
	readonly url: string;
	/** The authority's own certificate, as `openssl ts -verify` wants its anchor. */
	readonly certificatePem: string;
	readonly asked: () => number;
	manner: Manner;
	stop: () => Promise<void>;
}

const settings = `
[tsa]
default_tsa = stand_in
[stand_in]
serial = ./serial
signer_cert = ./tsa.pem
signer_key = ./tsa.key
signer_digest = sha256
default_policy = 1.2.3.4.1
digests = sha256
accuracy = secs:1
ess_cert_id_alg = sha256
[purpose]
basicConstraints = critical,CA:FALSE
keyUsage = critical,digitalSignature
extendedKeyUsage = critical,timeStamping
[own]
distinguished_name = none
[none]
`;

function openssl(folder: string, ...args: string[]): void {
	execFileSync('openssl', args, { cwd: folder, stdio: 'pipe' });
}

function reply(folder: string, query: Buffer, isRefused: boolean): Buffer {
	// A digest it does not know is what `openssl ts` refuses.
	const digests = isRefused ? 'sha512' : 'sha256';
	writeFileSync(join(folder, 'ts.conf'), settings.replace('digests = sha256', `digests = ${digests}`));
	writeFileSync(join(folder, 'query.tsq'), query);
	const args = ['ts', '-reply', '-config', 'ts.conf', '-queryfile', 'query.tsq', '-out', 'reply.tsr'];
	const { stderr, error } = spawnSync('openssl', args, { cwd: folder, encoding: 'utf8' });
	if (error) throw error;
	const made = readFileSync(join(folder, 'reply.tsr'));
	if (made.length === 0) throw new Error(stderr);
	return made;
}

async function bodyOf(request: IncomingMessage): Promise<Buffer> {
	const pieces: Buffer[] = [];
	for await (const piece of request) pieces.push(piece as Buffer);
	return Buffer.concat(pieces);
}

/** A timestamp authority on loopback: `openssl ts` behind HTTP. */
export async function startTimestampAuthority(): Promise<TimestampAuthority> {
	const folder = mkdtempSync(join(tmpdir(), 'timestamp-'));
	writeFileSync(join(folder, 'serial'), '01\n');
	writeFileSync(join(folder, 'ts.conf'), settings);
	openssl(folder, 'req', '-x509', '-newkey', 'rsa:2048', '-nodes', '-keyout', 'tsa.key', '-out', 'tsa.pem', '-days', '30',
		'-subj', '/CN=Stand-in timestamps', '-config', 'ts.conf', '-section', 'own', '-extensions', 'purpose'); // prettier-ignore
	let asked = 0;
	let first: Buffer | null = null;
	const authority = { manner: 'answers' as Manner };

	async function answer(request: IncomingMessage, response: ServerResponse): Promise<void> {
		asked++;
		const query = await bodyOf(request);
		if (authority.manner === 'hangs') return;
		response.setHeader('content-type', 'application/timestamp-reply');
		if (authority.manner === 'fails') response.statusCode = 503;
		if (authority.manner === 'babbles') response.end('<html>Welcome</html>');
		else {
			const made = reply(folder, query, authority.manner === 'refuses');
			first ??= made;
			response.end(authority.manner === 'repeats' ? first : made);
		}
	}

	const server = createServer((request, response) => void answer(request, response));
	await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
	return Object.assign(authority, {
		url: `http://127.0.0.1:${(server.address() as AddressInfo).port}/tsa`,
		certificatePem: readFileSync(join(folder, 'tsa.pem'), 'utf8'),
		asked: () => asked,
		async stop() {
			server.closeAllConnections();
			await new Promise((resolve) => server.close(resolve));
			rmSync(folder, { recursive: true, force: true });
		}
	});
}
