import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';

const pollMs = 200;

/** @param {number} pid */
export function isAlive(pid) {
	try {
		process.kill(pid, 0);
		return true;
	} catch (error) {
		return error instanceof Error && 'code' in error && error.code === 'EPERM';
	}
}

/** @param {string} folder */
function isStale(folder) {
	try {
		return !isAlive(Number(readFileSync(join(folder, 'pid'), 'utf8')));
	} catch {
		// The holder has the folder but not yet its pid file; it is alive.
		return false;
	}
}

/**
 * Holds a folder as a lock while `work` runs, so that start and test never install or build over each other.
 * @template T
 * @param {string} folder
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function withLock(folder, work) {
	for (;;) {
		try {
			mkdirSync(folder);
			break;
		} catch (error) {
			if (!(error instanceof Error && 'code' in error && error.code === 'EEXIST')) throw error;
			if (isStale(folder)) rmSync(folder, { recursive: true, force: true });
			else await wait(pollMs);
		}
	}
	try {
		writeFileSync(join(folder, 'pid'), String(process.pid));
		return await work();
	} finally {
		rmSync(folder, { recursive: true, force: true });
	}
}
