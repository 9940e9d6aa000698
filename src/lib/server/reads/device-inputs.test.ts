import { v7 as uuid } from 'uuid';
import { describe, expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { Logger } from '../db/models/logger';
import { LoggerTrip } from '../db/models/logger-trip';
import { listReads } from './list-reads';

useTestDatabase();

describe('what the dock’s device assesses by', () => {
	it('is each line with its spec, and each logger still expected whose accuracy is known', async () => {
		const site = await buildSite();
		const dock = await contextFor(await buildUser(['dock'], { sites: [site] }));
		const { shipment, lines } = await buildShipment({ site });
		const logger = await Logger.create({
			id: uuid(),
			serial: 'WH-DEVICE-1',
			kind: 'reusable',
			ownerId: null,
			accuracyCelsius: 0.3,
			startDelayMinutes: 0,
			calibrationDueOn: null,
			note: '',
			createdAt: dock.now,
			switchedOffAt: null
		});
		const trip = (serial: string, ordinal: number, status: 'expected' | 'found', loggerId: string | null) =>
			LoggerTrip.create({
				id: uuid(),
				shipmentId: shipment.id,
				serial,
				ordinal,
				status,
				loggerId,
				lineId: lines[0]?.id ?? null,
				palletId: null,
				position: null,
				placement: 'air'
			});
		await trip(logger.serial, 11, 'expected', logger.id);
		await trip('NOT-ON-THE-REGISTER', 12, 'expected', null);
		await trip('WH-FOUND', 13, 'found', null);

		const { inputs, context } = await listReads(dock, shipment.number);
		expect(inputs.lines.map(({ id }) => id)).toEqual(lines.map(({ id }) => id));
		expect(inputs.lines[0]?.spec.fullLifeHours).toBeGreaterThan(0);
		expect(inputs.lines[0]?.handovers.length).toBeGreaterThan(0);
		expect(inputs.loggers.filter(({ serial }) => /WH-|NOT/.test(serial))).toEqual([
			{
				serial: 'WH-DEVICE-1',
				accuracyCelsius: 0.3,
				placement: 'air',
				lineId: lines[0]?.id,
				compartmentId: null
			}
		]);
		expect(context).toMatchObject({ siteZone: site.zone, uploadedMs: dock.now.getTime(), answers: {} });
	});
});
