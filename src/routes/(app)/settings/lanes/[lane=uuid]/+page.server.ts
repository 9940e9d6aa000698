import { fail, redirect } from '@sveltejs/kit';
import { laneForm } from '$lib/schemas/lane';
import { getLane } from '$lib/server/lanes/get-lane';
import { changeLane, switchLane } from '$lib/server/lanes/save-lane';
import { listPartnerChoices } from '$lib/server/partners/list-partners';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { listSiteChoices } from '$lib/server/sites/list-sites';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	const lane = await orError(getLane(ctx, params.lane));
	const sites = await orError(listSiteChoices(ctx));
	const suppliers = await orError(listPartnerChoices(ctx, 'supplier'));

	return { lane, sites, suppliers, back: { href: '/settings/lanes', word: 'Lanes', title: lane.name } };
};

export const actions = {
	save: async ({ locals, params, request, url }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, laneForm);
		if (!parsed.ok) return fail(422, parsed);

		try {
			await changeLane(ctx, params.lane, parsed.data);
		} catch (e) {
			return orFail(e, nestedOf(await sent.formData()));
		}

		redirect(303, url.pathname);
	},

	switchOff: async ({ locals, params, url }) => {
		const ctx = contextOf(locals);

		await orError(switchLane(ctx, params.lane, false));

		redirect(303, url.pathname);
	},

	switchOn: async ({ locals, params, url }) => {
		const ctx = contextOf(locals);

		await orError(switchLane(ctx, params.lane, true));

		redirect(303, url.pathname);
	}
} satisfies Actions;
