import type { Readable } from 'node:stream';
import { v7 as uuid } from 'uuid';
import type { Transaction } from 'sequelize';
import { StoredFile } from '../db/models/stored-file';
import { env, type Env } from '../env';
import { folderStore } from './folder-store';
import { sha256Hex } from './sha256';

/** Bytes by their SHA-256. Putting the same bytes twice is harmless. */
export interface Store {
	put(sha256: string, bytes: Uint8Array): Promise<void>;
	/** Takes a finished file from this machine's disk; the original stays. */
	putFile(sha256: string, path: string): Promise<void>;
	read(sha256: string): Promise<Buffer>;
	open(sha256: string): Promise<Readable>;
	/** Takes bytes away for good; harmless where they are gone already. */
	remove(sha256: string): Promise<void>;
}

let store: Promise<Store> | null = null;

/** A store of one kind: a folder, or a bucket. */
export function storeOf(storage: Env['storage']): Promise<Store> {
	return storage.kind === 'folder'
		? Promise.resolve(folderStore(storage.folder))
		: import('./s3-store').then(({ s3Store }) => s3Store(storage));
}

/** The configured store. */
export function fileStore(): Promise<Store> {
	store ??= storeOf(env().storage);
	return store;
}

/** Keeps bytes in the store, then names them. @returns the file's row, an existing one where the bytes are known. */
export async function keepBytes(
	bytes: Uint8Array,
	mediaType: string,
	now: Date
): Promise<{ id: string; sha256: string; bytes: number }> {
	const sha256 = sha256Hex(bytes);
	await (await fileStore()).put(sha256, bytes);
	return nameFile(sha256, bytes.byteLength, mediaType, now);
}

/** Names bytes that are in the store already. Safe beside another request that names the same. */
export async function nameFile(
	sha256: string,
	bytes: number,
	mediaType: string,
	now: Date,
	transaction?: Transaction
): Promise<{ id: string; sha256: string; bytes: number }> {
	const known = await StoredFile.findOne({ where: { sha256 }, transaction });
	if (known) {
		// Bytes that retention took away and somebody brought again are there again.
		if (known.deletedAt) await known.update({ deletedAt: null }, { transaction });
		return { id: known.id, sha256, bytes: known.bytes };
	}
	try {
		const made = await StoredFile.create(
			{ id: uuid(), sha256, bytes, mediaType, storedAt: now },
			{ transaction }
		);
		return { id: made.id, sha256, bytes };
	} catch (error) {
		const other = await StoredFile.findOne({ where: { sha256 }, transaction });
		if (!other) throw error;
		return { id: other.id, sha256, bytes: other.bytes };
	}
}
