import { describe, expect, it } from 'vitest';
import {
	buildPartner,
	buildProduct,
	buildSite,
	buildUser,
	contextFor
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import type { Role } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { Handover } from '../db/models/handover';
import { LoggerTrip } from '../db/models/logger-trip';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { importNotices, previewImport } from './import-notices';

useTestDatabase();

async function setUp(role: Role = 'dock') {
	const site = await buildSite();
	const supplier = await buildPartner();
	const carrier = await buildPartner({
		...{ name: `Bexcombe Haulage ${site.code}`, isSupplier: false, isCarrier: true },
		gln: '9506000050027'
	});
	const { product } = await buildProduct();
	const partner = role === 'supplier' ? { partner: supplier } : { sites: [site] };
	const ctx = await contextFor(await buildUser([role], partner));
	const head = 'load;supplier;carrier;order;waybill;due;loaded;product;lot;cases;loggers';
	const row = (
		load: string,
		lot: string,
		more: Partial<Record<'order' | 'due' | 'cases' | 'product', string>> = {}
	) =>
		[
			...[load, supplier.name.toUpperCase(), '9506000050027', more.order ?? `PO-${load}`, ''],
			...[more.due ?? '2026-04-03 05:30', '2026-04-01 20:00', more.product ?? product.name, lot],
			...[more.cases ?? '100', `LG-${lot}`]
		].join(';');
	const file = (...rows: string[]) => [head, ...rows].join('\r\n');
	const count = () => Shipment.count({ where: { siteId: site.id } });
	return { site, supplier, carrier, ctx, row, file, count };
}

describe('importing advance notices', () => {
	it.each(['claims', 'supplier'] as const)('is not for the role %s', async (role) => {
		const { ctx, site, file } = await setUp(role);
		await expect(previewImport(ctx, site.id, file())).rejects.toMatchObject({ code: 'not-allowed' });
		await expect(importNotices(ctx, site.id, file(), 'all')).rejects.toMatchObject({ code: 'not-allowed' });
	});

	it('is not possible at a site of others', async () => {
		const { ctx, row, file } = await setUp();
		const other = await buildSite();
		await expect(previewImport(ctx, other.id, file(row('A', '1')))).rejects.toMatchObject({
			code: 'not-found'
		});
	});

	it('makes rows with one name the lines of one load', async () => {
		const { ctx, site, carrier, row, file } = await setUp();
		const text = file(row('A', '1'), row('A', '2'), row('B', '3'));
		const preview = await previewImport(ctx, site.id, text);
		expect(preview.loads).toMatchObject([
			{ name: 'A', lines: 2, cases: 200, faults: [], knownAs: null },
			{ name: 'B', lines: 1, cases: 100, firstRow: 4 }
		]);
		const { numbers } = await importNotices(ctx, site.id, text, 'all');
		expect(numbers).toEqual([`${site.code}-26-0001`, `${site.code}-26-0002`]);
		const shipment = await Shipment.findOne({ where: { number: numbers[0] } });
		expect(await ShipmentLine.count({ where: { shipmentId: shipment?.id } })).toBe(2);
		expect(await LoggerTrip.count({ where: { shipmentId: shipment?.id } })).toBe(2);
		const legs = await Handover.findAll({ where: { shipmentId: shipment?.id }, order: ['ordinal'] });
		expect(legs.map((leg) => leg.holder)).toEqual([carrier.name, site.name]);
		expect(await AuditEntry.count({ where: { chainId: shipment?.id, type: 'shipment.created' } })).toBe(1);
	});

	it('says what is wrong by row and column, and writes nothing before that', async () => {
		const { ctx, site, row, file, count } = await setUp();
		const text = file(
			row('A', '1'),
			row('B', '2', { due: '2026-03-29 02:30' }),
			row('C', '', { cases: 'many', product: 'Moon cheese' }),
			row('A', '4', { order: 'another' })
		);
		const { loads } = await previewImport(ctx, site.id, text);
		const faults = loads.flatMap((load) => load.faults.map(({ row: at, column }) => [load.name, at, column]));
		expect(faults).toEqual([
			['A', 5, 'order'],
			['B', 3, 'due'],
			['C', 4, 'product'],
			['C', 4, 'lot'],
			['C', 4, 'cases']
		]);
		expect(loads[2]?.faults[0]?.text).toContain('“Moon cheese”');
		await expect(importNotices(ctx, site.id, text, 'all')).rejects.toMatchObject({ code: 'invalid' });
		expect(await count()).toBe(0);
	});

	it('imports the good loads when that was chosen', async () => {
		const { ctx, site, row, file, count } = await setUp();
		const text = file(row('A', '1'), row('B', '2', { cases: 'many' }));
		expect((await importNotices(ctx, site.id, text, 'good')).numbers).toHaveLength(1);
		expect(await count()).toBe(1);
	});

	it('knows papers that were imported before, and those that stand in the file twice', async () => {
		const { ctx, site, row, file, count } = await setUp();
		await importNotices(ctx, site.id, file(row('A', '1')), 'all');
		const again = file(row('A', '1'), row('B', '2'), row('C', '3', { order: 'PO-B' }));
		const { loads } = await previewImport(ctx, site.id, again);
		expect(loads[0]?.knownAs).toBe(`${site.code}-26-0001`);
		expect(loads[2]?.faults[0]?.text).toContain('those of B');
		expect(await importNotices(ctx, site.id, again, 'good')).toMatchObject({
			known: 1,
			numbers: { length: 1 }
		});
		expect(await count()).toBe(2);
	});

	it('tells a file that is no table apart', async () => {
		const { ctx, site } = await setUp();
		expect(await previewImport(ctx, site.id, '')).toMatchObject({ fault: 'The file is empty.', loads: [] });
		await expect(importNotices(ctx, site.id, '', 'all')).rejects.toMatchObject({ code: 'invalid' });
	});
});
