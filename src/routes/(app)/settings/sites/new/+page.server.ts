import { fail, redirect } from '@sveltejs/kit';
import { siteForm } from '$lib/schemas/site';
import { authorize } from '$lib/server/policies';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { listZones } from '$lib/server/sites/list-zones';
import { addSite } from '$lib/server/sites/save-site';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);

	await orError(Promise.resolve().then(() => authorize(ctx, 'catalogue.change')));

	return { zones: listZones(ctx.now), back: { href: '/settings/sites', word: 'Sites' } };
};

export const actions = {
	save: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, siteForm);
		if (!parsed.ok) return fail(422, parsed);

		let id: string;
		try {
			id = await addSite(ctx, parsed.data);
		} catch (e) {
			return orFail(e, nestedOf(await sent.formData()));
		}

		redirect(303, `/settings/sites/${id}`);
	}
} satisfies Actions;
