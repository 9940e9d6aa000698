import { v7 as uuid } from 'uuid';
import type { NoteInput } from '../../schemas/note';
import type { Context } from '../context';
import { Note } from '../db/models/note';
import { inTransaction } from '../db/transaction';
import { Refusal } from '../refusals';
import { lockDocket } from '../shipments/lock-docket';

/** Writes a note on a docket, also on a signed one: a note is no part of what was signed. */
export async function addNote(ctx: Context, number: string, input: NoteInput): Promise<{ id: string }> {
	const id = input.id ?? uuid();
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
		record('note.written', { scope: 'shipment', id: shipment.id }, { noteId: id, text: input.text });
		return { id };
	});
}
