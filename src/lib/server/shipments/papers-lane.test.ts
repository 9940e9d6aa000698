import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildPartner,
	buildShipment,
	buildSite,
	buildUser,
	contextFor
} from '../../../../tests/helpers/factories';
import { buildTrace, steadyTrace } from '../../../../tests/helpers/trace-factory';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { laneForm } from '../../schemas/lane';
import { shipmentChange, shipmentInput } from '../../schemas/shipment-form';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { LineRecommendation } from '../db/models/line-recommendation';
import { Shipment } from '../db/models/shipment';
import { docketView } from '../dockets/get-docket';
import { evidenceText } from '../dispositions/freeze';
import { addLane, switchLane } from '../lanes/save-lane';
import { changeShipment } from './change-shipment';
import { createShipment } from './create-shipment';
import { getPapersForm } from './get-papers-form';

useTestDatabase();

const [from, to] = ['2026-03-30T06:10:00Z', '2026-04-03T03:30:00Z'];

/** A load at the door that is good but for an opening balance nobody declared, which is a note as usual. */
async function atTheDoor() {
	const arrivedAt = new Date('2026-04-03T03:52:00Z');
	const made = await buildShipment({ arrivedAt, lines: [{ openingKind: 'undeclared' }] });
	const { shipment, site, lines } = made;
	await buildTrace(shipment, await buildUser(['qa'], { sites: [site] }), steadyTrace(0, from, to, 5));
	const ctx = await contextFor(await buildUser(['dock'], { sites: [site] }));
	const admin = await contextFor(await buildUser(['admin'], { sites: [site] }));
	const laneOf = (more: Record<string, unknown> = {}) =>
		addLane(admin, laneForm.parse({ name: `Lane ${uuid()}`, siteId: site.id, ...more }));
	const save = async (changes: object) => {
		const { values } = await getPapersForm(ctx, shipment.number);
		return changeShipment(ctx, shipment.number, shipmentChange.parse({ ...values, ...changes }));
	};
	const found = async () => {
		const row = await LineRecommendation.findOne({ where: { lineId: lines[0]?.id } });
		const reasons = JSON.parse(row?.reasons ?? '[]') as { code: string; grade: string }[];
		const opening = reasons.find(({ code }) => code === 'opening-undeclared');
		return [row?.recommended, opening?.grade];
	};
	return { ...made, ctx, admin, laneOf, save, found };
}

describe('the lane of a docket', () => {
	it('grades its findings as soon as the papers name it, and no longer when they name none', async () => {
		const { laneOf, save, found } = await atTheDoor();
		const strict = await laneOf({ grades: { 'opening-undeclared': 'hold' } });
		const mild = await laneOf({ grades: { 'opening-undeclared': 'inform' } });
		await save({ seal: '0093188' });
		expect(await found()).toEqual(['accept', 'note']);
		await save({ laneId: strict });
		expect(await found()).toEqual(['hold', 'hold']);
		await save({ laneId: mild });
		expect(await found()).toEqual(['accept', 'inform']);
		await save({ laneId: strict });
		await save({ laneId: '' });
		expect(await found()).toEqual(['accept', 'note']);
	});

	it('is on the record with what it was before, with who chose it', async () => {
		const { laneOf, save, shipment, ctx } = await atTheDoor();
		const laneId = await laneOf();
		await save({ laneId, reason: 'came over the pass' });
		const entry = await AuditEntry.findOne({ where: { chainId: shipment.id, type: 'shipment.changed' } });
		expect(entry?.actorId).toBe(ctx.actor.id);
		expect(JSON.parse((await AuditPayload.findByPk(entry?.id))?.text ?? '{}')).toMatchObject({
			before: { laneId: null },
			after: { laneId },
			reason: 'came over the pass'
		});
	});

	it('is a fact the signer saw; a docket on none has the facts it had', async () => {
		const { laneOf, save, shipment, ctx } = await atTheDoor();
		const facts = async () => evidenceText(await docketView(await shipment.reload(), ctx.now));
		expect(await facts()).not.toContain('"lane"');
		await save({ laneId: await laneOf({ name: 'Over the pass' }) });
		expect(await facts()).toContain('"lane":"Over the pass"');
	});

	it('leads from the supplier of the papers to their site, and is in use', async () => {
		const { laneOf, save, admin, supplier } = await atTheDoor();
		const elsewhere = await laneOf({ siteId: (await buildSite()).id });
		const others = await laneOf({ supplierId: (await buildPartner()).id });
		const off = await laneOf();
		await switchLane(admin, off, false);
		for (const laneId of [uuid(), elsewhere, others, off])
			await expect(save({ laneId })).rejects.toMatchObject({ issues: { laneId: expect.any(String) } });
		const own = await laneOf({ supplierId: supplier.id });
		await save({ laneId: own });
		const change = save({ supplierId: (await buildPartner()).id });
		await expect(change).rejects.toMatchObject({ issues: { laneId: expect.stringContaining('supplier') } });
	});

	it('stays when it has been switched off since, and is offered to that docket alone', async () => {
		const { laneOf, save, admin, ctx, shipment, site } = await atTheDoor();
		const laneId = await laneOf();
		await save({ laneId });
		await switchLane(admin, laneId, false);
		const { values, choices } = await getPapersForm(ctx, shipment.number);
		expect(values.laneId).toBe(laneId);
		expect(choices.lanes.map(({ id }) => id)).toEqual([laneId]);
		await save({ seal: '0093199' });
		expect((await Shipment.findByPk(shipment.id))?.laneId).toBe(laneId);
		const other = await buildShipment({ site });
		expect((await getPapersForm(ctx, other.shipment.number)).choices.lanes).toEqual([]);
	});

	it('is named when a docket is opened too', async () => {
		const { laneOf, ctx, site, supplier, lines } = await atTheDoor();
		const laneId = await laneOf();
		const papers = (more: object) =>
			shipmentInput.parse({
				supplierId: supplier.id,
				due: '2026-04-04T05:30',
				lines: [{ productId: lines[0]?.productId, lot: 'OB-1', cases: '10' }],
				...more
			});
		const { id } = await createShipment(ctx, site.id, papers({ laneId }));
		expect((await Shipment.findByPk(id))?.laneId).toBe(laneId);
		const none = await createShipment(ctx, site.id, papers({}));
		expect((await Shipment.findByPk(none.id))?.laneId).toBeNull();
		const strange = createShipment(ctx, site.id, papers({ laneId: uuid() }));
		await expect(strange).rejects.toMatchObject({
			issues: { laneId: 'There is no such lane to this site.' }
		});
	});
});
