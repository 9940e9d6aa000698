import type { Context } from '../context';
import { Note } from '../db/models/note';
import { NoteFile } from '../db/models/note-file';
import { Shipment } from '../db/models/shipment';
import { StoredFile } from '../db/models/stored-file';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import type { OutgoingFile } from '../reports/open-report';
import { fileStore } from '../storage/store';

/** A file that hangs on a note, for staff of the docket's site: notes are the house's own. @throws Refusal `not-found`, `not-allowed`, `file-expired` */
export async function openNoteFile(ctx: Context, noteFileId: string): Promise<OutgoingFile> {
	const row = await NoteFile.findByPk(noteFileId);
	const note = row && (await Note.findByPk(row.noteId));
	authorizeShipment(ctx, 'docket.view', note && (await Shipment.findByPk(note.shipmentId)));
	const file = row && (await StoredFile.findByPk(row.fileId));
	if (!file) throw new Refusal('not-found');
	if (file.deletedAt) throw new Refusal('file-expired');
	return {
		fileName: row.fileName,
		// Never the type it came with: a page in other clothes must not be shown as one.
		mediaType: 'application/octet-stream',
		bytes: Number(file.bytes),
		sha256: file.sha256,
		open: async () => (await fileStore()).open(file.sha256)
	};
}
