import { fail } from '@sveltejs/kit';
import { queryOf } from '$lib/schemas/list';
import { queueQuery, takeInput } from '$lib/schemas/queue';
import { listQueue } from '$lib/server/queue/list-queue';
import { handBackDocket, takeDocket } from '$lib/server/queue/take-docket';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, cookies, url }) => {
	const ctx = contextOf(locals);

	const query = queueQuery.parse(queryOf(url.searchParams));

	const site = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));
	const queue = await orError(listQueue(ctx, site.id, query));

	return { query, queue, viewerId: ctx.actor.id };
};

export const actions = {
	take: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, takeInput);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await takeDocket(ctx, form.data.number);
		} catch (e) {
			return orFail(e, form.data);
		}
	},

	handBack: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, takeInput);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await handBackDocket(ctx, form.data.number);
		} catch (e) {
			return orFail(e, form.data);
		}
	}
} satisfies Actions;
