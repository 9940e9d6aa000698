import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { cut, exportText, multipart, type SentFile } from '../../../../tests/helpers/upload';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import type { Context } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { LoggerRead } from '../db/models/logger-read';
import { TraceRow } from '../db/models/trace-row';
import { env } from '../env';
import { fileStore } from '../storage/store';
import { sha256Hex } from '../storage/sha256';
import { receiveUpload } from './receive-upload';

useTestDatabase();

async function scene() {
	const site = await buildSite();
	const dock = await contextFor(await buildUser(['dock'], { sites: [site] }));
	return { dock, ...(await buildShipment({ site })) };
}

async function send(
	ctx: Context,
	number: string,
	files: SentFile[],
	options: { id?: string; maxBytes?: number } = {}
) {
	const { id, maxBytes } = options;
	const { body, contentType } = await multipart(files, id ? { id } : {});
	return receiveUpload(ctx, number, { body, contentType, maxBytes });
}

const good = (celsius = 1) => ({ name: 'WH-0412.csv', content: exportText({ celsius }) });

describe('receiving an upload', () => {
	it('understands a tidy export, keeps its bytes, and waits for a person to keep the read', async () => {
		const { dock, shipment } = await scene();
		const { reads } = await send(dock, shipment.number, [good()]);
		expect(reads).toMatchObject([
			{
				state: 'understood',
				fileName: 'WH-0412.csv',
				readings: 561,
				firstAt: '2026-03-30T06:10:00.000Z',
				lastAt: '2026-04-03T03:30:00.000Z',
				isDuplicate: false,
				alsoOn: []
			}
		]);
		const hash = sha256Hex(good().content);
		expect(reads[0]?.fileSha256).toBe(hash);
		expect((await (await fileStore()).read(hash)).toString()).toBe(good().content);
		expect(await TraceRow.count({ where: { shipmentId: shipment.id } })).toBe(0);
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'read.received' } })).toBe(1);
		expect(readdirSync(join(env().dataFolder, 'tmp'))).toEqual([]);
	});

	it('keeps a refused file too, with the sentence that says why', async () => {
		const { dock, shipment } = await scene();
		const { reads } = await send(dock, shipment.number, [
			{ name: 'trip.pdf', content: '%PDF-1.7\n%âãÏÓ\n1 0 obj' }
		]);
		expect(reads).toMatchObject([{ state: 'refused', sentence: expect.stringContaining('PDF') }]);
	});

	it('asks what the file cannot tell', async () => {
		const { dock, shipment } = await scene();
		const rows = Array.from({ length: 30 }, (_, i) => `04/04/2025 0${Math.floor(i / 10)}:${10 + i};1,5`);
		const content = ['Date;Temp', ...rows].join('\n');
		const { reads } = await send(dock, shipment.number, [{ name: 'trip.csv', content }]);
		expect(reads).toMatchObject([{ state: 'question', sentence: expect.stringContaining('?') }]);
	});

	it('refuses a file over the limit and takes the good one beside it', async () => {
		const { dock, shipment } = await scene();
		const small = { name: 'small.csv', content: exportText({ readings: 20 }) };
		const large = { name: 'large.csv', content: 'x'.repeat(2000) };
		const answer = await send(dock, shipment.number, [large, small], { maxBytes: 1000 });
		expect(answer.reads.map(({ fileName }) => fileName)).toEqual(['small.csv']);
		expect(answer.refused).toMatchObject([{ fileName: 'large.csv', code: 'too-large' }]);
		await expect(send(dock, shipment.number, [large], { maxBytes: 1000 })).rejects.toMatchObject({
			code: 'too-large',
			status: 413
		});
	});

	it('recognises the same bytes on the same docket and does not double them', async () => {
		const { dock, shipment } = await scene();
		const first = await send(dock, shipment.number, [good()]);
		const again = await send(dock, shipment.number, [{ ...good(), name: 'copy of it.csv' }]);
		expect(again.reads).toMatchObject([{ id: first.reads[0]?.id, isDuplicate: true }]);
		expect(await LoggerRead.count({ where: { shipmentId: shipment.id } })).toBe(1);
	});

	it('announces the same bytes on another docket in sight, and says nothing of one out of sight', async () => {
		const { dock, shipment, site } = await scene();
		const sent = good(2);
		const other = await buildShipment({ site });
		const foreign = await scene();
		await send(dock, other.shipment.number, [sent]);
		await send(foreign.dock, foreign.shipment.number, [sent]);
		const { reads } = await send(dock, shipment.number, [sent]);
		expect(reads).toMatchObject([{ isDuplicate: false, alsoOn: [other.shipment.number] }]);
	});

	it('is harmless when the client sends the same id again, also at the same time', async () => {
		const { dock, shipment } = await scene();
		const id = uuid();
		const answers = await Promise.all([1, 2, 3].map(() => send(dock, shipment.number, [good(3)], { id })));
		expect(new Set(answers.map(({ reads }) => reads[0]?.id))).toEqual(new Set([id]));
		expect(await LoggerRead.count({ where: { shipmentId: shipment.id } })).toBe(1);
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'read.received' } })).toBe(1);
	});

	it('refuses an id that names other bytes', async () => {
		const { dock, shipment } = await scene();
		const id = uuid();
		await send(dock, shipment.number, [good(4)], { id });
		await expect(send(dock, shipment.number, [good(5)], { id })).rejects.toMatchObject({ code: 'duplicate' });
	});

	it('writes nothing of an upload that broke off', async () => {
		const { dock, shipment } = await scene();
		const { bytes, contentType } = await multipart([good()]);
		const body = Readable.from(cut(bytes.subarray(0, 3000)));
		await expect(receiveUpload(dock, shipment.number, { body, contentType })).rejects.toMatchObject({
			code: 'upload-broken'
		});
		expect(await LoggerRead.count({ where: { shipmentId: shipment.id } })).toBe(0);
	});

	it('refuses who may not: another site, the supplier, claims', async () => {
		const { shipment, site, supplier } = await scene();
		const stranger = (await scene()).dock;
		await expect(send(stranger, shipment.number, [good()])).rejects.toMatchObject({ code: 'not-found' });
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(send(own, shipment.number, [good()])).rejects.toMatchObject({ code: 'not-allowed' });
		const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
		await expect(send(claims, shipment.number, [good()])).rejects.toMatchObject({ code: 'not-allowed' });
		expect(await LoggerRead.count({ where: { shipmentId: shipment.id } })).toBe(0);
	});

	it('refuses a form without a file', async () => {
		const { dock, shipment } = await scene();
		await expect(send(dock, shipment.number, [])).rejects.toMatchObject({ code: 'not-multipart' });
	});
});
