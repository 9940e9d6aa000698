import { fail, redirect } from '@sveltejs/kit';
import { forgetForm, layoutQuery } from '$lib/schemas/layout';
import { queryOf } from '$lib/schemas/list';
import { forgetLayout } from '$lib/server/layouts/forget-layout';
import { listLayouts } from '$lib/server/layouts/list-layouts';
import { may } from '$lib/server/policies';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url, cookies }) => {
	const ctx = contextOf(locals);

	const query = layoutQuery.parse(queryOf(url.searchParams));

	const { zone } = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));
	const { items, total } = await orError(listLayouts(ctx, query));

	return {
		query,
		items,
		total,
		zone,
		mayForget: may(ctx.actor, 'layout.confirm'),
		back: { href: '/settings', word: 'Settings', title: 'Remembered layouts' }
	};
};

export const actions = {
	forget: async ({ locals, request, url }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, forgetForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await forgetLayout(ctx, form.data.layoutId, form.data.reason);
		} catch (e) {
			return orFail(e, { ...form.data });
		}

		redirect(303, url.pathname);
	}
} satisfies Actions;
