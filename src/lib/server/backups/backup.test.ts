import { randomBytes } from 'node:crypto';
import { appendFileSync, existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { QueryTypes, type Sequelize } from 'sequelize';
import { v7 as uuid } from 'uuid';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { pdfsig } from '../../../../tests/helpers/pdf-tools';
import {
	buildContact,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testPassword
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { makeCheckpoint } from '../audit/checkpoint';
import { systemContext } from '../context';
import { Arrival } from '../db/models/arrival';
import { Disposition } from '../db/models/disposition';
import { Report } from '../db/models/report';
import { StoredFile } from '../db/models/stored-file';
import { closeDatabase, connect, database, openDatabase } from '../db/sequelize';
import { inTransaction } from '../db/transaction';
import { evidenceSha256 } from '../dispositions/freeze';
import { signDisposition } from '../dispositions/sign-disposition';
import { getDocket } from '../dockets/get-docket';
import { env } from '../env';
import { ensureReport } from '../reports/make-report';
import { folderStore } from '../storage/folder-store';
import { checkRestored } from './check-restored';
import { makeBackup } from './make-backup';
import type { Manifest } from './manifest';
import { restoreBackup, type Place } from './restore-backup';

const { appUrl } = useTestDatabase();

const folder = mkdtempSync(join(tmpdir(), 'wharfinger-backup-'));
const backup = join(folder, 'backup');
const names: string[] = [];
let manifest: Manifest;
let reportSha256 = '';
let pdf: Buffer;

const select = (on: Sequelize, sql: string) => on.query(sql, { type: QueryTypes.SELECT });

/** A docket signed with its sealed report, as the product makes it. */
async function signedDocket(): Promise<void> {
	const site = await buildSite();
	const { shipment, lines, supplier } = await buildShipment({
		site,
		arrivedAt: testNow,
		title: 'Kirschen, naß & “süß” 🍒'
	});
	await buildContact(supplier);
	const qa = await buildUser(['qa'], { sites: [site] });
	const ctx = await contextFor(qa);
	await Arrival.create({
		id: uuid(),
		shipmentId: shipment.id,
		arrivedAt: testNow,
		isSealIntact: true,
		loggedBy: qa.id,
		loggedAt: testNow
	});
	await signDisposition(ctx, shipment.number, {
		lines: lines.map(({ id }) => ({
			lineId: id,
			outcome: 'reject' as const,
			condition: null,
			reason: 'warm'
		})),
		reasons: '',
		meaning: 'approval',
		password: testPassword,
		evidenceSha256: evidenceSha256(await getDocket(ctx, shipment.number)),
		amendmentReason: null,
		notify: true
	});
	const { id } = await Disposition.findOne({ where: { shipmentId: shipment.id }, rejectOnEmpty: true });
	const report = await ensureReport(systemContext(testNow), id);
	const file = await StoredFile.findByPk(report.fileId, { rejectOnEmpty: true });
	reportSha256 = file.sha256;
}

/** An empty database, store and key folder of its own, on the same server. */
async function emptyPlace(): Promise<Place> {
	const name = `wharfinger_${randomBytes(6).toString('hex')}`;
	names.push(name);
	const owner = connect(inject('ownerUrl'), 1);
	await owner.query(`CREATE DATABASE ${name} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
	await owner.close();
	const on = (url: string) => Object.assign(new URL(url), { pathname: `/${name}` }).href;
	const files = join(folder, name, 'files');
	return {
		env: {
			databaseUrl: on(inject('appUrl')),
			databaseOwnerUrl: on(inject('ownerUrl')),
			keysFolder: join(folder, name, 'keys'),
			storage: { kind: 'folder', folder: files }
		},
		store: folderStore(files)
	};
}

/** Works on another place's database, and comes back. */
async function within<Result>(place: Place, work: () => Promise<Result>): Promise<Result> {
	await closeDatabase();
	openDatabase(place.env.databaseUrl);
	try {
		return await work();
	} finally {
		await closeDatabase();
		openDatabase(appUrl());
	}
}

beforeAll(async () => {
	await signedDocket();
	await makeCheckpoint(testNow);
	manifest = await makeBackup(backup, testNow);
}, 120_000);

afterAll(async () => {
	const owner = connect(inject('ownerUrl'), 1);
	for (const name of names) await owner.query(`DROP DATABASE ${name}`);
	await owner.close();
	rmSync(folder, { recursive: true, force: true });
});

describe('a backup', () => {
	it('names each part with its hash, the keys among them, and the last checkpoint', () => {
		const files = manifest.parts.map(({ file }) => file);
		expect(files).toContain('database.sql.gz');
		expect(files).toContain(`files/${reportSha256.slice(0, 2)}/${reportSha256}`);
		expect(files).toContain('keys/organisation.p12');
		expect(files).toContain('keys/certificate-passphrase');
		expect(manifest.checkpoint).toMatchObject({ seq: 1 });
		const sums = readFileSync(join(backup, 'SHA256SUMS'), 'utf8');
		expect(sums.trim().split('\n')).toHaveLength(manifest.parts.length);
	});

	it('goes into an empty folder only', async () => {
		await expect(makeBackup(backup, testNow)).rejects.toThrow(/is not empty/);
	});

	it('restored into an empty place has every chain, every file by its hash and a report that verifies', async () => {
		const place = await emptyPlace();
		await restoreBackup(backup, place, false);
		pdf = await place.store.read(reportSha256);
		expect(pdfsig(pdf)).toContain('Signature is Valid');
		const before = await select(database(), 'SELECT * FROM audit_entries ORDER BY chain_id, seq');
		await within(place, async () => {
			expect(await Report.count()).toBe(1);
			const { faults, checkpointFault, unrecorded, chains } = await checkRestored(manifest);
			expect([faults, checkpointFault, unrecorded]).toEqual([[], null, []]);
			expect(chains).toBeGreaterThan(0);
			expect(await select(database(), 'SELECT * FROM audit_entries ORDER BY chain_id, seq')).toEqual(before);
			const titles = await select(database(), 'SELECT title FROM shipments');
			expect(titles).toEqual([{ title: 'Kirschen, naß & “süß” 🍒' }]);
		});
		expect(readFileSync(join(place.env.keysFolder, 'organisation.p12'))).toEqual(
			readFileSync(join(env().keysFolder, 'organisation.p12'))
		);
	});

	it('gives the app’s account the rights it had and no more', async () => {
		const place = await emptyPlace();
		await restoreBackup(backup, place, false);
		await within(place, async () => {
			await inTransaction(systemContext(testNow), async ({ record }) =>
				record('hold.put', { scope: 'shipment', id: uuid() }, { reason: 'x' })
			);
			for (const sql of ['DELETE FROM audit_entries', 'DELETE FROM dispositions', 'DROP TABLE reports'])
				await expect(database().query(sql)).rejects.toThrow(/denied/);
		});
	});

	it('is refused by a place that is not empty, and changes nothing there unless told to replace it', async () => {
		const place = await emptyPlace();
		const owner = connect(place.env.databaseOwnerUrl, 1);
		await owner.query('CREATE TABLE shipments (x INT)');
		await owner.query('INSERT INTO shipments VALUES (7)');
		await expect(restoreBackup(backup, place, false)).rejects.toThrow(/not empty: the database has 1 tables/);
		expect(await select(owner, 'SELECT x FROM shipments')).toEqual([{ x: 7 }]);
		await owner.close();
		await restoreBackup(backup, place, true);
		await within(place, async () => expect(await Report.count()).toBe(1));
	});

	it.each([
		['a key', 'keys/organisation.p12'],
		['the dump', 'database.sql.gz']
	])('with %s changed is refused before anything is done', async (_, file) => {
		const kept = readFileSync(join(backup, file));
		appendFileSync(join(backup, file), 'x');
		const place = await emptyPlace();
		await expect(restoreBackup(backup, place, false)).rejects.toThrow(`The backup is damaged: ${file}`);
		writeFileSync(join(backup, file), kept);
		expect(existsSync(place.env.keysFolder)).toBe(false);
	});

	it.each([
		['without its manifest', (at: string) => rmSync(join(at, 'manifest.json')), /There is no backup/],
		[
			'whose manifest is something else',
			(at: string) => writeFileSync(join(at, 'manifest.json'), '{}'),
			/is not one/
		],
		[
			'whose manifest is no JSON',
			(at: string) => writeFileSync(join(at, 'manifest.json'), '{'),
			/cannot be read/
		],
		[
			'that names a part outside',
			(at: string) =>
				writeFileSync(
					join(at, 'manifest.json'),
					JSON.stringify({ ...manifest, parts: [{ file: '../x', bytes: 0, sha256: 'a'.repeat(64) }] })
				),
			/outside the backup/
		]
	])('%s is refused', async (_, spoil, message) => {
		const kept = readFileSync(join(backup, 'manifest.json'));
		spoil(backup);
		await expect(restoreBackup(backup, await emptyPlace(), false)).rejects.toThrow(message);
		writeFileSync(join(backup, 'manifest.json'), kept);
	});

	it('is not made of a store that has lost a file', async () => {
		const path = join(env().dataFolder, 'files', reportSha256.slice(0, 2), reportSha256);
		const kept = readFileSync(path);
		writeFileSync(path, 'other bytes');
		await expect(makeBackup(join(folder, 'damaged'), testNow)).rejects.toThrow(/is damaged/);
		rmSync(path);
		await expect(makeBackup(join(folder, 'lost'), testNow)).rejects.toThrow(/cannot be read/);
		expect(existsSync(join(folder, 'lost', 'manifest.json'))).toBe(false);
		writeFileSync(path, kept);
	});
});
