import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildPartner,
	buildShipment,
	buildSite,
	buildUser,
	contextFor
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { laneForm, laneQuery } from '../../schemas/lane';
import type { Context, Role } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { getLane } from './get-lane';
import { listLaneChoices, listLanes } from './list-lanes';
import { addLane, changeLane, switchLane } from './save-lane';

useTestDatabase();

async function as(role: Role): Promise<Context> {
	if (role === 'supplier')
		return contextFor(await buildUser(['supplier'], { partner: await buildPartner() }));
	return contextFor(await buildUser([role], { sites: [await buildSite()] }));
}

const form = (siteId: string, more: Record<string, unknown> = {}) =>
	laneForm.parse({ name: `Lane ${uuid()}`, siteId, ...more });

async function payloads(siteId: string): Promise<unknown[]> {
	const entries = await AuditEntry.findAll({
		where: { chainId: siteId, type: 'lane.saved' },
		order: ['seq']
	});
	const texts = entries.map(async ({ id }) => (await AuditPayload.findByPk(id))?.text ?? '{}');
	return (await Promise.all(texts)).map((text) => JSON.parse(text) as unknown);
}

describe('lanes', () => {
	it('are kept by admins only, and offered to those who may write papers', async () => {
		const site = await buildSite();
		const id = await addLane(await as('admin'), form(site.id));
		for (const role of ['dock', 'qa', 'claims', 'supplier'] as const) {
			const ctx = await as(role);
			const attempts = [
				() => addLane(ctx, form(site.id)),
				() => changeLane(ctx, id, form(site.id)),
				() => switchLane(ctx, id, false),
				() => listLanes(ctx, laneQuery.parse({})),
				() => getLane(ctx, id)
			];
			for (const attempt of attempts) await expect(attempt()).rejects.toMatchObject({ code: 'not-allowed' });
			const choices = listLaneChoices(ctx, site.id);
			if (role === 'dock' || role === 'qa') await expect(choices).resolves.toMatchObject([{ id }]);
			else await expect(choices).rejects.toMatchObject({ code: 'not-allowed' });
		}
	});

	it('hold their ends, the logger and grades, on the record of their site with both states', async () => {
		const ctx = await as('admin');
		const [site, supplier] = [
			await buildSite({ name: 'Ostrava' }),
			await buildPartner({ name: 'Brightfell' })
		];
		const sent = { name: 'Brightfell by road', supplierId: supplier.id, isLoggerRequired: 'on' };
		const grades = { 'interval-too-long': 'inform', 'seal-broken': '', 'calibration-overdue': 'hold' };
		const id = await addLane(ctx, form(site.id, { ...sent, grades }));
		const made = await getLane(ctx, id);
		const kept = { 'calibration-overdue': 'hold', 'interval-too-long': 'inform' };
		expect(made).toMatchObject({ siteName: 'Ostrava', supplierName: 'Brightfell', dockets: 0 });
		expect(made).toMatchObject({ isLoggerRequired: true, grades: kept });

		await changeLane(ctx, id, form(site.id, { name: 'Any by road', revision: made.revision }));
		expect(await getLane(ctx, id)).toMatchObject({ supplierName: null, isLoggerRequired: false, grades: {} });
		expect(await payloads(site.id)).toMatchObject([
			{ laneId: id, before: null, after: { name: 'Brightfell by road', grades: kept } },
			{ before: { grades: kept, supplierId: supplier.id }, after: { name: 'Any by road', grades: {} } }
		]);
	});

	it('have one revision whatever order the database keeps their grades in, and nobody overwrites unseen', async () => {
		const ctx = await as('admin');
		const site = await buildSite();
		const grades = { 'cases-differ': 'hold', excursion: 'note', unobserved: 'inform' };
		const id = await addLane(ctx, form(site.id, { grades }));
		const { revision } = await getLane(ctx, id);
		await changeLane(ctx, id, form(site.id, { grades, name: 'Renamed once', revision }));
		const late = changeLane(ctx, id, form(site.id, { name: 'Late', revision }));
		await expect(late).rejects.toMatchObject({ code: 'changed-meanwhile' });
		expect((await getLane(ctx, id)).name).toBe('Renamed once');
	});

	it('lead from a supplier to a site that are there, under a name of their own', async () => {
		const ctx = await as('admin');
		const site = await buildSite();
		const carrier = await buildPartner({ isSupplier: false, isCarrier: true });
		const attempts = [
			[form(uuid()), 'not-found'],
			[form(site.id, { supplierId: uuid() }), 'not-found'],
			[form(site.id, { supplierId: carrier.id }), 'not-found']
		] as const;
		for (const [sent, code] of attempts) await expect(addLane(ctx, sent)).rejects.toMatchObject({ code });
		await addLane(ctx, form(site.id, { name: 'Over the pass' }));
		const again = addLane(ctx, form(site.id, { name: 'over the pass' }));
		await expect(again).rejects.toMatchObject({ code: 'duplicate' });
		const nothing = [
			() => getLane(ctx, uuid()),
			() => changeLane(ctx, uuid(), form(site.id)),
			() => switchLane(ctx, uuid(), true)
		];
		for (const attempt of nothing) await expect(attempt()).rejects.toMatchObject({ code: 'not-found' });
	});

	it('keep their ends once a docket is on them, but may be opened to every supplier', async () => {
		const ctx = await as('admin');
		const [site, supplier] = [await buildSite(), await buildPartner()];
		const id = await addLane(ctx, form(site.id, { supplierId: supplier.id }));
		await buildShipment({ site, supplier, laneId: id });
		const { revision, dockets } = await getLane(ctx, id);
		expect(dockets).toBe(1);
		const moves = [
			form((await buildSite()).id, { supplierId: supplier.id, revision }),
			form(site.id, { supplierId: (await buildPartner()).id, revision })
		];
		for (const move of moves)
			await expect(changeLane(ctx, id, move)).rejects.toMatchObject({ code: 'in-use' });
		await changeLane(ctx, id, form(site.id, { revision }));
		expect((await getLane(ctx, id)).supplierId).toBeNull();
	});

	it('are offered at their own site while in use, and to a docket that is on them already', async () => {
		const ctx = await as('admin');
		const site = await buildSite();
		const [kept, off] = [
			await addLane(ctx, form(site.id, { name: 'AA kept' })),
			await addLane(ctx, form(site.id))
		];
		await addLane(ctx, form((await buildSite()).id));
		await switchLane(ctx, off, false);
		await switchLane(ctx, off, false);
		const ids = async (own?: string) => (await listLaneChoices(ctx, site.id, own)).map(({ id }) => id);
		expect(await ids()).toEqual([kept]);
		expect(await ids(off)).toEqual([kept, off]);
		expect((await payloads(site.id)).at(-1)).toEqual({
			laneId: off,
			before: { isInUse: true },
			after: { isInUse: false }
		});
		const items = async (query: object) => (await listLanes(ctx, laneQuery.parse(query))).items;
		expect((await items({ state: 'off' })).map(({ id }) => id)).toEqual([off]);
		expect((await items({ q: 'aa k' })).map(({ id }) => id)).toEqual([kept]);
		expect(await items({ q: '%' })).toEqual([]);
	});
});

describe('the form of a lane', () => {
	const [siteId, name] = [uuid(), 'Over the pass'];
	it.each([
		[{ name: ' ' }, 'name'],
		[{ name: 'x'.repeat(121) }, 'name'],
		[{ siteId: '' }, 'siteId'],
		[{ supplierId: 'nobody' }, 'supplierId'],
		[{ isLoggerRequired: 'perhaps' }, 'isLoggerRequired'],
		[{ grades: { 'seal-broken': 'reject' } }, 'grades.seal-broken'],
		[{ grades: { 'life-short': 'inform' } }, 'grades']
	])('is refused beside the field: %o', (sent, path) => {
		const { error } = laneForm.safeParse({ name, siteId, ...sent });
		expect(error?.issues.map((issue) => issue.path.join('.'))).toEqual([path]);
	});
});
