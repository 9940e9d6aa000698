import { fail, redirect } from '@sveltejs/kit';
import { dispositionSchema } from '$lib/schemas/disposition';
import { componentsAsked } from '$lib/server/accounts/check-signing-components';
import { mayAcceptAtDock } from '$lib/server/authority/dock-accept';
import { signingStanding } from '$lib/server/authority/signing-standing';
import { evidenceSha256 } from '$lib/server/dispositions/freeze';
import { signDisposition } from '$lib/server/dispositions/sign-disposition';
import { getDocket } from '$lib/server/dockets/get-docket';
import { authorize, may } from '$lib/server/policies';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';
import { askedGroups } from './groups';

export const load: PageServerLoad = async ({ locals, params, url }) => {
	const ctx = contextOf(locals);
	const docket = await orError(getDocket(ctx, params.docket));
	if (!may(ctx.actor, 'disposition.sign') && !(await mayAcceptAtDock(ctx, docket)))
		await orError(Promise.resolve().then(() => authorize(ctx, 'disposition.sign')));
	if (!docket.arrival) redirect(303, `/shipments/${docket.number}`);
	const isAmendment = docket.signatures.length > 0;
	if (isAmendment && !url.searchParams.has('amend')) redirect(303, `/shipments/${docket.number}`);

	const { lineFacts: _facts, ...standing } = await signingStanding(ctx, docket);
	return {
		docket,
		standing,
		isDock: !may(ctx.actor, 'disposition.sign'),
		isAmendment,
		asked: Object.fromEntries(askedGroups(url.searchParams.get('split'))),
		evidenceSha256: evidenceSha256(docket),
		signer: { name: ctx.actor.name, title: ctx.actor.title, email: ctx.actor.email },
		asks: await componentsAsked(ctx),
		frozenAt: ctx.now.toISOString(),
		back: {
			href: `/shipments/${docket.number}`,
			word: docket.number.split('-').at(-1) ?? '',
			title: 'Signature'
		}
	};
};

export const actions = {
	default: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, dispositionSchema);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		let version: number | null;
		try {
			({ version } = await signDisposition(ctx, params.docket, form.data));
		} catch (e) {
			return orFail(e, form.data);
		}

		redirect(
			303,
			version === null && form.data.meaning === 'review'
				? `/shipments/${params.docket}/sign`
				: `/shipments/${params.docket}#signature`
		);
	}
} satisfies Actions;
