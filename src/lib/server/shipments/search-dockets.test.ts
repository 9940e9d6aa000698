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
import { LoggerTrip } from '../db/models/logger-trip';
import { Pallet } from '../db/models/pallet';
import { searchDockets } from './search-dockets';

useTestDatabase();

describe('finding a docket', () => {
	it('goes by everything that stands on its papers, pallets and loggers', async () => {
		const { product } = await buildProduct();
		const { shipment, site, lines, supplier } = await buildShipment({
			...{ product, seal: 'SEAL-771', vehicle: 'QZ-88' }
		});
		await buildShipment({ site });
		const lineId = lines[0]?.id ?? '';
		await Pallet.create({ id: uuid(), lineId, ordinal: 1, sscc: '106141412345678908', cases: 1 });
		const trip = { id: uuid(), shipmentId: shipment.id, serial: 'LG-4711', ordinal: 1 };
		await LoggerTrip.create({ ...trip, placement: 'air', status: 'expected' });
		const ctx = await contextFor(await buildUser(['dock'], { sites: [site] }));
		for (const q of [
			shipment.number,
			'seal-771',
			'QZ-88',
			'LG-47',
			'(00)106141412345678908',
			shipment.purchaseOrder ?? '',
			supplier.name,
			product.name
		])
			expect((await searchDockets(ctx, q)).map((found) => found.number)).toContain(shipment.number);
		expect(await searchDockets(ctx, 'QZ-88')).toMatchObject([
			{ stage: 'expected', supplier: supplier.name, vehicle: 'QZ-88', zone: 'Europe/Amsterdam' }
		]);
	});

	it('takes signs of a pattern as they stand, and nothing typed finds nothing', async () => {
		const { site } = await buildShipment();
		const ctx = await contextFor(await buildUser(['qa'], { sites: [site] }));
		expect(await searchDockets(ctx, '%')).toEqual([]);
		expect(await searchDockets(ctx, '_')).toEqual([]);
		expect(await searchDockets(ctx, '  ')).toEqual([]);
	});

	it('finds nothing of other sites or of cancelled loads, and is not for suppliers', async () => {
		const { shipment, supplier } = await buildShipment();
		const site = await buildSite();
		const cancelled = await buildShipment({ site, cancelledAt: testNow });
		const ctx = await contextFor(await buildUser(['qa'], { sites: [site] }));
		expect(await searchDockets(ctx, shipment.number)).toEqual([]);
		expect(await searchDockets(ctx, cancelled.shipment.number)).toEqual([]);
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(searchDockets(own, shipment.number)).rejects.toMatchObject({ code: 'not-allowed' });
	});
});
