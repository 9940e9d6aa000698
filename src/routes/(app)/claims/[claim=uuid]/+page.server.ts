import { fail, redirect } from '@sveltejs/kit';
import { claimChange } from '$lib/schemas/claim';
import { attachFile } from '$lib/server/claims/attach-file';
import { changeClaim } from '$lib/server/claims/change-claim';
import { getClaim } from '$lib/server/claims/get-claim';
import { may } from '$lib/server/policies';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);
	const { claim, docket } = await orError(getClaim(ctx, params.claim));

	return {
		claim,
		docket,
		mayWork: may(ctx.actor, 'claim.work'),
		back: { href: '/claims', word: claim.number, title: docket.title }
	};
};

export const actions = {
	change: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, claimChange);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await changeClaim(ctx, params.claim, form.data);
		} catch (e) {
			return orFail(e, form.data);
		}

		redirect(303, `/claims/${params.claim}`);
	},

	attach: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await request.formData();
		const file = form.get('file');
		const what = String(form.get('what') ?? '').trim();
		if (!(file instanceof File) || file.size === 0)
			return fail(422, { values: { what }, issues: { file: 'Choose a file.' }, code: 'invalid' });

		try {
			await attachFile(ctx, params.claim, file, what);
		} catch (e) {
			return orFail(e, { what });
		}

		redirect(303, `/claims/${params.claim}#evidence`);
	}
} satisfies Actions;
