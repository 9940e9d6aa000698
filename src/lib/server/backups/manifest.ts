import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { readFile, readdir } from 'node:fs/promises';
import { join, relative, sep } from 'node:path';
import { z } from 'zod';

export const manifestName = 'manifest.json';

const part = z.object({ file: z.string(), bytes: z.number().int().min(0), sha256: z.string().length(64) });

/** What a backup says of itself. */
const manifest = z.object({
	format: z.literal(1),
	madeAt: z.string(),
	/** The newest change of the schema it holds. */
	schema: z.string(),
	/** What the app may do beyond SELECT and INSERT; grants are the server's and in no dump. */
	grants: z.array(z.object({ table: z.string(), privilege: z.string(), column: z.string().nullable() })),
	/** The last checkpoint over all audit chains, to hold a restored trail against. */
	checkpoint: z.object({ seq: z.number().int(), sha256: z.string() }).nullable(),
	parts: z.array(part)
});
export type Manifest = z.output<typeof manifest>;
export type Part = z.output<typeof part>;
export type Grant = Manifest['grants'][number];

/** A backup or restore that cannot be done, in words for whoever runs it. */
export class BackupFault extends Error {}

export async function partOf(folder: string, file: string): Promise<Part> {
	const hash = createHash('sha256');
	let bytes = 0;
	for await (const chunk of createReadStream(join(folder, file))) {
		hash.update(chunk);
		bytes += chunk.length;
	}
	return { file, bytes, sha256: hash.digest('hex') };
}

/** Every file below a folder, as paths with forward slashes. */
export async function filesBelow(folder: string): Promise<string[]> {
	const entries = await readdir(folder, { recursive: true, withFileTypes: true }).catch(
		(error: NodeJS.ErrnoException) => {
			if (error.code === 'ENOENT') return [];
			throw error;
		}
	);
	return entries
		.filter((entry) => entry.isFile())
		.map((entry) => relative(folder, join(entry.parentPath, entry.name)).split(sep).join('/'))
		.sort();
}

/** Reads a backup's manifest and holds every part against it. @throws BackupFault naming the first part that differs */
export async function checkedManifest(folder: string): Promise<Manifest> {
	const text = await readFile(join(folder, manifestName), 'utf8').catch(() => {
		throw new BackupFault(`There is no backup in ${folder}: it holds no ${manifestName}.`);
	});
	let read: ReturnType<typeof manifest.safeParse>;
	try {
		read = manifest.safeParse(JSON.parse(text));
	} catch {
		throw new BackupFault(`${manifestName} in ${folder} cannot be read.`);
	}
	if (!read.success)
		throw new BackupFault(`${manifestName} in ${folder} is not one of a backup this program makes.`);
	for (const expected of read.data.parts) {
		if (expected.file.split('/').includes('..'))
			throw new BackupFault(`${expected.file} lies outside the backup.`);
		const found = await partOf(folder, expected.file).catch(() => null);
		if (!found) throw new BackupFault(`The backup is not whole: ${expected.file} is missing.`);
		if (found.sha256 !== expected.sha256)
			throw new BackupFault(`The backup is damaged: ${expected.file} is not what was written.`);
	}
	return read.data;
}
