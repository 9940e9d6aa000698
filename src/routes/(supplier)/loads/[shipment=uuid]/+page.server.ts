import { fail, redirect } from '@sveltejs/kit';
import { answerSchema } from '$lib/schemas/supplier';
import { answerNotice } from '$lib/server/notices/answer-notice';
import { getSupplierDocket } from '$lib/server/notices/supplier-docket';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	return { docket: await orError(getSupplierDocket(ctx, params.shipment)), answeredAs: ctx.actor.name };
};

export const actions = {
	answer: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, answerSchema);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			const { notice } = await getSupplierDocket(ctx, params.shipment);
			await answerNotice(ctx, params.shipment, notice?.id ?? '', form.data);
		} catch (e) {
			return orFail(e, form.data);
		}

		redirect(303, `/loads/${params.shipment}#answer`);
	}
} satisfies Actions;
