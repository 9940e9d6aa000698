import { fail, redirect } from '@sveltejs/kit';
import { signInWithLink } from '$lib/server/accounts/auth';
import { findLink } from '$lib/server/accounts/find-link';
import { requestFreshLink } from '$lib/server/accounts/request-link';
import { orFail } from '$lib/server/request';
import { requestScope } from '$lib/server/request-scope';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ params, url, setHeaders }) => {
	const link = await findLink(params.secret, requestScope().now);

	// The address is a secret: it goes into no cache.
	setHeaders({ 'cache-control': 'no-store' });

	return {
		link: link && { state: link.state, kind: link.kind, maskedEmail: link.maskedEmail, docket: link.docket },
		hasGone: url.searchParams.get('mailed') === '1'
	};
};

export const actions = {
	use: async (event) => {
		const link = await findLink(event.params.secret, requestScope().now);

		let isUsed: boolean;
		try {
			isUsed = await signInWithLink(event, event.params.secret);
		} catch (e) {
			return orFail(e);
		}
		if (!isUsed) return fail(410, { issues: { form: 'This link has been used already, or has run out.' } });

		redirect(303, link?.shipmentId ? `/loads/${link.shipmentId}` : '/loads');
	},

	again: async ({ params, url }) => {
		try {
			await requestFreshLink(params.secret, requestScope());
		} catch (e) {
			return orFail(e);
		}

		redirect(303, `${url.pathname}?mailed=1`);
	}
} satisfies Actions;
