import { describe, expect, it } from 'vitest';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import {
	buildContact,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testPassword
} from '../../../../tests/helpers/factories';
import { Arrival } from '../db/models/arrival';
import { Disposition } from '../db/models/disposition';
import { Job } from '../db/models/job';
import { Notice } from '../db/models/notice';
import { User } from '../db/models/user';
import { verifyChain } from '../audit/verify';
import { getDocket } from '../dockets/get-docket';
import { frozenDocketOf } from '../reports/frozen-docket';
import type { DispositionInput } from '../../schemas/disposition';
import { evidenceSha256 } from './freeze';
import { signDisposition } from './sign-disposition';
import { v7 as uuid } from 'uuid';

useTestDatabase();

async function arrivedLoad() {
	const site = await buildSite();
	const load = await buildShipment({ site, lines: [{}, {}], arrivedAt: testNow });
	await buildContact(load.supplier);
	const dock = await buildUser(['dock'], { sites: [site] });
	const qa = await buildUser(['qa'], { sites: [site] });
	await Arrival.create({
		id: uuid(),
		shipmentId: load.shipment.id,
		arrivedAt: testNow,
		isSealIntact: true,
		loggedBy: dock.id,
		loggedAt: testNow
	});
	return { ...load, site, dock, qa, ctx: await contextFor(qa) };
}

async function decision(
	load: Awaited<ReturnType<typeof arrivedLoad>>,
	changes: Partial<DispositionInput> = {}
): Promise<DispositionInput> {
	const docket = await getDocket(load.ctx, load.shipment.number);
	return {
		lines: load.lines.map((line, index) => ({
			lineId: line.id,
			outcome: index === 0 ? ('accept' as const) : ('reject' as const),
			condition: null,
			reason: index === 0 ? null : 'Short of the need'
		})),
		reasons: 'Line 2 cannot make the week.',
		meaning: 'approval',
		password: testPassword,
		evidenceSha256: evidenceSha256(docket),
		amendmentReason: null,
		notify: true,
		...changes
	};
}

describe('signing a disposition', () => {
	it('freezes the docket with outcomes and signature, and writes report and notice as jobs', async () => {
		const load = await arrivedLoad();
		const { version } = await signDisposition(load.ctx, load.shipment.number, await decision(load));
		expect(version).toBe(1);

		const row = await Disposition.findOne({ where: { shipmentId: load.shipment.id }, rejectOnEmpty: true });
		const frozen = frozenDocketOf(row);
		expect(frozen.signature).toMatchObject({
			signedBy: load.qa.name,
			meaning: 'approval',
			zone: 'Europe/Amsterdam',
			signedAt: testNow.toISOString()
		});
		expect(frozen.docket.lines.map((line) => line.outcome?.outcome)).toEqual(['accept', 'reject']);
		expect(frozen.docket.verdict).toBe('part');

		const docket = await getDocket(load.ctx, load.shipment.number);
		expect(docket).toMatchObject({ stage: 'done', verdict: 'part' });
		expect(docket.signatures).toHaveLength(1);
		expect(await Notice.count({ where: { shipmentId: load.shipment.id, state: 'queued' } })).toBe(1);
		expect((await Job.findAll()).map((job) => job.kind).sort()).toEqual(['notice', 'report']);
		expect(await verifyChain(load.shipment.id)).toBeNull();
	});

	it('refuses a second signature, and takes an amendment with its reason as a new version', async () => {
		const load = await arrivedLoad();
		await signDisposition(load.ctx, load.shipment.number, await decision(load));
		const again = await decision(load);
		await expect(signDisposition(load.ctx, load.shipment.number, again)).rejects.toMatchObject({
			code: 'already-signed'
		});
		const amended = await signDisposition(load.ctx, load.shipment.number, {
			...again,
			amendmentReason: 'Buyer takes line 2'
		});
		expect(amended.version).toBe(2);
		expect(await Disposition.count({ where: { shipmentId: load.shipment.id } })).toBe(2);
	});

	it('refuses when the docket changed after the signer looked', async () => {
		const load = await arrivedLoad();
		const input = await decision(load);
		await load.lines[0]?.update({ casesReceived: 12 });
		await expect(signDisposition(load.ctx, load.shipment.number, input)).rejects.toMatchObject({
			code: 'changed-meanwhile'
		});
		expect(await Disposition.count({ where: { shipmentId: load.shipment.id } })).toBe(0);
	});

	it('is for QA of that site only', async () => {
		const load = await arrivedLoad();
		const input = await decision(load);
		const stranger = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
		await expect(
			signDisposition(await contextFor(load.dock), load.shipment.number, input)
		).rejects.toMatchObject({ code: 'not-allowed' });
		await expect(signDisposition(stranger, load.shipment.number, input)).rejects.toMatchObject({
			code: 'not-found'
		});
	});

	it('asks for the password again and locks the account after five wrong ones', async () => {
		const load = await arrivedLoad();
		const wrong = await decision(load, { password: 'not the password' });
		for (let i = 0; i < 5; i++)
			await expect(signDisposition(load.ctx, load.shipment.number, wrong)).rejects.toMatchObject({
				code: 'wrong-password'
			});
		await expect(signDisposition(load.ctx, load.shipment.number, await decision(load))).rejects.toMatchObject(
			{ code: 'locked' }
		);
		expect((await User.findByPk(load.qa.id))?.lockedAt).not.toBeNull();
	});

	it('lets one of two simultaneous signatures win', async () => {
		const load = await arrivedLoad();
		const input = await decision(load);
		const results = await Promise.allSettled(
			[1, 2, 3].map(() => signDisposition(load.ctx, load.shipment.number, input))
		);
		expect(results.filter((result) => result.status === 'fulfilled')).toHaveLength(1);
		expect(await Disposition.count({ where: { shipmentId: load.shipment.id } })).toBe(1);
	});
});
