import { describe, expect, it } from 'vitest';
import {
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { holdInput } from '../../schemas/note';
import { AuditEntry } from '../db/models/audit-entry';
import { Hold } from '../db/models/hold';
import { liftHold } from './lift-hold';
import { putHold } from './put-hold';

useTestDatabase();

const input = holdInput.parse({ reason: 'smells of ammonia' });

async function setUp(overrides: Parameters<typeof buildShipment>[0] = { arrivedAt: testNow }) {
	const built = await buildShipment(overrides);
	const dock = await contextFor(await buildUser(['dock'], { sites: [built.site] }));
	const qa = await contextFor(await buildUser(['qa'], { sites: [built.site] }));
	return { ...built, dock, qa, number: built.shipment.number };
}

describe('a hold', () => {
	it('is put by dock or QA of the site only, and lifted by QA only', async () => {
		const { number, site, supplier, dock } = await setUp();
		const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
		await expect(putHold(claims, number, input)).rejects.toMatchObject({ code: 'not-allowed' });
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(putHold(own, number, input)).rejects.toMatchObject({ code: 'not-allowed' });
		const elsewhere = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
		await expect(putHold(elsewhere, number, input)).rejects.toMatchObject({ code: 'not-found' });
		await expect(liftHold(elsewhere, number)).rejects.toMatchObject({ code: 'not-found' });
		await putHold(dock, number, input);
		await expect(liftHold(dock, number)).rejects.toMatchObject({ code: 'not-allowed' });
	});

	it('stands until it is lifted, and each step is in the trail', async () => {
		const { number, dock, qa, shipment } = await setUp();
		await putHold(dock, number, input);
		await expect(putHold(dock, number, input)).rejects.toMatchObject({ code: 'already-on-hold' });
		await liftHold(qa, number);
		expect(await Hold.findAll({ where: { shipmentId: shipment.id } })).toMatchObject([
			{ reason: 'smells of ammonia', putBy: dock.actor.id, liftedBy: qa.actor.id, liftedAt: testNow }
		]);
		const entries = await AuditEntry.findAll({ where: { chainId: shipment.id }, order: ['seq'] });
		expect(entries.map((entry) => entry.type)).toEqual(['hold.put', 'hold.lifted']);
		await expect(liftHold(qa, number)).rejects.toMatchObject({ code: 'not-on-hold' });
	});

	it('says what it awaits and until when, by the clock of the site', async () => {
		const { number, dock, shipment } = await setUp();
		const late = holdInput.parse({ reason: 'warm', awaited: 'a count', until: '2026-04-02T12:00' });
		await expect(putHold(dock, number, late)).rejects.toMatchObject({ code: 'invalid' });
		await putHold(dock, number, { ...late, until: '2026-04-05T12:00' });
		expect(await Hold.findOne({ where: { shipmentId: shipment.id } })).toMatchObject({
			awaited: 'a count',
			untilAt: new Date('2026-04-05T10:00:00Z')
		});
	});

	it('needs the load to be here and not decided on', async () => {
		const expected = await setUp({});
		await expect(putHold(expected.dock, expected.number, input)).rejects.toMatchObject({
			code: 'not-arrived'
		});
		const signed = await setUp({ arrivedAt: testNow, decidedAt: testNow });
		await expect(putHold(signed.dock, signed.number, input)).rejects.toMatchObject({
			code: 'already-signed'
		});
	});
});
