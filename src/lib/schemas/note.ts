import { z } from 'zod';
import { optionalId, optionalText, text } from './shipment-parts';

export const noteInput = z.object({ id: optionalId, text: text(2_000, 'Write the note.') });
export type NoteInput = z.output<typeof noteInput>;

export const holdInput = z.object({
	id: optionalId,
	reason: text(500, 'Why is it held?'),
	awaited: optionalText(400),
	/** By the clock of the site, or with its offset. */
	until: optionalText(40)
});
export type HoldInput = z.output<typeof holdInput>;
