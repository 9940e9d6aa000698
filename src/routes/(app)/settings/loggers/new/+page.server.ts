import { fail, redirect } from '@sveltejs/kit';
import { loggerForm } from '$lib/schemas/logger';
import { addLogger } from '$lib/server/loggers/save-logger';
import { listPartnerChoices } from '$lib/server/partners/list-partners';
import { authorize } from '$lib/server/policies';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);

	await orError(Promise.resolve().then(() => authorize(ctx, 'catalogue.change')));
	const owners = await orError(listPartnerChoices(ctx, 'any'));

	return { owners, back: { href: '/settings/loggers', word: 'Loggers' } };
};

export const actions = {
	save: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, loggerForm);
		if (!parsed.ok) return fail(422, parsed);

		let id: string;
		try {
			id = await addLogger(ctx, parsed.data);
		} catch (e) {
			return orFail(e, nestedOf(await sent.formData()));
		}

		redirect(303, `/settings/loggers/${id}`);
	}
} satisfies Actions;
