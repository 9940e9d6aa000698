import { v7 as uuid } from 'uuid';
import type { Transaction } from 'sequelize';
import type { ArrivalInput } from '../../schemas/arrival';
import { reassess } from '../assessments/reassess';
import type { Context } from '../context';
import { Arrival } from '../db/models/arrival';
import { Handover } from '../db/models/handover';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { inTransaction } from '../db/transaction';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import type { DocketName } from '../shipments/create-shipment';
import { lockDocket, refuseClosed } from '../shipments/lock-docket';
import { getOwnSite } from '../shipments/own-site';
import { arrivalFacts } from './arrival-facts';
import { keepDriverSignature } from './driver-signature';
import { pulpRows, writePulp } from './pulp-rows';
import { setRejectClock } from './reject-clock';

async function writeCounts(seen: ArrivalInput, transaction: Transaction): Promise<void> {
	for (const { lineId, received } of seen.counts)
		await ShipmentLine.update({ casesReceived: received }, { where: { id: lineId }, transaction });
}

/** Custody passes to us at the door, unless somebody already wrote when it did. */
async function closeLastHandover(
	shipmentId: string,
	arrivedAt: Date,
	transaction: Transaction
): Promise<void> {
	const last = await Handover.findOne({
		where: { shipmentId },
		order: [['ordinal', 'DESC']],
		transaction
	});
	if (last && last.actualAt === null)
		await last.update({ actualAt: arrivedAt, source: last.source ?? 'logged at the door' }, { transaction });
}

/**
 * Logs what was seen at the door: the arrival, counts and probe readings, the clock that starts with them, and what
 * is now to be said of the goods; all of it or nothing. The same id again answers the arrival it logged.
 */
export async function logArrival(ctx: Context, number: string, seen: ArrivalInput): Promise<DocketName> {
	const load = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, 'arrival.log', load);
	const site = await getOwnSite(ctx, load.siteId);
	const facts = await arrivalFacts(load, site.zone, ctx.now, seen);
	const driverSignatureId = await keepDriverSignature(ctx, seen.driverSignature);
	const pulp = pulpRows(ctx, load.id, seen.pulp, ctx.now);
	const [id, clockId] = [seen.id ?? uuid(), uuid()];

	return inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		const shipment = await lockDocket(ctx, 'arrival.log', number, transaction);
		refuseClosed(shipment);
		const known = await Arrival.findOne({ where: { shipmentId: shipment.id }, transaction });
		if (known?.id === id) return { id: shipment.id, number };
		if (known || shipment.arrivedAt) throw new Refusal('already-arrived');

		const { reservation: _reservation, conditionNote: _condition, arrivedAt, ...said } = facts;
		await Arrival.create(
			{
				...{ id, shipmentId: shipment.id, ...facts, driverSignatureId },
				loggedBy: ctx.actor.id,
				loggedAt: ctx.now
			},
			{ transaction }
		);
		const dock = seen.dock ?? shipment.dock;
		await shipment.update({ arrivedAt, dock, version: shipment.version + 1 }, { transaction });
		await writeCounts(seen, transaction);
		await closeLastHandover(shipment.id, arrivedAt, transaction);
		await setRejectClock(shipment, clockId, transaction);
		record(
			'arrival.logged',
			{ scope: 'shipment', id: shipment.id },
			{ ...said, arrivedAt: arrivedAt.toISOString() }
		);
		await writePulp(pulp, w);
		await reassess(w, ctx, shipment.id);
		return { id: shipment.id, number };
	});
}
