import { v7 as uuid } from 'uuid';
import type { ShipmentChange } from '../../schemas/shipment-form';
import { setRejectClock } from '../arrivals/reject-clock';
import { reassess } from '../assessments/reassess';
import { keepMove } from '../authority/keep-move';
import type { Context } from '../context';
import { Handover } from '../db/models/handover';
import { LoggerTrip } from '../db/models/logger-trip';
import { Pallet } from '../db/models/pallet';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { inTransaction, type Writing } from '../db/transaction';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import type { DocketName } from './create-shipment';
import { inCompartments } from './compartments';
import { docketRows, type DocketRows } from './docket-rows';
import { lockDocket, refuseClosed } from './lock-docket';
import { getOwnSite } from './own-site';
import { differences, papersSnapshot } from './papers-snapshot';
import { preparePapers } from './prepare-papers';
import { removeRows, replaceRows } from './replace-rows';

function changedMeanwhile(): Refusal {
	return new Refusal(
		'changed-meanwhile',
		'Somebody changed this docket while you were writing. Open it again and make your change there.'
	);
}

/** Ids that stand in the form must be this docket's own: a row of another is nobody's to change. */
async function refuseStrangeRows(shipmentId: string, input: ShipmentChange): Promise<void> {
	const where = { shipmentId };
	const own = [
		...(await ShipmentLine.findAll({ where })),
		...(await Handover.findAll({ where })),
		...(await LoggerTrip.findAll({ where }))
	].map((row) => row.id);
	const given = [...input.lines, ...input.handovers, ...input.loggers].map((row) => row.id);
	if (given.some((id) => id !== null && !own.includes(id))) throw changedMeanwhile();
}

/** Lines go last and come first: loggers and pallets hang on them. */
async function writeRows(shipment: Shipment, rows: DocketRows, { transaction }: Writing): Promise<void> {
	const where = { shipmentId: shipment.id };
	await removeRows(LoggerTrip, where, rows.trips, transaction);
	for (const line of await ShipmentLine.findAll({ where, transaction })) {
		const pallets = await Pallet.findAll({ where: { lineId: line.id }, order: ['ordinal'], transaction });
		const wanted = rows.pallets.filter((pallet) => pallet.lineId === line.id);
		// A pallet keeps its id, and with it whatever rests on it, as long as it keeps its place.
		wanted.forEach((pallet, at) => (pallet.id = pallets[at]?.id ?? pallet.id));
		await removeRows(Pallet, { lineId: line.id }, wanted, transaction);
	}
	await removeRows(ShipmentLine, where, rows.lines, transaction);
	await removeRows(Handover, where, rows.handovers, transaction);

	await replaceRows(
		ShipmentLine,
		where,
		await inCompartments(shipment, rows.lines, transaction),
		transaction
	);
	for (const line of rows.lines) {
		const wanted = rows.pallets.filter((pallet) => pallet.lineId === line.id);
		await replaceRows(Pallet, { lineId: line.id }, wanted, transaction);
	}
	await replaceRows(Handover, where, rows.handovers, transaction);
	const found = await LoggerTrip.findAll({ where, transaction });
	const trips = rows.trips.map((trip) => ({
		...trip,
		status: found.find((known) => known.id === trip.id)?.status ?? trip.status
	}));
	await replaceRows(LoggerTrip, where, await inCompartments(shipment, trips, transaction), transaction);
}

/**
 * Writes changed papers over the old ones, until the docket is signed: also planned and actual handover times. What
 * rests on them is worked out again in the same transaction.
 */
export async function changeShipment(
	ctx: Context,
	number: string,
	input: ShipmentChange
): Promise<DocketName> {
	const seen = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, 'shipment.change', seen);
	refuseClosed(seen);
	await refuseStrangeRows(seen.id, input);
	const prepared = await preparePapers(await getOwnSite(ctx, seen.siteId), input, seen.laneId);
	const rows = docketRows(prepared, seen.id);
	const [clockId, moveId] = [uuid(), uuid()];

	return inTransaction(ctx, async (w) => {
		const { transaction } = w;
		const shipment = await lockDocket(ctx, 'shipment.change', number, transaction);
		refuseClosed(shipment);
		if (shipment.version !== input.version) throw changedMeanwhile();
		const before = await papersSnapshot(shipment.id, transaction);
		await shipment.update({ ...prepared.papers, version: shipment.version + 1 }, { transaction });
		await writeRows(shipment, rows, w);
		await setRejectClock(shipment, clockId, transaction);
		const changes = differences(before, await papersSnapshot(shipment.id, transaction));
		w.record(
			'shipment.changed',
			{ scope: 'shipment', id: shipment.id },
			{ ...changes, reason: input.reason }
		);
		const kind = () => ('handovers' in changes.after ? ('handover' as const) : ('papers' as const));
		if (shipment.arrivedAt)
			await keepMove(ctx, w, { id: moveId, shipmentId: shipment.id, kind }, () =>
				reassess(w, ctx, shipment.id)
			);
		return { id: shipment.id, number };
	});
}
