import { describe, expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { buildTrace, steadyTrace } from '../../../../tests/helpers/trace-factory';
import { engineVersion } from '../../domain/receiving/engine-version';
import { AssessmentRow } from '../db/models/assessment-row';
import { TraceRow } from '../db/models/trace-row';
import { inTransaction } from '../db/transaction';
import { checkAllAssessments } from './check-all';
import { figureDifferences, largestRelative } from './figure-differences';
import { reassess } from './reassess';

const { appUrl } = useTestDatabase();

async function stored(celsius: number): Promise<AssessmentRow> {
	const site = await buildSite();
	const qa = await buildUser(['qa'], { sites: [site] });
	const { shipment } = await buildShipment({ site });
	await buildTrace(shipment, qa, steadyTrace(celsius, '2026-03-30T06:10:00Z', '2026-04-03T03:30:00Z'));
	const ctx = await contextFor(qa);
	await inTransaction(ctx, (w) => reassess(w, ctx, shipment.id));
	const row = await AssessmentRow.findOne({ where: { shipmentId: shipment.id } });
	if (!row) throw new Error('Nothing was assessed.');
	return row;
}

const present = async () => {
	const report = await checkAllAssessments(appUrl(), 0);
	return { report, version: report.versions.find(({ isPresent }) => isPresent) };
};

describe('the check of stored assessments', () => {
	it('finds every digit of the present version again', async () => {
		await stored(1);
		await stored(6);
		const { report, version } = await present();
		expect(report.isSound).toBe(true);
		expect(version).toMatchObject({ engineVersion, differing: [] });
		expect(version?.assessments).toBeGreaterThanOrEqual(2);
		expect(report.readings).toBeGreaterThan(1000);
	});

	it('fails on one digit, and names the figure with both values', async () => {
		const row = await stored(2);
		const whole = row.figures;
		const figures = JSON.parse(whole) as { mktCelsius: number };
		const changed = figures.mktCelsius + 4e-15;
		expect(changed).not.toBe(figures.mktCelsius);
		await row.update({ figures: JSON.stringify({ ...figures, mktCelsius: changed }) });
		const { report, version } = await present();
		expect(report.isSound).toBe(false);
		expect(version?.differing).toMatchObject([
			{
				id: row.id,
				fault: null,
				differences: [{ path: 'mktCelsius', stored: changed, recomputed: figures.mktCelsius }]
			}
		]);
		await row.update({ figures: whole });
	});

	it('fails where the trace or the inputs are not those the figures name', async () => {
		const row = await stored(3);
		const trace = await TraceRow.findByPk(row.traceId);
		const { contentSha256 } = trace ?? { contentSha256: '' };
		await trace?.update({ contentSha256: '0'.repeat(64) });
		expect((await present()).version?.differing).toMatchObject([{ id: row.id, fault: 'trace-replaced' }]);
		await trace?.update({ contentSha256 });
		const { inputsSha256 } = row;
		await row.update({ inputsSha256: 'f'.repeat(64) });
		expect((await present()).version?.differing).toMatchObject([{ id: row.id, fault: 'inputs-altered' }]);
		await row.update({ inputsSha256 });
		expect((await present()).report.isSound).toBe(true);
	});

	it('tells how an older version differs, by the figures that version stored, and is sound all the same', async () => {
		const row = await stored(4);
		const { rangeParts: _, ...known } = JSON.parse(row.figures) as Record<string, unknown>;
		const older = { ...known, engineVersion: '0.9.0', meanCelsius: 5 };
		await row.update({ engineVersion: '0.9.0', figures: JSON.stringify(older) });
		const { report } = await present();
		const version = report.versions.find(({ isPresent }) => !isPresent);
		expect(version).toMatchObject({ engineVersion: '0.9.0', assessments: 1, largestRelative: 0.2 });
		expect(version?.differing[0]?.differences).toEqual([{ path: 'meanCelsius', stored: 5, recomputed: 4 }]);
		expect(report.isSound).toBe(true);
	});
});

describe('the differences of figures', () => {
	it.each([
		[{ a: 1 }, { a: 1 }, true, []],
		[{ a: [1, { b: 2 }] }, { a: [1, { b: 3 }] }, true, ['a.1.b']],
		[{ a: 1 }, { a: 1, b: 2 }, true, ['b']],
		[{ a: 1 }, { a: 1, b: 2 }, false, []],
		[{ a: null }, { a: 0 }, true, ['a']],
		[{ a: [1, 2] }, { a: [1] }, false, ['a.1']]
	])('between %j and %j (whole %s) are at %j', (stored, again, isWhole, paths) => {
		expect(figureDifferences(stored, again, isWhole).map(({ path }) => path)).toEqual(paths);
	});

	it('are as large as the worst of their numbers, relative', () => {
		const differences = figureDifferences({ a: 1, b: 10, c: 'x' }, { a: 2, b: 9, c: 'y' }, true);
		expect(largestRelative(differences)).toBe(0.5);
		expect(largestRelative([])).toBe(0);
	});
});
