import { describe, expect, it } from 'vitest';
import {
	buildProduct,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testSpec
} from '../../../../tests/helpers/factories';
import { buildTrace, steadyTrace } from '../../../../tests/helpers/trace-factory';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { forecastAt } from '../../domain/receiving/forecast';
import { forecastTrip } from '../../domain/receiving/onward-trip';
import { reassess } from '../assessments/reassess';
import { inTransaction } from '../db/transaction';
import { listForecastBases } from './list-forecast-bases';

useTestDatabase();

const from = '2026-03-30T06:10:00Z';
const to = '2026-04-03T03:30:00Z';

async function scene() {
	const site = await buildSite();
	const user = await buildUser(['qa'], { sites: [site] });
	const qa = await contextFor(user);
	const neededAtCustomer = { hours: 72, celsius: 5 };
	const { product } = await buildProduct({ spec: { ...testSpec, neededAtCustomer } });
	const made = await buildShipment({ site, product, lines: [{}, { productId: product.id }] });
	await buildTrace(made.shipment, user, steadyTrace(0, from, to), { lineId: made.lines[0]?.id ?? null });
	await inTransaction(qa, (w) => reassess(w, qa, made.shipment.id));
	return { ...made, qa };
}

describe('what a docket looks ahead from', () => {
	it('is each line with a life figure, with the rates and the need of the version it was judged by', async () => {
		const { shipment, lines, qa } = await scene();
		const [basis, ...more] = await listForecastBases(qa, shipment.id);
		expect(more).toEqual([]);
		expect(basis).toMatchObject({
			lineId: lines[0]?.id,
			line: 1,
			neededAtCustomer: { hours: 72, celsius: 5 }
		});
		if (!basis) return;
		expect(new Date(basis.fromMs).toISOString()).toBe(new Date(to).toISOString());
		// By hand: 432 − 20 − 93 h 20 min at 0 °C are 318.67 h left; Q10 of 3, so at 10 °C a third as long.
		const left = 432 - 20 - (93 + 1 / 3);
		expect(forecastAt(basis.rates, basis.remainingHours, basis.fromMs, 10)?.lastsHours.value).toBeCloseTo(
			left / 3,
			9
		);
		// Two days at 10 °C use 144 h of it.
		const trip = [{ hours: 48, celsius: 10, plusMinusCelsius: 0 }];
		const { remainingHours } = forecastTrip(basis.rates, basis.remainingHours, basis.fromMs, trip, {
			days: 3,
			celsius: 5
		});
		expect(remainingHours.value).toBeCloseTo(left - 144, 9);
	});

	it('is nothing of a docket out of sight', async () => {
		const { shipment } = await scene();
		const elsewhere = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
		await expect(listForecastBases(elsewhere, shipment.id)).rejects.toEqual(
			expect.objectContaining({ code: 'not-found' })
		);
	});
});
