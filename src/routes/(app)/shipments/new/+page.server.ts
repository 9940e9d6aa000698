import { fail, redirect } from '@sveltejs/kit';
import { v7 as uuid } from 'uuid';
import { shipmentInput } from '$lib/schemas/shipment-form';
import { contextOf, nestedOf, orError, parseForm } from '$lib/server/request';
import { createShipment } from '$lib/server/shipments/create-shipment';
import { getPapersChoices } from '$lib/server/shipments/get-papers-form';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import { orFieldFaults } from '../field-faults';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, cookies }) => {
	const ctx = contextOf(locals);
	const site = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));

	return {
		choices: await orError(getPapersChoices(ctx, site.id)),
		/** Sent along with the form: pressed twice, it opens one docket. */
		newId: uuid(),
		back: { href: '/shipments', word: 'Dockets', title: 'New load' }
	};
};

export const actions = {
	create: async ({ locals, cookies, request }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const form = await parseForm(request, shipmentInput);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		let number: string;
		try {
			const site = await getCurrentSite(ctx, cookies.get(siteCookie));
			number = (await createShipment(ctx, site.id, form.data)).number;
		} catch (e) {
			return orFieldFaults(e, nestedOf(await sent.formData()));
		}

		redirect(303, `/shipments/${number}`);
	},

	/** A row more: the form comes back as it was sent, nothing is written. */
	more: async ({ locals, request }) => {
		contextOf(locals);

		return { values: nestedOf(await request.formData()), issues: {}, code: null };
	}
} satisfies Actions;
