import type { StoredIngestion } from '../../schemas/read';
import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { inTransaction, type Writing } from '../db/transaction';
import { Refusal } from '../refusals';
import { lockUnsigned } from './find-read';
import { readerVersion } from './read-bytes';

/** A file in the store and what the reader made of it. */
export interface Received {
	id: string;
	fileId: string;
	fileName: string;
	fileSha256: string;
	fileBytes: number;
	summary: StoredIngestion;
	layoutId: string | null;
}

/** What the row says of an ingestion. */
export function readColumns(summary: StoredIngestion) {
	return {
		state: summary.kind,
		answers: summary.context.answers,
		understanding: JSON.stringify(summary),
		refusalCode: summary.kind === 'refused' ? summary.code : null,
		readerVersion,
		// The zone data the local times were turned to UTC by: Node's own ICU.
		zoneDataVersion: process.versions.tz ?? null
	};
}

/** Notes a received file on its docket, once: the same bytes find the read that is there already. */
export async function writeReceived(
	ctx: Context,
	shipmentId: string,
	received: Received
): Promise<{ read: LoggerRead; isDuplicate: boolean }> {
	return inTransaction(ctx, async (w) => {
		const { transaction } = w;
		await lockUnsigned(shipmentId, transaction);
		const sameId = await LoggerRead.findByPk(received.id, { transaction });
		if (sameId) return { read: retried(sameId, shipmentId, received), isDuplicate: false };
		const where = { shipmentId, fileId: received.fileId, part: 0 };
		const known = await LoggerRead.findOne({ where, transaction });
		if (known && known.state !== 'withdrawn') return { read: known, isDuplicate: true };
		const read = known ? await revive(known, ctx, received, w) : await create(shipmentId, ctx, received, w);
		w.record('read.received', { scope: 'shipment', id: shipmentId }, entryOf(read, received));
		if (received.layoutId)
			w.record(
				'layout.applied',
				{ scope: 'shipment', id: shipmentId },
				{ layoutId: received.layoutId, readId: read.id }
			);
		return { read, isDuplicate: false };
	});
}

/** The same id again is a retry only with the same bytes on the same docket. */
function retried(read: LoggerRead, shipmentId: string, { fileId }: Received): LoggerRead {
	if (read.shipmentId !== shipmentId || read.fileId !== fileId) throw new Refusal('duplicate');
	return read;
}

async function create(
	shipmentId: string,
	ctx: Context,
	{ id, fileId, fileName, summary, layoutId }: Received,
	{ transaction }: Writing
): Promise<LoggerRead> {
	return LoggerRead.create(
		{
			id,
			shipmentId,
			fileId,
			part: 0,
			fileName,
			layoutId,
			...readColumns(summary),
			uploadedBy: ctx.actor.id,
			uploadedAt: ctx.now,
			keptAt: null,
			askedQaAt: null
		},
		{ transaction }
	);
}

/** A withdrawn file that comes again is read afresh. */
async function revive(
	read: LoggerRead,
	ctx: Context,
	{ fileName, summary, layoutId }: Received,
	{ transaction }: Writing
): Promise<LoggerRead> {
	const uploaded = { uploadedBy: ctx.actor.id, uploadedAt: ctx.now, keptAt: null, askedQaAt: null };
	return read.update({ fileName, layoutId, ...readColumns(summary), ...uploaded }, { transaction });
}

function entryOf(read: LoggerRead, { fileName, fileSha256, fileBytes }: Received) {
	return { readId: read.id, fileName, fileSha256, fileBytes, state: read.state };
}
