import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { exportText, multipart } from '../../../../tests/helpers/upload';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { unpackTrace } from '../../domain/trace/pack';
import { keepForm as sentForm, type KeepForm } from '../../schemas/read';
import type { Context } from '../context';
import { AssessmentRow } from '../db/models/assessment-row';
import { AuditEntry } from '../db/models/audit-entry';
import { Compartment } from '../db/models/compartment';
import { Logger } from '../db/models/logger';
import { LoggerRead } from '../db/models/logger-read';
import { LoggerTrip } from '../db/models/logger-trip';
import { TraceRow } from '../db/models/trace-row';
import { answerQuestion, askQa } from './answer-question';
import { getRead } from './get-read';
import { keepRead } from './keep-read';
import { keepUnread } from './keep-unread';
import { listReads } from './list-reads';
import { openRawFile } from './open-raw-file';
import { receiveUpload } from './receive-upload';
import { withdrawRead } from './withdraw-read';

useTestDatabase();

async function scene() {
	const site = await buildSite();
	const dock = await contextFor(await buildUser(['dock'], { sites: [site] }));
	const qa = await contextFor(await buildUser(['qa'], { sites: [site] }));
	const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
	return { dock, qa, claims, ...(await buildShipment({ site })) };
}

async function upload(ctx: Context, number: string, content: string): Promise<string> {
	const { body, contentType } = await multipart([{ name: 'trip.csv', content }]);
	const { reads } = await receiveUpload(ctx, number, { body, contentType });
	return reads[0]?.id ?? '';
}

let serials = 0;
const keepForm = (overrides: Partial<KeepForm> = {}): KeepForm => ({
	serial: `WH-9${++serials}`,
	lineId: null,
	position: 'pallet 3, door end',
	placement: 'between-cases',
	accuracyCelsius: 0.5,
	...overrides
});

/** All on one day whose day and month can be swapped, a year before the journey: nothing settles the order. */
const ambiguous = (celsius: string) =>
	[
		'Date;Temp °C',
		...Array.from(
			{ length: 30 },
			(_, i) => `05/04/2025 0${Math.floor(i / 10)}:${10 + (i % 10)}:00 +00:00;${celsius}`
		)
	].join('\n');

describe('keeping a read', () => {
	it('packs its readings, finds the logger, and assesses the docket, in one go', async () => {
		const { dock, shipment, lines } = await scene();
		const readId = await upload(dock, shipment.number, exportText({ celsius: 10 }));
		const form = keepForm();
		await keepRead(dock, readId, form);
		const [row] = await TraceRow.findAll({ where: { readId } });
		expect(row).toMatchObject({ isAssessed: true, readings: 561, unit: 'celsius', decimals: 1 });
		expect(unpackTrace(row?.packed ?? Buffer.alloc(0)).scaled[560]).toBe(100);
		const trip = await LoggerTrip.findByPk(row?.tripId ?? '');
		expect(trip).toMatchObject({ serial: form.serial, status: 'found', position: 'pallet 3, door end' });
		// Q10 of 3 at ten degrees above the reference: 93 h 20 min use three times as much.
		const [assessment] = await AssessmentRow.findAll({ where: { shipmentId: shipment.id } });
		expect(assessment?.lineId).toBe(lines[0]?.id);
		expect(assessment?.remainingHours).toBeCloseTo(432 - 20 - 280, 9);
		const entries = await AuditEntry.findAll({ where: { chainId: shipment.id }, order: ['seq'] });
		expect(entries.map(({ type }) => type)).toEqual([
			'read.received',
			'read.kept',
			'logger.assigned',
			'assessment.made'
		]);
	});

	it('registers an unknown logger with the accuracy given, and asks for it where none was', async () => {
		const { dock, shipment } = await scene();
		const readId = await upload(dock, shipment.number, exportText({ celsius: 2 }));
		const form = keepForm({ accuracyCelsius: null });
		await expect(keepRead(dock, readId, form)).rejects.toMatchObject({ code: 'invalid' });
		expect(await TraceRow.count({ where: { readId } })).toBe(0);
		await keepRead(dock, readId, { ...form, accuracyCelsius: 0.3 });
		expect(await Logger.findOne({ where: { serial: form.serial } })).toMatchObject({ accuracyCelsius: 0.3 });
	});

	it('finds the trip that was expected, and takes the accuracy from the register', async () => {
		const { dock, shipment, lines } = await scene();
		const expected = await LoggerTrip.create({
			id: uuid(),
			shipmentId: shipment.id,
			loggerId: null,
			serial: 'WH-EXP',
			ordinal: 1,
			lineId: lines[0]?.id ?? null,
			palletId: null,
			position: null,
			placement: 'in-product',
			status: 'expected'
		});
		const readId = await upload(dock, shipment.number, exportText({ celsius: 3 }));
		expect((await getRead(dock, readId)).proposed).toMatchObject({
			serial: 'WH-EXP',
			placement: 'in-product'
		});
		await keepRead(dock, readId, keepForm({ serial: 'WH-EXP' }));
		expect((await expected.reload()).status).toBe('found');
		expect(await LoggerTrip.count({ where: { shipmentId: shipment.id } })).toBe(1);
	});

	it('leaves a logger in the compartment of the papers, unless the dock found it in another', async () => {
		const { dock, shipment, lines } = await scene();
		const rear = uuid();
		const airs = { setPointCelsius: null, supplyAirCelsius: null, returnAirCelsius: null };
		await Compartment.create({ id: rear, visitId: null, shipmentId: shipment.id, name: 'rear', ...airs });
		await lines[0]?.update({ compartmentId: rear });
		const place = { shipmentId: shipment.id, loggerId: null, lineId: null, compartmentId: rear };
		for (const [at, serial] of ['WH-RR', 'WH-FF', 'WH-NN', 'WH-LL'].entries())
			await LoggerTrip.create({
				...{ id: uuid(), serial, ...place, ordinal: at + 1 },
				...{ palletId: null, position: null, placement: 'air', status: 'expected' }
			});
		const keep = async (serial: string, celsius: number, more: Partial<KeepForm> = {}) => {
			const readId = await upload(dock, shipment.number, exportText({ celsius }));
			expect(await getRead(dock, readId)).toMatchObject({ compartments: expect.arrayContaining(['rear']) });
			await keepRead(dock, readId, keepForm({ serial, ...more }));
			return (await LoggerTrip.findOne({ where: { shipmentId: shipment.id, serial } }))?.compartmentId;
		};
		expect(await keep('WH-RR', 3)).toBe(rear);
		expect(await keep('WH-FF', 4, { compartment: 'front' })).not.toBe(rear);
		expect(await keep('WH-NN', 5, { compartment: null })).toBeNull();
		// With a line, it is where its line is.
		const lineId = lines[0]?.id ?? null;
		expect(await keep('WH-LL', 6, { compartment: 'front', lineId })).toBeNull();
		// Its own logger before those of its compartment, and never those of the front.
		const rows = await AssessmentRow.findAll({ where: { shipmentId: shipment.id, isCurrent: true } });
		expect(rows).toHaveLength(1);
	});

	it.each([
		[{}, undefined],
		[{ compartment: '' }, null],
		[{ compartment: null }, null],
		[{ compartment: ' rear ' }, 'rear']
	])('takes the compartment of a form as it was sent: %o', (sent, expected) => {
		const parsed = sentForm.parse({ serial: 'WH-1', placement: 'air', ...sent });
		expect(parsed.compartment).toBe(expected);
	});

	it('keeps once however often it is asked, also at the same time', async () => {
		const { dock, shipment } = await scene();
		const readId = await upload(dock, shipment.number, exportText({ celsius: 4 }));
		const form = keepForm();
		await Promise.all([1, 2, 3].map(() => keepRead(dock, readId, form)));
		await keepRead(dock, readId, form);
		expect(await TraceRow.count({ where: { readId } })).toBe(1);
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'read.kept' } })).toBe(1);
	});

	it('refuses a second read of a logger that has one', async () => {
		const { dock, shipment } = await scene();
		const first = await upload(dock, shipment.number, exportText({ celsius: 5 }));
		const second = await upload(dock, shipment.number, exportText({ celsius: 6 }));
		await keepRead(dock, first, keepForm({ serial: 'WH-ONE' }));
		await expect(keepRead(dock, second, keepForm({ serial: 'WH-ONE' }))).rejects.toMatchObject({
			code: 'in-use'
		});
	});

	it('refuses a line of another docket, and whoever may not upload', async () => {
		const { dock, shipment, supplier } = await scene();
		const other = await scene();
		const readId = await upload(dock, shipment.number, exportText({ celsius: 7 }));
		const wrong = keepForm({ lineId: other.lines[0]?.id ?? null });
		await expect(keepRead(dock, readId, wrong)).rejects.toMatchObject({ code: 'invalid' });
		await expect(keepRead(other.dock, readId, keepForm())).rejects.toMatchObject({ code: 'not-found' });
		const theirs = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(keepRead(theirs, readId, keepForm())).rejects.toMatchObject({ code: 'not-allowed' });
		await expect(getRead(other.qa, readId)).rejects.toMatchObject({ code: 'not-found' });
	});

	it('is undone by QA with a reason; the same file can come again', async () => {
		const { dock, qa, shipment } = await scene();
		const content = exportText({ celsius: 8 });
		const readId = await upload(dock, shipment.number, content);
		await keepRead(dock, readId, keepForm());
		await expect(withdrawRead(dock, readId, 'wrong load')).rejects.toMatchObject({ code: 'not-allowed' });
		await withdrawRead(qa, readId, 'wrong load');
		expect(await AssessmentRow.count({ where: { shipmentId: shipment.id, isCurrent: true } })).toBe(0);
		expect((await listReads(dock, shipment.number)).reads).toMatchObject([{ state: 'withdrawn' }]);
		expect(await upload(dock, shipment.number, content)).toBe(readId);
		expect((await listReads(dock, shipment.number)).reads).toMatchObject([{ state: 'understood' }]);
	});
});

describe('a file that cannot be read', () => {
	it('can be kept as evidence: its bytes stay, nothing is assessed, and it is written down once', async () => {
		const { dock, claims, shipment } = await scene();
		const readId = await upload(dock, shipment.number, '%PDF-1.7 a report');
		expect(await getRead(dock, readId)).toMatchObject({ state: 'refused', keptAt: null });
		await expect(keepUnread(claims, readId)).rejects.toMatchObject({ code: 'not-allowed' });
		await keepUnread(dock, readId);
		await keepUnread(dock, readId);
		const view = await getRead(dock, readId);
		expect(view.state).toBe('refused');
		expect(view.keptAt).not.toBeNull();
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'read.kept-unread' } })).toBe(1);
		expect(await TraceRow.count({ where: { readId } })).toBe(0);
		const chunks: Buffer[] = [];
		for await (const chunk of await (await openRawFile(claims, readId)).open())
			chunks.push(Buffer.from(chunk));
		expect(Buffer.concat(chunks).toString()).toBe('%PDF-1.7 a report');
	});

	it('is the only kind of file kept without being read', async () => {
		const { dock, shipment } = await scene();
		const readId = await upload(dock, shipment.number, exportText({ celsius: 3 }));
		await expect(keepUnread(dock, readId)).rejects.toMatchObject({ code: 'invalid' });
	});
});

describe('a question about a file', () => {
	it('is answered with one of its choices, and then understood', async () => {
		const { dock, shipment } = await scene();
		const readId = await upload(dock, shipment.number, ambiguous('1,4'));
		const asked = (await getRead(dock, readId)).ingestion;
		if (asked?.kind !== 'question') throw new Error('The file asked nothing.');
		expect(asked.question.code).toBe('date-order');
		await expect(keepRead(dock, readId, keepForm())).rejects.toMatchObject({ code: 'not-understood' });
		const choice = asked.question.choices.findIndex(({ answer }) => answer.dateOrder === 'dmy');
		await answerQuestion(dock, readId, { choice, remember: false });
		const view = await getRead(dock, readId);
		expect(view).toMatchObject({ state: 'understood', firstAt: '2025-04-05T00:10:00.000Z' });
		expect((await LoggerRead.findByPk(readId))?.answers).toEqual({ dateOrder: 'dmy' });
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'read.answered' } })).toBe(1);
	});

	it('can be left to QA, once', async () => {
		const { dock, qa, shipment } = await scene();
		const readId = await upload(dock, shipment.number, ambiguous('1,8'));
		await askQa(dock, readId);
		await askQa(dock, readId);
		expect((await getRead(qa, readId)).askedQaAt).not.toBeNull();
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'read.asked-qa' } })).toBe(1);
	});

	it('refuses an answer that was not offered', async () => {
		const { dock, shipment } = await scene();
		const readId = await upload(dock, shipment.number, ambiguous('1,9'));
		const wrong = answerQuestion(dock, readId, { choice: 7, remember: false });
		await expect(wrong).rejects.toMatchObject({ code: 'invalid' });
	});
});
