import { contextOf, refusalAsJson } from '$lib/server/request';
import { csvResponse } from '$lib/server/traces/csv-response';
import { getReadingsCsv } from '$lib/server/traces/readings-csv';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	try {
		return csvResponse(await getReadingsCsv(ctx, params.trace));
	} catch (e) {
		return refusalAsJson(e);
	}
};
