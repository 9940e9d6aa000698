import type { ReadContext } from '../../domain/ingest/ingestion';
import type { LoggerRead } from '../db/models/logger-read';
import { StoredFile } from '../db/models/stored-file';
import { fileStore } from '../storage/store';
import type { LinesWish } from './lines-of-file';
import type { ReadResult } from './read-bytes';
import { runReader } from './run-reader';

/** Reads a kept file once more, from the bytes in the store. */
export async function readAgain(
	read: LoggerRead,
	context: ReadContext,
	withTraces: boolean,
	lines?: LinesWish
): Promise<ReadResult> {
	const file = await StoredFile.findByPk(read.fileId);
	if (!file) throw new Error(`The file of read ${read.id} is missing.`);
	const bytes = await (await fileStore()).read(file.sha256);
	return runReader({ bytes, context, withTraces, lines });
}
