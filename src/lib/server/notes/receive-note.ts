import { join } from 'node:path';
import { maxNoteFileBytes, maxNoteFiles, noteInput } from '../../schemas/note';
import type { Context } from '../context';
import { Shipment } from '../db/models/shipment';
import { env } from '../env';
import { authorizeShipment } from '../policies';
import type { Upload } from '../reads/receive-upload';
import { spoolUpload, type Spooled } from '../reads/spool-upload';
import { Refusal, type RefusalCode } from '../refusals';
import { addNote } from './add-note';
import { keepAttached } from './attached-files';

/** Room for the longest note in any script. */
const maxFieldBytes = 16_384;

/** A note that was not taken, with the words that were typed: nobody writes them twice. */
export class NoteNotTaken extends Refusal {
	constructor(
		code: RefusalCode,
		readonly fault: { field: 'text' | 'files'; sentence: string },
		readonly text: string
	) {
		super(code, fault.sentence);
		this.name = 'NoteNotTaken';
	}
}

async function spooledNote({ body, contentType, maxBytes = maxNoteFileBytes }: Upload): Promise<Spooled> {
	const folder = join(env().dataFolder, 'tmp');
	try {
		// One more than is taken, so that what is too many is said rather than dropped.
		const maxFiles = maxNoteFiles + 1;
		return await spoolUpload(body, contentType, { folder, maxBytes, maxFieldBytes, maxFiles });
	} catch (error) {
		if (!(error instanceof Refusal) || error.code !== 'too-large') throw error;
		throw new Refusal(
			'too-large',
			'The files together are too large to send at once. Write a note for each.'
		);
	}
}

async function takeSpooled(
	ctx: Context,
	number: string,
	{ fields, files }: Spooled
): Promise<{ id: string }> {
	const [text = '', id] = [fields.get('text')?.[0], fields.get('id')?.[0]];
	const parsed = noteInput.safeParse({ text, id });
	const [issue] = parsed.error?.issues ?? [];
	if (!parsed.success)
		throw new NoteNotTaken('invalid', { field: 'text', sentence: issue?.message ?? '' }, text);
	try {
		return await addNote(ctx, number, parsed.data, await keepAttached(files, ctx.now));
	} catch (error) {
		if (!(error instanceof Refusal)) throw error;
		throw new NoteNotTaken(error.code, { field: 'files', sentence: error.message }, text);
	}
}

/**
 * Takes a note as a form sends it: `text`, for sending again `id`, and files, streamed to disk and kept byte for byte.
 * @throws NoteNotTaken
 * @throws Refusal `not-found`, `not-allowed`, `too-large`, `not-multipart`, `upload-broken`
 */
export async function receiveNote(ctx: Context, number: string, upload: Upload): Promise<{ id: string }> {
	authorizeShipment(ctx, 'note.write', await Shipment.findOne({ where: { number } }));
	const spooled = await spooledNote(upload);
	try {
		return await takeSpooled(ctx, number, spooled);
	} finally {
		await spooled.clear();
	}
}
