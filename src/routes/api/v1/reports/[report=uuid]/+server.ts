import { attachmentResponse } from '$lib/server/file-response';
import { openReport } from '$lib/server/reports/open-report';
import { contextOf, refusalAsJson } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	try {
		return await attachmentResponse(await openReport(ctx, params.report));
	} catch (e) {
		return refusalAsJson(e);
	}
};
