import { fail, redirect } from '@sveltejs/kit';
import { apiTokenEnding, apiTokenForm } from '$lib/schemas/api-token';
import { listApiTokens, revokeApiToken } from '$lib/server/accounts/api-tokens';
import { makeOwnToken } from '$lib/server/accounts/own-token';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, cookies }) => {
	const ctx = contextOf(locals);

	const { zone } = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));
	const { items } = await listApiTokens(ctx);

	return { tokens: items, zone, back: { href: '/settings', word: 'Settings', title: 'API tokens' } };
};

export const actions = {
	/** Answers instead of leading on: the secret is shown in this answer and nowhere else. */
	make: async ({ locals, request, setHeaders }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, apiTokenForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			setHeaders({ 'cache-control': 'no-store' });
			return { made: { name: form.data.name, secret: await makeOwnToken(ctx, form.data) } };
		} catch (e) {
			return orFail(e, { name: form.data.name });
		}
	},

	revoke: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, apiTokenEnding);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await revokeApiToken(ctx, form.data.tokenId);
		} catch (e) {
			return orFail(e);
		}

		redirect(303, '/settings/tokens');
	}
} satisfies Actions;
