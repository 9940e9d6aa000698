import { describe, expect, it } from 'vitest';
import {
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { shipmentChange } from '../../schemas/shipment-form';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { Clock } from '../db/models/clock';
import { Handover } from '../db/models/handover';
import { Pallet } from '../db/models/pallet';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { cancelShipment } from './cancel-shipment';
import { changeShipment } from './change-shipment';

useTestDatabase();

async function setUp(overrides: Parameters<typeof buildShipment>[0] = {}) {
	const built = await buildShipment(overrides);
	const { shipment, lines, handovers, supplier, carrier, site } = built;
	const user = await buildUser(['dock'], { sites: [site] });
	const papers = {
		version: shipment.version,
		supplierId: supplier.id,
		carrierId: carrier.id,
		due: '2026-04-03T05:30',
		seal: '0093188',
		rejectWithinHours: '8',
		lines: lines.map((line) => ({
			id: line.id,
			productId: line.productId,
			lot: line.lot,
			cases: String(line.casesAdvised),
			pallets: String(line.palletsAdvised)
		})),
		handovers: handovers.map((row) => ({
			id: row.id,
			holder: row.holder,
			place: row.place,
			planned: row.plannedAt?.toISOString()
		}))
	};
	const make = (changes: object = {}) => shipmentChange.parse({ ...papers, ...changes });
	return { ...built, ctx: await contextFor(user), make, papers };
}

describe('changing a shipment', () => {
	it('is for dock, QA and admin of its site; others learn nothing of it', async () => {
		const { shipment, make, supplier, site } = await setUp();
		const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
		await expect(changeShipment(claims, shipment.number, make())).rejects.toMatchObject({
			code: 'not-allowed'
		});
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(changeShipment(own, shipment.number, make())).rejects.toMatchObject({ code: 'not-allowed' });
		const elsewhere = await contextFor(await buildUser(['dock'], { sites: [await buildSite()] }));
		await expect(changeShipment(elsewhere, shipment.number, make())).rejects.toMatchObject({
			code: 'not-found'
		});
	});

	it('writes papers, lines and handovers, counts the version and says what differs', async () => {
		const { shipment, lines, make, papers, ctx } = await setUp();
		const [line] = papers.lines;
		const [first, second, third] = papers.handovers;
		const added = { productId: line?.productId, lot: 'OB-NEW', cases: '7' };
		const stop = { holder: 'Cross-dock', planned: '2026-04-02T10:00' };
		await changeShipment(
			ctx,
			shipment.number,
			make({ lines: [added, line], handovers: [first, second, stop, third], reason: 'new papers' })
		);
		const after = await Shipment.findByPk(shipment.id);
		expect(after).toMatchObject({ seal: '0093188', version: 1 });
		const found = await ShipmentLine.findAll({ where: { shipmentId: shipment.id }, order: ['ordinal'] });
		expect(found.map((row) => row.lot)).toEqual(['OB-NEW', lines[0]?.lot]);
		expect(found[1]?.id).toBe(lines[0]?.id);
		expect(await Pallet.count({ where: { lineId: lines[0]?.id } })).toBe(5);
		const legs = await Handover.findAll({ where: { shipmentId: shipment.id }, order: ['ordinal'] });
		expect(legs.map((row) => row.holder)[2]).toBe('Cross-dock');
		const entry = await AuditEntry.findOne({ where: { chainId: shipment.id, type: 'shipment.changed' } });
		expect((await AuditPayload.findByPk(entry?.id))?.text).toContain('new papers');
	});

	it('takes out a line that is no longer on the papers', async () => {
		const { shipment, papers, make, ctx } = await setUp({ lines: [{}, { lot: 'OB-GONE' }] });
		await changeShipment(ctx, shipment.number, make({ lines: [papers.lines[0]] }));
		expect(await ShipmentLine.count({ where: { shipmentId: shipment.id } })).toBe(1);
	});

	it('is refused when somebody changed the docket meanwhile, and changes nothing', async () => {
		const { shipment, make, ctx } = await setUp();
		await changeShipment(ctx, shipment.number, make());
		await expect(changeShipment(ctx, shipment.number, make({ seal: 'X' }))).rejects.toMatchObject({
			code: 'changed-meanwhile'
		});
		expect((await Shipment.findByPk(shipment.id))?.seal).toBe('0093188');
	});

	it('does not take over a row of another docket', async () => {
		const { shipment, make, ctx, papers } = await setUp();
		const other = await setUp();
		const lines = [{ ...papers.lines[0], id: other.lines[0]?.id }];
		await expect(changeShipment(ctx, shipment.number, make({ lines }))).rejects.toMatchObject({
			code: 'changed-meanwhile'
		});
	});

	it('is refused once signed', async () => {
		const { shipment, make, ctx } = await setUp({ decidedAt: testNow, verdict: 'accepted' });
		await expect(changeShipment(ctx, shipment.number, make())).rejects.toMatchObject({
			code: 'already-signed'
		});
	});

	it('moves the rejection clock of a load that is here', async () => {
		const arrivedAt = new Date('2026-04-03T03:52:00Z');
		const { shipment, make, ctx } = await setUp({ arrivedAt });
		await changeShipment(ctx, shipment.number, make({ rejectWithinHours: '6' }));
		const clock = await Clock.findOne({ where: { shipmentId: shipment.id } });
		expect(clock?.deadlineAt.toISOString()).toBe('2026-04-03T09:52:00.000Z');
	});
});

describe('cancelling a shipment', () => {
	it('keeps the docket and says why', async () => {
		const { shipment, ctx } = await setUp();
		await cancelShipment(ctx, shipment.number, 'crop failed');
		expect((await Shipment.findByPk(shipment.id))?.cancelledAt).toEqual(testNow);
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'shipment.cancelled' } })).toBe(1);
		await expect(cancelShipment(ctx, shipment.number, 'again')).rejects.toMatchObject({ code: 'cancelled' });
	});

	it('is refused once the load is here, for other roles and at other sites', async () => {
		const { shipment, ctx, site } = await setUp({ arrivedAt: testNow });
		await expect(cancelShipment(ctx, shipment.number, 'no')).rejects.toMatchObject({
			code: 'already-arrived'
		});
		const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
		await expect(cancelShipment(claims, shipment.number, 'no')).rejects.toMatchObject({
			code: 'not-allowed'
		});
		const elsewhere = await contextFor(await buildUser(['dock'], { sites: [await buildSite()] }));
		await expect(cancelShipment(elsewhere, shipment.number, 'no')).rejects.toMatchObject({
			code: 'not-found'
		});
	});
});
