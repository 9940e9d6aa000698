import { fail, redirect, type RequestEvent } from '@sveltejs/kit';
import { ownAccountForm, passwordForm, siteChoiceForm, themeForm } from '$lib/schemas/account';
import { signInWithPassword, signOut } from '$lib/server/accounts/auth';
import { changeOwnAccount, changePassword } from '$lib/server/accounts/own-account';
import { contextOf, nestedOf, orFail, parseForm } from '$lib/server/request';
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

export const load: PageServerLoad = ({ locals, cookies }) => {
	const { actor } = contextOf(locals);

	return {
		own: { name: actor.name, email: actor.email, temperatureUnit: actor.temperatureUnit ?? '' },
		theme: themeForm.shape.theme.catch('system').parse(cookies.get(themeCookie))
	};
};

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

		try {
			await changePassword(ctx, parsed.data);
			// The change ended every session; whoever made it goes on with a new one.
			await signInWithPassword(event, ctx.actor.email, parsed.data.newPassword);
		} catch (e) {
			const { status, data } = orFail(e);
			return fail(status, { ...data, of: 'password' as const });
		}

		redirect(303, '/settings');
	},

	site: async (event) => {
		const ctx = contextOf(event.locals);

		const parsed = await parseForm(event.request, siteChoiceForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'site' as const });

		const site = await getCurrentSite(ctx, parsed.data.siteId);
		remember(event, siteCookie, site.id);

		redirect(303, '/settings');
	},

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
