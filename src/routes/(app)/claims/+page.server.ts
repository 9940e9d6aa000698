import { fail, redirect } from '@sveltejs/kit';
import { claimListQuery, claimOpening } from '$lib/schemas/claim';
import { queryOf } from '$lib/schemas/list';
import { listClaims } from '$lib/server/claims/list-claims';
import { openClaim } from '$lib/server/claims/open-claim';
import { may } from '$lib/server/policies';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, url }) => {
	const ctx = contextOf(locals);
	const query = claimListQuery.parse(queryOf(url.searchParams));

	return {
		query,
		list: await orError(listClaims(ctx, query)),
		mayWork: may(ctx.actor, 'claim.work'),
		opening: url.searchParams.get('docket')
	};
};

export const actions = {
	open: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, claimOpening);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		let id: string;
		try {
			({ id } = await openClaim(ctx, form.data));
		} catch (e) {
			return orFail(e, form.data);
		}

		redirect(303, `/claims/${id}`);
	}
} satisfies Actions;
