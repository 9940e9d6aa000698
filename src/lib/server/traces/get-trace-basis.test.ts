import { describe, expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { buildTrace, steadyTrace } from '../../../../tests/helpers/trace-factory';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { assess } from '../../domain/receiving/assess';
import { unpackTrace } from '../../domain/trace/pack';
import { seriesQuery } from '../../schemas/series';
import { reassess } from '../assessments/reassess';
import { AssessmentRow } from '../db/models/assessment-row';
import { inTransaction } from '../db/transaction';
import { getSeries } from './get-series';
import { getTraceBasis } from './get-trace-basis';
import { makeTrim } from './trims';

useTestDatabase();

const from = '2026-03-30T06:10:00Z';
const to = '2026-04-03T03:30:00Z';

async function scene() {
	const site = await buildSite();
	const user = await buildUser(['qa'], { sites: [site] });
	const made = await buildShipment({ site });
	const qa = await contextFor(user);
	const { row } = await buildTrace(made.shipment, user, steadyTrace(10, from, to));
	await inTransaction(qa, (w) => reassess(w, qa, made.shipment.id));
	return { ...made, site, qa, row };
}

/** As a browser has it: through JSON, and unpacked there. */
async function tried(scene: { qa: Awaited<ReturnType<typeof contextFor>>; row: { id: string } }) {
	const basis = JSON.parse(JSON.stringify(await getTraceBasis(scene.qa, scene.row.id))) as Awaited<
		ReturnType<typeof getTraceBasis>
	>;
	const trace = unpackTrace(Buffer.from(basis.packed, 'base64'));
	return { basis, trace };
}

describe('what a trace was assessed from', () => {
	it('gives the same digits again where it arrives', async () => {
		const made = await scene();
		const { basis, trace } = await tried(made);
		const [line] = basis.assessed;
		expect(line).toMatchObject({ line: 1, isGoverning: true, trims: [], accuracyCelsius: 0.5 });
		if (!line) return;
		const again = assess({ ...line, trace });
		const series = await getSeries(made.qa, made.row.id, seriesQuery.parse({}));
		const left = again.fullLifeHours - again.openingHours.value - (again.series.usedHours[560] ?? 0);
		expect(left).toBe(series.remainingHours?.[560]);
		// The total is added up by passage, the series by time: the last of sixteen digits may differ.
		expect(again.remainingHours.low).toBeCloseTo(series.remainingLowHours?.[560] ?? NaN, 9);
	});

	it('tells before a trim is sent to the digit what it will make of the figure', async () => {
		const made = await scene();
		const { basis, trace } = await tried(made);
		const [line] = basis.assessed;
		expect(line).toBeDefined();
		if (!line) return;
		const stretch = { fromMs: Date.parse('2026-04-03T00:25:00Z'), toMs: Date.parse(to) };
		const foretold = assess({ ...line, trace, trims: [...line.trims, stretch] });
		const reason = 'lay in the office';
		const [fromAt, toAt] = [new Date(stretch.fromMs).toISOString(), new Date(stretch.toMs).toISOString()];
		await makeTrim(made.qa, { traceId: made.row.id, fromAt, toAt, reason });
		const row = await AssessmentRow.findOne({ where: { traceId: made.row.id, isCurrent: true } });
		expect(JSON.parse(row?.figures ?? '{}')).toMatchObject({
			usedHours: foretold.usedHours,
			remainingHours: foretold.remainingHours
		});
		expect((await tried(made)).basis.assessed[0]?.trims).toEqual([stretch]);
	});

	it('has none where nothing was assessed, and the readings all the same', async () => {
		const made = await scene();
		await AssessmentRow.update({ isCurrent: false }, { where: {} });
		const { basis, trace } = await tried(made);
		expect(basis.assessed).toEqual([]);
		expect(trace.times).toHaveLength(561);
	});

	it('is for staff of the site alone', async () => {
		const { row, supplier } = await scene();
		const outside = await contextFor(await buildUser(['supplier'], { partner: supplier }));
		await expect(getTraceBasis(outside, row.id)).rejects.toMatchObject({ code: 'not-allowed' });
		const other = await scene();
		await expect(getTraceBasis(other.qa, row.id)).rejects.toMatchObject({ code: 'not-found' });
	});
});
