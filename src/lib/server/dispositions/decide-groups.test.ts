import { describe, expect, it } from 'vitest';
import {
	buildContact,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testPassword
} from '../../../../tests/helpers/factories';
import { arrivedDocket, signed } from '../../../../tests/helpers/sealed-docket';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { dispositionSchema } from '../../schemas/disposition';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { verifyChain } from '../audit/verify';
import { Disposition } from '../db/models/disposition';
import { Hold } from '../db/models/hold';
import { LineGroup } from '../db/models/line-group';
import { Notice } from '../db/models/notice';
import { Shipment } from '../db/models/shipment';
import { getDocket } from '../dockets/get-docket';
import { supplierFacts } from '../notices/supplier-facts';
import { noticeMail } from '../notices/notice-mail';
import { frozenDocketOf } from '../reports/frozen-docket';
import { evidenceSha256 } from './freeze';
import { getVersion } from './get-version';
import { signDisposition } from './sign-disposition';

useTestDatabase();

type Written = Record<string, string | number | null>;

/** A load of two lines, the first of which is to be split: sixteen pallets of 192 cases. */
async function splitLoad() {
	const load = await arrivedDocket();
	await load.lines[0]?.update({ casesAdvised: 200, casesReceived: 192, palletsAdvised: 16 });
	await buildContact(load.supplier);
	const [first, second] = load.lines.map((line) => line.id);
	const rest = { lineId: second ?? '', outcome: 'accept' };
	const decide = async (groups: Written[], more: Record<string, unknown> = {}) =>
		dispositionSchema.parse({
			lines: [...groups.map((group) => ({ lineId: first ?? '', ...group })), rest],
			reasons: 'As each group is.',
			meaning: 'approval',
			password: testPassword,
			evidenceSha256: evidenceSha256(await getDocket(load.ctx, load.shipment.number)),
			...more
		});
	return { ...load, decide, number: load.shipment.number };
}

const inStore = { name: 'Top pallets', cases: 144, pallets: 12, outcome: 'accept', whereabouts: 'store' };
const refused = {
	...{ name: 'By the doors', cases: 24, pallets: 2, outcome: 'reject', reason: 'Too warm' },
	...{ whereabouts: 'returned', place: 'with the same trailer' }
};
const held = {
	...{ name: 'Middle', cases: 24, pallets: 2, outcome: 'hold', awaited: 'the laboratory’s count' },
	...{ until: '2026-04-05T12:00', whereabouts: 'quarantine', place: 'Q2' }
};

describe('a line decided by groups', () => {
	it('is frozen group by group, with counts, places and a hold that says what it awaits', async () => {
		const { ctx, number, shipment, decide } = await splitLoad();
		await signDisposition(ctx, number, await decide([inStore, refused, held]));
		const row = await Disposition.findOne({ where: { shipmentId: shipment.id }, rejectOnEmpty: true });
		const frozen = frozenDocketOf(row);
		expect(frozen.docket.lines[0]).toMatchObject({
			outcome: { outcome: 'reject', cases: 192, pallets: 16 },
			groups: [
				{ name: 'Top pallets', outcome: 'accept', cases: 144, pallets: 12, whereabouts: 'store' },
				{ outcome: 'reject', cases: 24, whereabouts: 'returned', place: 'with the same trailer' },
				// Noon in the site's summer time. Source: Directive 2000/84/EC, articles 2 and 3.
				{ outcome: 'hold', awaited: 'the laboratory’s count', untilAt: '2026-04-05T10:00:00.000Z' }
			]
		});
		expect(row.verdict).toBe('part');
		const docket = await getDocket(ctx, number);
		expect(docket.lines[0]?.groups).toEqual(frozen.docket.lines[0]?.groups);
		expect(docket.lines[1]?.groups).toBeUndefined();
		expect(docket.hold).toMatchObject({
			awaited: 'the laboratory’s count',
			untilAt: '2026-04-05T10:00:00.000Z'
		});
		expect(await LineGroup.count({ where: { place: 'Q2', whereabouts: 'quarantine' } })).toBe(1);
		expect(await verifyChain(shipment.id)).toBeNull();
	});

	it('stands in the trail with every group', async () => {
		const { ctx, number, shipment, decide } = await splitLoad();
		await signDisposition(ctx, number, await decide([inStore, refused, held]));
		const entry = await AuditEntry.findOne({
			where: { chainId: shipment.id, type: 'disposition.signed' },
			rejectOnEmpty: true
		});
		const payload = await AuditPayload.findOne({ where: { entryId: entry.id }, rejectOnEmpty: true });
		expect(JSON.parse(payload.text ?? '')).toMatchObject({
			outcomes: [
				{ outcome: 'accept', cases: 144, pallets: 12, name: 'Top pallets' },
				{ outcome: 'reject', cases: 24, whereabouts: 'returned' },
				{ outcome: 'hold', cases: 24 },
				{ outcome: 'accept' }
			]
		});
	});

	it('reaches the supplier as quantities of each', async () => {
		const { ctx, number, shipment, decide } = await splitLoad();
		await signDisposition(ctx, number, await decide([inStore, refused, held], { notify: 'on' }));
		const row = await Disposition.findOne({ where: { shipmentId: shipment.id }, rejectOnEmpty: true });
		const docket = supplierFacts(frozenDocketOf(row));
		expect(docket.lines[0]?.groups?.map(({ outcome, cases }) => [outcome, cases])).toEqual([
			['accept', 144],
			['reject', 24],
			['hold', 24]
		]);
		const { subject, text } = noticeMail({
			...{ docket, noticeNumber: '1', answerByAt: null, contactName: 'R. Test', link: 'https://x.example' },
			hasReport: true
		});
		expect(subject).toMatch(/24 of [\d,]+ cases refused, 24 on hold/);
		expect(text).toContain('By the doors');
		expect(text).toContain('the laboratory’s count');
	});

	it.each([
		['a case too few', [{ ...inStore, cases: 143 }, refused, held], '191 cases; 192 were received'],
		['a pallet too many', [{ ...inStore, pallets: 13 }, refused, held], '17 pallets; 16 were received'],
		['cases that were advised and never came', [{ ...inStore, cases: 152 }, refused, held], '200 cases'],
		['no counts at all', [{ outcome: 'accept' }, refused], 'group 1: write its cases'],
		['a hold that has run out', [inStore, refused, { ...held, until: '2026-04-01T12:00' }], 'has passed'],
		['a time that never comes', [inStore, refused, { ...held, until: '2026-04-31T12:00' }], 'no such day']
	])('is refused in words with %s', async (_what, groups, words) => {
		const { ctx, number, shipment, lines, decide } = await splitLoad();
		const signing = signDisposition(ctx, number, await decide(groups));
		await expect(signing).rejects.toMatchObject({ code: 'invalid', message: expect.stringContaining(words) });
		expect(await Disposition.count({ where: { shipmentId: shipment.id } })).toBe(0);
		expect(await LineGroup.count({ where: { lineId: lines.map(({ id }) => id) } })).toBe(0);
	});

	it('tells whoever was notified of the amendment, and keeps the old version to be seen', async () => {
		const { ctx, number, shipment, decide } = await splitLoad();
		await signDisposition(ctx, number, await decide([inStore, refused, held], { notify: 'on' }));
		await signDisposition(
			ctx,
			number,
			await decide([{ outcome: 'accept' }], { amendmentReason: 'The count is in' })
		);
		expect(await Notice.count({ where: { shipmentId: shipment.id } })).toBe(2);
		const first = await getVersion(ctx, number, 1);
		expect(first.lines[0]?.groups).toHaveLength(3);
		expect(first.signatures.map(({ version }) => version)).toEqual([1]);
		expect((await getVersion(ctx, number, 2)).lines[0]?.outcome).toMatchObject({ outcome: 'accept' });
		await expect(getVersion(ctx, number, 3)).rejects.toMatchObject({ code: 'not-found' });
		const stranger = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
		await expect(getVersion(stranger, number, 1)).rejects.toMatchObject({ code: 'not-found' });
	});

	it('is decided later by an amendment, which ends the hold', async () => {
		const { ctx, number, shipment, decide } = await splitLoad();
		await signDisposition(ctx, number, await decide([inStore, refused, held]));
		const released = { ...held, outcome: 'conditions', conditionKind: 'use-first', whereabouts: 'store' };
		await signDisposition(
			ctx,
			number,
			await decide([inStore, refused, released], { amendmentReason: 'The count is in' })
		);
		expect(await Hold.count({ where: { shipmentId: shipment.id, liftedAt: null } })).toBe(0);
		const versions = await Disposition.findAll({ where: { shipmentId: shipment.id }, order: ['version'] });
		const outcomes = versions.map((row) => frozenDocketOf(row).docket.lines[0]?.groups?.[2]?.outcome);
		expect(outcomes).toEqual(['hold', 'conditions']);
		expect((await getDocket(ctx, number)).lines[0]?.groups?.[2]).toMatchObject({
			conditionKind: 'use-first',
			awaited: null
		});
	});
});

describe('a load held whole', () => {
	it('stays open with a hold that says what is awaited and until when, and nothing is frozen', async () => {
		const { ctx, number, shipment, lines, decide } = await splitLoad();
		const whole = { outcome: 'hold', awaited: 'a second logger', until: '2026-04-04T09:30' };
		const input = await decide([whole]);
		const all = {
			...input,
			lines: input.lines.map((row) => ({ ...row, ...whole, outcome: 'hold' as const })),
			meaning: 'approval' as const
		};
		expect(await signDisposition(ctx, number, all)).toEqual({ version: null });
		expect(await Disposition.count({ where: { shipmentId: shipment.id } })).toBe(0);
		expect((await Shipment.findByPk(shipment.id))?.decidedAt).toBeNull();
		expect(await getDocket(ctx, number)).toMatchObject({
			stage: 'on-hold',
			hold: { awaited: 'a second logger', untilAt: '2026-04-04T07:30:00.000Z' }
		});
		expect(lines).toHaveLength(2);
	});
});

describe('a line decided whole', () => {
	it('needs no counts, and carries the received ones', async () => {
		const load = await splitLoad();
		const disposition = await signed(load);
		const [line] = frozenDocketOf(disposition).docket.lines;
		expect(line).toMatchObject({ outcome: { outcome: 'accept', cases: 192, pallets: 16 } });
		expect(line?.groups).toBeUndefined();
		expect(testNow.getTime()).toBe(disposition.signedAt.getTime());
	});
});
