import { mkdir, readdir, writeFile, copyFile } from 'node:fs/promises';
import { createWriteStream } from 'node:fs';
import { dirname, join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { QueryTypes } from 'sequelize';
import { AuditCheckpoint } from '../db/models/audit-checkpoint';
import { database } from '../db/sequelize';
import { env } from '../env';
import { fileStore } from '../storage/store';
import { dumpDatabase } from './database-programs';
import { grantsOfApp } from './grants';
import { BackupFault, filesBelow, manifestName, partOf, type Manifest, type Part } from './manifest';

async function intoEmptyFolder(folder: string): Promise<void> {
	await mkdir(folder, { recursive: true, mode: 0o700 });
	if ((await readdir(folder)).length > 0)
		throw new BackupFault(`${folder} is not empty. Name a new folder for each backup.`);
}

/** Copies every kept file out of the store, wherever that is, and holds it against the hash it is kept by. */
async function copyFiles(folder: string): Promise<Part[]> {
	const store = await fileStore();
	const rows = await database().query<{ sha256: string }>(
		'SELECT sha256 FROM files WHERE deleted_at IS NULL ORDER BY sha256',
		{ type: QueryTypes.SELECT }
	);
	const parts: Part[] = [];
	for (const { sha256 } of rows) {
		const file = `files/${sha256.slice(0, 2)}/${sha256}`;
		await mkdir(dirname(join(folder, file)), { recursive: true });
		try {
			await pipeline(await store.open(sha256), createWriteStream(join(folder, file), { mode: 0o600 }));
		} catch (error) {
			throw new BackupFault(`The file ${sha256} cannot be read from the store: ${String(error)}`);
		}
		const part = await partOf(folder, file);
		if (part.sha256 !== sha256) throw new BackupFault(`The stored file ${sha256} is damaged.`);
		parts.push(part);
	}
	return parts;
}

/** Keys seal reports and sign sessions: without them old reports stay valid, and new ones come from a stranger. */
async function copyKeys(folder: string): Promise<Part[]> {
	const { keysFolder } = env();
	const parts: Part[] = [];
	for (const name of await filesBelow(keysFolder)) {
		const file = `keys/${name}`;
		await mkdir(dirname(join(folder, file)), { recursive: true, mode: 0o700 });
		await copyFile(join(keysFolder, name), join(folder, file));
		parts.push(await partOf(folder, file));
	}
	return parts;
}

async function newestMigration(): Promise<string> {
	const [row] = await database().query<{ name: string }>('SELECT MAX(name) AS name FROM migrations', {
		type: QueryTypes.SELECT
	});
	return row?.name ?? '';
}

/**
 * Writes database, files and keys into an empty folder, with the hash of each part. The database comes first: a file
 * is in the store before any row names it, so every file the dump names is there to be copied.
 */
export async function makeBackup(folder: string, now: Date): Promise<Manifest> {
	await intoEmptyFolder(folder);
	const { databaseUrl, databaseOwnerUrl } = env();
	await dumpDatabase(databaseOwnerUrl, join(folder, 'database.sql.gz'));
	const checkpoint = await AuditCheckpoint.findOne({
		order: [['seq', 'DESC']],
		attributes: ['seq', 'sha256']
	});
	const made: Manifest = {
		format: 1,
		madeAt: now.toISOString(),
		schema: await newestMigration(),
		grants: databaseUrl === databaseOwnerUrl ? [] : await grantsOfApp(database()),
		checkpoint: checkpoint && { seq: checkpoint.seq, sha256: checkpoint.sha256 },
		parts: [
			await partOf(folder, 'database.sql.gz'),
			...(await copyFiles(folder)),
			...(await copyKeys(folder))
		]
	};
	await writeFile(
		join(folder, 'SHA256SUMS'),
		made.parts.map(({ sha256, file }) => `${sha256}  ${file}\n`).join(''),
		{
			mode: 0o600
		}
	);
	// Last: a folder without it is no backup.
	await writeFile(join(folder, manifestName), `${JSON.stringify(made, null, '\t')}\n`, { mode: 0o600 });
	return made;
}
