import { createHash } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { verifyAllChains, type Verified } from '../audit/verify';
import { database } from '../db/sequelize';
import { fileStore } from '../storage/store';
import type { Manifest } from './manifest';

async function sha256InStore(sha256: string): Promise<string | null> {
	const hash = createHash('sha256');
	try {
		for await (const chunk of await (await fileStore()).open(sha256)) hash.update(chunk);
	} catch {
		return null;
	}
	return hash.digest('hex');
}

/** Holds a restored place against itself: chains, the checkpoint the backup named, and every file by its hash. */
export async function checkRestored({
	checkpoint
}: Manifest): Promise<Verified & { damagedFiles: string[] }> {
	const rows = await database().query<{ sha256: string }>(
		'SELECT sha256 FROM files WHERE deleted_at IS NULL',
		{
			type: QueryTypes.SELECT
		}
	);
	const damagedFiles: string[] = [];
	for (const { sha256 } of rows) if ((await sha256InStore(sha256)) !== sha256) damagedFiles.push(sha256);
	return { ...(await verifyAllChains(checkpoint)), damagedFiles };
}
