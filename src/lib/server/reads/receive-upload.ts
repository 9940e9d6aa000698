import { join } from 'node:path';
import type { Readable } from 'node:stream';
import { v7 as uuid, validate as isUuid } from 'uuid';
import { maxUploadBytes, maxUploadFiles, type UploadAnswer } from '../../schemas/read';
import type { Context } from '../context';
import type { Shipment } from '../db/models/shipment';
import { env } from '../env';
import { applyRemembered } from '../layouts/apply-layout';
import { Refusal, type RefusalCode } from '../refusals';
import { fileStore, nameFile } from '../storage/store';
import { getShipmentFor, isSigned } from './find-read';
import { readContextOf } from './read-context';
import { writeReceived } from './write-received';
import { runReader } from './run-reader';
import { spoolUpload, type SpooledFile } from './spool-upload';
import { alsoOnDockets, readRowView } from './views';

/** An upload as it comes off the wire. */
export interface Upload {
	body: Readable;
	contentType: string | null;
	/** For tests; the app takes 50 MB a file. */
	maxBytes?: number;
}

/**
 * Takes the exports of one upload: spooled, hashed, kept in the store, read, and noted on the docket. The client's own
 * ids (`id` fields, one a file in their order) make sending it twice harmless; the same bytes are never a second read.
 * @throws Refusal `not-found`, `not-allowed`, `already-signed`, `not-multipart`, `upload-broken`, `too-large`
 */
export async function receiveUpload(ctx: Context, number: string, upload: Upload): Promise<UploadAnswer> {
	const shipment = await getShipmentFor(ctx, number, 'read.upload');
	if (await isSigned(shipment.id)) throw new Refusal('already-signed');
	const { maxBytes = maxUploadBytes } = upload;
	const folder = join(env().dataFolder, 'tmp');
	const spooled = await spoolUpload(upload.body, upload.contentType, {
		folder,
		maxBytes,
		maxFiles: maxUploadFiles
	});
	try {
		if (spooled.files.length === 0) throw new Refusal('not-multipart');
		return await receiveAll(ctx, shipment, spooled.files, idsOf(spooled.fields.get('id') ?? []));
	} finally {
		await spooled.clear();
	}
}

function idsOf(given: readonly string[]): string[] {
	return given.flatMap((text) => text.split(',')).map((text) => text.trim().toLowerCase());
}

async function receiveAll(
	ctx: Context,
	shipment: Shipment,
	files: readonly SpooledFile[],
	ids: readonly string[]
): Promise<UploadAnswer> {
	const answer: UploadAnswer = { reads: [], refused: [] };
	for (const [index, file] of files.entries()) {
		try {
			if (file.isTooLarge) throw new Refusal('too-large');
			const id = ids[index];
			answer.reads.push(await receiveOne(ctx, shipment, file, id && isUuid(id) ? id : uuid()));
		} catch (error) {
			// One bad file of several must not cost the good ones; alone, it is the answer.
			if (!(error instanceof Refusal) || files.length === 1 || isFatal.has(error.code)) throw error;
			answer.refused.push({ fileName: file.fileName, code: error.code, message: error.message });
		}
	}
	return answer;
}

const isFatal = new Set<RefusalCode>(['already-signed', 'not-found', 'not-allowed']);

async function receiveOne(
	ctx: Context,
	shipment: Shipment,
	file: SpooledFile,
	id: string
): Promise<UploadAnswer['reads'][number]> {
	await (await fileStore()).putFile(file.sha256, file.path);
	const named = await nameFile(file.sha256, file.bytes, file.mediaType.slice(0, 100), ctx.now);
	const context = await readContextOf(shipment, ctx.now, {});
	const first = await runReader({ path: file.path, context, withTraces: false });
	const remembered = await applyRemembered(first.summary, shipment.supplierId, (answers) =>
		runReader({ path: file.path, context: { ...context, answers }, withTraces: false })
	);
	const { read, isDuplicate } = await writeReceived(ctx, shipment.id, {
		id,
		fileId: named.id,
		fileName: file.fileName,
		fileSha256: file.sha256,
		fileBytes: file.bytes,
		summary: remembered?.summary ?? first.summary,
		layoutId: remembered?.layoutId ?? null
	});
	return { ...(await readRowView(read)), isDuplicate, alsoOn: await alsoOnDockets(ctx, read) };
}
