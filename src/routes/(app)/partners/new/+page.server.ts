import { fail, redirect } from '@sveltejs/kit';
import { partnerForm } from '$lib/schemas/partner';
import { addPartner } from '$lib/server/partners/save-partner';
import { authorize } from '$lib/server/policies';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);

	await orError(Promise.resolve().then(() => authorize(ctx, 'catalogue.change')));

	return { back: { href: '/partners', word: 'Partners' } };
};

export const actions = {
	save: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, partnerForm);
		if (!parsed.ok) return fail(422, parsed);

		let id: string;
		try {
			id = await addPartner(ctx, parsed.data);
		} catch (e) {
			return orFail(e, nestedOf(await sent.formData()));
		}

		redirect(303, `/partners/${id}`);
	}
} satisfies Actions;
