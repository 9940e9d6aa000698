import { beforeAll, describe, expect, it } from 'vitest';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { boardQuery, type BoardRow } from '../../schemas/board';
import { listBoard } from '../arrivals/list-board';
import { loadActor } from '../accounts/load-actor';
import { isPassword } from '../accounts/password';
import { verifyAllChains } from '../audit/verify';
import type { Context } from '../context';
import { AssessmentRow } from '../db/models/assessment-row';
import { AuditEntry } from '../db/models/audit-entry';
import { Claim } from '../db/models/claim';
import { Disposition } from '../db/models/disposition';
import { DispositionLine } from '../db/models/disposition-line';
import { ExcursionRow } from '../db/models/excursion-row';
import { Handover } from '../db/models/handover';
import { Job } from '../db/models/job';
import { LineRecommendation } from '../db/models/line-recommendation';
import { Logger } from '../db/models/logger';
import { LoggerRead } from '../db/models/logger-read';
import { NoticeAnswer } from '../db/models/notice-answer';
import { Notice } from '../db/models/notice';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { Site } from '../db/models/site';
import { SpecVersion } from '../db/models/spec-version';
import { User } from '../db/models/user';
import { getDocket } from '../dockets/get-docket';
import { demoPassword } from './cast/people';
import { demoLoadedAt, loadDemo } from './load-demo';

useTestDatabase();

/** A working morning on both sides, with both changes of the clocks in the two months before. */
const anchor = new Date('2026-04-03T12:05:20Z');
const said: string[] = [];

async function as(email: string): Promise<Context> {
	const user = await User.findOne({ where: { email }, rejectOnEmpty: true });
	const actor = await loadActor({ kind: 'user', subjectId: user.id, tokenVersion: 0 }, anchor);
	if (!actor) throw new Error(`${email} cannot sign in.`);
	return { actor, now: anchor, requestId: 'test', address: '127.0.0.1' };
}

async function boardOf(code: string): Promise<BoardRow[]> {
	const site = await Site.findOne({ where: { code }, rejectOnEmpty: true });
	const board = await listBoard(await as('qa@wharfinger.example'), site.id, boardQuery.parse({}));
	return board.rows;
}

const counted = (values: readonly (string | null)[]) =>
	Object.fromEntries(
		[...new Set(values)].map((one) => [one, values.filter((value) => value === one).length])
	);

beforeAll(async () => {
	await loadDemo(anchor, (line) => said.push(line));
}, 240_000);

describe('the demo', () => {
	it('is loaded once, and says so', async () => {
		const [dockets, entries] = [await Shipment.count(), await AuditEntry.count()];
		expect(dockets).toBeGreaterThanOrEqual(60);
		expect(await loadDemo(anchor)).toBeNull();
		expect([await Shipment.count(), await AuditEntry.count()]).toEqual([dockets, entries]);
		expect(await demoLoadedAt()).toBe(anchor.toISOString());
		expect(said.at(-1)).toBe(`${dockets} dockets are open.`);
	});

	it('leaves whole audit chains, none of whose entries lies ahead', async () => {
		const { chains, faults } = await verifyAllChains();
		expect(faults).toEqual([]);
		expect(chains).toBeGreaterThan(60);
		expect((await AuditEntry.max<Date, AuditEntry>('occurredAt')).getTime()).toBeLessThanOrEqual(
			anchor.getTime()
		);
	});

	it('has two sites in two zones with two units, papers and currencies', async () => {
		const sites = await Site.findAll({ order: ['code'] });
		expect(
			sites.map(({ code, zone, temperatureUnit, pageSize, currency }) => [
				code,
				zone,
				temperatureUnit,
				pageSize,
				currency
			])
		).toEqual([
			['HM', 'America/New_York', 'fahrenheit', 'letter', 'USD'],
			['PS', 'Europe/Amsterdam', 'celsius', 'a4', 'EUR']
		]);
		for (const { id } of sites) expect(await Shipment.count({ where: { siteId: id } })).toBeGreaterThan(15);
	});

	it('lets its people sign in at both sites, and nobody with a password who has none to choose', async () => {
		for (const name of ['dock', 'qa', 'qa2', 'claims', 'admin']) {
			const email = `${name}@wharfinger.example`;
			const user = await User.findOne({ where: { email }, rejectOnEmpty: true });
			expect(await isPassword(demoPassword, user.passwordHash)).toBe(true);
			expect((await as(email)).actor).toMatchObject({
				roles: [name === 'qa2' ? 'qa' : name],
				siteIds: [expect.any(String), expect.any(String)]
			});
		}
		const rest = (await User.findAll()).filter(({ email }) => !/^(dock|qa2?|claims|admin)@/.test(email));
		expect(rest.map(({ passwordHash }) => passwordHash)).toEqual([null, null]);
	});

	it('has signed specs, and instruments some of which are overdue', async () => {
		expect(await SpecVersion.count({ where: { state: 'signed' } })).toBeGreaterThanOrEqual(12);
		expect(await SpecVersion.count({ where: { state: 'draft' } })).toBe(0);
		const due = (await Logger.findAll()).map(({ calibrationDueOn }) => calibrationDueOn ?? '');
		expect(due.filter((on) => on < '2026-04-03').length).toBeGreaterThan(2);
		expect(due.filter((on) => on > '2026-04-03').length).toBeGreaterThan(10);
	});

	it('shows every stage of a morning at each site', async () => {
		for (const [code, least] of [
			['PS', { done: 7, 'on-hold': 2, 'at-the-door': 2, expected: 5 }],
			['HM', { done: 3, 'on-hold': 1, 'at-the-door': 2, expected: 3 }]
		] as const)
			expect([code, counted((await boardOf(code)).map(({ stage }) => stage))]).toEqual([code, least]);
	});

	it('has a load at the door without a read and one with a question open at each site', async () => {
		for (const code of ['PS', 'HM']) {
			const atTheDoor = (await boardOf(code)).filter(({ stage }) => stage === 'at-the-door');
			expect(atTheDoor.map(({ reads }) => reads.questions).sort()).toEqual([0, 1]);
			expect(atTheDoor.find(({ reads }) => reads.questions === 0)?.reads.kept).toBe(0);
		}
		expect(await LoggerRead.count({ where: { state: 'refused' } })).toBe(0);
	});

	it('reaches every verdict, outcome and recommendation, with claims open and ended', async () => {
		const of = (rows: readonly string[]) => [...new Set(rows)].sort();
		const verdicts = (await Disposition.findAll()).map(({ verdict }) => verdict);
		expect(of(verdicts)).toEqual(['accepted', 'conditions', 'part', 'rejected']);
		const outcomes = (await DispositionLine.findAll()).map(({ outcome }) => outcome);
		expect(of(outcomes)).toEqual(['accept', 'conditions', 'hold', 'reject']);
		const recommended = (await LineRecommendation.findAll()).map((row) => row.recommended);
		expect(of(recommended)).toEqual(['accept', 'hold', 'reject']);
		const statuses = (await Claim.findAll()).map(({ status }) => status);
		expect(of(statuses)).toEqual(['declined', 'filed', 'noticed', 'settled']);
		expect(of((await NoticeAnswer.findAll()).map(({ kind }) => kind))).toEqual(['acknowledge', 'dispute']);
	});

	it('holds at QA a docket of three lots whose journey went warm, cold and silent', async () => {
		const [hero] = (await boardOf('PS')).filter(
			({ stage, goods }) => stage === 'on-hold' && goods.lots === 3
		);
		expect(hero?.number).toBe('PS-26-1184');
		const docket = await getDocket(await as('qa@wharfinger.example'), 'PS-26-1184');
		expect(docket.lines.map(({ recommendation }) => recommendation?.recommended)).toEqual([
			'accept',
			'hold',
			'reject'
		]);
		expect(docket.loggers).toHaveLength(3);
		expect(docket.handovers).toHaveLength(7);
		const third = docket.assessments.find(({ lineId }) => lineId === docket.lines[2]?.id);
		expect(third?.gaps).toHaveLength(1);
		expect(new Set(third?.excursions.map(({ kind }) => kind))).toEqual(new Set(['too-warm', 'too-cold']));
	});

	it('never leaves more life than a line began with, nor a need nobody could meet', async () => {
		const full = new Map(
			(await SpecVersion.findAll()).map(({ id, figures }) => [
				id,
				JSON.parse(figures) as { fullLifeHours: number; fullLifeUncertaintyHours: number }
			])
		);
		const assessed = await AssessmentRow.findAll({ where: { isCurrent: true } });
		expect(assessed.length).toBeGreaterThan(50);
		for (const row of assessed) {
			const spec = full.get(row.specVersionId);
			const fullHours = spec?.fullLifeHours ?? 0;
			expect(row.remainingHours).toBeLessThan(fullHours);
			expect(row.remainingHighHours).toBeLessThanOrEqual(fullHours + (spec?.fullLifeUncertaintyHours ?? 0));
			expect(row.remainingLowHours).toBeLessThanOrEqual(row.remainingHours);
			expect(row.neededHours).toBeLessThan(fullHours);
		}
		const kinds = (await ExcursionRow.findAll()).map(({ kind, severity }) => `${kind} ${severity}`);
		expect(new Set(kinds)).toContain('too-warm critical');
		expect(new Set(kinds)).toContain('too-cold critical');
	});

	it('names no lot twice in one supplier’s loads', async () => {
		const lines = await ShipmentLine.findAll();
		const lots = lines.map(({ lot }) => lot);
		expect(lots.filter((lot, at) => lots.indexOf(lot) !== at)).toEqual([]);
	});

	it('puts handovers in order, each later than the one before', async () => {
		const rows = await Handover.findAll({ order: ['shipmentId', 'ordinal'] });
		for (const [at, row] of rows.entries()) {
			const before = rows[at - 1];
			if (before?.shipmentId !== row.shipmentId || !row.actualAt || !before.actualAt) continue;
			expect(row.actualAt.getTime()).toBeGreaterThanOrEqual(before.actualAt.getTime());
		}
	});

	it('leaves the reports to the worker, and no more than a dozen mails', async () => {
		const open = await Job.findAll({ where: { doneAt: null } });
		const kinds = counted(open.map(({ kind }) => kind));
		expect(kinds.report).toBe(await Disposition.count());
		expect(kinds.notice).toBe(await Notice.count({ where: { state: 'queued' } }));
		expect(kinds.notice).toBeLessThanOrEqual(12);
		expect(kinds.notice).toBeGreaterThan(0);
		expect(Object.keys(kinds).sort()).toEqual(['notice', 'report']);
	});

	it('has photographs, a split line that is held in part, and somebody qualified who is not the usual signer', async () => {
		const hero = await getDocket(await as('qa@wharfinger.example'), 'PS-26-1184');
		expect(hero.photos.map(({ kind }) => kind)).toEqual(['seal', 'set-point', 'damage']);
		const split = await DispositionLine.findOne({ where: { outcome: 'hold' }, rejectOnEmpty: true });
		const disposition = await Disposition.findByPk(split.dispositionId, { rejectOnEmpty: true });
		const shipment = await Shipment.findByPk(disposition.shipmentId, { rejectOnEmpty: true });
		const docket = await getDocket(await as('qa@wharfinger.example'), shipment.number);
		expect(docket.stage).toBe('done');
		expect(docket.lines[0]?.groups?.map(({ pallets, cases }) => [pallets, cases])).toEqual([
			[5, 200],
			[2, 80]
		]);
		expect(docket.hold).toMatchObject({ awaited: 'A second probing of the crowns' });
		const qualified = await User.findAll({ where: { isQualifiedPerson: true } });
		expect(qualified.map(({ email }) => email)).toEqual(['qa2@wharfinger.example']);
	});

	it('holds no export twice', async () => {
		const reads = await LoggerRead.findAll();
		expect(new Set(reads.map(({ fileId }) => fileId)).size).toBe(reads.length);
	});
});
