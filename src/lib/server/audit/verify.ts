import { QueryTypes, Transaction } from 'sequelize';
import { AuditChain } from '../db/models/audit-chain';
import { database } from '../db/sequelize';
import { ChainWalk, type ChainFault, type KnownHead, type StoredEntry } from './chain-walk';
import { signaturesWithoutEntry, type UnrecordedSignature } from './unrecorded';
import { walkCheckpoints, type CheckpointFault, type NotedCheckpoint } from './verify-checkpoints';

const batchSize = 5_000;

/** A chain's entries from the oldest, in batches, each with its stored text. */
export async function* storedEntries(
	chainId: string,
	transaction?: Transaction
): AsyncGenerator<StoredEntry> {
	for (let seq = 0; ;) {
		const rows = await database().query<StoredEntry & { hasPayload: number }>(
			`SELECT e.chain_id AS chainId, e.seq, e.type, e.actor_id AS actorId, e.actor_kind AS actorKind,
				e.session_kind AS sessionKind, e.occurred_at AS occurredAt, e.request_id AS requestId, e.address,
				e.payload_sha256 AS payloadSha256, e.previous_sha256 AS previousSha256, e.sha256, p.text,
				p.entry_id IS NOT NULL AS hasPayload
			FROM audit_entries e LEFT JOIN audit_payloads p ON p.entry_id = e.id
			WHERE e.chain_id = :chainId AND e.seq > :seq ORDER BY e.seq LIMIT :batchSize`,
			{ replacements: { chainId, seq, batchSize }, type: QueryTypes.SELECT, transaction }
		);
		for (const { hasPayload, text, occurredAt, ...row } of rows) {
			seq = row.seq;
			yield { ...row, occurredAt: new Date(occurredAt), text: Number(hasPayload) ? text : undefined };
		}
		if (rows.length < batchSize) return;
	}
}

/** Walks one chain from its start to its head, past what checkpoints know of it. A payload that retention blanked is allowed. */
export async function verifyChain(
	chainId: string,
	checkpoints: readonly KnownHead[] = [],
	transaction?: Transaction
): Promise<ChainFault | null> {
	const walk = new ChainWalk(chainId, checkpoints);
	for await (const entry of storedEntries(chainId, transaction)) {
		const fault = walk.take(entry);
		if (fault) return fault;
	}
	return walk.end(await AuditChain.findByPk(chainId, { transaction }));
}

export interface Verified {
	chains: number;
	/** The first fault of each broken chain, with what the chain is about. */
	faults: (ChainFault & { about: string })[];
	checkpointFault: CheckpointFault | null;
	lastCheckpoint: NotedCheckpoint | null;
	unrecorded: UnrecordedSignature[];
}

/** Every chain anything knows of: heads, entries and checkpoints, so that none vanishes with its row. */
async function chainIds(known: Iterable<string>, transaction: Transaction): Promise<string[]> {
	const rows = await database().query<{ id: string }>(
		'SELECT id FROM audit_chains UNION SELECT DISTINCT chain_id FROM audit_entries',
		{ type: QueryTypes.SELECT, transaction }
	);
	return [...new Set([...rows.map(({ id }) => id), ...known])].sort();
}

async function aboutOf(chainId: string, transaction: Transaction): Promise<string> {
	const [row] = await database().query<{ about: string | null }>(
		`SELECT COALESCE((SELECT number FROM shipments WHERE id = :chainId), (SELECT name FROM sites WHERE id = :chainId),
			(SELECT email FROM users WHERE id = :chainId), (SELECT name FROM organisations WHERE id = :chainId)) AS about`,
		{ replacements: { chainId }, type: QueryTypes.SELECT, transaction }
	);
	return row?.about ?? chainId;
}

/**
 * Walks the checkpoints and every chain in one snapshot, so that a running server does not disturb it.
 * @param noted a checkpoint written down elsewhere, which must still be there unchanged
 */
export async function verifyAllChains(noted: NotedCheckpoint | null = null): Promise<Verified> {
	const isolationLevel = Transaction.ISOLATION_LEVELS.REPEATABLE_READ;
	return database().transaction({ isolationLevel }, async (transaction) => {
		const { heads, fault, last } = await walkCheckpoints(noted, transaction);
		const ids = await chainIds(heads.keys(), transaction);
		const faults: Verified['faults'] = [];
		for (const id of ids) {
			const found = await verifyChain(id, heads.get(id), transaction);
			if (found) faults.push({ ...found, about: await aboutOf(id, transaction) });
		}
		const unrecorded = await signaturesWithoutEntry(transaction);
		return { chains: ids.length, faults, checkpointFault: fault, lastCheckpoint: last, unrecorded };
	});
}
