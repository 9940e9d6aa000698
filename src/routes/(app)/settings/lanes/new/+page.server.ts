import { fail, redirect } from '@sveltejs/kit';
import { laneForm } from '$lib/schemas/lane';
import { addLane } from '$lib/server/lanes/save-lane';
import { listPartnerChoices } from '$lib/server/partners/list-partners';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { listSiteChoices } from '$lib/server/sites/list-sites';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);

	const sites = await orError(listSiteChoices(ctx));
	const suppliers = await orError(listPartnerChoices(ctx, 'supplier'));

	return { sites, suppliers, back: { href: '/settings/lanes', word: 'Lanes' } };
};

export const actions = {
	save: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, laneForm);
		if (!parsed.ok) return fail(422, parsed);

		let id: string;
		try {
			id = await addLane(ctx, parsed.data);
		} catch (e) {
			return orFail(e, nestedOf(await sent.formData()));
		}

		redirect(303, `/settings/lanes/${id}`);
	}
} satisfies Actions;
