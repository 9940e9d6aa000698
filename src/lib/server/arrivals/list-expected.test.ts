import { describe, expect, it } from 'vitest';
import {
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { listExpected } from './list-expected';

useTestDatabase();

describe('loads that may be at the door', () => {
	it('are those expected today, or those that carry what was scanned', async () => {
		const site = await buildSite();
		const expected = await buildShipment({ site, dueAt: new Date('2026-04-03T09:00:00Z') });
		const here = await buildShipment({ site, arrivedAt: testNow });
		const nextWeek = await buildShipment({ site, dueAt: new Date('2026-04-10T09:00:00Z'), seal: 'S-88' });
		const ctx = await contextFor(await buildUser(['dock'], { sites: [site] }));
		const numbers = async (q: string) => (await listExpected(ctx, site.id, q)).map((row) => row.number);
		expect(await numbers('')).toEqual([expected.shipment.number]);
		expect(await numbers('s-88')).toEqual([nextWeek.shipment.number]);
		expect(await numbers(here.shipment.number)).toEqual([here.shipment.number]);
	});

	it('are for those who log arrivals, at their own sites', async () => {
		const { site } = await buildShipment();
		const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
		await expect(listExpected(claims, site.id, '')).rejects.toMatchObject({ code: 'not-allowed' });
		const elsewhere = await contextFor(await buildUser(['dock'], { sites: [await buildSite()] }));
		await expect(listExpected(elsewhere, site.id, '')).rejects.toMatchObject({ code: 'not-found' });
	});
});
