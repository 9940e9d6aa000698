import { randomBytes } from 'node:crypto';
import { mkdir, open, readFile, rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { env } from '../env';

/** The store made at first start, or put there by hand. */
export function firstStorePath(): string {
	return join(env().keysFolder, 'organisation.p12');
}

/** An uploaded certificate's store lies under its certificate's SHA-256. */
export function storePathOf(sha256: string): string {
	return join(env().keysFolder, `${sha256}.p12`);
}

/** Of two processes that start at once the first one's key stays. @returns the store that lies there */
export async function keepFirstStore(p12: Uint8Array): Promise<Uint8Array> {
	await mkdir(env().keysFolder, { recursive: true, mode: 0o700 });
	await writeFile(firstStorePath(), p12, { mode: 0o600, flag: 'wx' }).catch(
		(error: NodeJS.ErrnoException) => {
			if (error.code !== 'EEXIST') throw error;
		}
	);
	return readFile(firstStorePath());
}

/** Keeps an uploaded store before any row names it; a crash leaves a key that nothing uses. */
export async function keepStore(sha256: string, p12: Uint8Array): Promise<void> {
	await mkdir(env().keysFolder, { recursive: true, mode: 0o700 });
	const part = `${storePathOf(sha256)}.${randomBytes(4).toString('hex')}.part`;
	const file = await open(part, 'wx', 0o600);
	await file.writeFile(p12);
	await file.sync();
	await file.close();
	await rename(part, storePathOf(sha256));
}
