import type { Context } from '../context';
import { Shipment } from '../db/models/shipment';
import { TraceRow } from '../db/models/trace-row';
import { authorizeShipment, type Act } from '../policies';
import { Refusal } from '../refusals';

/** A trace by its id, for an act on its docket. @throws Refusal `not-found`, `not-allowed` */
export async function getTraceFor(
	ctx: Context,
	traceId: string,
	act: Act
): Promise<{ trace: TraceRow; shipment: Shipment }> {
	const trace = await TraceRow.findByPk(traceId);
	const shipment = trace ? await Shipment.findByPk(trace.shipmentId) : null;
	authorizeShipment(ctx, act, shipment);
	if (!trace || !shipment) throw new Refusal('not-found');
	return { trace, shipment };
}
