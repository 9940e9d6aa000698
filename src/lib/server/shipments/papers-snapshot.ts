import type { Transaction } from 'sequelize';
import { Handover } from '../db/models/handover';
import { LoggerTrip } from '../db/models/logger-trip';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { listCompartments } from './compartments';

/** A docket's papers as the audit trail compares them. */
export async function papersSnapshot(
	shipmentId: string,
	transaction: Transaction
): Promise<Record<string, unknown>> {
	const of = { where: { shipmentId }, order: ['ordinal'], transaction };
	const shipment = await Shipment.findByPk(shipmentId, { transaction });
	const { version: _version, ...papers } = shipment?.get({ plain: true }) ?? {};
	const plain = (rows: { get(options: { plain: true }): object }[]) =>
		rows.map((row) => row.get({ plain: true }));
	return {
		...papers,
		lines: plain(await ShipmentLine.findAll(of)),
		handovers: plain(await Handover.findAll(of)),
		loggers: plain(await LoggerTrip.findAll(of)),
		compartments: shipment ? plain(await listCompartments(shipment, transaction)) : []
	};
}

/** What differs between two snapshots, each side with its own values. */
export function differences(before: Record<string, unknown>, after: Record<string, unknown>) {
	const names = Object.keys(after).filter(
		(name) => JSON.stringify(before[name]) !== JSON.stringify(after[name])
	);
	const pick = (from: Record<string, unknown>) =>
		Object.fromEntries(names.map((name) => [name, from[name] ?? null]));
	return { before: pick(before), after: pick(after) };
}
