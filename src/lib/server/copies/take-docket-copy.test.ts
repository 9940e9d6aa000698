import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { buffer } from 'node:stream/consumers';
import { parse } from 'csv-parse/sync';
import { unzipSync } from 'fflate';
import { v7 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { buildSeenLoad } from '../../../../tests/handlers/signed-load';
import { buildUser, contextFor, testNow } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { multipart } from '../../../../tests/helpers/upload';
import { makeCheckpoint } from '../audit/checkpoint';
import { AuditEntry } from '../db/models/audit-entry';
import { Disposition } from '../db/models/disposition';
import { inTransaction } from '../db/transaction';
import { addNote } from '../notes/add-note';
import { receiveNote } from '../notes/receive-note';
import { sha256Hex } from '../storage/sha256';
import { recordsCsv } from './records-csv';
import { takeDocketCopy } from './take-docket-copy';

useTestDatabase();

let load: Awaited<ReturnType<typeof buildSeenLoad>>;
let files: Record<string, Uint8Array>;
const folders: string[] = [];

const letter = '%PDF-1.4 a letter';
const frozen = '{"docket":{"number":"x"},"signature":{"meaning":"approval"}}';

beforeAll(async () => {
	load = await buildSeenLoad();
	const qa = await contextFor(load.people.qa);
	await addNote(qa, load.shipment.number, { id: uuid(), text: '=HYPERLINK("http://a.example")' });
	const sent = await multipart([{ name: 'letter (1).pdf', content: letter }], { text: 'The letter' });
	await receiveNote(qa, load.shipment.number, sent);
	await Disposition.create({
		id: uuid(),
		shipmentId: load.shipment.id,
		version: 1,
		verdict: 'accepted',
		amendmentReason: null,
		meaning: 'approval',
		signedBy: load.people.qa.id,
		signedName: load.people.qa.name,
		signedTitle: 'QA',
		signedAt: testNow,
		zone: 'UTC',
		frozen,
		frozenSha256: sha256Hex(frozen)
	});
	await inTransaction(qa, async ({ record }) =>
		record(
			'disposition.signed',
			{ scope: 'shipment', id: load.shipment.id },
			{
				dispositionId: uuid(),
				version: 1,
				verdict: 'accepted',
				meaning: 'approval',
				frozenSha256: sha256Hex(frozen),
				outcomes: [],
				amendmentReason: null
			}
		)
	);
	await makeCheckpoint(testNow);
	const { stream, fileName } = await takeDocketCopy(qa, load.shipment.number);
	expect(fileName).toBe(`${load.shipment.number}-copy.zip`);
	files = unzipSync(await buffer(stream));
}, 60_000);

afterAll(() => {
	for (const folder of folders) rmSync(folder, { recursive: true, force: true });
});

const textOf = (name: string) => Buffer.from(files[name] ?? []).toString('utf8');

/** What the copy's own script says of it, in a plain Node without anything of ours. */
function verified(changes: Record<string, string | null> = {}): { code: number | null; said: string } {
	const folder = mkdtempSync(join(tmpdir(), 'wharfinger-copy-'));
	folders.push(folder);
	for (const [name, bytes] of Object.entries(files)) {
		const change = changes[name];
		if (change === null) continue;
		mkdirSync(dirname(join(folder, name)), { recursive: true });
		writeFileSync(join(folder, name), change ?? bytes);
	}
	const { status, stdout, stderr } = spawnSync(process.execPath, ['verify.mjs'], {
		cwd: folder,
		env: { PATH: process.env.PATH ?? '' },
		encoding: 'utf8'
	});
	return { code: status, said: `${stdout}${stderr}` };
}

/** The copy with one file changed and its sums made right again: only the chain can tell. */
function withSums(name: string, text: string): Record<string, string> {
	const sums = textOf('SHA256SUMS').replace(
		new RegExp(`^.{64}(  ${name.replace(/[.]/g, '\\.')})$`, 'm'),
		`${sha256Hex(text)}$1`
	);
	return { [name]: text, SHA256SUMS: sums };
}

const lines = () => textOf('audit/entries.jsonl').trim().split('\n');
const joined = (rows: readonly string[]) => `${rows.join('\n')}\n`;

describe('a copy of a docket', () => {
	it('holds records as JSON and CSV, files, decisions, the trail and how to check it, each with its hash', () => {
		const names = Object.keys(files);
		for (const name of [
			'README.txt',
			'verify.mjs',
			'records.json',
			'records/shipments.csv',
			'records/notes.csv',
			'records/assessments.csv',
			'records/traces.csv',
			'decisions/version-1.json',
			'audit/entries.jsonl',
			'audit/entries.csv',
			'audit/head.json',
			'SHA256SUMS',
			'manifest.json'
		])
			expect(names).toContain(name);
		expect(names.some((name) => name.startsWith('exports/'))).toBe(true);
		expect(names.some((name) => name.startsWith('photographs/'))).toBe(true);
		expect(names.some((name) => name.startsWith('readings/'))).toBe(true);
		const manifest = JSON.parse(textOf('manifest.json'));
		expect(manifest.files).toHaveLength(names.length - 2);
		for (const { file, sha256, bytes } of manifest.files) {
			expect(sha256Hex(files[file] ?? new Uint8Array()), file).toBe(sha256);
			expect(files[file]?.byteLength).toBe(bytes);
		}
		expect(textOf('decisions/version-1.json')).toBe(frozen);
	});

	it('holds the files of notes byte for byte, named in its records and in the trail by hash', () => {
		const kept = Object.keys(files).filter((name) => /^notes\/\d+-letter_1_\.pdf$/.test(name));
		expect(kept.map(textOf)).toEqual([letter]);
		expect(JSON.parse(textOf('records.json')).note_files).toContainEqual(
			expect.objectContaining({ file_name: 'letter (1).pdf' })
		);
		expect(textOf('audit/entries.jsonl')).toContain(sha256Hex(letter));
	});

	it('holds every file its records name, also those of no other kind', () => {
		const { files: rows } = JSON.parse(textOf('records.json'));
		const held = Object.values(files).map((bytes) => sha256Hex(bytes));
		expect(
			rows.map(({ sha256 }: { sha256: string }) => sha256).filter((one: string) => !held.includes(one))
		).toEqual([]);
	});

	it('holds no password, session or token, and people by name and duty only', () => {
		const records = JSON.parse(textOf('records.json'));
		expect(Object.keys(records)).not.toEqual(expect.arrayContaining(['tokens']));
		expect(Object.keys(records.users[0])).toEqual(['id', 'name', 'title']);
		expect(textOf('records.json')).not.toContain('argon2');
		expect(records.shipments).toHaveLength(1);
		expect(records.shipments[0].number).toBe(load.shipment.number);
	});

	it('defuses formulas in its CSV, and spoils no figure', () => {
		const notes = parse(textOf('records/notes.csv'), { columns: true });
		expect(notes).toContainEqual(expect.objectContaining({ text: `'=HYPERLINK("http://a.example")` }));
		const csv = recordsCsv([{ a: -1.5, b: '-12.50', c: '-x', d: null, e: '+1', f: 'a,"b"' }]);
		expect(csv).toBe(`a,b,c,d,e,f\r\n-1.5,-12.50,'-x,,'+1,"a,""b"""\r\n`);
	});

	it('verifies by its own script with nothing but Node', () => {
		expect(verified()).toMatchObject({ code: 0, said: expect.stringContaining('Whole:') });
	});

	it('says in the trail that it was taken, also in itself', async () => {
		expect(await AuditEntry.count({ where: { chainId: load.shipment.id, type: 'copy.taken' } })).toBe(1);
		expect(textOf('audit/entries.jsonl')).toContain('copy.taken');
	});

	it.each([
		['a file changed', () => ({ 'records.json': '{}' }), /records\.json is not what was written/],
		['a file taken out', () => ({ 'records/notes.csv': null }), /records\/notes\.csv is missing/],
		[
			'an entry changed',
			() =>
				withSums(
					'audit/entries.jsonl',
					joined(
						lines().map((line, i) =>
							i === 1 ? line.replace('"address":"127.0.0.1"', '"address":"10.9.9.9"') : line
						)
					)
				),
			/audit entry 2 was changed/
		],
		[
			'what an entry says changed',
			() =>
				withSums(
					'audit/entries.jsonl',
					joined(lines().map((line, i) => (i === 0 ? line.replace('isSealIntact', 'isSealBroken') : line)))
				),
			/audit entry 1 says something else/
		],
		[
			'an entry taken out',
			() => withSums('audit/entries.jsonl', joined(lines().filter((_, i) => i !== 1))),
			/audit entry 2 is missing/
		],
		[
			'its last entry taken out',
			() => withSums('audit/entries.jsonl', joined(lines().slice(0, -1))),
			/does not end where its head says/
		],
		[
			'two entries swapped',
			() =>
				withSums('audit/entries.jsonl', joined([lines()[1] ?? '', lines()[0] ?? '', ...lines().slice(2)])),
			/audit entry 1 is missing/
		],
		[
			'a payload blanked',
			() =>
				withSums(
					'audit/entries.jsonl',
					joined(
						lines().map((line, i) =>
							i === 0 ? JSON.stringify({ ...JSON.parse(line), payload: null }) : line
						)
					)
				),
			/audit entry 1 was blanked/
		],
		[
			'a signed decision changed',
			() => withSums('decisions/version-1.json', frozen.replace('approval', 'review')),
			/not what was signed as version 1/
		]
	])('shows %s', (_, changes, message) => {
		const { code, said } = verified(changes() as Record<string, string | null>);
		expect(said).toMatch(message);
		expect(code).toBe(1);
	});

	it('is taken by QA and admins of that site only', async () => {
		const { number } = load.shipment;
		for (const who of ['dock', 'claims'] as const)
			await expect(takeDocketCopy(await contextFor(load.people[who]), number)).rejects.toMatchObject({
				code: 'not-allowed'
			});
		for (const who of ['far', 'supplier', 'stranger'] as const)
			await expect(takeDocketCopy(await contextFor(load.people[who]), number)).rejects.toMatchObject({
				code: expect.stringMatching(/^not-(found|allowed)$/)
			});
		const admin = await contextFor(await buildUser(['admin'], {}));
		await expect(takeDocketCopy(admin, number)).rejects.toMatchObject({ code: 'not-found' });
	});
});
