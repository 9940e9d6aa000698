import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildPartner,
	buildProduct,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { shipmentInput } from '../../schemas/shipment-form';
import type { Role } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { Handover } from '../db/models/handover';
import { LoggerTrip } from '../db/models/logger-trip';
import { Pallet } from '../db/models/pallet';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { createShipment } from './create-shipment';

useTestDatabase();

async function setUp(role: Role = 'dock', now = testNow) {
	const site = await buildSite();
	const supplier = await buildPartner();
	const carrier = await buildPartner({ isSupplier: false, isCarrier: true });
	const { product } = await buildProduct();
	const user = await buildUser([role], role === 'supplier' ? { partner: supplier } : { sites: [site] });
	const papers = {
		supplierId: supplier.id,
		carrierId: carrier.id,
		purchaseOrder: '450-1',
		due: '2026-04-03T09:30',
		lines: [
			{
				productId: product.id,
				lot: 'OB-1',
				cases: '100',
				ssccs: '106141412345678908',
				pallets: '3',
				value: '1382,40'
			}
		],
		handovers: [
			{ partnerId: supplier.id, place: 'cold room', planned: '2026-03-30T08:10' },
			{ partnerId: carrier.id, place: 'road', planned: '2026-04-01T20:00', setPointCelsius: '0,5' }
		],
		loggers: [{ serial: 'LG-77', line: '1', placement: 'between-cases' }]
	};
	const make = (changes: object = {}) => shipmentInput.parse({ ...papers, ...changes });
	return { site, supplier, carrier, product, ctx: await contextFor(user, now), make };
}

describe('creating a shipment', () => {
	it.each(['claims', 'supplier'] as const)('is not for the role %s', async (role) => {
		const { ctx, site, make } = await setUp(role);
		await expect(createShipment(ctx, site.id, make())).rejects.toMatchObject({ code: 'not-allowed' });
	});

	it('is not possible at a site of others', async () => {
		const { ctx, make } = await setUp();
		const other = await buildSite();
		await expect(createShipment(ctx, other.id, make())).rejects.toMatchObject({ code: 'not-found' });
	});

	it('keeps the papers, lines, pallets, handovers and expected loggers, with an audit entry', async () => {
		const { ctx, site, make, supplier } = await setUp();
		const { id, number } = await createShipment(ctx, site.id, make());
		expect(number).toBe(`${site.code}-26-0001`);

		const shipment = await Shipment.findByPk(id);
		expect(shipment).toMatchObject({ siteId: site.id, supplierId: supplier.id, createdBy: ctx.actor.id });
		expect(shipment?.dueAt?.toISOString()).toBe('2026-04-03T07:30:00.000Z');
		const [line] = await ShipmentLine.findAll({ where: { shipmentId: id } });
		expect(line).toMatchObject({ casesAdvised: 100, valueMinor: 138_240, currency: 'EUR' });
		const pallets = await Pallet.findAll({ where: { lineId: line?.id }, order: ['ordinal'] });
		expect(pallets.map((pallet) => pallet.cases)).toEqual([33, 33, 34]);
		expect(pallets[0]?.sscc).toBe('106141412345678908');
		const handovers = await Handover.findAll({ where: { shipmentId: id }, order: ['ordinal'] });
		expect(handovers.map((row) => row.plannedAt?.toISOString())).toEqual([
			'2026-03-30T06:10:00.000Z',
			'2026-04-01T18:00:00.000Z',
			'2026-04-03T07:30:00.000Z'
		]);
		expect(handovers[2]?.holder).toBe(site.name);
		expect(await LoggerTrip.findOne({ where: { shipmentId: id } })).toMatchObject({
			serial: 'LG-77',
			lineId: line?.id,
			status: 'expected'
		});
		expect(await AuditEntry.count({ where: { type: 'shipment.created' } })).toBeGreaterThan(0);
	});

	it('gives dockets made at the same moment different numbers', async () => {
		const { ctx, site, make } = await setUp();
		const made = await Promise.all([1, 2, 3, 4, 5].map(() => createShipment(ctx, site.id, make())));
		expect(made.map(({ number }) => number).sort()).toEqual(
			[1, 2, 3, 4, 5].map((n) => `${site.code}-26-000${n}`)
		);
	});

	it('counts each year by the site’s own calendar', async () => {
		// 23:30 UTC of the last of December is already next year in Amsterdam.
		const { ctx, site, make } = await setUp('dock', new Date('2026-12-31T23:30:00Z'));
		expect((await createShipment(ctx, site.id, make())).number).toBe(`${site.code}-27-0001`);
	});

	it('makes one docket of a form that was sent twice', async () => {
		const { ctx, site, make } = await setUp();
		const id = uuid();
		const [first, second] = await Promise.all([
			createShipment(ctx, site.id, make({ id })),
			createShipment(ctx, site.id, make({ id }))
		]);
		expect(second).toEqual(first);
		expect(await Shipment.count({ where: { siteId: site.id } })).toBe(1);
	});

	it('says beside the field what the records do not know, and writes nothing', async () => {
		const { ctx, site, make, carrier } = await setUp();
		const input = make({
			supplierId: carrier.id,
			due: '2026-03-29T02:30',
			loggers: [{ serial: 'LG-1', line: '4' }],
			handovers: [{ planned: '2026-04-02T10:00' }, { holder: 'Carrier', planned: '2026-04-01T10:00' }]
		});
		await expect(createShipment(ctx, site.id, input)).rejects.toMatchObject({
			code: 'invalid',
			issues: {
				supplierId: 'There is no such supplier.',
				due: expect.stringContaining('does not come on that day'),
				'loggers.0.line': 'There is no line 4.',
				'handovers.0.holder': expect.stringContaining('To whom'),
				'handovers.1.planned': expect.stringContaining('Earlier')
			}
		});
		expect(await Shipment.count({ where: { siteId: site.id } })).toBe(0);
	});
});
