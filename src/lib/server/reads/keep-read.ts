import { v7 as uuid } from 'uuid';
import type { Transaction } from 'sequelize';
import type { KeepForm } from '../../schemas/read';
import { reassess } from '../assessments/reassess';
import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { TraceRow } from '../db/models/trace-row';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { getReadFor, lockUnsigned } from './find-read';
import { tripFound } from './find-trip';
import type { PackedTrace } from './read-bytes';
import { readAgain } from './read-again';
import { parseUnderstanding } from './stored-understanding';

interface Kept {
	readId: string;
	shipmentId: string;
	tripId: string;
}

/**
 * Keeps a read as evidence: its temperatures packed, its logger found on the load, the docket assessed again; all of
 * it in one transaction. Keeping it twice is keeping it once.
 * @throws Refusal `not-understood`, `already-signed`, `invalid`, `in-use`
 */
export async function keepRead(ctx: Context, readId: string, form: KeepForm): Promise<void> {
	const { read, shipment } = await getReadFor(ctx, readId, 'read.upload');
	if (read.keptAt) return;
	const understood = parseUnderstanding(read.understanding);
	if (read.state !== 'ok' || understood?.kind !== 'ok') throw new Refusal('not-understood');
	const { summary, traces } = await readAgain(read, understood.context, true);
	if (summary.kind !== 'ok') throw new Error(`Read ${readId} was understood and now is not.`);
	const ids = traces.map(() => uuid());

	await inTransaction(ctx, async (w) => {
		const { transaction, record } = w;
		await lockUnsigned(shipment.id, transaction);
		const fresh = await LoggerRead.findByPk(readId, { transaction });
		if (fresh?.keptAt) return;
		if (fresh?.understanding !== read.understanding) throw new Refusal('changed-meanwhile');
		const trip = await tripFound(ctx, shipment, form, w);
		const kept = { readId, shipmentId: shipment.id, tripId: trip.id };
		await writeTraces(kept, traces, ids, transaction);
		await fresh.update({ keptAt: ctx.now }, { transaction });
		const chain = { scope: 'shipment', id: shipment.id } as const;
		record('read.kept', chain, { readId, traceIds: ids, readings: understood.readings });
		const assessed = ids[traces.findIndex(({ isChosen }) => isChosen)] ?? '';
		const { serial, lineId, compartmentId } = trip;
		record('logger.assigned', chain, { traceId: assessed, serial, lineId, compartmentId });
		await reassess(w, ctx, shipment.id);
	});
}

async function writeTraces(
	{ readId, shipmentId, tripId }: Kept,
	traces: readonly PackedTrace[],
	ids: readonly string[],
	transaction: Transaction
): Promise<void> {
	for (const [index, trace] of traces.entries()) {
		const { firstMs, lastMs, packed, isChosen, name, ...columns } = trace;
		await TraceRow.create(
			{
				...columns,
				id: ids[index] ?? uuid(),
				readId,
				shipmentId,
				name: name.slice(0, 120),
				quantity: 'temperature',
				firstAt: new Date(firstMs),
				lastAt: new Date(lastMs),
				packed: Buffer.from(packed),
				tripId: isChosen ? tripId : null,
				isAssessed: isChosen
			},
			{ transaction }
		);
	}
}
