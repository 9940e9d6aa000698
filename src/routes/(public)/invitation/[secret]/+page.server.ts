import { fail, redirect } from '@sveltejs/kit';
import { invitationForm } from '$lib/schemas/account';
import { acceptInvitation, findInvitation } from '$lib/server/accounts/accept-invitation';
import { goOnWithPassword } from '$lib/server/accounts/auth';
import { nestedOf, orFail, parseForm } from '$lib/server/request';
import { requestScope } from '$lib/server/request-scope';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ params, setHeaders }) => {
	const invitation = await findInvitation(params.secret, requestScope().now);

	// The address is a secret: it goes into no cache.
	setHeaders({ 'cache-control': 'no-store' });

	return { invitation };
};

export const actions = {
	accept: async (event) => {
		const sent = event.request.clone();
		const parsed = await parseForm(event.request, invitationForm);
		if (!parsed.ok) return fail(422, parsed);

		let to: string;
		try {
			const email = await acceptInvitation(event.params.secret, parsed.data, requestScope());
			to = await goOnWithPassword(event, email, parsed.data.password);
		} catch (e) {
			return orFail(e, nestedOf(await sent.formData()));
		}

		redirect(303, to);
	}
} satisfies Actions;
