import { z } from 'zod';
import { optionalId, optionalText, text } from './shipment-parts';

export const noteInput = z.object({ id: optionalId, text: text(2_000, 'Write the note.') });
export type NoteInput = z.output<typeof noteInput>;

/** A note as staff read it; suppliers see none. */
export interface NoteView {
	id: string;
	text: string;
	by: string;
	at: string;
	/** Absent in records from before notes had any. */
	files?: { id: string; fileName: string; bytes: number; sha256: string }[];
}

/** What may hang on one note: a surveyor's letter, a photograph of the papers, a spreadsheet. */
export const maxNoteFiles = 5;
export const maxNoteFileBytes = 25_000_000;

/** Endings of what may be attached; nothing of it is ever shown in the page, only saved. */
export const noteFileEndings = [
	...['jpg', 'jpeg', 'png', 'webp', 'pdf', 'csv', 'tsv', 'txt', 'json'],
	...['xlsx', 'docx', 'ods', 'odt', 'eml']
] as const;

export const holdInput = z.object({
	id: optionalId,
	reason: text(500, 'Why is it held?'),
	awaited: optionalText(400),
	/** By the clock of the site, or with its offset. */
	until: optionalText(40)
});
export type HoldInput = z.output<typeof holdInput>;
