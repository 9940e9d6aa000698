import { fail, redirect } from '@sveltejs/kit';
import { isoDay } from '$lib/format-time';
import { calibrationForm, loggerForm } from '$lib/schemas/logger';
import { getLogger } from '$lib/server/loggers/get-logger';
import { recordCalibration } from '$lib/server/loggers/record-calibration';
import { changeLogger, switchLogger } from '$lib/server/loggers/save-logger';
import { listPartnerChoices } from '$lib/server/partners/list-partners';
import { may } from '$lib/server/policies';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params, cookies }) => {
	const ctx = contextOf(locals);

	const { zone } = await orError(getCurrentSite(ctx, cookies.get(siteCookie)));
	const logger = await orError(getLogger(ctx, params.logger, isoDay(ctx.now, zone)));
	const owners = await orError(listPartnerChoices(ctx, 'any'));

	return {
		logger,
		owners,
		mayChange: may(ctx.actor, 'catalogue.change'),
		back: { href: '/settings/loggers', word: 'Loggers', title: logger.serial }
	};
};

export const actions = {
	save: async ({ locals, params, request, url }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, loggerForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'logger' as const });

		try {
			await changeLogger(ctx, params.logger, parsed.data);
		} catch (e) {
			const { status, data } = orFail(e, nestedOf(await sent.formData()));
			return fail(status, { ...data, of: 'logger' as const });
		}

		redirect(303, url.pathname);
	},

	switchOff: async ({ locals, params, url }) => {
		const ctx = contextOf(locals);

		await orError(switchLogger(ctx, params.logger, false));

		redirect(303, url.pathname);
	},

	switchOn: async ({ locals, params, url }) => {
		const ctx = contextOf(locals);

		await orError(switchLogger(ctx, params.logger, true));

		redirect(303, url.pathname);
	},

	calibrate: async ({ locals, params, request, url, cookies }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, calibrationForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'calibration' as const });

		try {
			const { zone } = await getCurrentSite(ctx, cookies.get(siteCookie));
			await recordCalibration(ctx, params.logger, parsed.data, isoDay(ctx.now, zone));
		} catch (e) {
			const { status, data } = orFail(e, nestedOf(await sent.formData()));
			return fail(status, { ...data, of: 'calibration' as const });
		}

		redirect(303, `${url.pathname}#calibrations`);
	}
} satisfies Actions;
