import type { PulpInput } from '../../schemas/arrival';
import { reassess } from '../assessments/reassess';
import type { Context } from '../context';
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

	return inTransaction(ctx, async (w) => {
		const shipment = await lockDocket(ctx, 'arrival.log', number, w.transaction);
		refuseClosed(shipment);
		if (!shipment.arrivedAt) throw new Refusal('not-arrived');
		await writePulp(rows, w);
		await reassess(w, ctx, shipment.id);
		return { id: shipment.id, number };
	});
}
