import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { systemContext } from '../context';
import { Job } from '../db/models/job';
import { AuditEntry } from '../db/models/audit-entry';
import { connect, database } from '../db/sequelize';
import { inTransaction } from '../db/transaction';
import { verifyChain } from './verify';

const { ownerUrl } = useTestDatabase();
const ctx = systemContext(new Date('2026-04-03T07:35:00.123Z'));

describe('an audit chain', () => {
	it('holds what was recorded, in order, and verifies', async () => {
		const id = uuid();
		await inTransaction(ctx, async ({ record }) => {
			record('hold.put', { scope: 'shipment', id }, { reason: 'E2 is critical' });
			record('hold.lifted', { scope: 'shipment', id }, { holdId: uuid() });
		});
		const entries = await AuditEntry.findAll({ where: { chainId: id }, order: ['seq'] });
		expect(entries.map((entry) => entry.type)).toEqual(['hold.put', 'hold.lifted']);
		expect(entries[0]?.occurredAt.toISOString()).toBe('2026-04-03T07:35:00.123Z');
		expect(await verifyChain(id)).toBeNull();
	});

	it('keeps nothing of a transaction that failed, neither entry nor job', async () => {
		const id = uuid();
		const failing = inTransaction(ctx, async ({ record, enqueue }) => {
			record('hold.put', { scope: 'shipment', id }, { reason: 'x' });
			enqueue('report', {}, id);
			throw new Error('broken');
		});
		await expect(failing).rejects.toThrow('broken');
		expect(await AuditEntry.count({ where: { chainId: id } })).toBe(0);
		expect(await Job.count({ where: { dedupeKey: id } })).toBe(0);
	});

	it('neither forks nor deadlocks under forty writers on five chains', async () => {
		const chains = Array.from({ length: 5 }, () => uuid());
		await Promise.all(
			Array.from({ length: 40 }, (_, writer) =>
				inTransaction(ctx, async ({ record }) => {
					for (const id of [chains[writer % 5], chains[(writer + 1) % 5]])
						record('hold.put', { scope: 'shipment', id: id ?? '' }, { reason: `writer ${writer}` });
				})
			)
		);
		for (const id of chains) {
			expect(await AuditEntry.count({ where: { chainId: id } })).toBe(16);
			expect(await verifyChain(id)).toBeNull();
		}
	});

	it('cannot be updated, deleted or truncated by the application account', async () => {
		for (const sql of [
			'UPDATE audit_entries SET type = "x"',
			'DELETE FROM audit_entries',
			'TRUNCATE audit_entries',
			'DROP TABLE audit_entries'
		])
			await expect(database().query(sql)).rejects.toThrow(/denied/);
	});

	it('names the first entry that somebody with more rights changed', async () => {
		const id = uuid();
		for (let i = 0; i < 3; i++)
			await inTransaction(ctx, async ({ record }) =>
				record('hold.put', { scope: 'shipment', id }, { reason: `r${i}` })
			);
		const owner = connect(ownerUrl(), 1);
		await owner.query("UPDATE audit_entries SET type = 'hold.lifted' WHERE chain_id = ? AND seq = 2", {
			replacements: [id]
		});
		await owner.close();
		expect(await verifyChain(id)).toEqual({ chainId: id, seq: 2, fault: 'entry-changed' });
	});
});
