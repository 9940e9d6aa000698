import { attachmentResponse } from '$lib/server/file-response';
import { openRawFile } from '$lib/server/reads/open-raw-file';
import { contextOf, refusalAsJson } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	try {
		return await attachmentResponse(await openRawFile(ctx, params.read));
	} catch (e) {
		return refusalAsJson(e);
	}
};
