import type { PulpInput } from '../../schemas/arrival';
import { v7 as uuid } from 'uuid';
import { reassess } from '../assessments/reassess';
import { keepMove } from '../authority/keep-move';
import type { Context } from '../context';
import { PulpReading } from '../db/models/pulp-reading';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { inTransaction } from '../db/transaction';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import type { DocketName } from '../shipments/create-shipment';
import { refuseFaults } from '../shipments/invalid-fields';
import { lockDocket, refuseClosed } from '../shipments/lock-docket';
import { pulpRows, writePulp } from './pulp-rows';

/** Adds probe readings to a load that is here, and works out again what they change. */
export async function recordPulp(
	ctx: Context,
	number: string,
	pulp: readonly PulpInput[]
): Promise<DocketName> {
	const load = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, 'arrival.log', load);
	const lines = await ShipmentLine.findAll({ where: { shipmentId: load.id } });
	const strange = pulp.filter(({ lineId }) => lineId !== null && !lines.some((line) => line.id === lineId));
	refuseFaults(
		Object.fromEntries(
			strange.map(({ at }) => [`pulp.${at}.lineId`, 'There is no such line on this docket.'])
		)
	);
	const rows = pulpRows(ctx, load.id, pulp, ctx.now);
	const moveId = uuid();

	return inTransaction(ctx, async (w) => {
		const shipment = await lockDocket(ctx, 'arrival.log', number, w.transaction);
		refuseClosed(shipment);
		if (!shipment.arrivedAt) throw new Refusal('not-arrived');
		// A first probing is evidence; one that follows another corrects it.
		const { transaction } = w;
		const hasPulp = (await PulpReading.count({ where: { shipmentId: shipment.id }, transaction })) > 0;
		const kind = () => (hasPulp ? ('pulp' as const) : null);
		await keepMove(ctx, w, { id: moveId, shipmentId: shipment.id, kind }, async () => {
			await writePulp(rows, w);
			await reassess(w, ctx, shipment.id);
		});
		return { id: shipment.id, number };
	});
}
