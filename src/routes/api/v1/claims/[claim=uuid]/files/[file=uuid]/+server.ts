import { openClaimFile } from '$lib/server/claims/get-claim';
import { attachmentResponse } from '$lib/server/file-response';
import { contextOf, refusalAsJson } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	try {
		return await attachmentResponse(await openClaimFile(ctx, params.claim, params.file));
	} catch (e) {
		return refusalAsJson(e);
	}
};
