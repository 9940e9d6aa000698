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

/** What a chain starts from. */
export const emptyHeadSha256 = '0'.repeat(64);

/** The fields an entry's hash covers, in this order, one a line. Verification builds the same text from the row. */
export function entryText(entry: {
	chainId: string;
	seq: number;
	type: string;
	actorId: string | null;
	actorKind: string;
	occurredAt: Date;
	requestId: string;
	address: string;
	payloadSha256: string;
	previousSha256: string;
}): string {
	const {
		chainId,
		seq,
		type,
		actorId,
		actorKind,
		occurredAt,
		requestId,
		address,
		payloadSha256,
		previousSha256
	} = entry;
	return [
		chainId,
		seq,
		type,
		actorId ?? '',
		actorKind,
		occurredAt.toISOString(),
		requestId,
		address,
		payloadSha256,
		previousSha256
	].join('\n');
}

// Not INSERT IGNORE: that leaves a shared lock, and two writers who both want more than that deadlock.
async function lockChain(
	chain: ChainName,
	transaction: Transaction
): Promise<{ length: number; headSha256: string }> {
	await database().query(
		'INSERT INTO audit_chains (id, scope, length, head_sha256) VALUES (?, ?, 0, ?) ON DUPLICATE KEY UPDATE id = id',
		{ replacements: [chain.id, chain.scope, emptyHeadSha256], transaction }
	);
	const [row] = await database().query<{ length: number; headSha256: string }>(
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
		let { length, headSha256 } = await lockChain(chain, transaction);
		for (const { type, data } of group) {
			const text = JSON.stringify(data);
			const entry = {
				id: uuid(),
				chainId,
				seq: ++length,
				type,
				...actorOf(ctx),
				occurredAt: ctx.now,
				requestId: ctx.requestId,
				address: ctx.address,
				payloadSha256: sha256Hex(text),
				previousSha256: headSha256
			};
			headSha256 = sha256Hex(entryText(entry));
			await AuditEntry.create({ ...entry, sha256: headSha256 }, { transaction });
			await AuditPayload.create({ entryId: entry.id, text }, { transaction });
		}
		await AuditChain.update({ length, headSha256 }, { where: { id: chainId }, transaction });
	}
}

function groupByChain(events: readonly AuditEvent[]): Map<string, AuditEvent[]> {
	const groups = new Map<string, AuditEvent[]>();
	for (const event of events) groups.set(event.chain.id, [...(groups.get(event.chain.id) ?? []), event]);
	return groups;
}
