import { receiveNote } from '$lib/server/notes/receive-note';
import { uploadOf } from '$lib/server/reads/upload-of';
import { contextOf, refusalAsJson } from '$lib/server/request';
import type { RequestHandler } from './$types';

/** Writes a note: a form with `text`, any `files`, and for sending again `id`. */
export const POST: RequestHandler = async ({ locals, params, request }) => {
	const ctx = contextOf(locals);

	try {
		return Response.json(await receiveNote(ctx, params.docket, uploadOf(request)), { status: 201 });
	} catch (e) {
		return refusalAsJson(e);
	}
};
