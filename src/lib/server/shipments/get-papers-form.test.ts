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
import { ShipmentLine } from '../db/models/shipment-line';
import { changeShipment } from './change-shipment';
import { getPapersForm } from './get-papers-form';

useTestDatabase();

describe('the form of the papers', () => {
	it('goes back unchanged: what it shows is what it keeps', async () => {
		const { shipment, site, lines } = await buildShipment();
		const ctx = await contextFor(await buildUser(['dock'], { sites: [site] }));
		const { values } = await getPapersForm(ctx, shipment.number);
		const before = await ShipmentLine.findByPk(lines[0]?.id);
		await changeShipment(ctx, shipment.number, shipmentChange.parse(values));
		expect((await ShipmentLine.findByPk(lines[0]?.id))?.get()).toEqual(before?.get());
		const again = (await getPapersForm(ctx, shipment.number)).values;
		expect({ ...again, version: 0 }).toEqual({ ...values, version: 0 });
	});

	it('is for those who may change the docket, as long as it is open', async () => {
		const { shipment, site } = await buildShipment({ decidedAt: testNow });
		const ctx = await contextFor(await buildUser(['dock'], { sites: [site] }));
		await expect(getPapersForm(ctx, shipment.number)).rejects.toMatchObject({ code: 'already-signed' });
		const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
		await expect(getPapersForm(claims, shipment.number)).rejects.toMatchObject({ code: 'not-allowed' });
		const elsewhere = await contextFor(await buildUser(['dock'], { sites: [await buildSite()] }));
		await expect(getPapersForm(elsewhere, shipment.number)).rejects.toMatchObject({ code: 'not-found' });
	});
});
