import type { Transaction } from 'sequelize';
import { unpackTrace } from '../../domain/trace/pack';
import type { Trace } from '../../domain/trace/trace';
import type { Trim } from '../../domain/receiving/assessment';
import { Arrival } from '../db/models/arrival';
import { Compartment } from '../db/models/compartment';
import { Handover } from '../db/models/handover';
import { Lane } from '../db/models/lane';
import { Logger } from '../db/models/logger';
import { LoggerRead } from '../db/models/logger-read';
import { LoggerTrip } from '../db/models/logger-trip';
import { Pallet } from '../db/models/pallet';
import { Product } from '../db/models/product';
import { PulpReading } from '../db/models/pulp-reading';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { Site } from '../db/models/site';
import { StoredFile } from '../db/models/stored-file';
import { TraceRow } from '../db/models/trace-row';
import { TrimRow } from '../db/models/trim-row';
import { layoutFingerprintOf } from '../reads/stored-understanding';

/** A trace of the docket with the instrument that wrote it. */
export interface LoadedTrace {
	id: string;
	trace: Trace;
	contentSha256: string;
	fileSha256: string;
	layoutFingerprint: string | null;
	clockShiftMs: number;
	trims: Trim[];
	trip: LoggerTrip;
	/** The line of the pallet it rode on, else the line it was given to; null where it rode for all. */
	lineId: string | null;
	accuracyCelsius: number;
	startDelayMinutes: number;
	calibrationDueOn: string | null;
}

/** Everything a docket's assessments and recommendations are worked out from. */
export interface DocketEvidence {
	shipment: Shipment;
	siteZone: string;
	lines: ShipmentLine[];
	products: Product[];
	lane: Lane | null;
	/** The chambers its lines and loggers rode in. */
	compartments: Compartment[];
	handovers: Handover[];
	traces: LoadedTrace[];
	arrival: Arrival | null;
	pulp: PulpReading[];
}

/** Loads a docket's evidence, within the transaction that will write what follows from it if any will. */
export async function loadEvidence(shipment: Shipment, transaction?: Transaction): Promise<DocketEvidence> {
	const where = { shipmentId: shipment.id };
	const site = await Site.findByPk(shipment.siteId, { transaction });
	if (!site) throw new Error(`The site of docket ${shipment.number} is missing.`);
	const lines = await ShipmentLine.findAll({ where, order: ['ordinal'], transaction });
	return {
		shipment,
		siteZone: site.zone,
		lines,
		products: await Product.findAll({ where: { id: lines.map(({ productId }) => productId) }, transaction }),
		lane: shipment.laneId ? await Lane.findByPk(shipment.laneId, { transaction }) : null,
		compartments: await loadCompartments(shipment, lines, transaction),
		handovers: await Handover.findAll({ where, order: ['ordinal'], transaction }),
		traces: await loadTraces(shipment.id, transaction),
		arrival: await Arrival.findOne({ where, transaction }),
		pulp: await PulpReading.findAll({ where, order: ['takenAt', 'id'], transaction })
	};
}

async function loadCompartments(
	{ compartmentId }: Shipment,
	lines: readonly ShipmentLine[],
	transaction?: Transaction
): Promise<Compartment[]> {
	const ids = [compartmentId, ...lines.map((line) => line.compartmentId)].filter((id) => id !== null);
	return ids.length === 0 ? [] : Compartment.findAll({ where: { id: ids }, transaction });
}

async function lineOfTrip(trip: LoggerTrip, transaction?: Transaction): Promise<string | null> {
	const pallet = trip.palletId ? await Pallet.findByPk(trip.palletId, { transaction }) : null;
	return pallet?.lineId ?? trip.lineId;
}

/** The assessed traces whose instrument and accuracy are known; without an accuracy there is no range, so no figure. */
async function loadTraces(shipmentId: string, transaction?: Transaction): Promise<LoadedTrace[]> {
	const rows = await TraceRow.findAll({
		where: { shipmentId, isAssessed: true },
		order: ['id'],
		transaction
	});
	const loaded: LoadedTrace[] = [];
	for (const row of rows) {
		const trip = row.tripId ? await LoggerTrip.findByPk(row.tripId, { transaction }) : null;
		const logger = trip ? await findLogger(trip, transaction) : null;
		if (!trip || !logger) continue;
		loaded.push({
			id: row.id,
			trace: unpackTrace(row.packed),
			contentSha256: row.contentSha256,
			...(await originOf(row.readId, transaction)),
			clockShiftMs: Number(row.clockShiftMs),
			trims: await trimsOf(row.id, transaction),
			trip,
			lineId: await lineOfTrip(trip, transaction),
			accuracyCelsius: logger.accuracyCelsius,
			startDelayMinutes: logger.startDelayMinutes,
			calibrationDueOn: logger.calibrationDueOn
		});
	}
	return loaded.sort((a, b) => a.trip.ordinal - b.trip.ordinal);
}

/** The register's entry of a trip's instrument. */
async function findLogger(trip: LoggerTrip, transaction?: Transaction): Promise<Logger | null> {
	return Logger.findOne({
		where: trip.loggerId ? { id: trip.loggerId } : { serial: trip.serial },
		transaction
	});
}

async function originOf(readId: string, transaction?: Transaction) {
	const read = await LoggerRead.findByPk(readId, { transaction });
	const file = read ? await StoredFile.findByPk(read.fileId, { transaction }) : null;
	if (!read || !file) throw new Error(`The file of read ${readId} is missing.`);
	return { fileSha256: file.sha256, layoutFingerprint: layoutFingerprintOf(read.understanding) };
}

async function trimsOf(traceId: string, transaction?: Transaction): Promise<Trim[]> {
	const rows = await TrimRow.findAll({ where: { traceId, undoneAt: null }, order: ['fromAt'], transaction });
	return rows.map((row) => ({ fromMs: row.fromAt.getTime(), toMs: row.toAt.getTime() }));
}
