import { Op, type Transaction } from 'sequelize';
import { AuditCheckpoint } from '../db/models/audit-checkpoint';
import { sha256Hex } from '../storage/sha256';
import type { KnownHead } from './chain-walk';
import { checkpointText } from './checkpoint';
import { emptyHeadSha256 } from './entry-text';

export interface CheckpointFault {
	checkpoint: number;
	fault: 'checkpoint-changed' | 'checkpoint-missing' | 'checkpoint-not-as-known';
}

/** A checkpoint somebody wrote down elsewhere: its number and hash. */
export interface NotedCheckpoint {
	seq: number;
	sha256: string;
}

export interface WalkedCheckpoints {
	last: NotedCheckpoint | null;
	fault: CheckpointFault | null;
	/** What the checkpoints know of each chain. */
	heads: Map<string, KnownHead[]>;
}

const batchSize = 200;

function noteHeads(text: string, heads: WalkedCheckpoints['heads']): void {
	for (const line of text.split('\n')) {
		const [id = '', length = '', headSha256 = ''] = line.split(' ');
		const known = heads.get(id);
		const head = { length: Number(length), headSha256 };
		if (known) known.push(head);
		else heads.set(id, [head]);
	}
}

/** Walks the checkpoints from the first; what a broken one and those after it say counts no more. */
export async function walkCheckpoints(
	noted: NotedCheckpoint | null,
	transaction?: Transaction
): Promise<WalkedCheckpoints> {
	const walked: WalkedCheckpoints = { last: null, fault: null, heads: new Map() };
	for (let seq = 0; ;) {
		const rows = await AuditCheckpoint.findAll({
			where: { seq: { [Op.gt]: seq } },
			order: [['seq', 'ASC']],
			limit: batchSize,
			transaction
		});
		for (const row of rows) {
			const fault = faultOf(row, ++seq, walked.last?.sha256 ?? emptyHeadSha256, noted);
			if (fault) return { ...walked, fault: { checkpoint: seq, fault } };
			noteHeads(row.heads, walked.heads);
			walked.last = { seq: row.seq, sha256: row.sha256 };
		}
		if (rows.length < batchSize) break;
	}
	if (noted && noted.seq > (walked.last?.seq ?? 0))
		return { ...walked, fault: { checkpoint: (walked.last?.seq ?? 0) + 1, fault: 'checkpoint-missing' } };
	return walked;
}

function faultOf(
	row: AuditCheckpoint,
	seq: number,
	previousSha256: string,
	noted: NotedCheckpoint | null
): CheckpointFault['fault'] | null {
	if (row.seq !== seq) return 'checkpoint-missing';
	if (row.previousSha256 !== previousSha256 || sha256Hex(checkpointText(row)) !== row.sha256)
		return 'checkpoint-changed';
	return noted?.seq === seq && noted.sha256 !== row.sha256 ? 'checkpoint-not-as-known' : null;
}
