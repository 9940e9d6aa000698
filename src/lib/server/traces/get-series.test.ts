import { describe, expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { buildTrace, steadyTrace } from '../../../../tests/helpers/trace-factory';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { seriesQuery } from '../../schemas/series';
import { reassess } from '../assessments/reassess';
import { SpecVersion } from '../db/models/spec-version';
import { inTransaction } from '../db/transaction';
import { getSeries } from './get-series';
import { makeTrim, undoTrim } from './trims';

useTestDatabase();

const from = '2026-03-30T06:10:00Z';
const to = '2026-04-03T03:30:00Z';
const whole = seriesQuery.parse({});

async function scene(everyMinutes = 10) {
	const site = await buildSite();
	const user = await buildUser(['qa'], { sites: [site] });
	const made = await buildShipment({ site });
	const qa = await contextFor(user);
	const { row } = await buildTrace(made.shipment, user, steadyTrace(10, from, to, everyMinutes));
	await inTransaction(qa, (w) => reassess(w, qa, made.shipment.id));
	return { ...made, site, qa, row };
}

describe('the series of a trace', () => {
	it('gives every reading with the life left at it, low and high, where the points allow', async () => {
		const { qa, row } = await scene();
		const series = await getSeries(qa, row.id, whole);
		expect(series).toMatchObject({ label: 'L1', isGoverning: true, totalReadings: 561 });
		expect(series.times).toHaveLength(561);
		expect(series.remainingHours?.[0]).toBe(412);
		// 432 h, 20 h before, and 93 h 20 min at three times the speed of 0 °C (Q10 of 3).
		expect(series.remainingHours?.[560]).toBeCloseTo(132, 9);
		expect(series.remainingLowHours?.[560]).toBeLessThan(132);
		expect(series.remainingHighHours?.[560]).toBeGreaterThan(132);
	});

	it('thins to the points asked for and keeps both ends', async () => {
		const { qa, row } = await scene(1);
		const series = await getSeries(qa, row.id, { ...whole, points: 100 });
		expect(series.times.length).toBeLessThanOrEqual(100);
		expect([series.times[0], series.times.at(-1)]).toEqual([Date.parse(from), Date.parse(to)]);
		expect(series.totalReadings).toBe(5601);
	});

	it('gives the part in view with one neighbour on either side', async () => {
		const { qa, row } = await scene();
		const query = { ...whole, from: '2026-04-01T00:05:00Z', to: '2026-04-01T01:05:00Z' };
		const series = await getSeries(qa, row.id, query);
		expect(series.times[0]).toBe(Date.parse('2026-04-01T00:00:00Z'));
		expect(series.times.at(-1)).toBe(Date.parse('2026-04-01T01:10:00Z'));
		expect((await getSeries(qa, row.id, { ...whole, from: '2026-05-01T00:00:00Z' })).times).toEqual([]);
	});

	it('rests on the spec the assessment pinned, whatever is in force since', async () => {
		const { qa, row } = await scene();
		await SpecVersion.update({ supersededAt: new Date('2026-04-03T04:00:00Z') }, { where: {} });
		expect((await getSeries(qa, row.id, whole)).remainingHours?.[560]).toBeCloseTo(132, 9);
	});

	it('has no life where a trim took the readings out, and has it again when that is undone', async () => {
		const { qa, row } = await scene();
		const reason = 'lay in the office';
		const trim = { traceId: row.id, fromAt: '2026-04-03T00:30:00Z', toAt: to, reason };
		const id = await makeTrim(qa, trim);
		const trimmed = await getSeries(qa, row.id, whole);
		expect(trimmed.celsius.at(-1)).toBe(10);
		expect(trimmed.remainingHours?.at(-1)).toBeNull();
		await expect(makeTrim(qa, trim)).rejects.toMatchObject({ code: 'invalid' });
		await undoTrim(qa, id);
		await undoTrim(qa, id);
		expect((await getSeries(qa, row.id, whole)).remainingHours?.at(-1)).toBeCloseTo(132, 9);
	});

	it('lets only QA trim, and only where there are readings', async () => {
		const { qa, row, site } = await scene();
		const dock = await contextFor(await buildUser(['dock'], { sites: [site] }));
		const trim = { traceId: row.id, fromAt: from, toAt: to, reason: 'not ours' };
		await expect(makeTrim(dock, trim)).rejects.toMatchObject({ code: 'not-allowed' });
		const outside = { ...trim, fromAt: '2026-05-01T00:00:00Z', toAt: '2026-05-02T00:00:00Z' };
		await expect(makeTrim(qa, outside)).rejects.toMatchObject({ code: 'invalid' });
	});

	it('is shown to its supplier and to nobody else outside', async () => {
		const { row, supplier } = await scene();
		const own = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		expect((await getSeries(own, row.id, whole)).totalReadings).toBe(561);
		const other = await scene();
		const stranger = await contextFor(await buildUser(['supplier'], { partner: other.supplier }));
		await expect(getSeries(stranger, row.id, whole)).rejects.toMatchObject({ code: 'not-found' });
		await expect(getSeries(other.qa, row.id, whole)).rejects.toMatchObject({ code: 'not-found' });
	});
});
