import { fail, redirect } from '@sveltejs/kit';
import { cancelInput, shipmentChange } from '$lib/schemas/shipment-form';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { cancelShipment } from '$lib/server/shipments/cancel-shipment';
import { changeShipment } from '$lib/server/shipments/change-shipment';
import { getPapersForm } from '$lib/server/shipments/get-papers-form';
import { orFieldFaults } from '../../field-faults';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	const papers = await orError(getPapersForm(ctx, params.docket));

	return {
		papers,
		back: {
			href: `/shipments/${params.docket}`,
			word: params.docket.split('-').at(-1) ?? '',
			title: 'Papers'
		}
	};
};

export const actions = {
	save: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const form = await parseForm(request, shipmentChange);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await changeShipment(ctx, params.docket, form.data);
		} catch (e) {
			return orFieldFaults(e, nestedOf(await sent.formData()));
		}

		redirect(303, `/shipments/${params.docket}`);
	},

	/** A row more: the form comes back as it was sent, nothing is written. */
	more: async ({ locals, request }) => {
		contextOf(locals);

		return { values: nestedOf(await request.formData()), issues: {}, code: null };
	},

	cancel: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, cancelInput);
		if (!form.ok)
			return fail(422, { values: null, issues: { cancelReason: form.issues.reason ?? '' }, code: 'invalid' });

		try {
			await cancelShipment(ctx, params.docket, form.data.reason);
		} catch (e) {
			const { status, data } = orFail(e);
			return fail(status, { ...data, values: null });
		}

		redirect(303, '/shipments?stage=cancelled');
	}
} satisfies Actions;
