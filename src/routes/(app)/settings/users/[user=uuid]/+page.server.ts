import { fail, redirect } from '@sveltejs/kit';
import { accountForm } from '$lib/schemas/account';
import {
	changeAccount,
	switchAccountOff,
	switchAccountOn,
	unlockAccount
} from '$lib/server/accounts/change-account';
import { resendInvitation } from '$lib/server/accounts/invite-account';
import { getAccount } from '$lib/server/accounts/list-accounts';
import { resetSecondFactor } from '$lib/server/accounts/second-factor/set-up';
import type { Context } from '$lib/server/context';
import { listPartnerChoices } from '$lib/server/partners/list-partners';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import { listSiteChoices } from '$lib/server/sites/list-sites';
import type { Actions, PageServerLoad, RequestEvent } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	const user = await orError(getAccount(ctx, params.user));
	const sites = await orError(listSiteChoices(ctx));
	const suppliers = await orError(listPartnerChoices(ctx, 'supplier'));

	return {
		user,
		isSelf: user.id === ctx.actor.id,
		choices: { sites, suppliers },
		back: { href: '/settings/users', word: 'Users', title: user.name }
	};
};

/** An act on the account that takes nothing but the button. */
function act(work: (ctx: Context, userId: string) => Promise<void>) {
	return async ({ locals, params, url }: RequestEvent) => {
		const ctx = contextOf(locals);

		try {
			await work(ctx, params.user);
		} catch (e) {
			const { status, data } = orFail(e);
			return fail(status, { values: undefined, issues: data.issues });
		}

		redirect(303, url.pathname);
	};
}

export const actions = {
	save: async ({ locals, params, request, url }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, accountForm);
		if (!parsed.ok) return fail(422, { values: parsed.values, issues: parsed.issues });

		try {
			await changeAccount(ctx, params.user, parsed.data);
		} catch (e) {
			return orFail(e, nestedOf(await sent.formData()));
		}

		redirect(303, url.pathname);
	},
	switchOff: act(switchAccountOff),
	switchOn: act(switchAccountOn),
	unlock: act(unlockAccount),
	resend: act(resendInvitation),
	resetFactor: act(resetSecondFactor)
} satisfies Actions;
