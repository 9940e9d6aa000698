import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildPartner,
	buildProduct,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { boardQuery } from '../../schemas/board';
import type { Role } from '../context';
import { AssessmentRow } from '../db/models/assessment-row';
import { ExcursionRow } from '../db/models/excursion-row';
import { Hold } from '../db/models/hold';
import { LoggerRead } from '../db/models/logger-read';
import { LoggerTrip } from '../db/models/logger-trip';
import { Shipment } from '../db/models/shipment';
import type { Site } from '../db/models/site';
import { SiteHoliday } from '../db/models/site-holiday';
import { SpecVersion } from '../db/models/spec-version';
import { TraceRow } from '../db/models/trace-row';
import { database } from '../db/sequelize';
import { keepBytes } from '../storage/store';
import { listBoard } from './list-board';
import { logArrival } from './log-arrival';
import { arrivalInput } from '../../schemas/arrival';

useTestDatabase();

const today = boardQuery.parse({});
const hour = (text: string) => new Date(`2026-04-03T${text}:00Z`);

async function contextAt(site: Site, role: Role = 'dock') {
	return contextFor(await buildUser([role], { sites: [site] }));
}

async function addRead(shipment: Shipment, by: string, state: 'ok' | 'question') {
	const file = await keepBytes(Buffer.from(shipment.id), 'text/csv', testNow);
	return LoggerRead.create({
		...{ id: uuid(), shipmentId: shipment.id, fileId: file.id, part: 0, fileName: 'trip-0077.csv', state },
		...{ answers: {}, readerVersion: '1', uploadedBy: by, uploadedAt: testNow },
		keptAt: state === 'ok' ? testNow : null
	});
}

async function addTrip(shipment: Shipment) {
	return LoggerTrip.create({
		...{ id: uuid(), shipmentId: shipment.id, serial: 'L-1', ordinal: 1, placement: 'air' },
		status: 'expected'
	});
}

/** A kept trace, and what it says of the docket's first line. */
async function addAssessment(built: Awaited<ReturnType<typeof buildShipment>>, by: string) {
	const { shipment, lines } = built;
	const read = await addRead(shipment, by, 'ok');
	const trace = await TraceRow.create({
		...{ id: uuid(), readId: read.id, shipmentId: shipment.id, ordinal: 1, name: 'T', unit: 'celsius' },
		...{ quantity: 'temperature', decimals: 1, readings: 2, firstAt: testNow, lastAt: testNow },
		...{ usualIntervalMs: 600_000, packed: Buffer.from([0]), contentSha256: 'a'.repeat(64), isAssessed: true }
	});
	const spec = await SpecVersion.findOne({ where: { productId: lines[0]?.productId } });
	const id = uuid();
	await AssessmentRow.create({
		...{ id, shipmentId: shipment.id, lineId: lines[0]?.id ?? '', traceId: trace.id },
		...{ specVersionId: spec?.id ?? '', engineVersion: '1', inputsSha256: 'b'.repeat(64) },
		...{ figures: '{}', remainingHours: 242.4, remainingLowHours: 232.8, remainingHighHours: 252 },
		...{ neededHours: 264, isGoverning: true, isCurrent: true, madeAt: testNow }
	});
	await ExcursionRow.create({
		...{ id: uuid(), assessmentId: id, ordinal: 2, kind: 'too-warm', severity: 'critical' },
		...{ fromAt: testNow, toAt: testNow, extremeCelsius: 11.3, costHours: 40 }
	});
}

describe('the arrivals board', () => {
	it('is not for suppliers, and hides other sites', async () => {
		const { site, supplier } = await buildShipment();
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(listBoard(own, site.id, today)).rejects.toMatchObject({ code: 'not-allowed' });
		const elsewhere = await contextAt(await buildSite());
		await expect(listBoard(elsewhere, site.id, today)).rejects.toMatchObject({ code: 'not-found' });
	});

	it('has the loads of the site’s own day, and today also what is still open', async () => {
		const site = await buildSite();
		const ctx = await contextAt(site);
		const product = (await buildProduct()).product;
		const make = (changes: Partial<Shipment>) => buildShipment({ site, product, ...changes });
		// 21:59 UTC of the third is 23:59 in Amsterdam; a minute later is the fourth.
		const lastMinute = await make({ dueAt: hour('21:59') });
		const tomorrow = await make({ dueAt: hour('22:00') });
		const openSinceMonday = await make({
			dueAt: new Date('2026-03-30T08:00:00Z'),
			arrivedAt: new Date('2026-03-30T08:10:00Z')
		});
		const lateSinceYesterday = await make({ dueAt: new Date('2026-04-02T15:00:00Z') });
		await make({ dueAt: new Date('2026-03-20T15:00:00Z') });
		await make({ dueAt: hour('08:00'), cancelledAt: testNow });
		await buildShipment();

		const board = await listBoard(ctx, site.id, today);
		expect(board.dayOn).toBe('2026-04-03');
		expect(board.rows.map((row) => row.number)).toEqual([
			openSinceMonday.shipment.number,
			lateSinceYesterday.shipment.number,
			lastMinute.shipment.number
		]);
		const next = await listBoard(ctx, site.id, boardQuery.parse({ day: '2026-04-04' }));
		expect(next.rows.map((row) => row.number)).toEqual([tomorrow.shipment.number]);
		expect(board.days).toEqual([
			{ on: '2026-04-03', loads: 3, done: 0, isShown: true },
			{ on: '2026-04-04', loads: 1, done: 0, isShown: false },
			{ on: '2026-04-02', loads: 1, done: 0, isShown: false }
		]);
		expect(board.opensAt).toBe('2026-04-03T02:00:00.000Z');
	});

	it('says of each load where it stands and what is next, for the one who asks', async () => {
		const site = await buildSite();
		const [dock, qa] = [await contextAt(site), await contextAt(site, 'qa')];
		const product = (await buildProduct()).product;
		const make = (changes: Partial<Shipment>) => buildShipment({ site, product, ...changes });
		const expected = await make({ dueAt: hour('08:00') });
		const unread = await make({ arrivedAt: hour('07:00') });
		await addTrip(unread.shipment);
		const asking = await make({ arrivedAt: hour('07:10') });
		const read = await addRead(asking.shipment, dock.actor.id, 'question');
		const held = await make({ arrivedAt: hour('05:00') });
		await addAssessment(held, dock.actor.id);
		const hold = { id: uuid(), shipmentId: held.shipment.id, putBy: qa.actor.id, putAt: testNow };
		await Hold.create({ ...hold, reason: 'warm' });
		const done = await make({ arrivedAt: hour('04:00'), decidedAt: testNow, verdict: 'accepted' });

		const board = await listBoard(dock, site.id, today);
		const rowOf = ({ shipment }: { shipment: Shipment }, from = board) =>
			from.rows.find((row) => row.id === shipment.id);
		const docket = (built: { shipment: Shipment }) => `/shipments/${built.shipment.number}`;
		expect(rowOf(expected)).toMatchObject({
			stage: 'expected',
			next: { act: 'log-arrival', href: `${docket(expected)}/arrival` }
		});
		expect(rowOf(unread)).toMatchObject({
			...{ stage: 'at-the-door', reads: { due: 1, kept: 0 } },
			next: { act: 'upload', href: `${docket(unread)}/reads`, isMine: true }
		});
		expect(rowOf(asking)).toMatchObject({
			finding: { kind: 'question', fileName: 'trip-0077.csv' },
			next: { act: 'answer', questions: 1, href: `${docket(asking)}/reads/${read.id}` }
		});
		expect(rowOf(held)).toMatchObject({
			stage: 'on-hold',
			life: { hours: 242.4, lowHours: 232.8, highHours: 252, neededHours: 264, fullHours: 432 },
			finding: { kind: 'excursion', ordinal: 2, severity: 'critical', extremeCelsius: 11.3 },
			next: { act: 'open', isMine: false }
		});
		expect(rowOf(done)).toMatchObject({ stage: 'done', verdict: 'accepted', next: { act: 'open' } });
		expect(board.counts).toEqual({
			...{ expected: 1, 'at-the-door': 2, 'on-hold': 1, done: 1 },
			...{ mine: 2, all: 5 }
		});
		const forQa = await listBoard(qa, site.id, today);
		expect(rowOf(held, forQa)?.next).toEqual({
			...{ act: 'sign', href: `${docket(held)}/sign`, questions: 0, isMine: true }
		});
	});

	it('shows the clock that an arrival starts', async () => {
		const { site, shipment } = await buildShipment();
		const ctx = await contextAt(site);
		const seen = arrivalInput.parse({ arrived: '2026-04-03T05:52', seal: 'as-on-papers' });
		await logArrival(ctx, shipment.number, seen);
		const [row] = (await listBoard(ctx, site.id, today)).rows;
		expect(row?.rejectBy).toEqual({
			startsAt: '2026-04-03T03:52:00.000Z',
			deadlineAt: '2026-04-03T11:52:00.000Z'
		});
	});

	it('keeps to its filters while the counts stay those of the day', async () => {
		const site = await buildSite();
		const ctx = await contextAt(site);
		const carrier = await buildPartner({ isSupplier: false, isCarrier: true, name: 'Lanyard Freight' });
		const wanted = await buildShipment({ site, carrier, dock: 'Dock 2', lines: [{ lot: 'TH-99' }] });
		await buildShipment({ site, dock: 'Dock 1' });
		for (const query of [
			{ dock: 'Dock 2' },
			{ carrier: carrier.id },
			{ product: wanted.lines[0]?.productId },
			{ q: 'th-99' },
			{ q: 'lanyard' }
		]) {
			const board = await listBoard(ctx, site.id, boardQuery.parse(query));
			expect(board.rows.map((row) => row.id)).toEqual([wanted.shipment.id]);
			expect(board.counts.all).toBe(2);
		}
	});

	it('names a holiday, and a day on which the docks stay shut', async () => {
		const site = await buildSite();
		const ctx = await contextAt(site);
		await SiteHoliday.create({ id: uuid(), siteId: site.id, heldOn: '2026-04-03', name: 'Good Friday' });
		expect((await listBoard(ctx, site.id, today)).holiday).toBe('Good Friday');
		const sunday = await listBoard(ctx, site.id, boardQuery.parse({ day: '2026-04-05' }));
		expect(sunday).toMatchObject({ opensAt: null, closesAt: null, holiday: null, isToday: false });
	});

	it('asks as many questions of the database for thirty loads as for three', async () => {
		const site = await buildSite();
		const ctx = await contextAt(site);
		const given = { site, ...(await buildProduct()), supplier: await buildPartner() };
		const asked = async () => {
			let queries = 0;
			database().addHook('beforeQuery', 'count', () => void queries++);
			await listBoard(ctx, site.id, today);
			database().removeHook('beforeQuery', 'count');
			return queries;
		};
		for (let n = 0; n < 3; n++) await buildShipment(given);
		const few = await asked();
		for (let n = 0; n < 27; n++) await buildShipment(given);
		expect(await asked()).toBe(few);
	});
});
