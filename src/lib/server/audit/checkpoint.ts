import { QueryTypes, UniqueConstraintError } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { AuditCheckpoint } from '../db/models/audit-checkpoint';
import { AuditChain } from '../db/models/audit-chain';
import { database } from '../db/sequelize';
import { sha256Hex } from '../storage/sha256';
import { emptyHeadSha256 } from './entry-text';

interface ChainHead {
	id: string;
	length: number;
	headSha256: string;
}

/** What a checkpoint's hash covers, one a line: number, moment, the one before, and the heads. */
export function checkpointText(checkpoint: {
	seq: number;
	madeAt: Date;
	previousSha256: string;
	heads: string;
}): string {
	const { seq, madeAt, previousSha256, heads } = checkpoint;
	return [seq, madeAt.toISOString(), previousSha256, heads].join('\n');
}

/** `chain length hash`, a chain a line. */
function headsText(heads: readonly ChainHead[]): string {
	return heads.map(({ id, length, headSha256 }) => `${id} ${length} ${headSha256}`).join('\n');
}

/**
 * Takes note of every chain that has grown since the checkpoint before, chained to that one: who later rewrites a
 * chain and its head would have to rewrite every checkpoint after it too. @returns its number, null when nothing grew
 */
export async function makeCheckpoint(now: Date): Promise<number | null> {
	const heads = await database().query<ChainHead>(
		`SELECT id, length, head_sha256 AS headSha256 FROM audit_chains WHERE length <> checkpointed_length ORDER BY id`,
		{ type: QueryTypes.SELECT }
	);
	if (heads.length === 0) return null;
	const last = await AuditCheckpoint.findOne({ order: [['seq', 'DESC']], attributes: ['seq', 'sha256'] });
	const checkpoint = {
		seq: (last?.seq ?? 0) + 1,
		madeAt: now,
		previousSha256: last?.sha256 ?? emptyHeadSha256,
		heads: headsText(heads)
	};
	try {
		await AuditCheckpoint.create({
			id: uuid(),
			...checkpoint,
			sha256: sha256Hex(checkpointText(checkpoint))
		});
	} catch (error) {
		// Another worker made this one; what grew since goes into the next.
		if (error instanceof UniqueConstraintError) return null;
		throw error;
	}
	// One by one and after the fact: a writer waits for none of it, and a crash here only names a head twice.
	for (const { id, length } of heads)
		await AuditChain.update({ checkpointedLength: length }, { where: { id } });
	return checkpoint.seq;
}
