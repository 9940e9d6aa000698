import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { buffer } from 'node:stream/consumers';
import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { multipart, type SentFile } from '../../../../tests/helpers/upload';
import { maxNoteFiles } from '../../schemas/note';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { Note } from '../db/models/note';
import { NoteFile } from '../db/models/note-file';
import { StoredFile } from '../db/models/stored-file';
import { getDocket } from '../dockets/get-docket';
import { env } from '../env';
import { samplePhoto } from '../photos/sample-photo';
import { sha256Hex } from '../storage/sha256';
import { openNoteFile } from './open-note-file';
import { receiveNote } from './receive-note';

useTestDatabase();

const csv: SentFile = { name: 'kühl tour.csv', content: 'Time;°C\n06:10;1.2\n' };
const pdf: SentFile = { name: 'letter.pdf', content: '%PDF-1.7 …', type: 'application/pdf' };
const photo: SentFile = { name: 'IMG_1.JPG', content: samplePhoto, type: 'image/jpeg' };

async function setUp() {
	const { shipment, site, supplier } = await buildShipment({ arrivedAt: testNow });
	const ctx = await contextFor(await buildUser(['qa'], { sites: [site] }));
	const send = async (files: readonly SentFile[], fields: Record<string, string>, maxBytes?: number) =>
		receiveNote(ctx, shipment.number, {
			...(await multipart(files, fields)),
			...(maxBytes === undefined ? {} : { maxBytes })
		});
	const notes = async () => (await getDocket(ctx, shipment.number)).notes;
	return { shipment, site, supplier, ctx, send, notes };
}

describe('a note with files', () => {
	it('keeps each byte for byte under its name, and shows it with its hash on the docket', async () => {
		const { send, notes, ctx } = await setUp();
		await send([csv, pdf, photo], { text: 'From the carrier.' });
		const [note] = await notes();
		expect(note).toMatchObject({
			text: 'From the carrier.',
			files: [csv, pdf, photo].map(({ name, content }) => ({
				fileName: name,
				bytes: Buffer.from(content).byteLength,
				sha256: sha256Hex(Buffer.from(content))
			}))
		});
		const file = await openNoteFile(ctx, note?.files?.[0]?.id ?? '');
		expect((await buffer(await file.open())).toString()).toBe(csv.content);
		expect(file).toMatchObject({ fileName: 'kühl tour.csv', mediaType: 'application/octet-stream' });
	});

	it('stands in the audit chain with the hash of each file', async () => {
		const { send, shipment } = await setUp();
		await send([csv, photo], { text: 'x' });
		const entries = await AuditEntry.findAll({ where: { chainId: shipment.id }, order: ['seq'] });
		expect(entries.map(({ type }) => type)).toEqual([
			'note.written',
			'note.file-attached',
			'note.file-attached'
		]);
		const payload = await AuditPayload.findByPk(entries[1]?.id ?? '', { rejectOnEmpty: true });
		expect(JSON.parse(payload.text ?? '')).toMatchObject({
			fileSha256: sha256Hex(Buffer.from(csv.content)),
			fileBytes: Buffer.from(csv.content).byteLength,
			mediaType: 'text/csv'
		});
	});

	it('is written once with its files, however often it is sent', async () => {
		const { send, shipment } = await setUp();
		const id = uuid();
		await send([csv], { id, text: 'x' });
		await send([csv, pdf], { id, text: 'x' });
		expect(await Note.count({ where: { shipmentId: shipment.id } })).toBe(1);
		expect(await NoteFile.count({ where: { noteId: id } })).toBe(1);
	});

	it('needs no file: a form without one sends an empty part', async () => {
		const { send, notes } = await setUp();
		await send([], { text: 'Only words.' });
		await send([{ name: '', content: '' }], { text: 'Only words, by a browser.' });
		expect((await notes()).map(({ files }) => files)).toEqual([[], []]);
	});

	it('takes the longest note in a script of three bytes a letter', async () => {
		const { send, notes } = await setUp();
		const text = '温'.repeat(2_000);
		await send([], { text });
		expect((await notes())[0]?.text).toBe(text);
	});

	const many = Array.from({ length: maxNoteFiles + 1 }, (_, at) => ({ ...csv, name: `${at}.csv` }));
	it.each<[string, SentFile[], string, string, RegExp]>([
		['no words', [csv], ' ', 'invalid', /Write the note/],
		['too many words', [], 'x'.repeat(2_001), 'invalid', /At most 2000/],
		['a page', [{ name: 'a.html', content: '<script>' }], 'kept', 'wrong-type', /a\.html is of a kind/],
		['a drawing', [{ name: 'a.svg', content: '<svg/>' }], 'kept', 'wrong-type', /a\.svg/],
		['a program', [{ name: 'a.pdf.exe', content: '%PDF-' }], 'kept', 'wrong-type', /a\.pdf\.exe/],
		['no ending', [{ name: 'pdf', content: '%PDF-' }], 'kept', 'wrong-type', /of a kind/],
		[
			'a page called a PDF',
			[{ name: 'a.pdf', content: '<html>' }],
			'kept',
			'wrong-type',
			/not what its name/
		],
		['a text called a photograph', [{ name: 'a.jpg', content: 'x' }], 'kept', 'wrong-type', /not what its/],
		['an empty file', [{ name: 'a.csv', content: '' }], 'kept', 'wrong-type', /a\.csv is empty/],
		['one bad file of two', [csv, { name: 'a.svg', content: 'x' }], 'kept', 'wrong-type', /a\.svg/],
		['too many files', many, 'kept', 'invalid', /At most 5 files/]
	])('is refused whole with %s, and its words come back', async (_what, files, text, code, sentence) => {
		const { send, shipment } = await setUp();
		const sent = send(files, { text });
		await expect(sent).rejects.toMatchObject({ name: 'NoteNotTaken', code, text });
		await expect(sent).rejects.toThrow(sentence);
		expect(await Note.count({ where: { shipmentId: shipment.id } })).toBe(0);
		expect(await readdir(join(env().dataFolder, 'tmp'))).toEqual([]);
	});

	it('is refused with a file over the limit, and taken with one of just the limit', async () => {
		const { send, notes } = await setUp();
		const bytes = Buffer.from(csv.content).byteLength;
		await expect(send([csv], { text: 'x' }, bytes - 1)).rejects.toMatchObject({ code: 'too-large' });
		await send([csv], { text: 'x' }, bytes);
		expect(await notes()).toHaveLength(1);
	});

	it('names no folder, whatever the upload calls itself', async () => {
		const { send, notes } = await setUp();
		await send([{ name: '../../etc/pass\u202Ewd.csv', content: 'a;b' }], { text: 'x' });
		expect((await notes())[0]?.files?.[0]?.fileName).toBe('passwd.csv');
	});

	it('opens to staff of its site only: not to its supplier, not to another site', async () => {
		const { send, notes, site, supplier } = await setUp();
		await send([csv], { text: 'x' });
		const id = (await notes())[0]?.files?.[0]?.id ?? '';
		for (const role of ['dock', 'qa', 'claims', 'admin'] as const)
			expect(
				await openNoteFile(await contextFor(await buildUser([role], { sites: [site] })), id)
			).toBeTruthy();
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(openNoteFile(own, id)).rejects.toMatchObject({ code: 'not-allowed' });
		const far = await contextFor(await buildUser(['admin'], { sites: [await buildSite()] }));
		await expect(openNoteFile(far, id)).rejects.toMatchObject({ code: 'not-found' });
		await expect(openNoteFile(far, uuid())).rejects.toMatchObject({ code: 'not-found' });
	});

	it('says so when retention has taken the bytes', async () => {
		const { send, notes, ctx } = await setUp();
		await send([csv], { text: 'x' });
		const file = (await notes())[0]?.files?.[0];
		await StoredFile.update({ deletedAt: testNow }, { where: { sha256: file?.sha256 } });
		await expect(openNoteFile(ctx, file?.id ?? '')).rejects.toMatchObject({ code: 'file-expired' });
	});
});
