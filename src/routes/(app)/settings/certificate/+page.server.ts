import { fail, redirect } from '@sveltejs/kit';
import { certificateForm } from '$lib/schemas/certificate';
import { listCertificates } from '$lib/server/certificates/list-certificates';
import { replaceCertificate } from '$lib/server/certificates/replace-certificate';
import { contextOf, orError, orFail, parseForm } from '$lib/server/request';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);

	const { items, timestampAuthority } = await orError(listCertificates(ctx));

	return { items, timestampAuthority, back: { href: '/settings', word: 'Settings', title: 'Certificate' } };
};

export const actions = {
	replace: async ({ locals, request, url }) => {
		const ctx = contextOf(locals);

		const parsed = await parseForm(request, certificateForm);
		if (!parsed.ok) return fail(422, parsed);

		try {
			const { store, password } = parsed.data;
			await replaceCertificate(ctx, { p12: new Uint8Array(await store.arrayBuffer()), password });
		} catch (e) {
			return orFail(e);
		}

		redirect(303, url.pathname);
	}
} satisfies Actions;
