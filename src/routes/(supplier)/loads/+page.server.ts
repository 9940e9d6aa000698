import { listLoads } from '$lib/server/notices/list-loads';
import { contextOf, orError } from '$lib/server/request';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);

	return { loads: await orError(listLoads(ctx)) };
};
