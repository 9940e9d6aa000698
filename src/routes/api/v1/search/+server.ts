import { asJson, contextOf } from '$lib/server/request';
import { searchDockets } from '$lib/server/shipments/search-dockets';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async ({ locals, url }) => {
	const ctx = contextOf(locals);

	const q = (url.searchParams.get('q') ?? '').slice(0, 100);

	return asJson(async () => ({ items: await searchDockets(ctx, q) }));
};
