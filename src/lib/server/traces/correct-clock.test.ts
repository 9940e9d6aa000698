import { describe, expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { buildTrace } from '../../../../tests/helpers/trace-factory';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import type { Trace } from '../../domain/trace/trace';
import { seriesQuery } from '../../schemas/series';
import { reassess } from '../assessments/reassess';
import { AssessmentRow } from '../db/models/assessment-row';
import { AuditEntry } from '../db/models/audit-entry';
import { TraceRow } from '../db/models/trace-row';
import { inTransaction } from '../db/transaction';
import { getDocket } from '../dockets/get-docket';
import { signingStanding } from '../authority/signing-standing';
import { getRead } from '../reads/get-read';
import { correctClock, restoreClock } from './correct-clock';
import { getSeries } from './get-series';
import { makeTrim } from './trims';

useTestDatabase();

const hour = 3_600_000;
const from = Date.parse('2026-03-30T06:10:00Z');
const reason = 'Stopped in my hand, its display two hours ahead.';

/** Every ten minutes until 5:30, two hours after the arrival of the factory's load: 0 °C, and 25 °C in its last ten hours. */
function aheadTrace(): Trace {
	const count = Math.round((Date.parse('2026-04-03T05:30:00Z') - from) / 600_000) + 1;
	return {
		unit: 'celsius',
		decimals: 1,
		times: Float64Array.from({ length: count }, (_, i) => from + i * 600_000),
		scaled: Int32Array.from({ length: count }, (_, i) => (i < count - 60 ? 0 : 250))
	};
}

async function scene() {
	const site = await buildSite();
	const [qa, dock] = await Promise.all(
		(['qa', 'dock'] as const).map(async (role) => contextFor(await buildUser([role], { sites: [site] })))
	);
	if (!qa || !dock) throw new Error('nobody');
	const user = await buildUser(['qa'], { sites: [site] });
	const made = await buildShipment({ site });
	const { row, read } = await buildTrace(made.shipment, user, aheadTrace());
	await inTransaction(qa, (w) => reassess(w, qa, made.shipment.id));
	return { ...made, qa, dock, row, readId: read.id };
}

const leftHours = async (shipmentId: string) =>
	(await AssessmentRow.findOne({ where: { shipmentId, isCurrent: true, isGoverning: true } }))
		?.remainingHours ?? Number.NaN;

describe('a corrected clock', () => {
	it('moves every reading, leaves file and packed readings alone, and assesses again', async () => {
		const { qa, shipment, row, readId } = await scene();
		const before = await leftHours(shipment.id);
		await correctClock(qa, readId, { shiftMs: -2 * hour, reason });
		const series = await getSeries(qa, row.id, seriesQuery.parse({}));
		expect(series.times[0]).toBe(from - 2 * hour);
		const after = await TraceRow.findByPk(row.id, { rejectOnEmpty: true });
		expect(after.packed.equals(row.packed)).toBe(true);
		expect(after.contentSha256).toBe(row.contentSha256);
		// Two more of the warm hours lie before the arrival: at 25 °C they use more than two hours at 0 °C.
		expect(await leftHours(shipment.id)).toBeLessThan(before - 2);
		const docket = await getDocket(qa, shipment.number);
		expect(docket.clockCorrections).toMatchObject([{ shiftMs: -2 * hour, reason, readId }]);
		expect((await getRead(qa, readId)).clockCorrection).toMatchObject({ shiftMs: -2 * hour });
		expect(await AuditEntry.count({ where: { type: 'clock.corrected', chainId: shipment.id } })).toBe(1);
	});

	it('is undone to the digit, and undoing it twice changes nothing', async () => {
		const { qa, shipment, readId } = await scene();
		const before = await leftHours(shipment.id);
		const id = await correctClock(qa, readId, { shiftMs: -2 * hour, reason });
		await restoreClock(qa, readId, id);
		await restoreClock(qa, readId, id);
		expect(await leftHours(shipment.id)).toBe(before);
		expect((await getRead(qa, readId)).clockCorrection).toBeNull();
		expect(await AuditEntry.count({ where: { type: 'clock.restored', chainId: shipment.id } })).toBe(1);
	});

	it('is made once at a time, and not over trims by the old clock', async () => {
		const { qa, row, readId } = await scene();
		const id = await correctClock(qa, readId, { shiftMs: -2 * hour, reason });
		await expect(correctClock(qa, readId, { shiftMs: hour, reason })).rejects.toMatchObject({
			code: 'invalid'
		});
		// The trace begins two hours earlier now, and can be trimmed there.
		const trim = { traceId: row.id, fromAt: '2026-03-30T04:10:00Z', toAt: '2026-03-30T05:00:00Z', reason };
		await makeTrim(qa, trim);
		await expect(restoreClock(qa, readId, id)).rejects.toMatchObject({ code: 'invalid' });
	});

	it('that moves the recommendation needs a second person', async () => {
		const { qa, shipment, readId } = await scene();
		await correctClock(qa, readId, { shiftMs: 30 * hour, reason });
		const docket = await getDocket(qa, shipment.number);
		const { corrections } = await signingStanding(qa, docket);
		expect(corrections).toMatchObject([{ kind: 'clock', madeById: qa.actor.id }]);
		const [move] = corrections;
		expect(Object.values(move?.after ?? {})).not.toEqual(Object.values(move?.before ?? {}));
	});

	it('is QA’s to make, on a read that counts', async () => {
		const { qa, dock, row, readId } = await scene();
		await expect(correctClock(dock, readId, { shiftMs: hour, reason })).rejects.toMatchObject({
			code: 'not-allowed'
		});
		const stranger = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
		await expect(correctClock(stranger, readId, { shiftMs: hour, reason })).rejects.toMatchObject({
			code: 'not-found'
		});
		await TraceRow.update({ isAssessed: false }, { where: { id: row.id } });
		await expect(correctClock(qa, readId, { shiftMs: hour, reason })).rejects.toMatchObject({
			code: 'invalid'
		});
	});
});
