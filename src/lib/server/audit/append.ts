import type { Transaction } from 'sequelize';
import { QueryTypes } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { sha256Hex } from '../storage/sha256';
import { isSystem, type Context } from '../context';
import { database } from '../db/sequelize';
import { AuditChain } from '../db/models/audit-chain';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import type { AuditEvent, ChainName } from './catalogue';
import { emptyHeadSha256, entryText } from './entry-text';

/** Rows written by one statement. */
const rowsAtOnce = 500;

interface Head {
	length: number;
	headSha256: string;
}

// Not INSERT IGNORE: that leaves a shared lock, and two writers who both want more than that deadlock.
async function lockChain(chain: ChainName, transaction: Transaction): Promise<Head> {
	await database().query(
		'INSERT INTO audit_chains (id, scope, length, head_sha256) VALUES (?, ?, 0, ?) ON DUPLICATE KEY UPDATE length = length',
		{ replacements: [chain.id, chain.scope, emptyHeadSha256], transaction }
	);
	const [row] = await database().query<Head>(
		'SELECT length, head_sha256 AS headSha256 FROM audit_chains WHERE id = ? FOR UPDATE',
		{ replacements: [chain.id], transaction, type: QueryTypes.SELECT }
	);
	if (!row) throw new Error(`The audit chain ${chain.id} is missing.`);
	return row;
}

function actorOf({ actor }: Context): { actorId: string | null; actorKind: 'user' | 'link' | 'system' } {
	if (isSystem(actor)) return { actorId: null, actorKind: 'system' };
	return { actorId: actor.id, actorKind: actor.kind };
}

/** The entries that follow a chain's head, each hashed over the one before. */
function chained(ctx: Context, chainId: string, head: Head, events: readonly AuditEvent[]) {
	let previousSha256 = head.headSha256;
	return events.map(({ type, data }, index) => {
		const text = JSON.stringify(data);
		const entry = {
			id: uuid(),
			chainId,
			seq: head.length + index + 1,
			type,
			...actorOf(ctx),
			sessionKind: ctx.sessionKind ?? null,
			occurredAt: ctx.now,
			requestId: ctx.requestId,
			address: ctx.address,
			payloadSha256: sha256Hex(text),
			previousSha256
		};
		previousSha256 = sha256Hex(entryText(entry));
		return { entry: { ...entry, sha256: previousSha256 }, text };
	});
}

/** Appends the events of one transaction to their chains, chains in one order so that two writers never deadlock. */
export async function appendEvents(
	ctx: Context,
	events: readonly AuditEvent[],
	transaction: Transaction
): Promise<void> {
	const byChain = groupByChain(events);
	for (const chainId of [...byChain.keys()].sort()) {
		const group = byChain.get(chainId) ?? [];
		const chain = group[0]?.chain;
		if (!chain) continue;
		const head = await lockChain(chain, transaction);
		const added = chained(ctx, chainId, head, group);
		for (let from = 0; from < added.length; from += rowsAtOnce) {
			const rows = added.slice(from, from + rowsAtOnce);
			await AuditEntry.bulkCreate(
				rows.map(({ entry }) => entry),
				{ transaction }
			);
			await AuditPayload.bulkCreate(
				rows.map(({ entry, text }) => ({ entryId: entry.id, text })),
				{ transaction }
			);
		}
		const length = head.length + added.length;
		const headSha256 = added.at(-1)?.entry.sha256 ?? head.headSha256;
		await AuditChain.update({ length, headSha256 }, { where: { id: chainId }, transaction });
	}
}

function groupByChain(events: readonly AuditEvent[]): Map<string, AuditEvent[]> {
	const groups = new Map<string, AuditEvent[]>();
	for (const event of events) {
		const group = groups.get(event.chain.id);
		if (group) group.push(event);
		else groups.set(event.chain.id, [event]);
	}
	return groups;
}
