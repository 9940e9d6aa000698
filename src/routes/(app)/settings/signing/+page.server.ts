import { fail, redirect } from '@sveltejs/kit';
import { minorUnitDigits } from '$lib/format';
import { signingRulesForm } from '$lib/schemas/signing';
import { getSigningRules, setSigningRules } from '$lib/server/authority/signing-rules';
import { authorize } from '$lib/server/policies';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);
	await orError(Promise.resolve().then(() => authorize(ctx, 'account.manage')));

	return { rules: await getSigningRules() };
};

export const actions = {
	default: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const form = await parseForm(request, signingRulesForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues });

		try {
			const { value, currency, severity } = form.data;
			await setSigningRules(ctx, {
				fromValue:
					value === null ? null : { minor: Math.round(value * 10 ** minorUnitDigits(currency)), currency },
				fromSeverity: severity === '' ? null : severity
			});
		} catch (e) {
			return orFail(e, nestedOf(await sent.formData()));
		}

		redirect(303, '/settings/signing');
	}
} satisfies Actions;
