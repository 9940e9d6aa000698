import { fail, redirect } from '@sveltejs/kit';
import { linkRequestForm, ownPath, signInForm } from '$lib/schemas/account';
import { signInWithPassword, signOut } from '$lib/server/accounts/auth';
import { requestLink } from '$lib/server/accounts/request-link';
import { env } from '$lib/server/env';
import { nestedOf, orFail, parseForm } from '$lib/server/request';
import { requestScope } from '$lib/server/request-scope';
import type { Actions, PageServerLoad } from './$types';

const demoPeople = [
	{ email: 'dock@wharfinger.example', does: 'logs arrivals' },
	{ email: 'qa@wharfinger.example', does: 'decides and signs' },
	{ email: 'qa2@wharfinger.example', does: 'signs second' },
	{ email: 'claims@wharfinger.example', does: 'follows claims' },
	{ email: 'admin@wharfinger.example', does: 'keeps the rest' }
];

export const load: PageServerLoad = ({ locals, url }) => ({
	to: ownPath(url.searchParams.get('to')),
	signedInAs: locals.context?.actor.name ?? null,
	demo: env().isDemo ? { password: 'wharfinger-demo', people: demoPeople } : null,
	hasLinkGone: url.searchParams.get('mailed') === '1'
});

export const actions = {
	signIn: async (event) => {
		const sent = event.request.clone();
		const parsed = await parseForm(event.request, signInForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'password' as const });

		let isRight: boolean;
		try {
			isRight = await signInWithPassword(event, parsed.data);
		} catch (e) {
			const { status, data } = orFail(e, nestedOf(await sent.formData()));
			return fail(status, { ...data, of: 'password' as const });
		}
		if (!isRight)
			return fail(422, {
				of: 'password' as const,
				values: { email: parsed.data.email },
				issues: {
					form: 'That e-mail and password do not belong together. Check both, and the Caps Lock key.'
				}
			});

		redirect(303, ownPath(event.url.searchParams.get('to')) ?? '/');
	},

	mailLink: async ({ request }) => {
		const sent = request.clone();
		const parsed = await parseForm(request, linkRequestForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'link' as const });

		try {
			await requestLink(parsed.data.email, requestScope());
		} catch (e) {
			const { status, data } = orFail(e, nestedOf(await sent.formData()));
			return fail(status, { ...data, of: 'link' as const });
		}

		redirect(303, '/sign-in?mailed=1#link');
	},

	signOut: async (event) => {
		await signOut(event);

		redirect(303, '/sign-in');
	}
} satisfies Actions;
