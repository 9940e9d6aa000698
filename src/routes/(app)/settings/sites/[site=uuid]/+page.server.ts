import { fail, redirect } from '@sveltejs/kit';
import { holidayForm, holidayRef, siteForm } from '$lib/schemas/site';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { getSite } from '$lib/server/sites/get-site';
import { listZones } from '$lib/server/sites/list-zones';
import { addHoliday, dropHoliday } from '$lib/server/sites/save-holiday';
import { changeSite, switchSite } from '$lib/server/sites/save-site';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	const record = await orError(getSite(ctx, params.site));

	return {
		record,
		zones: listZones(ctx.now, record.zone),
		back: { href: '/settings/sites', word: 'Sites', title: record.name }
	};
};

export const actions = {
	save: async ({ locals, params, request, url }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, siteForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'site' as const });

		try {
			await changeSite(ctx, params.site, parsed.data);
		} catch (e) {
			const { status, data } = orFail(e, nestedOf(await sent.formData()));
			return fail(status, { ...data, of: 'site' as const });
		}

		redirect(303, url.pathname);
	},

	switchOff: async ({ locals, params, url }) => {
		const ctx = contextOf(locals);

		try {
			await switchSite(ctx, params.site, false);
		} catch (e) {
			const { status, data } = orFail(e);
			return fail(status, { issues: data.issues, values: undefined, of: 'site' as const });
		}

		redirect(303, url.pathname);
	},

	switchOn: async ({ locals, params, url }) => {
		const ctx = contextOf(locals);

		await orError(switchSite(ctx, params.site, true));

		redirect(303, url.pathname);
	},

	addHoliday: async ({ locals, params, request, url }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, holidayForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'holiday' as const });

		try {
			await addHoliday(ctx, params.site, parsed.data);
		} catch (e) {
			const { status, data } = orFail(e, nestedOf(await sent.formData()));
			return fail(status, { ...data, of: 'holiday' as const });
		}

		redirect(303, `${url.pathname}#holidays`);
	},

	dropHoliday: async ({ locals, params, request, url }) => {
		const ctx = contextOf(locals);

		const parsed = await parseForm(request, holidayRef);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'holiday' as const });

		await orError(dropHoliday(ctx, params.site, parsed.data.holidayId));

		redirect(303, `${url.pathname}#holidays`);
	}
} satisfies Actions;
