import { describe, expect, it } from 'vitest';
import { v7 as uuid } from 'uuid';
import {
	buildOrganisation,
	buildPartner,
	buildShipment,
	buildSite,
	buildUser,
	contextFor
} from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { auditQuery } from '../../schemas/audit-list';
import type { Context, Role } from '../context';
import { inTransaction } from '../db/transaction';
import { instantOfDay } from './day-bounds';
import { listAuditActors, listAuditEntries } from './list-entries';

useTestDatabase();

const zone = 'Europe/Amsterdam';
const at = (instant: string, ctx: Context): Context => ({ ...ctx, now: new Date(instant) });

async function scene() {
	const site = await buildSite();
	const elsewhere = await buildSite();
	const { shipment } = await buildShipment({ site });
	const { shipment: foreign } = await buildShipment({ site: elsewhere });
	const person = async (role: Role) => contextFor(await buildUser([role], { sites: [site] }));
	return {
		site,
		shipment,
		foreign,
		qa: await person('qa'),
		admin: await person('admin'),
		dock: await person('dock')
	};
}

const hold = (ctx: Context, id: string, reason: string) =>
	inTransaction(ctx, async ({ record }) => record('hold.put', { scope: 'shipment', id }, { reason }));

async function list(ctx: Context, query: Record<string, string> = {}) {
	return listAuditEntries(ctx, auditQuery.parse(query), zone);
}

describe('the audit trail', () => {
	it('is read by QA and admins only', async () => {
		const { qa, admin, dock, site } = await scene();
		const claims = await contextFor(await buildUser(['claims'], { sites: [site] }));
		const supplier = await contextFor(await buildUser(['supplier'], { partner: await buildPartner() }));
		for (const ctx of [dock, claims, supplier]) {
			await expect(list(ctx)).rejects.toMatchObject({ code: 'not-allowed' });
			await expect(listAuditActors(ctx)).rejects.toMatchObject({ code: 'not-allowed' });
		}
		for (const ctx of [qa, admin]) await expect(list(ctx)).resolves.toBeTruthy();
	});

	it('comes newest first, with who, about which docket and what was stored', async () => {
		const { shipment, qa, dock } = await scene();
		await hold(at('2026-04-03T06:00:00Z', dock), shipment.id, 'E2 is critical');
		await hold(at('2026-04-03T07:00:00Z', qa), shipment.id, 'still');
		const { items, total } = await list(qa, { docket: shipment.number.toLowerCase() });
		expect(total).toBe(2);
		expect(items[0]).toMatchObject({
			type: 'hold.put',
			seq: 2,
			occurredAt: '2026-04-03T07:00:00.000Z',
			actorName: qa.actor.name,
			scope: 'shipment',
			about: shipment.number,
			payload: '{"reason":"still"}'
		});
		expect((await list(qa, { docket: shipment.number, by: dock.actor.id })).items).toMatchObject([
			{ seq: 1 }
		]);
		expect((await listAuditActors(qa)).map(({ id }) => id)).toContain(dock.actor.id);
	});

	it('shows no docket of a site one does not belong to', async () => {
		const { foreign, qa, admin } = await scene();
		await hold(admin, foreign.id, 'elsewhere');
		expect((await list(qa, { docket: foreign.number })).total).toBe(0);
		expect((await list(admin, { docket: foreign.number })).total).toBe(0);
	});

	it('shows accounts and refused sign-ins to admins only', async () => {
		const { qa, admin } = await scene();
		const organisation = await buildOrganisation();
		await inTransaction(admin, async ({ record }) => {
			record('account.unlocked', { scope: 'account', id: qa.actor.id }, { userId: qa.actor.id });
			record(
				'session.refused',
				{ scope: 'organisation', id: organisation.id },
				{ email: 'x', why: 'unknown' }
			);
			record(
				'partner.saved',
				{ scope: 'organisation', id: organisation.id },
				{ partnerId: uuid(), before: null, after: { name: 'A' } }
			);
		});
		const seen = async (ctx: Context) => new Set((await list(ctx)).items.map(({ type }) => type));
		expect(await seen(admin)).toEqual(new Set([...(await seen(qa)), 'account.unlocked', 'session.refused']));
		expect(await seen(qa)).toContain('partner.saved');
		expect((await list(qa, { about: 'account' })).total).toBe(0);
		expect((await list(admin, { about: 'account', by: admin.actor.id })).items).toMatchObject([
			{ about: qa.actor.name, scope: 'account' }
		]);
	});

	it('takes days of the site’s zone, the last one whole', async () => {
		const { shipment, qa } = await scene();
		// 3 April begins at 22:00 UTC the day before while Amsterdam keeps summer time.
		for (const instant of [
			'2026-04-02T21:59:59Z',
			'2026-04-02T22:00:00Z',
			'2026-04-03T21:59:59Z',
			'2026-04-03T22:00:00Z'
		])
			await hold(at(instant, qa), shipment.id, instant);
		const day = await list(qa, { docket: shipment.number, from: '2026-04-03', to: '2026-04-03' });
		expect(day.items.map(({ payload }) => payload)).toEqual([
			'{"reason":"2026-04-03T21:59:59Z"}',
			'{"reason":"2026-04-02T22:00:00Z"}'
		]);
		// Source: IANA tz database, EU rule: clocks go forward on 29 March 2026, so that day has 23 hours.
		const hours =
			instantOfDay('2026-03-29', zone, 1).getTime() - instantOfDay('2026-03-29', zone, 0).getTime();
		expect(hours).toBe(23 * 3_600_000);
	});

	it('comes in pages, and takes a faulty address as one without filters', async () => {
		const { shipment, qa } = await scene();
		await inTransaction(qa, async ({ record }) => {
			for (let i = 0; i < 45; i++)
				record('hold.put', { scope: 'shipment', id: shipment.id }, { reason: `${i}` });
		});
		const docket = shipment.number;
		expect((await list(qa, { docket })).items).toHaveLength(40);
		expect((await list(qa, { docket, page: '2' })).items).toHaveLength(5);
		expect((await list(qa, { docket, page: 'x', from: 'yesterday', about: '%', by: "' OR 1" })).total).toBe(
			45
		);
	});
});
