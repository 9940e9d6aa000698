import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import {
	buildProduct,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testSpec
} from '../../../../tests/helpers/factories';
import { buildTrace, steadyTrace } from '../../../../tests/helpers/trace-factory';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { AssessmentRow } from '../db/models/assessment-row';
import { AuditEntry } from '../db/models/audit-entry';
import { Compartment } from '../db/models/compartment';
import { Disposition } from '../db/models/disposition';
import { ExcursionRow } from '../db/models/excursion-row';
import { Lane } from '../db/models/lane';
import { LegUseRow } from '../db/models/leg-use-row';
import { LineRecommendation } from '../db/models/line-recommendation';
import { Pallet } from '../db/models/pallet';
import { PulpReading } from '../db/models/pulp-reading';
import { SpecVersion } from '../db/models/spec-version';
import { TrimRow } from '../db/models/trim-row';
import { Visit } from '../db/models/visit';
import { inTransaction } from '../db/transaction';
import { sha256Hex } from '../storage/sha256';
import { reassess } from './reassess';
import { parseFigures } from './stored-figures';

useTestDatabase();

const from = '2026-03-30T06:10:00Z';
const to = '2026-04-03T03:30:00Z';
/** First to last handover of the factory's load. */
const journeyHours = 93 + 1 / 3;

async function scene(options: Parameters<typeof buildShipment>[0] = {}) {
	const site = options.site ?? (await buildSite());
	const qa = await buildUser(['qa'], { sites: [site] });
	const made = await buildShipment({ ...options, site });
	const ctx = await contextFor(qa);
	const run = () => inTransaction(ctx, (w) => reassess(w, ctx, made.shipment.id));
	return { ...made, qa, run };
}

const current = (shipmentId: string) => AssessmentRow.findAll({ where: { shipmentId, isCurrent: true } });
const reasonCodes = async (lineId: string) => {
	const row = await LineRecommendation.findOne({ where: { lineId } });
	return (JSON.parse(row?.reasons ?? '[]') as { code: string }[]).map(({ code }) => code);
};

describe('reassess', () => {
	it('gives the figures worked out by hand for a steady journey', async () => {
		// Life runs at Q10^((T − Tref)/10): 3 times as fast at 10 °C as at 0 °C, so 93 h 20 min use 280 h.
		// Q10 as defined by Saltveit, 'Respiratory metabolism', USDA Agriculture Handbook 66: the ratio of rates 10 °C apart.
		const { shipment, lines, qa, run } = await scene();
		await buildTrace(shipment, qa, steadyTrace(10, from, to));
		await run();
		const [row] = await current(shipment.id);
		expect(row?.remainingHours).toBeCloseTo(432 - 20 - 3 * journeyHours, 9);
		// Warmer by the accuracy of 0.5 °C, and two hours more used before: 3^(0.05) times as much.
		expect(row?.remainingLowHours).toBeCloseTo(432 - 22 - 3 ** 1.05 * journeyHours, 9);
		expect(row?.remainingHighHours).toBeCloseTo(432 - 18 - 3 ** 0.95 * journeyHours, 9);
		expect(row?.isGoverning).toBe(true);
		const recommendation = await LineRecommendation.findOne({ where: { lineId: lines[0]?.id } });
		expect(recommendation?.recommended).toBe('reject');
		expect(await reasonCodes(lines[0]?.id ?? '')).toContain('life-short');
	});

	it('writes the excursion and both legs, whose use adds up to what was used', async () => {
		const { shipment, qa, run } = await scene();
		await buildTrace(shipment, qa, steadyTrace(10, from, to));
		await run();
		const [row] = await current(shipment.id);
		const excursions = await ExcursionRow.findAll({ where: { assessmentId: row?.id } });
		expect(excursions).toMatchObject([
			{ ordinal: 1, kind: 'too-warm', severity: 'critical', extremeCelsius: 10 }
		]);
		const legs = await LegUseRow.findAll({ where: { assessmentId: row?.id }, order: ['ordinal'] });
		expect(legs.map(({ usedHours }) => usedHours)).toEqual([
			expect.closeTo(3 * (59 + 5 / 6), 8),
			expect.closeTo(3 * 33.5, 8)
		]);
	});

	it('keeps with the figures what they rest on, hashed as the stored text', async () => {
		const { shipment, qa, run, handovers } = await scene();
		const { row: trace } = await buildTrace(shipment, qa, steadyTrace(1, from, to));
		await run();
		const [row] = await current(shipment.id);
		const figures = parseFigures(row?.figures ?? '');
		expect(figures).not.toHaveProperty('series');
		expect(figures.inputs).toMatchObject({
			accuracyCelsius: 0.5,
			traceSha256: trace.contentSha256,
			neededHours: 264
		});
		expect(figures.inputs.handovers.map(({ id }) => id)).toEqual(handovers.map(({ id }) => id));
		expect(row?.inputsSha256).toBe(sha256Hex(JSON.stringify(figures.inputs)));
	});

	it('lets the trace with the least life left govern, and says when two disagree', async () => {
		const { shipment, lines, qa, run } = await scene();
		await buildTrace(shipment, qa, steadyTrace(0, from, to));
		const warm = await buildTrace(shipment, qa, steadyTrace(2, from, to));
		await run();
		const rows = await current(shipment.id);
		expect(rows).toHaveLength(2);
		expect(rows.filter(({ isGoverning }) => isGoverning).map(({ traceId }) => traceId)).toEqual([
			warm.row.id
		]);
		expect(await reasonCodes(lines[0]?.id ?? '')).toContain('loggers-disagree');
	});

	it('judges a line by its own loggers, and one without by those that belong to no other', async () => {
		const { shipment, lines, qa, run } = await scene({ lines: [{}, {}] });
		const own = await buildTrace(shipment, qa, steadyTrace(2, from, to), { lineId: lines[0]?.id ?? null });
		const free = await buildTrace(shipment, qa, steadyTrace(0, from, to));
		await run();
		const rows = await current(shipment.id);
		const traceOf = (line: number) => rows.filter(({ lineId }) => lineId === lines[line]?.id);
		expect(traceOf(0).map(({ traceId }) => traceId)).toEqual([own.row.id]);
		expect(traceOf(1).map(({ traceId }) => traceId)).toEqual([free.row.id]);
	});

	it('says that life is not known where there is no trace, and does not hold for it', async () => {
		const { lines, run, shipment } = await scene();
		await run();
		expect(await current(shipment.id)).toEqual([]);
		const row = await LineRecommendation.findOne({ where: { lineId: lines[0]?.id } });
		expect(row?.recommended).toBe('accept');
		expect(await reasonCodes(lines[0]?.id ?? '')).toEqual(['life-not-known']);
	});

	it('rests on pulp and counts where there is no trace', async () => {
		const { shipment, lines, qa, run } = await scene({ lines: [{ casesReceived: 940 }] });
		await PulpReading.create({
			id: uuid(),
			shipmentId: shipment.id,
			lineId: null,
			position: 'door, top',
			degrees: 50,
			unit: 'fahrenheit',
			takenAt: testNow,
			takenBy: qa.id
		});
		await run();
		const row = await LineRecommendation.findOne({ where: { lineId: lines[0]?.id } });
		expect(row?.recommended).toBe('hold');
		expect(JSON.parse(row?.reasons ?? '[]')).toEqual(
			expect.arrayContaining([
				expect.objectContaining({ code: 'pulp-above-limit', pulpCelsius: 10 }),
				expect.objectContaining({ code: 'cases-differ', advised: 960, received: 940 })
			])
		);
	});

	it('leaves out what a person trimmed, and keeps the assessment before as past', async () => {
		const { shipment, qa, run } = await scene();
		const { row: trace } = await buildTrace(shipment, qa, steadyTrace(10, from, to));
		await run();
		const [before] = await current(shipment.id);
		await TrimRow.create({
			id: uuid(),
			traceId: trace.id,
			fromAt: new Date('2026-04-03T00:30:00Z'),
			toAt: new Date('2026-04-03T03:30:00Z'),
			reason: 'lay in the office',
			madeBy: qa.id,
			madeAt: testNow,
			undoneBy: null,
			undoneAt: null
		});
		await run();
		const [after] = await current(shipment.id);
		expect(parseFigures(after?.figures ?? '').trimmedHours).toBe(3);
		// The reading at 00:30 is trimmed too, so the last that counts is 00:20: 3 h 10 min at three times the speed.
		expect((after?.remainingHours ?? 0) - (before?.remainingHours ?? 0)).toBeCloseTo(9.5, 9);
		await before?.reload();
		expect(before).toMatchObject({ isCurrent: false, isGoverning: false });
	});

	it('leaves an assessment as it stands while its inputs are the same', async () => {
		const { shipment, qa, run } = await scene();
		await buildTrace(shipment, qa, steadyTrace(1, from, to));
		await run();
		const [first] = await current(shipment.id);
		await run();
		expect((await current(shipment.id)).map(({ id }) => id)).toEqual([first?.id]);
		expect(await AuditEntry.count({ where: { chainId: shipment.id, type: 'assessment.made' } })).toBe(2);
	});

	it('takes the version in force at arrival, the variety’s before the product’s', async () => {
		const { product } = await buildProduct();
		const later = { ...testSpec, fullLifeHours: 100 };
		const draft = JSON.stringify(later);
		await SpecVersion.create({
			id: uuid(),
			productId: product.id,
			varietyId: null,
			number: 2,
			state: 'signed',
			figures: draft,
			figuresSha256: sha256Hex(draft),
			createdAt: testNow,
			inForceFrom: new Date('2026-05-01T00:00:00Z')
		});
		const { shipment, qa, run } = await scene({ product, arrivedAt: new Date(to) });
		await buildTrace(shipment, qa, steadyTrace(0, from, to));
		await run();
		expect((await current(shipment.id))[0]?.remainingHours).toBeCloseTo(432 - 20 - journeyHours, 9);
	});

	it('refuses to touch a signed docket', async () => {
		const { shipment, qa, run } = await scene();
		await Disposition.create({
			id: uuid(),
			shipmentId: shipment.id,
			version: 1,
			verdict: 'accepted',
			amendmentReason: null,
			meaning: 'approval',
			signedBy: qa.id,
			signedName: qa.name,
			signedTitle: qa.title,
			signedAt: testNow,
			zone: 'Europe/Amsterdam',
			frozen: '{}',
			frozenSha256: sha256Hex('{}')
		});
		await expect(run()).rejects.toMatchObject({ code: 'already-signed' });
		expect(await LineRecommendation.count({ where: { shipmentId: shipment.id } })).toBe(0);
	});

	it('computes an opening balance with the ± of its assumed temperature', async () => {
		const opening = {
			openingKind: 'computed' as const,
			openingSinceAt: new Date('2026-03-30T00:10:00Z'),
			openingCelsius: 10,
			openingPlusMinusCelsius: 10,
			openingBasis: 'pack time'
		};
		const { shipment, qa, run } = await scene({ lines: [opening] });
		await buildTrace(shipment, qa, steadyTrace(0, from, to));
		await run();
		const [row] = await current(shipment.id);
		const { openingHours } = parseFigures(row?.figures ?? '');
		// Six hours at 10 °C and a Q10 of 3, by its definition: 18; ten degrees colder 6, warmer 54.
		expect(openingHours.value).toBeCloseTo(18, 9);
		expect(openingHours.low).toBeCloseTo(6, 9);
		expect(openingHours.high).toBeCloseTo(54, 9);
	});

	it('judges a line by the logger on its pallet, whatever line the trip names', async () => {
		const { shipment, lines, qa, run } = await scene({ lines: [{}, {}] });
		const pallet = await Pallet.create({
			id: uuid(),
			lineId: lines[1]?.id ?? '',
			ordinal: 1,
			sscc: null,
			cases: 10,
			whereabouts: null
		});
		const onPallet = await buildTrace(shipment, qa, steadyTrace(2, from, to), { palletId: pallet.id });
		const free = await buildTrace(shipment, qa, steadyTrace(0, from, to));
		await run();
		const rows = await current(shipment.id);
		const traceOf = (line: number) => rows.filter(({ lineId }) => lineId === lines[line]?.id);
		expect(traceOf(1).map(({ traceId }) => traceId)).toEqual([onPallet.row.id]);
		expect(traceOf(0).map(({ traceId }) => traceId)).toEqual([free.row.id]);
	});

	it('judges no line by a logger of another compartment', async () => {
		const { shipment, lines, qa, run } = await scene({ lines: [{}, {}] });
		const visit = await Visit.create({
			id: uuid(),
			siteId: shipment.siteId,
			carrierId: null,
			trailer: 'TR-1',
			driverName: '',
			dock: 'Dock 1',
			stopsMade: null,
			stopsToCome: null,
			sealOff: null,
			sealOn: null,
			arrivedAt: testNow,
			departedAt: null
		});
		const chamber = async (name: string) =>
			Compartment.create({
				id: uuid(),
				visitId: visit.id,
				name,
				setPointCelsius: null,
				supplyAirCelsius: null,
				returnAirCelsius: null
			});
		const [front, rear] = [await chamber('front'), await chamber('rear')];
		await shipment.update({ visitId: visit.id, compartmentId: front.id });
		await lines[1]?.update({ compartmentId: rear.id });
		const inFront = await buildTrace(shipment, qa, steadyTrace(0, from, to));
		await run();
		let rows = await current(shipment.id);
		expect(rows.map(({ lineId, traceId }) => [lineId, traceId])).toEqual([[lines[0]?.id, inFront.row.id]]);
		expect(await reasonCodes(lines[1]?.id ?? '')).toContain('life-not-known');
		const inRear = await buildTrace(shipment, qa, steadyTrace(2, from, to), { compartmentId: rear.id });
		await run();
		rows = await current(shipment.id);
		const traceOf = (line: number) => rows.filter(({ lineId }) => lineId === lines[line]?.id);
		expect(traceOf(0).map(({ traceId }) => traceId)).toEqual([inFront.row.id]);
		expect(traceOf(1).map(({ traceId }) => traceId)).toEqual([inRear.row.id]);
	});

	it('grades findings as the product says, and before it the lane', async () => {
		const { product } = await buildProduct();
		await product.update({ findingGrades: { 'opening-undeclared': 'hold', 'life-short': 'inform' } });
		const { shipment, lines, qa, run } = await scene({ product, lines: [{ openingKind: 'undeclared' }] });
		await buildTrace(shipment, qa, steadyTrace(0, from, to, 5));
		const recommended = async () =>
			(await LineRecommendation.findOne({ where: { lineId: lines[0]?.id } }))?.recommended;
		await run();
		expect(await recommended()).toBe('hold');
		const lane = await Lane.create({
			id: uuid(),
			name: `lane ${uuid()}`,
			supplierId: null,
			siteId: shipment.siteId,
			isLoggerRequired: false,
			findingGrades: { 'opening-undeclared': 'note' },
			createdAt: testNow,
			switchedOffAt: null
		});
		await shipment.update({ laneId: lane.id });
		await run();
		expect(await recommended()).toBe('accept');
	});

	it('holds a printed date older than the last taken in, and one too near', async () => {
		const { product } = await buildProduct();
		await product.update({ isNotOlderThanLast: true, minimumDatedDays: 10 });
		const site = await buildSite();
		const before = new Date('2026-04-01T08:00:00Z');
		await buildShipment({ site, product, arrivedAt: before, lines: [{ bestBeforeOn: '2026-04-20' }] });
		const { shipment, lines, qa, run } = await scene({
			site,
			product,
			arrivedAt: new Date(to),
			lines: [{ bestBeforeOn: '2026-04-12' }]
		});
		await buildTrace(shipment, qa, steadyTrace(0, from, to, 5));
		await run();
		const codes = await reasonCodes(lines[0]?.id ?? '');
		expect(codes).toContain('date-short');
		expect(codes).toContain('older-than-last');
	});
});
