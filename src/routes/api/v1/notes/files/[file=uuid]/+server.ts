import { attachmentResponse } from '$lib/server/file-response';
import { openNoteFile } from '$lib/server/notes/open-note-file';
import { contextOf, refusalAsJson } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	try {
		return await attachmentResponse(await openNoteFile(ctx, params.file));
	} catch (e) {
		return refusalAsJson(e);
	}
};
