import { QueryTypes, type Transaction } from 'sequelize';
import { storedEntries } from '../audit/verify';
import { AuditChain } from '../db/models/audit-chain';
import { database } from '../db/sequelize';

/** A docket's chain as text: one entry a line, what it hashes beside it, its payload as the very text that was hashed. */
export interface ChainCopy {
	entries: Record<string, string | number | null>[];
	head: { chainId: string; length: number; headSha256: string; checkpoints: Record<string, unknown>[] };
}

async function checkpointsOf(chainId: string, transaction: Transaction): Promise<Record<string, unknown>[]> {
	const rows = await database().query<{ seq: number; madeAt: Date; sha256: string; heads: string }>(
		`SELECT seq, made_at AS madeAt, sha256, heads FROM audit_checkpoints WHERE heads LIKE :like ORDER BY seq`,
		{ replacements: { like: `%${chainId} %` }, type: QueryTypes.SELECT, transaction }
	);
	return rows.flatMap(({ heads, ...checkpoint }) =>
		heads
			.split('\n')
			.filter((line) => line.startsWith(chainId))
			.map((line) => {
				const [, length, headSha256] = line.split(' ');
				return { ...checkpoint, length: Number(length), headSha256 };
			})
	);
}

export async function chainCopy(chainId: string, transaction: Transaction): Promise<ChainCopy> {
	const entries: ChainCopy['entries'] = [];
	for await (const { occurredAt, text, ...entry } of storedEntries(chainId, transaction))
		entries.push({ ...entry, occurredAt: occurredAt.toISOString(), payload: text ?? null });
	const head = await AuditChain.findByPk(chainId, { transaction });
	return {
		entries,
		head: {
			chainId,
			length: head?.length ?? 0,
			headSha256: head?.headSha256 ?? '',
			checkpoints: await checkpointsOf(chainId, transaction)
		}
	};
}
