import type { DeviceInputs, DeviceLine, DeviceLogger } from '../../schemas/read';
import { domainHandover, openingOf } from '../assessments/assess-line';
import type { Context } from '../context';
import { Handover } from '../db/models/handover';
import { Logger } from '../db/models/logger';
import { LoggerTrip } from '../db/models/logger-trip';
import { Pallet } from '../db/models/pallet';
import type { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { findSpecInForce } from '../specs/find-spec-in-force';

/**
 * What the dock's device needs to say how much life is left before it has sent a file: the lines with what they are
 * judged by, and the loggers that are still expected. A logger whose accuracy is not known gives no figure.
 */
export async function deviceInputs(ctx: Context, shipment: Shipment): Promise<DeviceInputs> {
	const where = { shipmentId: shipment.id };
	const handovers = (await Handover.findAll({ where, order: ['ordinal'] })).map(domainHandover);
	const lines: DeviceLine[] = [];
	for (const line of await ShipmentLine.findAll({ where, order: ['ordinal'] })) {
		const spec = await findSpecInForce(line, shipment.arrivedAt ?? ctx.now);
		if (!spec) continue;
		lines.push({
			id: line.id,
			name: `Line ${line.ordinal}`,
			compartmentId: line.compartmentId ?? shipment.compartmentId,
			spec: spec.figures,
			opening: openingOf(line),
			handovers,
			neededHours: line.neededHours ?? spec.figures.neededHours
		});
	}
	return { lines, loggers: await expectedLoggers(shipment) };
}

async function expectedLoggers(shipment: Shipment): Promise<DeviceLogger[]> {
	const trips = await LoggerTrip.findAll({
		where: { shipmentId: shipment.id, status: 'expected' },
		order: ['ordinal']
	});
	const found: DeviceLogger[] = [];
	for (const trip of trips) {
		const logger = await Logger.findOne({
			where: trip.loggerId ? { id: trip.loggerId } : { serial: trip.serial }
		});
		if (!logger) continue;
		const pallet = trip.palletId ? await Pallet.findByPk(trip.palletId) : null;
		found.push({
			serial: trip.serial,
			accuracyCelsius: logger.accuracyCelsius,
			placement: trip.placement,
			lineId: pallet?.lineId ?? trip.lineId,
			compartmentId: trip.compartmentId ?? shipment.compartmentId
		});
	}
	return found;
}
