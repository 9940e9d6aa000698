import { libraryQuery } from '$lib/schemas/spec-library';
import { queryOf } from '$lib/schemas/list';
import { contextOf, orError } from '$lib/server/request';
import { listStarting } from '$lib/server/specs/list-starting';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url }) => {
	const ctx = contextOf(locals);

	const { q } = libraryQuery.parse(queryOf(url.searchParams));

	const list = await orError(listStarting(ctx, q));

	return { ...list, q, back: { href: '/specs', word: 'Specs' } };
};
