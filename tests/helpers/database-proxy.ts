import { connect, createServer, type Socket } from 'node:net';
import { freePort } from '../../src/cli/setup/mariadb.mjs';

/** Between a program and its database: sees every statement, and can keep one back for ever. */
export interface DatabaseProxy {
	/** The given address, by way of the proxy. */
	url: (direct: string) => string;
	/** Statements seen since the last call of `watch`, oldest first. */
	seen: () => readonly string[];
	/** Forgets what it saw; from now on `isLast` is asked before each statement goes on, and true stops all traffic. */
	watch: (isLast?: (sql: string, nth: number) => boolean) => void;
	/** Resolves once a statement was kept back. */
	stopped: () => Promise<void>;
	close: () => Promise<void>;
}

const commandQuery = 0x03;
const headerBytes = 4;

/** Cuts a client's bytes into protocol packets. Source: MySQL client/server protocol, packet header: 3 bytes length, 1 byte number. */
function* packetsOf(held: Buffer): Generator<Buffer> {
	for (let at = 0; at + headerBytes <= held.length;) {
		const end = at + headerBytes + held.readUIntLE(at, 3);
		if (end > held.length) return;
		yield held.subarray(at, end);
		at = end;
	}
}

/** A command is packet 0 of its exchange; what follows a handshake is not. */
function sqlOf(packet: Buffer): string | null {
	const isQuery = packet[3] === 0 && packet[headerBytes] === commandQuery;
	return isQuery ? packet.subarray(headerBytes + 1).toString('utf8') : null;
}

/** Starts a proxy on a port of its own. */
export async function startDatabaseProxy(direct: string): Promise<DatabaseProxy> {
	const target = new URL(direct);
	const port = await freePort();
	const sockets = new Set<Socket>();
	let seen: string[] = [];
	let isLast: ((sql: string, nth: number) => boolean) | undefined;
	let isStopped = false;
	let tellStopped = () => {};
	let stopped = Promise.resolve();

	function pass(packet: Buffer, server: Socket): void {
		const sql = sqlOf(packet);
		if (isStopped) return;
		if (sql !== null) {
			seen.push(sql);
			if (isLast?.(sql, seen.length)) {
				isStopped = true;
				return tellStopped();
			}
		}
		server.write(packet);
	}

	const listener = createServer((client) => {
		const server = connect(Number(target.port), target.hostname);
		let held = Buffer.alloc(0);
		client.on('data', (chunk) => {
			held = Buffer.concat([held, chunk]);
			for (const packet of packetsOf(held)) {
				pass(packet, server);
				held = held.subarray(packet.length);
			}
		});
		server.on('data', (chunk) => void (isStopped || client.write(chunk)));
		for (const [one, other] of [
			[client, server],
			[server, client]
		] as const) {
			sockets.add(one);
			one.on('error', () => {});
			one.on('close', () => {
				sockets.delete(one);
				other.destroy();
			});
		}
	});
	await new Promise<void>((resolve) => listener.listen(port, '127.0.0.1', resolve));
	return {
		url(direct) {
			const changed = new URL(direct);
			changed.port = String(port);
			return changed.href;
		},
		seen: () => seen,
		watch(until) {
			seen = [];
			isLast = until;
			isStopped = false;
			stopped = new Promise((resolve) => (tellStopped = resolve));
		},
		stopped: () => stopped,
		async close() {
			for (const socket of sockets) socket.destroy();
			await new Promise((resolve) => listener.close(resolve));
		}
	};
}
