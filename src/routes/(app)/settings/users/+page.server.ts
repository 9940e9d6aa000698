import { accountQuery } from '$lib/schemas/account';
import { queryOf } from '$lib/schemas/list';
import { listAccounts } from '$lib/server/accounts/list-accounts';
import { contextOf, orError } from '$lib/server/request';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url }) => {
	const ctx = contextOf(locals);

	const query = accountQuery.parse(queryOf(url.searchParams));

	const { items, total } = await orError(listAccounts(ctx, query));

	return { query, items, total, back: { href: '/settings', word: 'Settings', title: 'Users' } };
};
