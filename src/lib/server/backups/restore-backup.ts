import { copyFile, mkdir, readFile } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import { QueryTypes, type Sequelize } from 'sequelize';
import { accountOf, migrate } from '../db/migrate';
import { connect } from '../db/sequelize';
import type { Env } from '../env';
import type { Store } from '../storage/store';
import { loadDatabase } from './database-programs';
import { grantToApp } from './grants';
import { BackupFault, checkedManifest, filesBelow, type Manifest } from './manifest';

/** Where a backup is restored to. */
export interface Place {
	env: Pick<Env, 'databaseUrl' | 'databaseOwnerUrl' | 'keysFolder' | 'storage'>;
	store: Store;
}

async function tablesOf(owner: Sequelize): Promise<string[]> {
	const rows = await owner.query<{ name: string }>(
		"SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() AND table_type = 'BASE TABLE'",
		{ type: QueryTypes.SELECT }
	);
	return rows.map(({ name }) => name);
}

/** What is there already, in words; nothing in an empty place. */
async function whatIsThere(owner: Sequelize, { env }: Place): Promise<string[]> {
	const tables = await tablesOf(owner);
	const keys = await filesBelow(env.keysFolder);
	const files = env.storage.kind === 'folder' ? await filesBelow(env.storage.folder) : [];
	return [
		...(tables.length > 0 ? [`the database has ${tables.length} tables`] : []),
		...(keys.length > 0 ? [`${env.keysFolder} holds ${keys.length} keys`] : []),
		...(files.length > 0 ? [`the file store holds ${files.length} files`] : [])
	];
}

async function dropAll(owner: Sequelize): Promise<void> {
	const tables = await tablesOf(owner);
	if (tables.length === 0) return;
	await owner.transaction(async (transaction) => {
		await owner.query('SET foreign_key_checks = 0', { transaction });
		await owner.query(`DROP TABLE ${tables.map((name) => `\`${name}\``).join(', ')}`, { transaction });
		await owner.query('SET foreign_key_checks = 1', { transaction });
	});
}

async function restoreDatabase(
	folder: string,
	{ grants }: Manifest,
	{ env }: Place,
	owner: Sequelize
): Promise<void> {
	await loadDatabase(env.databaseOwnerUrl, join(folder, 'database.sql.gz'));
	const hasTwoAccounts = env.databaseOwnerUrl !== env.databaseUrl;
	if (hasTwoAccounts) {
		const database = new URL(env.databaseOwnerUrl).pathname.slice(1);
		await grantToApp(owner, database, await accountOf(env.databaseUrl), grants);
	}
	// A backup of an older version is brought up to date as that version would be.
	await migrate(env.databaseOwnerUrl, env.databaseUrl);
}

async function restoreFilesAndKeys(
	folder: string,
	{ parts }: Manifest,
	{ env, store }: Place
): Promise<void> {
	for (const { file } of parts) {
		if (file.startsWith('files/')) await store.put(basename(file), await readFile(join(folder, file)));
		if (!file.startsWith('keys/')) continue;
		const target = join(env.keysFolder, file.slice('keys/'.length));
		await mkdir(dirname(target), { recursive: true, mode: 0o700 });
		await copyFile(join(folder, file), target);
	}
}

/**
 * Brings a backup back into an empty place, once every part has been held against its hash. What is there already is
 * replaced only where `replaces` says so. @throws BackupFault
 */
export async function restoreBackup(folder: string, place: Place, replaces: boolean): Promise<Manifest> {
	const manifest = await checkedManifest(folder);
	const { databaseUrl, databaseOwnerUrl } = place.env;
	if (manifest.grants.length === 0 && databaseUrl !== databaseOwnerUrl)
		throw new BackupFault(
			'This backup comes from a place with one database account and says nothing of a second. Restore it with DATABASE_URL alone.'
		);
	const owner = connect(databaseOwnerUrl, 1);
	try {
		const there = await whatIsThere(owner, place);
		if (there.length > 0 && !replaces)
			throw new BackupFault(
				`This place is not empty: ${there.join('; ')}. Nothing was changed. Restore into an empty one, or replace all of it with RESTORE_REPLACES_EVERYTHING=yes.`
			);
		await dropAll(owner);
		await restoreDatabase(folder, manifest, place, owner);
	} finally {
		await owner.close();
	}
	await restoreFilesAndKeys(folder, manifest, place);
	return manifest;
}
