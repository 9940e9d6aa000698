import { lineQuery } from '$lib/schemas/file-lines';
import { getReadingLine } from '$lib/server/reads/get-file-lines';
import { asJson, contextOf, parseInput } from '$lib/server/request';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params, url }) => {
	const ctx = contextOf(locals);

	return asJson(async () => {
		const query = parseInput(Object.fromEntries(url.searchParams), lineQuery);

		return getReadingLine(ctx, params.trace, query);
	});
};
