import { fail, redirect } from '@sveltejs/kit';
import { copyForm } from '$lib/schemas/spec-library';
import { authorize, may } from '$lib/server/policies';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import { getStarting, listCopyPlaces } from '$lib/server/specs/list-starting';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	const starting = await orError(getStarting(ctx, params.key));
	const mayChange = may(ctx.actor, 'catalogue.change');

	return {
		starting,
		places: mayChange ? await orError(listCopyPlaces(ctx)) : [],
		mayChange,
		back: { href: '/specs/library', word: 'Starting specs', title: starting.product }
	};
};

export const actions = {
	copy: async ({ locals, request, params }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, copyForm);
		if (!form.ok) return fail(422, { values: form.values, issues: form.issues });

		try {
			authorize(ctx, 'catalogue.change');
			await getStarting(ctx, params.key);
		} catch (e) {
			return orFail(e, {});
		}

		const from = `from=${encodeURIComponent(params.key)}`;
		const { place } = form.data;
		if (place === null) redirect(303, `/specs/new?${from}`);
		redirect(303, `/specs/${place.productId}?${place.varietyId ? `variety=${place.varietyId}&` : ''}${from}`);
	}
} satisfies Actions;
