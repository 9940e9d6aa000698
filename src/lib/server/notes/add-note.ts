import { v7 as uuid } from 'uuid';
import type { NoteInput } from '../../schemas/note';
import type { Context } from '../context';
import { Note } from '../db/models/note';
import { NoteFile } from '../db/models/note-file';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { lockDocket } from '../shipments/lock-docket';
import type { KeptFile } from './attached-files';

/**
 * Writes a note on a docket with the files that hang on it, also on a signed one: a note is no part of what was signed.
 * The same id again answers the one it made. @throws Refusal `not-found`, `not-allowed`, `cancelled`, `duplicate`
 */
export async function addNote(
	ctx: Context,
	number: string,
	input: NoteInput,
	files: readonly KeptFile[] = []
): Promise<{ id: string }> {
	const id = input.id ?? uuid();
	const rows = files.map((file, at) => ({ id: uuid(), noteId: id, ordinal: at + 1, ...file }));
	return inTransaction(ctx, async ({ transaction, record }) => {
		const shipment = await lockDocket(ctx, 'note.write', number, transaction);
		if (shipment.cancelledAt) throw new Refusal('cancelled');
		const known = await Note.findByPk(id, { transaction });
		if (known && known.shipmentId !== shipment.id) throw new Refusal('duplicate');
		if (known) return { id };
		await Note.create(
			{ id, shipmentId: shipment.id, text: input.text, writtenBy: ctx.actor.id, writtenAt: ctx.now },
			{ transaction }
		);
		const chain = { scope: 'shipment', id: shipment.id } as const;
		record('note.written', chain, { noteId: id, text: input.text });
		for (const { sha256, bytes, mediaType, ...row } of rows) {
			await NoteFile.create(row, { transaction });
			record('note.file-attached', chain, { noteId: id, fileSha256: sha256, fileBytes: bytes, mediaType });
		}
		return { id };
	});
}
