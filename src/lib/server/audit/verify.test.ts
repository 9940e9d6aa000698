import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { buildShipment, buildUser, testNow } from '../../../../tests/helpers/factories';
import { sha256Hex } from '../storage/sha256';
import { systemContext } from '../context';
import { Disposition } from '../db/models/disposition';
import { connect, database } from '../db/sequelize';
import { inTransaction } from '../db/transaction';
import { makeCheckpoint } from './checkpoint';
import { emptyHeadSha256, entryText } from './entry-text';
import { storedEntries, verifyAllChains, verifyChain } from './verify';

const { ownerUrl } = useTestDatabase();
const ctx = systemContext(new Date('2026-04-03T07:35:00.123Z'));

/** A chain of some entries, for somebody with all rights to work on. */
async function chainOf(length: number): Promise<string> {
	const id = uuid();
	await inTransaction(ctx, async ({ record }) => {
		for (let i = 1; i <= length; i++)
			record('hold.put', { scope: 'shipment', id }, { reason: `reason ${i}` });
	});
	return id;
}

/** Statements run by the database's owner, who is not held back by grants or keys. */
async function asOwner(statements: readonly string[], chain: string): Promise<void> {
	const owner = connect(ownerUrl(), 1);
	await owner.query('SET foreign_key_checks = 0');
	for (const sql of statements) await owner.query(sql, { replacements: { chain } });
	await owner.close();
}

/** Every hash from `fromSeq` on worked out anew, as somebody would who knows how the chain is made. */
async function rehash(chain: string, fromSeq: number): Promise<void> {
	let previous = emptyHeadSha256;
	const updates: string[] = [];
	for await (const entry of storedEntries(chain)) {
		if (entry.seq >= fromSeq) {
			const payloadSha256 = sha256Hex(entry.text ?? '');
			const sha256 = sha256Hex(entryText({ ...entry, payloadSha256, previousSha256: previous }));
			updates.push(
				`UPDATE audit_entries SET payload_sha256 = '${payloadSha256}', previous_sha256 = '${previous}', sha256 = '${sha256}' WHERE chain_id = :chain AND seq = ${entry.seq}`
			);
			previous = sha256;
		} else previous = entry.sha256;
	}
	updates.push(`UPDATE audit_chains SET head_sha256 = '${previous}' WHERE id = :chain`);
	await asOwner(updates, chain);
}

const entry = (seq: number) => `(SELECT id FROM audit_entries WHERE chain_id = :chain AND seq = ${seq})`;
const at = (seq: number) => `WHERE chain_id = :chain AND seq = ${seq}`;

/** What somebody with all rights on the database might do to a chain of six entries, and what verifying must say. */
const crimes: { what: string; sql: string[]; seq: number; fault: string }[] = [
	{
		what: 'a changed payload',
		sql: [`UPDATE audit_payloads SET text = '{"reason":"kinder"}' WHERE entry_id = ${entry(3)}`],
		seq: 3,
		fault: 'payload-changed'
	},
	{
		what: 'a payload changed with its hash',
		sql: [
			`UPDATE audit_payloads SET text = '{}' WHERE entry_id = ${entry(3)}`,
			`UPDATE audit_entries SET payload_sha256 = SHA2('{}', 256) ${at(3)}`
		],
		seq: 3,
		fault: 'entry-changed'
	},
	{
		what: 'a changed actor',
		sql: [`UPDATE audit_entries SET actor_id = UUID() ${at(2)}`],
		seq: 2,
		fault: 'entry-changed'
	},
	{
		what: 'a changed kind of session',
		sql: [`UPDATE audit_entries SET session_kind = 'password' ${at(2)}`],
		seq: 2,
		fault: 'entry-changed'
	},
	{
		what: 'a kind of session taken out',
		sql: [`UPDATE audit_entries SET session_kind = NULL ${at(2)}`],
		seq: 2,
		fault: 'entry-changed'
	},
	{
		what: 'a time changed by a millisecond',
		sql: [`UPDATE audit_entries SET occurred_at = occurred_at + INTERVAL 1000 MICROSECOND ${at(4)}`],
		seq: 4,
		fault: 'entry-changed'
	},
	{
		what: 'a changed address',
		sql: [`UPDATE audit_entries SET address = '10.0.0.9' ${at(1)}`],
		seq: 1,
		fault: 'entry-changed'
	},
	{
		what: 'a deleted first entry',
		sql: [`DELETE FROM audit_entries ${at(1)}`],
		seq: 1,
		fault: 'entry-missing'
	},
	{
		what: 'a deleted entry in the middle',
		sql: [`DELETE FROM audit_entries ${at(3)}`],
		seq: 3,
		fault: 'entry-missing'
	},
	{
		what: 'a deleted entry in the middle, the others moved up',
		sql: [
			`DELETE FROM audit_entries ${at(3)}`,
			...[4, 5, 6].map((n) => `UPDATE audit_entries SET seq = ${n - 1} ${at(n)}`)
		],
		seq: 3,
		fault: 'entry-changed'
	},
	{
		what: 'a deleted last entry',
		sql: [`DELETE FROM audit_entries ${at(6)}`],
		seq: 6,
		fault: 'tail-missing'
	},
	{
		what: 'all entries deleted',
		sql: ['DELETE FROM audit_entries WHERE chain_id = :chain'],
		seq: 1,
		fault: 'tail-missing'
	},
	{
		what: 'two entries that changed places',
		sql: [
			`UPDATE audit_entries SET seq = 99 ${at(3)}`,
			`UPDATE audit_entries SET seq = 3 ${at(4)}`,
			`UPDATE audit_entries SET seq = 4 ${at(99)}`
		],
		seq: 3,
		fault: 'entry-changed'
	},
	{
		what: 'an entry added behind the head',
		sql: [
			`INSERT INTO audit_entries SELECT UUID(), chain_id, 7, type, actor_id, actor_kind, session_kind, occurred_at, request_id, address, payload_sha256, previous_sha256, sha256 FROM audit_entries ${at(6)}`
		],
		seq: 7,
		fault: 'entry-changed'
	},
	{
		what: 'a head moved back',
		sql: ['UPDATE audit_chains SET length = 4 WHERE id = :chain'],
		seq: 5,
		fault: 'entry-added'
	},
	{
		what: 'a head that names another hash',
		sql: ["UPDATE audit_chains SET head_sha256 = REPEAT('a', 64) WHERE id = :chain"],
		seq: 6,
		fault: 'head-differs'
	},
	{
		what: 'a head taken away',
		sql: ['DELETE FROM audit_chains WHERE id = :chain'],
		seq: 6,
		fault: 'head-missing'
	},
	{
		what: 'a payload taken away',
		sql: [`DELETE FROM audit_payloads WHERE entry_id = ${entry(2)}`],
		seq: 2,
		fault: 'payload-missing'
	},
	{
		what: 'a payload blanked behind the back of retention',
		sql: [`UPDATE audit_payloads SET text = NULL WHERE entry_id = ${entry(2)}`],
		seq: 2,
		fault: 'payload-blanked'
	}
];

describe('verifying a chain', () => {
	it.each(crimes)('names $what: entry $seq, $fault', async ({ sql, seq, fault }) => {
		const chain = await chainOf(6);
		expect(await verifyChain(chain)).toBeNull();
		await asOwner(sql, chain);
		expect(await verifyChain(chain)).toEqual({ chainId: chain, seq, fault });
	});

	it('names an entry put in between, made well in itself and the others moved down', async () => {
		const chain = await chainOf(4);
		await asOwner(
			[`UPDATE audit_entries SET seq = 99 ${at(3)}`, `UPDATE audit_entries SET seq = 98 ${at(4)}`],
			chain
		);
		const forged = {
			chainId: chain,
			seq: 3,
			type: 'hold.lifted',
			actorId: null,
			actorKind: 'system',
			sessionKind: 'program',
			occurredAt: ctx.now,
			requestId: 'system',
			address: 'local',
			payloadSha256: sha256Hex('{}'),
			previousSha256: sha256Hex('a guess')
		};
		const owner = connect(ownerUrl(), 1);
		await owner.query(
			`INSERT INTO audit_entries (id, chain_id, seq, type, actor_kind, session_kind, occurred_at, request_id, address, payload_sha256, previous_sha256, sha256)
			 VALUES (UUID(), :chainId, 3, :type, 'system', 'program', '2026-04-03 07:35:00.123', 'system', 'local', :payloadSha256, :previousSha256, :sha256)`,
			{ replacements: { ...forged, sha256: sha256Hex(entryText(forged)) } }
		);
		await owner.close();
		expect(await verifyChain(chain)).toEqual({ chainId: chain, seq: 3, fault: 'not-following' });
	});

	it('takes entries from before sessions were kept, whose hashes cover none', async () => {
		const chain = await chainOf(3);
		await asOwner(['UPDATE audit_entries SET session_kind = NULL WHERE chain_id = :chain'], chain);
		expect(await verifyChain(chain)).toMatchObject({ seq: 1, fault: 'entry-changed' });
		await rehash(chain, 1);
		expect(await verifyChain(chain)).toBeNull();
	});
});

describe('verifying everything', () => {
	it('finds a chain written anew with all its hashes, by the checkpoint that knew it', async () => {
		const chain = await chainOf(5);
		await makeCheckpoint(testNow);
		await asOwner(
			[`UPDATE audit_payloads SET text = '{"reason":"kinder"}' WHERE entry_id = ${entry(4)}`],
			chain
		);
		await rehash(chain, 4);
		expect(await verifyChain(chain)).toBeNull();
		const { faults } = await verifyAllChains();
		expect(faults.find(({ chainId }) => chainId === chain)).toMatchObject({
			seq: 5,
			fault: 'checkpoint-differs'
		});
	});

	it('finds a tail taken off together with its head, by the checkpoint', async () => {
		const chain = await chainOf(5);
		await makeCheckpoint(testNow);
		await asOwner(
			[
				`DELETE FROM audit_entries WHERE chain_id = :chain AND seq > 3`,
				`UPDATE audit_chains SET length = 3, head_sha256 = (SELECT sha256 FROM audit_entries ${at(3)}) WHERE id = :chain`
			],
			chain
		);
		expect(await verifyChain(chain)).toBeNull();
		const { faults } = await verifyAllChains();
		expect(faults.find(({ chainId }) => chainId === chain)).toMatchObject({ seq: 4, fault: 'tail-missing' });
	});

	it('finds a chain that vanished with its head, by the checkpoint', async () => {
		const chain = await chainOf(2);
		await makeCheckpoint(testNow);
		await asOwner(
			['DELETE FROM audit_entries WHERE chain_id = :chain', 'DELETE FROM audit_chains WHERE id = :chain'],
			chain
		);
		const { faults } = await verifyAllChains();
		expect(faults.find(({ chainId }) => chainId === chain)).toMatchObject({ seq: 0, fault: 'head-missing' });
	});

	it('names the docket, and a signature whose entry vanished', async () => {
		const { shipment } = await buildShipment();
		const signer = await buildUser(['qa']);
		await inTransaction(ctx, async ({ record }) =>
			record('hold.put', { scope: 'shipment', id: shipment.id }, { reason: 'x' })
		);
		await asOwner([`UPDATE audit_entries SET address = 'elsewhere' ${at(1)}`], shipment.id);
		await Disposition.create({
			id: uuid(),
			shipmentId: shipment.id,
			version: 1,
			verdict: 'accepted',
			amendmentReason: null,
			meaning: 'approval',
			signedBy: signer.id,
			signedName: 'x',
			signedTitle: '',
			signedAt: testNow,
			zone: 'UTC',
			frozen: '{}',
			frozenSha256: sha256Hex('{}')
		});
		const { faults, unrecorded } = await verifyAllChains();
		expect(faults).toContainEqual({
			chainId: shipment.id,
			seq: 1,
			fault: 'entry-changed',
			about: shipment.number
		});
		expect(unrecorded).toContainEqual({ docket: shipment.number, version: 1 });
	});

	it('names every chain once the table of entries has been emptied', async () => {
		const chains = [await chainOf(1), await chainOf(2)];
		await asOwner(['TRUNCATE audit_entries'], '');
		const { faults } = await verifyAllChains();
		for (const chainId of chains)
			expect(faults).toContainEqual(expect.objectContaining({ chainId, seq: 1, fault: 'tail-missing' }));
	});
});

describe('checkpoints', () => {
	it('take note of what grew, once, and are chained themselves', async () => {
		const chain = await chainOf(1);
		const first = await makeCheckpoint(testNow);
		expect(await makeCheckpoint(testNow)).toBeNull();
		await inTransaction(ctx, async ({ record }) =>
			record('hold.put', { scope: 'shipment', id: chain }, { reason: 'y' })
		);
		expect(await makeCheckpoint(testNow)).toBe((first ?? 0) + 1);
		expect((await verifyAllChains()).checkpointFault).toBeNull();
	});

	it('are made once by many workers at the same moment', async () => {
		const before = (await verifyAllChains()).lastCheckpoint?.seq ?? 0;
		await chainOf(1);
		const made = await Promise.all([1, 2, 3, 4].map(() => makeCheckpoint(testNow)));
		expect(Math.max(...made.map((seq) => seq ?? 0))).toBeGreaterThan(before);
		expect((await verifyAllChains()).checkpointFault).toBeNull();
	});

	it('are held against one noted elsewhere', async () => {
		await chainOf(1);
		await makeCheckpoint(testNow);
		const last = (await verifyAllChains()).lastCheckpoint;
		if (!last) throw new Error('There is no checkpoint.');
		expect((await verifyAllChains(last)).checkpointFault).toBeNull();
		expect((await verifyAllChains({ ...last, sha256: sha256Hex('another') })).checkpointFault).toEqual({
			checkpoint: last.seq,
			fault: 'checkpoint-not-as-known'
		});
		expect((await verifyAllChains({ ...last, seq: last.seq + 1 })).checkpointFault).toEqual({
			checkpoint: last.seq + 1,
			fault: 'checkpoint-missing'
		});
	});

	it.each([
		[
			'a head in it rewritten',
			"UPDATE audit_checkpoints SET heads = CONCAT(heads, ' ') WHERE seq = 1",
			'checkpoint-changed'
		],
		['one taken out', 'DELETE FROM audit_checkpoints WHERE seq = 1', 'checkpoint-missing']
	])('show %s', async (_, sql, fault) => {
		await asOwner([sql], '');
		expect((await verifyAllChains()).checkpointFault).toEqual({ checkpoint: 1, fault });
	});
});

describe('the application’s database account', () => {
	const tables = ['audit_entries', 'audit_payloads', 'audit_checkpoints', 'audit_chains'];
	const changes = tables.flatMap((table) => [
		`DELETE FROM ${table}`,
		`TRUNCATE ${table}`,
		`DROP TABLE ${table}`,
		`ALTER TABLE ${table} ADD COLUMN x INT`,
		`RENAME TABLE ${table} TO elsewhere`,
		`CREATE TRIGGER t BEFORE INSERT ON ${table} FOR EACH ROW SET @x = 1`
	]);
	const updates = [
		"UPDATE audit_entries SET type = 'x'",
		"UPDATE audit_entries SET occurred_at = '2020-01-01'",
		"UPDATE audit_checkpoints SET sha256 = ''",
		'UPDATE audit_payloads SET entry_id = UUID()',
		'REPLACE INTO audit_entries (id) VALUES (UUID())',
		'GRANT DELETE ON audit_entries TO CURRENT_USER',
		'SET GLOBAL general_log = 1'
	];
	it.each([...changes, ...updates])('may not: %s', async (sql) => {
		await expect(database().query(sql)).rejects.toThrow(/denied/);
	});
});
