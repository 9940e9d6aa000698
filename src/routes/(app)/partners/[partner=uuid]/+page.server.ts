import { fail, redirect } from '@sveltejs/kit';
import { contactForm, contactRef, partnerForm } from '$lib/schemas/partner';
import { getPartner } from '$lib/server/partners/get-partner';
import { saveContact, switchContact } from '$lib/server/partners/save-contact';
import { changePartner, switchPartner } from '$lib/server/partners/save-partner';
import { may } from '$lib/server/policies';
import { contextOf, nestedOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params, url }) => {
	const ctx = contextOf(locals);

	const contactId = url.searchParams.get('contact');

	const partner = await orError(getPartner(ctx, params.partner));

	return {
		partner,
		chosen: partner.contacts.find(({ id }) => id === contactId) ?? null,
		mayChange: may(ctx.actor, 'catalogue.change'),
		back: { href: '/partners', word: 'Partners', title: partner.name }
	};
};

export const actions = {
	save: async ({ locals, params, request, url }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, partnerForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'partner' as const });

		try {
			await changePartner(ctx, params.partner, parsed.data);
		} catch (e) {
			const { status, data } = orFail(e, nestedOf(await sent.formData()));
			return fail(status, { ...data, of: 'partner' as const });
		}

		redirect(303, url.pathname);
	},

	switchOff: async ({ locals, params, url }) => {
		const ctx = contextOf(locals);

		await orError(switchPartner(ctx, params.partner, false));

		redirect(303, url.pathname);
	},

	switchOn: async ({ locals, params, url }) => {
		const ctx = contextOf(locals);

		await orError(switchPartner(ctx, params.partner, true));

		redirect(303, url.pathname);
	},

	saveContact: async ({ locals, params, request, url }) => {
		const ctx = contextOf(locals);

		const sent = request.clone();
		const parsed = await parseForm(request, contactForm);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'contact' as const });

		try {
			await saveContact(ctx, params.partner, parsed.data);
		} catch (e) {
			const { status, data } = orFail(e, nestedOf(await sent.formData()));
			return fail(status, { ...data, of: 'contact' as const });
		}

		redirect(303, `${url.pathname}#contacts`);
	},

	switchContactOff: async ({ locals, params, request, url }) => {
		const ctx = contextOf(locals);

		const parsed = await parseForm(request, contactRef);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'contact' as const });

		await orError(switchContact(ctx, params.partner, parsed.data.contactId, false));

		redirect(303, `${url.pathname}#contacts`);
	},

	switchContactOn: async ({ locals, params, request, url }) => {
		const ctx = contextOf(locals);

		const parsed = await parseForm(request, contactRef);
		if (!parsed.ok) return fail(422, { ...parsed, of: 'contact' as const });

		await orError(switchContact(ctx, params.partner, parsed.data.contactId, true));

		redirect(303, `${url.pathname}#contacts`);
	}
} satisfies Actions;
