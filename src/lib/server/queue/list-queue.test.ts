import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildProduct,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { queueQuery } from '../../schemas/queue';
import type { Role } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { Clock } from '../db/models/clock';
import { Hold } from '../db/models/hold';
import { Shipment } from '../db/models/shipment';
import type { Site } from '../db/models/site';
import { findTaker } from './find-taker';
import { findNextWaiting, listQueue } from './list-queue';
import { handBackDocket, takeDocket } from './take-docket';

useTestDatabase();

const hour = (text: string) => new Date(`2026-04-03T${text}:00Z`);
const asked = (query: Record<string, string> = {}) => queueQuery.parse(query);

async function contextAt(site: Site, role: Role = 'qa') {
	return contextFor(await buildUser([role], { sites: [site] }));
}

async function makers() {
	const site = await buildSite();
	const { product } = await buildProduct();
	const make = async (changes: Partial<Shipment>, deadline?: string) => {
		const { shipment } = await buildShipment({ site, product, ...changes });
		if (deadline !== undefined)
			await Clock.create({
				...{ id: uuid(), shipmentId: shipment.id, noticeId: null, claimId: null, name: 'Reject the goods' },
				...{ basis: 'Terms', startsAt: hour('04:00'), deadlineAt: hour(deadline), metAt: null, metBy: null }
			});
		return shipment;
	};
	return { site, make, product, qa: await contextAt(site) };
}

async function hold(shipment: Shipment, by: string) {
	await Hold.create({ id: uuid(), shipmentId: shipment.id, putBy: by, putAt: testNow, reason: 'warm' });
}

describe('what waits for QA', () => {
	it('is for those who sign, at their own sites', async () => {
		const { site } = await makers();
		for (const role of ['dock', 'claims', 'admin'] as const)
			await expect(listQueue(await contextAt(site, role), site.id, asked())).rejects.toMatchObject({
				code: 'not-allowed'
			});
		const elsewhere = await contextAt(await buildSite());
		await expect(listQueue(elsewhere, site.id, asked())).rejects.toMatchObject({ code: 'not-found' });
	});

	it('stands by the clock that runs out first, then the longest waiting', async () => {
		const { site, make, qa } = await makers();
		const without = await make({ arrivedAt: hour('03:00') });
		const late = await make({ arrivedAt: hour('05:00') }, '14:00');
		const soon = await make({ arrivedAt: hour('06:00') }, '09:00');
		await make({ dueAt: hour('08:00') });
		await make({ arrivedAt: hour('05:00'), decidedAt: testNow, verdict: 'accepted' });
		await make({ arrivedAt: hour('05:00'), cancelledAt: testNow });
		const numbersOf = async (query: Record<string, string>) =>
			(await listQueue(qa, site.id, asked({ show: 'all', ...query }))).rows.map((row) => row.number);
		expect(await numbersOf({})).toEqual([soon.number, late.number, without.number]);
		expect(await numbersOf({ sort: 'arrived' })).toEqual([without.number, late.number, soon.number]);
		expect(await numbersOf({ q: soon.number })).toEqual([soon.number]);
	});

	it('is narrowed to what is ready and to who has taken it', async () => {
		const { site, make, qa, product } = await makers();
		const held = await make({ arrivedAt: hour('05:00') });
		await hold(held, qa.actor.id);
		const unread = await make({ arrivedAt: hour('06:00') });
		await takeDocket(qa, held.number);
		const queue = await listQueue(qa, site.id, asked({ show: 'all' }));
		expect(queue.counts).toMatchObject({ all: 2, mine: 1, nobody: 1 });
		expect(queue.products).toEqual([{ id: product.id, name: product.name }]);
		expect(queue.rows.find((row) => row.id === held.id)?.takenBy?.id).toBe(qa.actor.id);
		const mine = await listQueue(qa, site.id, asked({ taken: 'me' }));
		expect(mine.rows.map((row) => row.number)).toEqual([held.number]);
		const free = await listQueue(qa, site.id, asked({ taken: 'nobody', show: 'all' }));
		expect(free.rows.map((row) => row.number)).toEqual([unread.number]);
	});

	it('keeps a load that is signed in part and held for the rest, by the clock of the hold', async () => {
		const { site, make, qa } = await makers();
		const part = await make({ arrivedAt: hour('05:00'), decidedAt: testNow, verdict: 'part' });
		await Hold.create({
			...{ id: uuid(), shipmentId: part.id, putBy: qa.actor.id, putAt: testNow, reason: '2 pallets' },
			...{ awaited: 'a count', untilAt: hour('12:00') }
		});
		const { rows } = await listQueue(qa, site.id, asked());
		expect(rows).toMatchObject([
			{
				number: part.number,
				clock: { kind: 'hold', deadlineAt: '2026-04-03T12:00:00.000Z' },
				next: { href: `/shipments/${part.number}/sign?amend`, isMine: true }
			}
		]);
		await takeDocket(qa, part.number);
		expect((await listQueue(qa, site.id, asked({ taken: 'me' }))).rows).toHaveLength(1);
	});

	it('names what comes next, but not what a colleague has taken on', async () => {
		const { site, make, qa } = await makers();
		const colleague = await contextAt(site);
		const [first, second, third] = [
			await make({ arrivedAt: hour('05:00') }, '09:00'),
			await make({ arrivedAt: hour('05:00') }, '10:00'),
			await make({ arrivedAt: hour('05:00') }, '11:00')
		];
		for (const shipment of [first, second, third]) await hold(shipment, qa.actor.id);
		await takeDocket(colleague, second.number);
		expect((await findNextWaiting(qa, site.id, first.number))?.number).toBe(third.number);
		expect((await findNextWaiting(colleague, site.id, first.number))?.number).toBe(second.number);
	});
});

describe('taking a docket on', () => {
	it('is written down, can be taken over, and is handed back by whoever has it', async () => {
		const { site, make, qa } = await makers();
		const colleague = await contextAt(site);
		const docket = await make({ arrivedAt: hour('05:00') });
		await takeDocket(qa, docket.number);
		await takeDocket(qa, docket.number);
		await takeDocket(colleague, docket.number);
		expect(await findTaker(qa, docket.number)).toMatchObject({ name: colleague.actor.name, isOwn: false });
		expect(await findTaker(colleague, docket.number)).toMatchObject({ isOwn: true });
		await handBackDocket(qa, docket.number);
		expect((await Shipment.findByPk(docket.id))?.takenBy).toBe(colleague.actor.id);
		await handBackDocket(colleague, docket.number);
		expect((await Shipment.findByPk(docket.id))?.takenBy).toBeNull();
		const entries = await AuditEntry.findAll({
			order: ['seq'],
			where: { type: ['docket.taken', 'docket.handed-back'] }
		});
		expect(entries.map((entry) => entry.type).slice(-3)).toEqual([
			'docket.taken',
			'docket.taken',
			'docket.handed-back'
		]);
	});

	it('is not for the dock, nor for what has not come or is decided', async () => {
		const { site, make, qa } = await makers();
		const docket = await make({ arrivedAt: hour('05:00') });
		await expect(takeDocket(await contextAt(site, 'dock'), docket.number)).rejects.toMatchObject({
			code: 'not-allowed'
		});
		const expected = await make({ dueAt: hour('08:00') });
		await expect(takeDocket(qa, expected.number)).rejects.toMatchObject({ code: 'not-arrived' });
		const done = await make({ arrivedAt: hour('04:00'), decidedAt: testNow, verdict: 'accepted' });
		await expect(takeDocket(qa, done.number)).rejects.toMatchObject({ code: 'already-signed' });
	});
});
