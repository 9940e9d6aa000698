import { v7 as uuid } from 'uuid';
import { reassess } from '../assessments/reassess';
import { keepMove } from '../authority/keep-move';
import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { LoggerTrip } from '../db/models/logger-trip';
import { TraceRow } from '../db/models/trace-row';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { getReadFor, lockUnsigned } from './find-read';

/**
 * Takes a read out of the evidence: its traces are assessed no more, its logger counts as expected again. File, rows
 * and past assessments stay.
 */
export async function withdrawRead(ctx: Context, readId: string, reason: string): Promise<void> {
	const { shipment } = await getReadFor(ctx, readId, 'read.withdraw');
	const moveId = uuid();
	await inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		await lockUnsigned(shipment.id, transaction);
		const read = await LoggerRead.findByPk(readId, { transaction });
		if (!read || read.state === 'withdrawn') throw new Refusal('invalid', 'This read is withdrawn already.');
		const traces = await TraceRow.findAll({ where: { readId, isAssessed: true }, transaction });
		for (const trace of traces) {
			await trace.update({ isAssessed: false }, { transaction });
			if (trace.tripId)
				await LoggerTrip.update({ status: 'expected' }, { where: { id: trace.tripId }, transaction });
		}
		await read.update({ state: 'withdrawn' }, { transaction });
		record('read.withdrawn', { scope: 'shipment', id: shipment.id }, { readId, reason });
		if (traces.length > 0)
			await keepMove(ctx, w, { id: moveId, shipmentId: shipment.id, kind: () => 'read' }, () =>
				reassess(w, ctx, shipment.id)
			);
	});
}
