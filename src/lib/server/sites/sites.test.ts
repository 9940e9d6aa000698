import { describe, expect, it } from 'vitest';
import {
	buildPartner,
	buildShipment,
	buildSite,
	buildUser,
	contextFor
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { siteForm, siteQuery } from '../../schemas/site';
import type { Context, Role } from '../context';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { UserSite } from '../db/models/user-site';
import { getSite } from './get-site';
import { listSiteChoices, listSites } from './list-sites';
import { addHoliday, dropHoliday } from './save-holiday';
import { addSite, changeSite, switchSite } from './save-site';

useTestDatabase();

async function as(role: Role): Promise<Context> {
	if (role === 'supplier')
		return contextFor(await buildUser(['supplier'], { partner: await buildPartner() }));
	return contextFor(await buildUser([role], { sites: [await buildSite()] }));
}

const filled = {
	code: 'hw',
	name: 'Heronswick',
	address: 'Wharf 9, Heronswick',
	zone: 'America/New_York',
	temperatureUnit: 'fahrenheit',
	pageSize: 'letter',
	currency: 'usd',
	opening: { mon: { from: '04:00', to: '15:00' }, sat: { from: '05:00', to: '24:00' } },
	docks: 'Dock 1\nDock 2, Dock 3\n'
};
const form = (more: Record<string, unknown> = {}) => siteForm.parse({ ...filled, ...more });

describe('sites', () => {
	it('are kept by admins only', async () => {
		const site = await buildSite();
		for (const role of ['dock', 'qa', 'claims', 'supplier'] as const) {
			const ctx = await as(role);
			const attempts = [
				() => addSite(ctx, form()),
				() => changeSite(ctx, site.id, form()),
				() => switchSite(ctx, site.id, false),
				() => addHoliday(ctx, site.id, { heldOn: '2026-12-25', name: 'Christmas' }),
				() => dropHoliday(ctx, site.id, site.id),
				() => listSites(ctx, siteQuery.parse({})),
				() => listSiteChoices(ctx),
				() => getSite(ctx, site.id)
			];
			for (const attempt of attempts) await expect(attempt()).rejects.toMatchObject({ code: 'not-allowed' });
		}
	});

	it('are opened with hours, docks and whoever opened them', async () => {
		const ctx = await as('admin');
		const id = await addSite(ctx, form());
		expect(await getSite(ctx, id)).toMatchObject({
			code: 'HW',
			currency: 'USD',
			opening: { mon: ['04:00', '15:00'], sat: ['05:00', '24:00'] },
			docks: ['Dock 1', 'Dock 2', 'Dock 3'],
			hasDockets: false
		});
		expect(await UserSite.count({ where: { siteId: id, userId: ctx.actor.id } })).toBe(1);
		expect(await AuditEntry.findAll({ where: { chainId: id } })).toMatchObject([
			{ type: 'site.saved', seq: 1 }
		]);
		await expect(addSite(ctx, form({ name: 'Another' }))).rejects.toMatchObject({ code: 'duplicate' });
	});

	it('keep their number prefix once a docket carries it', async () => {
		const ctx = await as('admin');
		const site = await buildSite({ code: 'KP', gln: null });
		await buildShipment({ site });
		const { revision } = await getSite(ctx, site.id);
		const other = changeSite(ctx, site.id, form({ code: 'ZZ', revision }));
		await expect(other).rejects.toMatchObject({ code: 'in-use' });
		await changeSite(ctx, site.id, form({ code: 'KP', revision }));
		expect(await getSite(ctx, site.id)).toMatchObject({ code: 'KP', name: 'Heronswick' });
		const late = changeSite(ctx, site.id, form({ code: 'KP', name: 'Late', revision }));
		await expect(late).rejects.toMatchObject({ code: 'changed-meanwhile' });
	});

	it('have holidays, each day once, and their coming and going is written down', async () => {
		const ctx = await as('admin');
		const site = await buildSite();
		await addHoliday(ctx, site.id, { heldOn: '2026-04-03', name: 'Good Friday' });
		const again = addHoliday(ctx, site.id, { heldOn: '2026-04-03', name: 'Good Friday' });
		await expect(again).rejects.toMatchObject({ code: 'duplicate' });
		const [day] = (await getSite(ctx, site.id)).holidays;
		expect(day).toMatchObject({ heldOn: '2026-04-03', name: 'Good Friday' });
		await expect(dropHoliday(ctx, (await buildSite()).id, day?.id ?? '')).rejects.toMatchObject({
			code: 'not-found'
		});
		await dropHoliday(ctx, site.id, day?.id ?? '');
		expect((await getSite(ctx, site.id)).holidays).toEqual([]);
		const entries = await AuditEntry.findAll({ where: { chainId: site.id }, order: ['seq'] });
		const texts = await AuditPayload.findAll({ where: { entryId: entries.map(({ id }) => id) } });
		expect(texts).toHaveLength(2);
		expect(texts.every(({ text }) => text?.includes('Good Friday'))).toBe(true);
	});

	it('are searched, sorted and counted with their people', async () => {
		const ctx = await as('admin');
		const site = await buildSite({ name: 'Ostrava Cross-dock', zone: 'Europe/Prague' });
		await buildUser(['dock'], { sites: [site] });
		const found = await listSites(ctx, siteQuery.parse({ q: 'prague' }));
		expect(found).toMatchObject({ total: 1, items: [{ name: 'Ostrava Cross-dock', people: 1 }] });
		const codes = (await listSites(ctx, siteQuery.parse({ sort: 'code', dir: 'desc' }))).items.map(
			(s) => s.code
		);
		expect(codes).toEqual([...codes].sort((a, b) => b.localeCompare(a)));
	});

	it('are never all closed', async () => {
		const ctx = await as('admin');
		const { items } = await listSites(ctx, siteQuery.parse({}));
		for (const { id } of items.slice(1)) await switchSite(ctx, id, false);
		await expect(switchSite(ctx, items[0]?.id ?? '', false)).rejects.toMatchObject({ code: 'in-use' });
		expect(await listSiteChoices(ctx)).toHaveLength(1);
		await switchSite(ctx, items[1]?.id ?? '', true);
		expect(await listSiteChoices(ctx)).toHaveLength(2);
	});
});

describe('the form of a site', () => {
	const faults = (more: Record<string, unknown>) =>
		siteForm.safeParse({ ...filled, ...more }).error?.issues.map((issue) => issue.path.join('.'));

	it('takes zones of the IANA list only', () => {
		expect(faults({ zone: 'Europe/Pell' })).toEqual(['zone']);
		expect(faults({ zone: '' })).toEqual(['zone']);
		expect(faults({ zone: 'Asia/Kathmandu' })).toBeUndefined();
	});

	it('names the day whose hours are wrong', () => {
		expect(faults({ opening: { tue: { from: '15:00', to: '04:00' } } })).toEqual(['opening.tue']);
		expect(faults({ opening: { wed: { from: '4', to: '15:00' } } })).toEqual(['opening.wed']);
		expect(faults({ opening: { wed: { from: '04:00', to: '' } } })).toEqual(['opening.wed']);
	});

	it('wants a currency of ISO 4217, a dock, a short prefix and a right GLN', () => {
		expect(faults({ currency: 'EURO', docks: ' ', code: 'P1', gln: '123' })).toEqual([
			'code',
			'gln',
			'currency',
			'docks'
		]);
	});
});
