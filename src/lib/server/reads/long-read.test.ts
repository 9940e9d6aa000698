import { expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { measureReads } from '../../../../tests/bench/reads';
import { AssessmentRow } from '../db/models/assessment-row';
import { parseFigures } from '../assessments/stored-figures';

useTestDatabase();

it('a file of 100,000 readings loses none of them between the wire and the figures', async () => {
	const site = await buildSite();
	const dock = await contextFor(await buildUser(['dock'], { sites: [site] }));
	const { shipment } = await buildShipment({ site });
	const cost = await measureReads(dock, shipment.number, 100_000, () => performance.now());
	expect(cost.readings).toBe(100_000);
	const row = await AssessmentRow.findOne({ where: { shipmentId: shipment.id, isCurrent: true } });
	expect(parseFigures(row?.figures ?? '').readings).toBe(100_000);
	// A trace is one packed blob, not rows: well under half a byte a reading at a regular interval.
	expect(cost.packedBytes).toBeLessThan(40_000);
});
