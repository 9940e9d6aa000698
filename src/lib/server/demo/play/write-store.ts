import { msPerMinute } from '../../../domain/units';
import type { ShipmentInput } from '../../../schemas/shipment-form';
import type { Context } from '../../context';
import { Handover } from '../../db/models/handover';
import { LoggerTrip } from '../../db/models/logger-trip';
import { Shipment } from '../../db/models/shipment';
import { ShipmentLine } from '../../db/models/shipment-line';
import { changeShipment } from '../../shipments/change-shipment';
import type { Opened } from './aftermath';
import type { Staged } from './staged';

function withIds<Row extends { id: string | null }>(
	rows: readonly Row[],
	known: readonly { id: string }[]
): Row[] {
	return rows.map((row, at) => ({ ...row, id: known[at]?.id ?? null }));
}

/** Writes into the papers when the load reached the dock and when it went on into the store. */
export async function writeStore(
	ctx: Context,
	docket: Opened,
	papers: ShipmentInput,
	{ plan, arrivedMs }: Staged
): Promise<void> {
	const rows = { where: { shipmentId: docket.id }, order: ['ordinal'] };
	const { version } = await Shipment.findByPk(docket.id, { rejectOnEmpty: true });
	const inStoreMs = arrivedMs + (plan.intoStore?.minutes ?? 0) * msPerMinute;
	const ours = [arrivedMs, inStoreMs];
	const handovers = withIds(papers.handovers, await Handover.findAll(rows)).map((row, at, all) => {
		const own = ours[at - (all.length - ours.length)];
		return own === undefined
			? row
			: { ...row, actual: new Date(own).toISOString(), source: 'logged at the door' };
	});
	await changeShipment(ctx, docket.number, {
		...papers,
		...{ version, handovers, reason: 'Custody at the dock and in the chill room' },
		lines: withIds(papers.lines, await ShipmentLine.findAll(rows)),
		loggers: withIds(papers.loggers, await LoggerTrip.findAll(rows))
	});
}
