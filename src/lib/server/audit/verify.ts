import { Op } from 'sequelize';
import { AuditChain } from '../db/models/audit-chain';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { sha256Hex } from '../storage/sha256';
import { emptyHeadSha256, entryText } from './append';

/** The first thing wrong with a chain, or null. */
export interface ChainFault {
	chainId: string;
	seq: number;
	fault: 'entry-changed' | 'entry-missing' | 'payload-changed' | 'head-differs';
}

const batchSize = 1000;

/** Walks one chain from its start. A payload that was blanked is allowed: the entry keeps its hash. */
export async function verifyChain(chainId: string): Promise<ChainFault | null> {
	let previousSha256 = emptyHeadSha256;
	let seq = 0;
	for (;;) {
		const entries = await AuditEntry.findAll({
			where: { chainId, seq: { [Op.gt]: seq } },
			order: [['seq', 'ASC']],
			limit: batchSize
		});
		if (entries.length === 0) break;
		const payloads = await AuditPayload.findAll({ where: { entryId: entries.map((entry) => entry.id) } });
		const texts = new Map(payloads.map((payload) => [payload.entryId, payload.text]));
		for (const entry of entries) {
			if (entry.seq !== ++seq) return { chainId, seq, fault: 'entry-missing' };
			const isSame = entry.previousSha256 === previousSha256 && sha256Hex(entryText(entry)) === entry.sha256;
			if (!isSame) return { chainId, seq, fault: 'entry-changed' };
			const text = texts.get(entry.id);
			if (text === undefined) return { chainId, seq, fault: 'payload-changed' };
			if (text !== null && sha256Hex(text) !== entry.payloadSha256)
				return { chainId, seq, fault: 'payload-changed' };
			previousSha256 = entry.sha256;
		}
	}
	const head = await AuditChain.findByPk(chainId);
	if (head && (head.headSha256 !== previousSha256 || head.length !== seq))
		return { chainId, seq, fault: 'head-differs' };
	return null;
}

/** Verifies every chain; the first fault of each broken one. */
export async function verifyAllChains(): Promise<{ chains: number; faults: ChainFault[] }> {
	const chains = await AuditChain.findAll({ attributes: ['id'], order: [['id', 'ASC']] });
	const faults: ChainFault[] = [];
	for (const { id } of chains) {
		const fault = await verifyChain(id);
		if (fault) faults.push(fault);
	}
	return { chains: chains.length, faults };
}
