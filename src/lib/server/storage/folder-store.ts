import { createReadStream } from 'node:fs';
import { copyFile, mkdir, open, readFile, rename, rm, stat, unlink } from 'node:fs/promises';
import { randomBytes } from 'node:crypto';
import { dirname, join } from 'node:path';
import type { Store } from './store';

async function exists(path: string): Promise<boolean> {
	return stat(path).then(
		() => true,
		() => false
	);
}

/** Writes beside the final name and renames: a crash leaves a stray part, never half a file under its hash. */
async function intoPlace(path: string, write: (part: string) => Promise<void>): Promise<void> {
	if (await exists(path)) return;
	await mkdir(dirname(path), { recursive: true });
	const part = `${path}.${randomBytes(4).toString('hex')}.part`;
	try {
		await write(part);
		await rename(part, path);
	} catch (error) {
		await unlink(part).catch(() => {});
		throw error;
	}
}

/** A folder of files named by their hash, two letters a level. */
export function folderStore(folder: string): Store {
	const pathOf = (sha256: string) => join(folder, sha256.slice(0, 2), sha256);
	return {
		put: (sha256, bytes) =>
			intoPlace(pathOf(sha256), async (part) => {
				const file = await open(part, 'wx');
				await file.writeFile(bytes);
				await file.sync();
				await file.close();
			}),
		putFile: (sha256, path) => intoPlace(pathOf(sha256), (part) => copyFile(path, part)),
		read: (sha256) => readFile(pathOf(sha256)),
		async open(sha256) {
			const path = pathOf(sha256);
			await stat(path);
			return createReadStream(path);
		},
		remove: (sha256) => rm(pathOf(sha256), { force: true })
	};
}
