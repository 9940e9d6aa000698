import type { Context } from '../context';
import { StoredFile } from '../db/models/stored-file';
import { Refusal } from '../refusals';
import type { OutgoingFile } from '../reports/open-report';
import { fileStore } from '../storage/store';
import { getReadFor } from './find-read';

/** An export as it was uploaded, byte for byte. @throws Refusal `not-found`, `not-allowed` */
export async function openRawFile(ctx: Context, readId: string): Promise<OutgoingFile> {
	const { read } = await getReadFor(ctx, readId, 'raw-file.open');
	const file = await StoredFile.findByPk(read.fileId);
	if (!file) throw new Refusal('not-found');
	if (file.deletedAt) throw new Refusal('file-expired');
	const store = await fileStore();
	return {
		fileName: read.fileName,
		// Never the type the upload claimed: a page in an export's clothes must not be shown as one.
		mediaType: 'application/octet-stream',
		bytes: Number(file.bytes),
		sha256: file.sha256,
		open: () => store.open(file.sha256)
	};
}
