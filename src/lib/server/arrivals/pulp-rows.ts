import { v7 as uuid } from 'uuid';
import type { PulpInput } from '../../schemas/arrival';
import type { Context } from '../context';
import { PulpReading } from '../db/models/pulp-reading';
import type { Writing } from '../db/transaction';

/** The rows of probe readings, with their ids: made before the transaction, which may have to run twice. */
export function pulpRows(ctx: Context, shipmentId: string, pulp: readonly PulpInput[], takenAt: Date) {
	return pulp.flatMap(({ degrees, lineId, position, caseLabel, unit, instrument }) =>
		degrees === null
			? []
			: [
					{
						...{ id: uuid(), shipmentId, lineId, caseLabel, degrees, unit, instrument, takenAt },
						position: position ?? '',
						takenBy: ctx.actor.id
					}
				]
	);
}

/** Writes the readings, each with its entry in the docket's trail. */
export async function writePulp(rows: ReturnType<typeof pulpRows>, w: Writing): Promise<void> {
	await PulpReading.bulkCreate(rows, { transaction: w.transaction });
	for (const { shipmentId, lineId, position, degrees, unit } of rows)
		w.record('pulp.recorded', { scope: 'shipment', id: shipmentId }, { lineId, position, degrees, unit });
}
