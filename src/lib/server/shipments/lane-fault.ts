import type { ShipmentInput } from '../../schemas/shipment-form';
import { Lane } from '../db/models/lane';
import type { Site } from '../db/models/site';

/** What is wrong with the lane that papers name, or null: it leads from their supplier to their site and is in use. */
export async function laneFault(
	site: Site,
	{ laneId, supplierId }: ShipmentInput,
	ownLaneId: string | null
): Promise<string | null> {
	if (laneId === null) return null;
	const lane = await Lane.findByPk(laneId);
	if (lane?.siteId !== site.id) return 'There is no such lane to this site.';
	if (lane.switchedOffAt && laneId !== ownLaneId) return 'This lane has been switched off. Choose another.';
	if (lane.supplierId && lane.supplierId !== supplierId)
		return 'This lane is another supplier’s. Choose one of this supplier’s, or none.';
	return null;
}
