import { fail, redirect } from '@sveltejs/kit';
import { inviteForm } from '$lib/schemas/account';
import { inviteAccount } from '$lib/server/accounts/invite-account';
import { listPartnerChoices } from '$lib/server/partners/list-partners';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { listSiteChoices } from '$lib/server/sites/list-sites';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);

	const sites = await orError(listSiteChoices(ctx));
	const suppliers = await orError(listPartnerChoices(ctx, 'supplier'));

	return { choices: { sites, suppliers }, back: { href: '/settings/users', word: 'Users' } };
};

export const actions = {
	invite: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, inviteForm);
		if (!parsed.ok) return fail(422, parsed);

		let id: string;
		try {
			id = await inviteAccount(ctx, parsed.data);
		} catch (e) {
			return orFail(e, nestedOf(await sent.formData()));
		}

		redirect(303, `/settings/users/${id}`);
	}
} satisfies Actions;
