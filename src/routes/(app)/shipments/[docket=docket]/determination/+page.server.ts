import { fail, redirect } from '@sveltejs/kit';
import { determinationForm } from '$lib/schemas/signing';
import { componentsAsked } from '$lib/server/accounts/check-signing-components';
import { signingStanding } from '$lib/server/authority/signing-standing';
import { writeDetermination } from '$lib/server/authority/write-determination';
import { evidenceSha256 } from '$lib/server/dispositions/freeze';
import { getDocket } from '$lib/server/dockets/get-docket';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	const docket = await orError(getDocket(ctx, params.docket));
	const { isQualifiedPerson, determinations } = await signingStanding(ctx, docket);
	if (!isQualifiedPerson || !docket.arrival) redirect(303, `/shipments/${docket.number}`);

	return {
		docket,
		determinations,
		evidenceSha256: evidenceSha256(docket),
		asks: await componentsAsked(ctx),
		back: {
			href: `/shipments/${docket.number}`,
			word: docket.number.split('-').at(-1) ?? '',
			title: 'Determination'
		}
	};
};

export const actions = {
	default: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, determinationForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await writeDetermination(ctx, params.docket, form.data);
		} catch (e) {
			return orFail(e, form.data);
		}

		redirect(303, `/shipments/${params.docket}#signature`);
	}
} satisfies Actions;
