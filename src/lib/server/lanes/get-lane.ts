import type { Context } from '../context';
import { Lane } from '../db/models/lane';
import { Shipment } from '../db/models/shipment';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { withEnds } from './list-lanes';
import type { LaneView } from './views';

export interface LaneRecord extends LaneView {
	/** Once a docket is on it, it leads where it leads. */
	dockets: number;
}

/** One lane. @throws Refusal `not-found`, `not-allowed` */
export async function getLane(ctx: Context, laneId: string): Promise<LaneRecord> {
	authorize(ctx, 'catalogue.change');
	const lane = await Lane.findByPk(laneId);
	const [view] = lane ? await withEnds([lane]) : [];
	if (!view) throw new Refusal('not-found');
	return { ...view, dockets: await Shipment.count({ where: { laneId } }) };
}
