import { fail, redirect, type RequestEvent } from '@sveltejs/kit';
import type { z } from 'zod';
import {
	ownAccountForm,
	passwordForm,
	secondFactorBeginForm,
	secondFactorCodeForm,
	secondFactorRemoveForm,
	siteChoiceForm,
	themeForm
} from '$lib/schemas/account';
import { goOnWithPassword, signOut } from '$lib/server/accounts/auth';
import { changeOwnAccount, changePassword } from '$lib/server/accounts/own-account';
import {
	beginSecondFactor,
	confirmSecondFactor,
	removeSecondFactor,
	viewSecondFactor
} from '$lib/server/accounts/second-factor/set-up';
import type { Context } from '$lib/server/context';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { Actions, PageServerLoad } from './$types';

const yearSeconds = 365 * 24 * 3600;
const themeCookie = 'theme';

function remember({ cookies, url }: RequestEvent, name: string, value: string): void {
	cookies.set(name, value, {
		path: '/',
		maxAge: yearSeconds,
		sameSite: 'lax',
		httpOnly: true,
		secure: url.protocol === 'https:'
	});
}

export const load: PageServerLoad = async ({ locals, cookies }) => {
	const ctx = contextOf(locals);
	const { actor } = ctx;

	return {
		own: { name: actor.name, email: actor.email, temperatureUnit: actor.temperatureUnit ?? '' },
		factor: await orError(viewSecondFactor(ctx)),
		theme: themeForm.shape.theme.catch('system').parse(cookies.get(themeCookie))
	};
};

/** An act on one's own second factor: the same beats for each. */
function factorAct<Schema extends z.ZodType>(
	schema: Schema,
	work: (ctx: Context, input: z.output<Schema>) => Promise<void>
) {
	return async ({ locals, request }: RequestEvent) => {
		const ctx = contextOf(locals);

		const parsed = await parseForm(request, schema);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'factor' as const });

		try {
			await work(ctx, parsed.data);
		} catch (e) {
			const { status, data } = orFail(e);
			return fail(status, { ...data, of: 'factor' as const });
		}

		redirect(303, '/settings#second-factor');
	};
}

export const actions = {
	save: async ({ locals, request }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, ownAccountForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'own' as const });

		try {
			await changeOwnAccount(ctx, parsed.data);
		} catch (e) {
			const { status, data } = orFail(e, nestedOf(await sent.formData()));
			return fail(status, { ...data, of: 'own' as const });
		}

		redirect(303, '/settings');
	},

	password: async (event) => {
		const ctx = contextOf(event.locals);

		const parsed = await parseForm(event.request, passwordForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'password' as const });

		let to: string;
		try {
			await changePassword(ctx, parsed.data);
			// The change ended every session; whoever made it goes on with a new one.
			to = await goOnWithPassword(event, ctx.actor.email, parsed.data.newPassword);
		} catch (e) {
			const { status, data } = orFail(e);
			return fail(status, { ...data, of: 'password' as const });
		}

		redirect(303, to === '/' ? '/settings' : to);
	},

	site: async (event) => {
		const ctx = contextOf(event.locals);

		const parsed = await parseForm(event.request, siteChoiceForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'site' as const });

		const site = await getCurrentSite(ctx, parsed.data.siteId);
		remember(event, siteCookie, site.id);

		redirect(303, '/settings');
	},

	beginFactor: factorAct(secondFactorBeginForm, (ctx, { password }) => beginSecondFactor(ctx, password)),
	confirmFactor: factorAct(secondFactorCodeForm, (ctx, { code }) => confirmSecondFactor(ctx, code)),
	removeFactor: factorAct(secondFactorRemoveForm, (ctx, { password, code }) =>
		removeSecondFactor(ctx, password, code)
	),

	theme: async (event) => {
		contextOf(event.locals);

		const parsed = await parseForm(event.request, themeForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'theme' as const });

		remember(event, themeCookie, parsed.data.theme);

		redirect(303, '/settings');
	},

	signOut: async (event) => {
		contextOf(event.locals);

		await signOut(event);

		redirect(303, '/sign-in');
	}
} satisfies Actions;
