import { seriesQuery } from '$lib/schemas/series';
import { asJson, contextOf, parseInput } from '$lib/server/request';
import { getSeries } from '$lib/server/traces/get-series';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = ({ locals, params, url }) => {
	const ctx = contextOf(locals);

	return asJson(async () => {
		const query = parseInput(Object.fromEntries(url.searchParams), seriesQuery);

		return getSeries(ctx, params.trace, query);
	});
};
