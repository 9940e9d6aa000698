import { mkdir, readdir, utimes, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { v7 as uuid } from 'uuid';
import { beforeEach, describe, expect, it } from 'vitest';
import {
	buildOrganisation,
	buildShipment,
	buildSite,
	buildUser,
	contextFor
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { periodsOf, retentionForm, retentionRules } from '../../schemas/retention';
import { verifyAllChains } from '../audit/verify';
import { systemContext, type Context } from '../context';
import { Arrival } from '../db/models/arrival';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { Calibration } from '../db/models/calibration';
import { Claim } from '../db/models/claim';
import { ClaimFile } from '../db/models/claim-file';
import { Disposition } from '../db/models/disposition';
import { Job } from '../db/models/job';
import { Logger } from '../db/models/logger';
import { LoggerRead } from '../db/models/logger-read';
import { Note } from '../db/models/note';
import { NoteFile } from '../db/models/note-file';
import { Notice } from '../db/models/notice';
import { NoticeAnswer } from '../db/models/notice-answer';
import type { Shipment } from '../db/models/shipment';
import type { Site } from '../db/models/site';
import { StoredFile } from '../db/models/stored-file';
import type { User } from '../db/models/user';
import { env } from '../env';
import { sha256Hex } from '../storage/sha256';
import { inTransaction } from '../db/transaction';
import { openRawFile } from '../reads/open-raw-file';
import { fileStore, keepBytes } from '../storage/store';
import { liftRetentionHold, listRetentionHolds, putRetentionHold } from './holds';
import { getPeriods, savePeriods } from './periods';
import { previewRetention } from './preview-retention';
import { runRetention } from './run-retention';

useTestDatabase();

const decidedAt = new Date('2026-04-03T08:00:00Z');
const at = (instant: string): Context => systemContext(new Date(instant));
/** Uploads are kept 24 months from the decision, people 60. */
const beforeUploads = at('2028-04-03T07:59:59Z');
const afterUploads = at('2028-04-03T08:00:01Z');
const afterPeople = at('2031-04-03T08:00:01Z');

let site: Site;
let admin: Context;
let dock: User;

beforeEach(async () => {
	await buildOrganisation();
	site = await buildSite();
	admin = await contextFor(await buildUser(['admin'], { sites: [site] }));
	dock = await buildUser(['dock'], { sites: [site] });
});

async function addRead(
	shipment: Shipment,
	fileId: string,
	state: LoggerRead['state'] = 'ok'
): Promise<LoggerRead> {
	return LoggerRead.create({
		id: uuid(),
		shipmentId: shipment.id,
		fileId,
		part: 0,
		fileName: 'logger.csv',
		state,
		answers: {},
		readerVersion: '1',
		uploadedBy: dock.id,
		uploadedAt: decidedAt
	});
}

/** A decided docket with an upload and entries about people. */
async function oldDocket(changes: Partial<Shipment> = {}) {
	const { shipment } = await buildShipment({
		site,
		arrivedAt: decidedAt,
		decidedAt,
		verdict: 'accepted',
		...changes
	});
	const file = await keepBytes(Buffer.from(`export of ${shipment.number}`), 'text/csv', decidedAt);
	const read = await addRead(shipment, file.id);
	await inTransaction({ ...systemContext(decidedAt) }, async ({ record }) => {
		const chain = { scope: 'shipment', id: shipment.id } as const;
		record('shipment.created', chain, { number: shipment.number, by: 'hand' });
		record('arrival.logged', chain, {
			arrivedAt: decidedAt.toISOString(),
			sealFound: null,
			isSealIntact: true,
			setPointCelsius: 1,
			returnAirCelsius: 1,
			driverName: 'Marek Ostrowid'
		});
		record('note.written', chain, { noteId: uuid(), text: 'The driver was ill.' });
	});
	return { shipment, file, read };
}

/** An old docket whose rows speak of a driver and of somebody who answered. */
async function talkedOf() {
	const old = await oldDocket();
	const { shipment } = old;
	const signature = await keepBytes(Buffer.from(`signature ${uuid()}`), 'image/png', decidedAt);
	await Arrival.create({
		...{ id: uuid(), shipmentId: shipment.id, arrivedAt: decidedAt, isSealIntact: true },
		...{ sealFound: null, setPointCelsius: null, returnAirCelsius: null },
		...{
			driverName: 'Marek Ostrowid',
			driverSignatureId: signature.id,
			reservation: 'Signed by M. Ostrowid'
		},
		...{ loggedBy: dock.id, loggedAt: decidedAt }
	});
	const note = { id: uuid(), shipmentId: shipment.id, writtenBy: dock.id, writtenAt: decidedAt };
	await Note.create({ ...note, text: 'The driver was ill.' });
	const disposition = await Disposition.create({
		...{ id: uuid(), shipmentId: shipment.id, version: 1, verdict: 'rejected', amendmentReason: null },
		...{
			meaning: 'approval',
			signedBy: dock.id,
			signedName: dock.name,
			signedTitle: 'QA',
			signedAt: decidedAt
		},
		...{ zone: 'UTC', frozen: '{}', frozenSha256: sha256Hex('{}'), reasons: '' }
	});
	const notice = await Notice.create({
		...{ id: uuid(), number: uuid().slice(-12), shipmentId: shipment.id, dispositionId: disposition.id },
		...{ partnerId: shipment.supplierId, contactId: null, state: 'sent', subject: 'x', createdAt: decidedAt },
		...{ answerByAt: null, sentAt: decidedAt, messageId: null, firstOpenedAt: null }
	});
	await NoticeAnswer.create({
		...{
			id: uuid(),
			noticeId: notice.id,
			kind: 'dispute',
			disputed: [],
			whatIsWrong: 'Our logger reads cold.'
		},
		...{ who: 'Lucía Ferrán', answeredBy: 'lucia@example.test', answeredAt: decidedAt },
		...{ doneByOn: null, fileId: null }
	});
	return { ...old, signature };
}

async function claimOn(shipment: Shipment, closedAt: Date | null): Promise<Claim> {
	return Claim.create({
		id: uuid(),
		number: `CL-${uuid().slice(-8)}`,
		shipmentId: shipment.id,
		status: closedAt ? 'settled' : 'open',
		currency: 'EUR',
		openedBy: dock.id,
		openedAt: decidedAt,
		closedAt
	});
}

const isKept = async (sha256: string) =>
	(await fileStore()).read(sha256).then(
		() => true,
		() => false
	);

async function textsOf(shipmentId: string): Promise<(string | null)[]> {
	const entries = await AuditEntry.findAll({ where: { chainId: shipmentId }, order: ['seq'] });
	const payloads = await AuditPayload.findAll({ where: { entryId: entries.map(({ id }) => id) } });
	const byId = new Map(payloads.map(({ entryId, text }) => [entryId, text]));
	return entries.map(({ id }) => byId.get(id) ?? null);
}

const typesOf = async (shipmentId: string) =>
	(await AuditEntry.findAll({ where: { chainId: shipmentId }, order: ['seq'] })).map(({ type }) => type);

describe('retention', () => {
	it('takes an upload’s bytes when its period has ended, not a second before, and says so in the trail', async () => {
		const { shipment, file, read } = await oldDocket();
		await runRetention(beforeUploads);
		expect(await isKept(file.sha256)).toBe(true);
		await runRetention(afterUploads);
		expect(await isKept(file.sha256)).toBe(false);
		expect(await typesOf(shipment.id)).toContain('retention.deleted');
		expect((await StoredFile.findByPk(file.id))?.sha256).toBe(file.sha256);
		const qa = await contextFor(await buildUser(['qa'], { sites: [site] }));
		await expect(openRawFile(qa, read.id)).rejects.toMatchObject({ code: 'file-expired' });
	});

	it('blanks what entries say of people, keeps the rest, and every chain still verifies', async () => {
		const { shipment } = await oldDocket();
		await runRetention(afterPeople);
		const texts = await textsOf(shipment.id);
		expect(texts.slice(0, 3)).toEqual([expect.stringContaining(shipment.number), null, null]);
		expect(texts.find((text) => text?.includes('"entries"'))).toContain('"entries":"2-3"');
		expect(JSON.stringify(texts)).not.toContain('Ostrowid');
		const { faults } = await verifyAllChains();
		expect(faults).toEqual([]);
	});

	it('does nothing a second time', async () => {
		await oldDocket();
		await runRetention(afterPeople);
		const nothing = { files: 0, entries: 0, rows: 0, mails: 0, jobs: 0 };
		expect(await runRetention(afterPeople)).toEqual(nothing);
	});

	it('empties notes, the driver’s name and signature and who answered, says so, and the chain verifies', async () => {
		const { shipment, signature } = await talkedOf();
		await runRetention(afterUploads);
		expect((await Note.findOne({ where: { shipmentId: shipment.id } }))?.text).toBe('The driver was ill.');
		expect(await isKept(signature.sha256)).toBe(true);
		await runRetention(afterPeople);
		expect((await Note.findOne({ where: { shipmentId: shipment.id } }))?.text).toBe('');
		expect(await Arrival.findOne({ where: { shipmentId: shipment.id } })).toMatchObject({
			driverName: null,
			reservation: '',
			isSealIntact: true
		});
		expect(await NoticeAnswer.findOne({ order: [['id', 'DESC']] })).toMatchObject({
			who: '',
			answeredBy: '',
			kind: 'dispute',
			whatIsWrong: 'Our logger reads cold.'
		});
		expect(await isKept(signature.sha256)).toBe(false);
		const texts = await textsOf(shipment.id);
		expect(texts.find((text) => text?.includes('"rows"'))).toContain('{"notes":1,"arrivals":1,"answers":1}');
		expect((await verifyAllChains()).faults).toEqual([]);
	});

	it('takes files of notes and papers of ended claims with the other uploads', async () => {
		const { shipment, file } = await oldDocket();
		const letter = await keepBytes(Buffer.from(`letter ${uuid()}`), 'application/pdf', decidedAt);
		const noteId = uuid();
		const note = { id: noteId, shipmentId: shipment.id, text: 'x', writtenBy: dock.id, writtenAt: decidedAt };
		await Note.create(note);
		await NoteFile.create({ id: uuid(), noteId, fileId: letter.id, ordinal: 1, fileName: 'letter.pdf' });
		const claim = await claimOn(shipment, null);
		const paper = await keepBytes(Buffer.from(`invoice ${uuid()}`), 'application/pdf', decidedAt);
		await ClaimFile.create({
			...{ id: uuid(), claimId: claim.id, fileId: paper.id, fileName: 'i.pdf', what: 'invoice' },
			...{ attachedBy: dock.id, attachedAt: decidedAt }
		});
		await runRetention(afterUploads);
		for (const { sha256 } of [file, letter, paper]) expect(await isKept(sha256)).toBe(true);
		await claim.update({ closedAt: decidedAt, status: 'settled' });
		await runRetention(afterUploads);
		for (const { sha256 } of [file, letter, paper]) expect(await isKept(sha256)).toBe(false);
	});

	it('takes mails of the stand-in and the orders of done work, and leaves what is younger or open', async () => {
		const folder = env().mailFolder;
		await mkdir(folder, { recursive: true });
		for (const [name, at] of [
			['old.eml', '2026-03-01T00:00:00Z'],
			['young.eml', '2026-05-01T00:00:00Z']
		] as const) {
			await writeFile(join(folder, name), 'To: somebody@example.test');
			await utimes(join(folder, name), new Date(at), new Date(at));
		}
		const job = { kind: 'mail', payload: '{}', dedupeKey: null, runAt: decidedAt, createdAt: decidedAt };
		const open = await Job.create({ ...job, id: uuid() });
		const done = await Job.create({ ...job, id: uuid(), doneAt: decidedAt });
		const { mails, jobs } = await runRetention(afterPeople);
		expect([mails, jobs]).toEqual([1, 1]);
		expect(await readdir(folder)).toEqual(['young.eml']);
		expect([await Job.findByPk(open.id), await Job.findByPk(done.id)]).toEqual([expect.anything(), null]);
	});

	it('leaves an open docket alone, however old', async () => {
		const { file, shipment } = await oldDocket({ decidedAt: null, verdict: null });
		await runRetention(at('2050-01-01T00:00:00Z'));
		expect(await isKept(file.sha256)).toBe(true);
		expect(await textsOf(shipment.id)).not.toContain(null);
	});

	it('counts from the cancellation where nothing was decided', async () => {
		const { file } = await oldDocket({ decidedAt: null, verdict: null, cancelledAt: decidedAt });
		await runRetention(afterUploads);
		expect(await isKept(file.sha256)).toBe(false);
	});

	it('takes what could not be read after its own, shorter period', async () => {
		const { shipment } = await oldDocket({ decidedAt: null, verdict: null });
		const file = await keepBytes(Buffer.from(`refused ${uuid()}`), 'text/csv', decidedAt);
		await addRead(shipment, file.id, 'refused');
		await runRetention(at('2027-04-03T07:59:59Z'));
		expect(await isKept(file.sha256)).toBe(true);
		await runRetention(at('2027-04-03T08:00:01Z'));
		expect(await isKept(file.sha256)).toBe(false);
	});
});

describe('a legal hold', () => {
	it('stands by itself while a claim is open, and for its period after', async () => {
		const { shipment, file } = await oldDocket();
		const claim = await claimOn(shipment, null);
		await runRetention(afterPeople);
		expect(await isKept(file.sha256)).toBe(true);
		expect(await textsOf(shipment.id)).not.toContain(null);
		await claim.update({ closedAt: new Date('2031-01-01T00:00:00Z'), status: 'settled' });
		await runRetention(afterPeople);
		expect(await isKept(file.sha256)).toBe(true);
		await runRetention(at('2032-01-01T00:00:01Z'));
		expect(await isKept(file.sha256)).toBe(false);
		expect(await textsOf(shipment.id)).toContain(null);
	});

	it('is put and lifted by hand with a reason, by an admin of that site only', async () => {
		const { shipment, file } = await oldDocket();
		const input = { docket: shipment.number, reason: 'Letter of the authority' };
		for (const role of ['dock', 'qa', 'claims'] as const)
			await expect(
				putRetentionHold(await contextFor(await buildUser([role], { sites: [site] })), input)
			).rejects.toMatchObject({ code: 'not-allowed' });
		const far = await contextFor(await buildUser(['admin'], { sites: [await buildSite()] }));
		await expect(putRetentionHold(far, input)).rejects.toMatchObject({ code: 'not-found' });

		const { id } = await putRetentionHold(admin, input);
		expect(await listRetentionHolds(admin)).toContainEqual(
			expect.objectContaining({ id, docket: shipment.number, reason: 'Letter of the authority' })
		);
		await runRetention(afterPeople);
		expect(await isKept(file.sha256)).toBe(true);
		await liftRetentionHold(admin, { holdId: id, reason: 'Answered' });
		await expect(liftRetentionHold(admin, { holdId: id, reason: 'again' })).rejects.toMatchObject({
			code: 'not-found'
		});
		await runRetention(afterPeople);
		expect(await isKept(file.sha256)).toBe(false);
		const types = await typesOf(shipment.id);
		expect(types).toContain('retention.held');
		expect(types).toContain('retention.released');
	});
});

describe('one file of several dockets', () => {
	it('stays while one of them is open or held', async () => {
		const { file } = await oldDocket();
		const other = await oldDocket({ decidedAt: null, verdict: null });
		await addRead(other.shipment, file.id);
		await runRetention(afterUploads);
		expect(await isKept(file.sha256)).toBe(true);
		await other.shipment.update({ decidedAt });
		await claimOn(other.shipment, null);
		await runRetention(afterUploads);
		expect(await isKept(file.sha256)).toBe(true);
	});

	it('stays where something that never goes names it too, such as a certificate of calibration', async () => {
		const { file } = await oldDocket();
		const logger = await Logger.create({
			...{ id: uuid(), serial: uuid().slice(-8), kind: 'reusable', ownerId: null, accuracyCelsius: 0.5 },
			...{ startDelayMinutes: 0, calibrationDueOn: null, note: '', createdAt: decidedAt, switchedOffAt: null }
		});
		await Calibration.create({
			...{ id: uuid(), loggerId: logger.id, calibratedOn: '2026-01-01', dueOn: '2027-01-01' },
			...{ certificateNumber: 'C-1', laboratory: 'Bench', errorCelsius: null, fileId: file.id }
		});
		await runRetention(afterPeople);
		expect(await isKept(file.sha256)).toBe(true);
	});

	it('is there again when somebody brings the same bytes again', async () => {
		const { shipment, file } = await oldDocket();
		await runRetention(afterUploads);
		const again = await keepBytes(Buffer.from(`export of ${shipment.number}`), 'text/csv', afterUploads.now);
		expect(again.id).toBe(file.id);
		expect((await StoredFile.findByPk(file.id))?.deletedAt).toBeNull();
		expect(await isKept(file.sha256)).toBe(true);
	});
});

describe('the preview', () => {
	it('says what would go and when, held things marked, to admins only', async () => {
		const { shipment } = await oldDocket();
		const held = await oldDocket();
		await claimOn(held.shipment, null);
		const ctx = { ...admin, now: new Date('2028-03-01T00:00:00Z') };
		const { lines } = await previewRetention(ctx);
		const due = { rule: 'uploads', what: 'logger.csv', dueAt: '2028-04-03T08:00:00.000Z' };
		expect(lines).toContainEqual({ ...due, docket: shipment.number, isHeld: false });
		expect(lines).toContainEqual({ ...due, docket: held.shipment.number, isHeld: true });
		const qa = await contextFor(await buildUser(['qa'], { sites: [site] }));
		await expect(previewRetention(qa)).rejects.toMatchObject({ code: 'not-allowed' });
	});

	it('looks half a year ahead and no further', async () => {
		const { shipment } = await oldDocket();
		const { lines } = await previewRetention({ ...admin, now: new Date('2027-09-01T00:00:00Z') });
		expect(lines.filter(({ docket }) => docket === shipment.number)).toEqual([]);
	});
});

describe('the periods', () => {
	it('have defaults, each with its source, and are changed by an admin with both states in the trail', async () => {
		for (const { source, months } of retentionRules) {
			expect(source.length).toBeGreaterThan(20);
			expect(months).toBeGreaterThanOrEqual(6);
		}
		const periods = await getPeriods();
		const qa = await contextFor(await buildUser(['qa'], { sites: [site] }));
		await expect(savePeriods(qa, periods)).rejects.toMatchObject({ code: 'not-allowed' });
		await savePeriods(admin, { ...periods, uploads: 36 });
		expect((await getPeriods()).uploads).toBe(36);
		const entry = await AuditEntry.findOne({ where: { type: 'settings.changed' }, rejectOnEmpty: true });
		const text = (await AuditPayload.findByPk(entry.id))?.text ?? '';
		expect(JSON.parse(text)).toMatchObject({ before: { uploads: 24 }, after: { uploads: 36 } });
		await savePeriods(admin, periods);
	});

	it.each(['', '0', '5', '-1', '1.5', 'x', '1201', 'Infinity', '1e9'])('are not %j months', (uploads) => {
		const form = { uploads, 'refused-uploads': '12', people: '60', claims: '12' };
		expect(retentionForm.safeParse(form).success).toBe(false);
	});

	it('are the defaults where what was kept is broken', () => {
		expect(periodsOf({ uploads: 'x', people: 0, claims: 18 })).toEqual({
			uploads: 24,
			'refused-uploads': 12,
			people: 60,
			claims: 18
		});
		expect(periodsOf(null).people).toBe(60);
	});
});
