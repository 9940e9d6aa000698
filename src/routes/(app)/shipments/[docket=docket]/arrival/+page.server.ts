import { fail, redirect } from '@sveltejs/kit';
import { v7 as uuid } from 'uuid';
import { arrivalInput } from '$lib/schemas/arrival';
import { photoInput } from '$lib/schemas/photo';
import { rowsAt } from '$lib/schemas/shipment-values';
import { getArrivalForm } from '$lib/server/arrivals/get-arrival-form';
import { logArrival } from '$lib/server/arrivals/log-arrival';
import { addPhoto } from '$lib/server/photos/add-photo';
import { photoOf } from '$lib/server/photos/photo-upload';
import { contextOf, nestedOf, orError, orFail, parseForm, parseInput } from '$lib/server/request';
import { orFieldFaults } from '../../field-faults';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	const arrival = await orError(getArrivalForm(ctx, params.docket));

	return {
		arrival,
		/** Sent along with the form: pressed twice, it logs one arrival. */
		newId: uuid(),
		back: { href: '/arrivals', word: params.docket.split('-').at(-1) ?? '', title: arrival.title }
	};
};

export const actions = {
	log: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const form = await parseForm(request, arrivalInput);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues, code: 'invalid' });

		try {
			await logArrival(ctx, params.docket, form.data);
		} catch (e) {
			return orFieldFaults(e, nestedOf(await sent.formData()));
		}

		redirect(303, `/shipments/${params.docket}`);
	},

	/** Without scripts a row more is asked for like this; nothing is written. */
	addPulp: async ({ locals, request }) => {
		contextOf(locals);

		const values = nestedOf(await request.formData());

		return { values: { ...values, pulpRows: rowsAt(values, 'pulp') + 1 }, issues: {}, code: null };
	},

	photo: async ({ locals, params, request }) => {
		const ctx = contextOf(locals);

		try {
			const { fields, bytes } = await photoOf(request);
			await addPhoto(ctx, params.docket, parseInput(fields, photoInput), bytes);
		} catch (e) {
			const { status, data } = orFail(e);
			return fail(status, { ...data, hasPhoto: false });
		}

		return { values: {}, issues: {}, code: null, hasPhoto: true };
	}
} satisfies Actions;
