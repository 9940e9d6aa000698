import { beforeEach, describe, expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { multipart } from '../../../../tests/helpers/upload';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { layoutQuery } from '../../schemas/layout';
import type { Context } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { LoggerRead } from '../db/models/logger-read';
import { RememberedLayout } from '../db/models/remembered-layout';
import { answerQuestion } from '../reads/answer-question';
import { askAgain } from '../reads/ask-again';
import { getRead } from '../reads/get-read';
import { receiveUpload } from '../reads/receive-upload';
import { forgetLayout } from './forget-layout';
import { listLayouts } from './list-layouts';
import { rememberLayout } from './remember-layout';

useTestDatabase();

async function scene() {
	const site = await buildSite();
	const at = async (role: 'dock' | 'qa' | 'admin' | 'claims') =>
		contextFor(await buildUser([role], { sites: [site] }));
	const people = { dock: await at('dock'), qa: await at('qa'), admin: await at('admin') };
	return { claims: await at('claims'), ...people, ...(await buildShipment({ site })) };
}

async function upload(ctx: Context, number: string, content: string): Promise<string> {
	const { body, contentType } = await multipart([{ name: 'trip.csv', content }]);
	const { reads } = await receiveUpload(ctx, number, { body, contentType });
	return reads[0]?.id ?? '';
}

let files = 0;
/** Bytes of its own each time; a day and month that can be swapped, a year before the journey. */
const ambiguous = (head = 'Date;Temp °C', date = '05/04/2025') => {
	const celsius = `${++files},5`;
	return [
		head,
		...Array.from(
			{ length: 30 },
			(_, i) => `${date} 0${Math.floor(i / 10)}:${10 + (i % 10)}:00 +00:00;${celsius}`
		)
	].join('\n');
};

const dayFirst = '2025-04-05T00:10:00.000Z';
const monthFirst = '2025-05-04T00:10:00.000Z';
const all = layoutQuery.parse({});

async function answer(ctx: Context, readId: string, dateOrder: string, remember = false): Promise<void> {
	const asked = (await getRead(ctx, readId)).ingestion;
	if (asked?.kind !== 'question') throw new Error('The file asked nothing.');
	const choice = asked.question.choices.findIndex((one) => one.answer.dateOrder === dateOrder);
	await answerQuestion(ctx, readId, { choice, remember });
}

describe('an answer about a file', () => {
	let here: Awaited<ReturnType<typeof scene>>;
	beforeEach(async () => {
		here = await scene();
		for (const one of await RememberedLayout.findAll({ where: { withdrawnAt: null } }))
			await forgetLayout(here.qa, one.id, 'another test');
	});

	it('serves that file alone while nobody confirms it', async () => {
		const { dock, shipment } = here;
		const first = await upload(dock, shipment.number, ambiguous());
		await answer(dock, first, 'dmy');
		expect(await getRead(dock, first)).toMatchObject({ firstAt: dayFirst, remembered: null });
		const next = await upload(dock, shipment.number, ambiguous());
		expect(await getRead(dock, next)).toMatchObject({ state: 'question', remembered: null });
	});

	it('is not remembered by the dock or claims, whatever their form says', async () => {
		const { dock, claims, shipment } = here;
		const first = await upload(dock, shipment.number, ambiguous());
		await expect(answer(dock, first, 'dmy', true)).rejects.toMatchObject({ code: 'not-allowed' });
		await answer(dock, first, 'dmy');
		for (const who of [dock, claims])
			await expect(rememberLayout(who, first, 'partner')).rejects.toMatchObject({ code: 'not-allowed' });
		expect(await RememberedLayout.count({ where: { sourceReadId: first } })).toBe(0);
	});

	it.each(['qa', 'admin'] as const)('holds for that sender’s files once %s confirms it', async (role) => {
		const { dock, shipment, supplier, site } = here;
		const first = await upload(dock, shipment.number, ambiguous());
		await answer(dock, first, 'mdy');
		await rememberLayout(here[role], first, 'partner');
		const next = await upload(dock, shipment.number, ambiguous());
		expect(await getRead(dock, next)).toMatchObject({
			state: 'understood',
			firstAt: monthFirst,
			remembered: {
				answers: { dateOrder: 'mdy' },
				partnerName: supplier.name,
				timesUsed: 1,
				isFromHere: false
			}
		});
		const events = { chainId: shipment.id, type: 'layout.applied' };
		expect(await AuditEntry.count({ where: events })).toBe(1);
		const other = await buildShipment({ site });
		expect((await getRead(dock, await upload(dock, other.shipment.number, ambiguous()))).state).toBe(
			'question'
		);
	});

	it('holds for this type of logger from anybody, where that is said', async () => {
		const { dock, qa, shipment, site } = here;
		const first = await upload(dock, shipment.number, ambiguous('Datum;Temp °C'));
		await answer(dock, first, 'dmy');
		await rememberLayout(qa, first, 'logger-type');
		const other = await buildShipment({ site });
		const next = await upload(dock, other.shipment.number, ambiguous('Datum;Temp °C'));
		expect(await getRead(dock, next)).toMatchObject({
			firstAt: dayFirst,
			remembered: { partnerName: null }
		});
		const another = await upload(dock, other.shipment.number, ambiguous('Date/Time;Temp °C'));
		expect((await getRead(dock, another)).state).toBe('question');
	});

	it('that is the sender’s own comes before one for anybody', async () => {
		const { dock, qa, shipment } = here;
		const first = await upload(dock, shipment.number, ambiguous());
		await answer(dock, first, 'dmy');
		await rememberLayout(qa, first, 'logger-type');
		const second = await upload(dock, shipment.number, ambiguous());
		await askAgain(dock, second);
		await answer(dock, second, 'mdy');
		await rememberLayout(qa, second, 'partner');
		const third = await upload(dock, shipment.number, ambiguous());
		expect((await getRead(dock, third)).firstAt).toBe(monthFirst);
	});

	it('is undone on one read, which then asks as at first', async () => {
		const { dock, qa, shipment } = here;
		const first = await upload(dock, shipment.number, ambiguous());
		await answer(dock, first, 'dmy');
		await rememberLayout(qa, first, 'partner');
		const next = await upload(dock, shipment.number, ambiguous());
		await askAgain(dock, next);
		expect(await getRead(dock, next)).toMatchObject({ state: 'question', remembered: null });
		expect((await LoggerRead.findByPk(next))?.answers).toEqual({});
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'read.asked-again' } })).toBe(1);
		await expect(askAgain(dock, next)).rejects.toMatchObject({ code: 'invalid' });
		await expect(askAgain(here.claims, next)).rejects.toMatchObject({ code: 'not-allowed' });
		expect((await getRead(dock, first)).state).toBe('understood');
	});

	it('is a new version when it is answered anew, and the old one is never changed', async () => {
		const { dock, qa, shipment } = here;
		const first = await upload(dock, shipment.number, ambiguous('When;Temp °C'));
		await answer(dock, first, 'dmy');
		await rememberLayout(qa, first, 'partner');
		const second = await upload(dock, shipment.number, ambiguous('When;Temp °C'));
		await askAgain(dock, second);
		await answer(qa, second, 'mdy', true);
		const { items } = await listLayouts(qa, { ...all, state: 'any', q: 'trip.csv' });
		const own = items.filter(({ answers }) => answers.dateOrder).slice(0, 2);
		expect(own).toMatchObject([
			{ version: 2, answers: { dateOrder: 'mdy' }, forgotten: null },
			{ version: 1, answers: { dateOrder: 'dmy' }, forgotten: { reason: 'Answered anew on trip.csv' } }
		]);
	});

	it('is not taken where the evidence speaks against it: the question stands', async () => {
		const { dock, qa, shipment } = here;
		const first = await upload(dock, shipment.number, ambiguous());
		await answer(dock, first, 'dmy');
		await rememberLayout(qa, first, 'partner');
		// Day first this would be the fifth of December, long after the upload.
		const ahead = `12/05/${new Date(dock.now).getUTCFullYear() + 1}`;
		const next = await upload(dock, shipment.number, ambiguous('Date;Temp °C', ahead));
		expect((await getRead(dock, next)).remembered).toBeNull();
	});

	it('cannot be confirmed where nothing was answered that holds for other files', async () => {
		const { dock, qa, shipment } = here;
		const rows = [
			'Date;Temp °C',
			'2026-03-30T06:10:00Z;1',
			'2026-03-30T06:20:00Z;2',
			'2026-03-30T06:30:00Z;3'
		];
		const readId = await upload(dock, shipment.number, rows.join('\n'));
		await expect(rememberLayout(qa, readId, 'partner')).rejects.toMatchObject({ code: 'invalid' });
		const asking = await upload(dock, shipment.number, ambiguous());
		await expect(rememberLayout(qa, asking, 'partner')).rejects.toMatchObject({ code: 'not-understood' });
	});

	it('is out of reach for QA of another site', async () => {
		const { dock, shipment } = here;
		const first = await upload(dock, shipment.number, ambiguous());
		await answer(dock, first, 'dmy');
		const stranger = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
		await expect(rememberLayout(stranger, first, 'partner')).rejects.toMatchObject({ code: 'not-found' });
		await expect(askAgain(stranger, first)).rejects.toMatchObject({ code: 'not-found' });
	});
});

describe('the list of remembered layouts', () => {
	it('says who confirmed what, on which file, and how often it served; and forgets with a reason', async () => {
		const { dock, qa, claims, admin, shipment, supplier } = await scene();
		const first = await upload(dock, shipment.number, ambiguous('Stamp;Temp °C'));
		await answer(dock, first, 'dmy');
		await rememberLayout(qa, first, 'partner');
		const next = await upload(dock, shipment.number, ambiguous('Stamp;Temp °C'));
		const query = { ...all, q: supplier.name };
		const { items, total } = await listLayouts(claims, query);
		expect(total).toBe(1);
		expect(items).toMatchObject([
			{ sourceName: 'trip.csv', timesUsed: 1, forgotten: null, partnerName: supplier.name, version: 1 }
		]);
		const id = items[0]?.id ?? '';
		for (const who of [dock, claims])
			await expect(forgetLayout(who, id, 'no')).rejects.toMatchObject({ code: 'not-allowed' });
		await forgetLayout(admin, id, 'a new export program');
		await expect(forgetLayout(qa, id, 'twice')).rejects.toMatchObject({ code: 'invalid' });
		expect((await listLayouts(qa, query)).total).toBe(0);
		expect((await listLayouts(qa, { ...query, state: 'forgotten' })).items).toMatchObject([
			{ forgotten: { reason: 'a new export program' } }
		]);
		expect((await getRead(dock, next)).state).toBe('understood');
		const later = await upload(dock, shipment.number, ambiguous('Stamp;Temp °C'));
		expect((await getRead(dock, later)).state).toBe('question');
		expect(await AuditEntry.count({ where: { type: 'layout.remembered' } })).toBeGreaterThan(0);
		expect(await AuditEntry.count({ where: { type: 'layout.forgotten' } })).toBeGreaterThan(0);
	});

	it('finds nothing for a supplier, who may not see it', async () => {
		const { supplier } = await scene();
		const outside = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(listLayouts(outside, all)).rejects.toMatchObject({ code: 'not-allowed' });
	});
});
