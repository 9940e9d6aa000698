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
import { shipmentListQuery } from '../../schemas/shipment-list';
import { Hold } from '../db/models/hold';
import { listShipments } from './list-shipments';

useTestDatabase();

const query = (changes: object = {}) => shipmentListQuery.parse(changes);

async function setUp() {
	const site = await buildSite();
	const ctx = await contextFor(await buildUser(['claims'], { sites: [site] }));
	const expected = await buildShipment({ site, dueAt: new Date('2026-04-03T08:00:00Z') });
	const here = await buildShipment({ site, dueAt: new Date('2026-04-02T21:30:00Z'), arrivedAt: testNow });
	const held = await buildShipment({ site, dueAt: new Date('2026-04-02T08:00:00Z'), arrivedAt: testNow });
	const by = (await buildUser(['qa'], { sites: [site] })).id;
	await Hold.create({ id: uuid(), shipmentId: held.shipment.id, putBy: by, putAt: testNow, reason: 'x' });
	const done = await buildShipment({
		...{ site, dueAt: new Date('2026-04-01T08:00:00Z'), arrivedAt: testNow, decidedAt: testNow },
		verdict: 'accepted'
	});
	const cancelled = await buildShipment({ site, cancelledAt: testNow });
	await buildShipment();
	const numbers = async (changes: object) =>
		(await listShipments(ctx, site.id, query(changes))).items.map((row) => row.number);
	return { site, ctx, expected, here, held, done, cancelled, numbers };
}

describe('the list of dockets', () => {
	it('is for staff of the site', async () => {
		const { site, supplier } = await buildShipment();
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(listShipments(own, site.id, query())).rejects.toMatchObject({ code: 'not-allowed' });
		const elsewhere = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
		await expect(listShipments(elsewhere, site.id, query())).rejects.toMatchObject({ code: 'not-found' });
	});

	it('has the site’s dockets, latest due first, without cancelled ones', async () => {
		const { ctx, site, expected, here, held, done, numbers } = await setUp();
		const all = [expected, here, held, done].map(({ shipment }) => shipment.number);
		expect(await numbers({})).toEqual(all);
		expect(await numbers({ sort: 'due', dir: 'asc' })).toEqual([...all].reverse());
		const { items, total } = await listShipments(ctx, site.id, query());
		expect(total).toBe(4);
		expect(items[3]).toMatchObject({ stage: 'done', verdict: 'accepted', cases: 960 });
	});

	it('narrows by stage, party, product and the days of the site’s calendar', async () => {
		const { expected, here, held, done, cancelled, numbers } = await setUp();
		const only = async (changes: object, ...wanted: (typeof expected)[]) =>
			expect(await numbers(changes)).toEqual(wanted.map(({ shipment }) => shipment.number));
		await only({ stage: 'expected' }, expected);
		await only({ stage: 'at-the-door' }, here);
		await only({ stage: 'on-hold' }, held);
		await only({ stage: 'done' }, done);
		await only({ stage: 'cancelled' }, cancelled);
		await only({ supplier: held.supplier.id }, held);
		await only({ carrier: done.carrier.id }, done);
		await only({ product: here.lines[0]?.productId }, here);
		await only({ q: expected.shipment.purchaseOrder ?? '' }, expected);
		// 21:30 UTC of the second is 23:30 in Amsterdam, the same day.
		await only({ from: '2026-04-02', to: '2026-04-02' }, here, held);
		await only({ from: 'nonsense', stage: 'nonsense', sort: 'supplier', q: 'no such thing' });
	});
});

describe('a search in the list of dockets', () => {
	it('finds a docket by its number, its supplier, its carrier and its lots, and takes a wildcard for a sign', async () => {
		const { expected, numbers } = await setUp();
		const { shipment, lines, supplier } = expected;
		const all = (await numbers({})).length;
		expect(await numbers({ q: shipment.number })).toEqual([shipment.number]);
		expect(await numbers({ q: supplier.name })).toContain(shipment.number);
		expect(await numbers({ q: lines[0]?.lot ?? 'no lot' })).toContain(shipment.number);
		expect((await numbers({ q: supplier.name })).length).toBeLessThanOrEqual(all);
		expect(await numbers({ q: '%' })).toEqual([]);
		expect(await numbers({ q: 'nobody of that name' })).toEqual([]);
	});
});
