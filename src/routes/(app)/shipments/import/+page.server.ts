import { fail } from '@sveltejs/kit';
import { importForm, maxImportBytes } from '$lib/schemas/import';
import { may } from '$lib/server/policies';
import { contextOf, orFail, parseForm } from '$lib/server/request';
import { importNotices, previewImport } from '$lib/server/shipments/import-notices';
import { noticeText } from '$lib/server/shipments/notice-text';
import { getCurrentSite, siteCookie } from '$lib/server/sites/current-site';
import type { Actions, PageServerLoad } from './$types';

export const load: PageServerLoad = ({ locals }) => {
	const ctx = contextOf(locals);

	return {
		mayImport: may(ctx.actor, 'shipment.create'),
		maxBytes: maxImportBytes,
		back: { href: '/shipments', word: 'Dockets', title: 'Import papers' }
	};
};

export const actions = {
	/** Says what the file would open; nothing is written. */
	preview: async ({ locals, cookies, request }) => {
		const ctx = contextOf(locals);

		try {
			const { name, text } = await noticeText(request);
			const site = await getCurrentSite(ctx, cookies.get(siteCookie));

			return { name, text, preview: await previewImport(ctx, site.id, text), imported: null, fault: null };
		} catch (e) {
			const { status, data } = orFail(e);
			return fail(status, {
				fault: data.issues.form ?? null,
				preview: null,
				imported: null,
				name: '',
				text: ''
			});
		}
	},

	import: async ({ locals, cookies, request }) => {
		const ctx = contextOf(locals);

		const form = await parseForm(request, importForm);
		const none = { preview: null, imported: null, name: '', text: '' };
		if (!form.ok) return fail(422, { ...none, fault: Object.values(form.issues)[0] ?? null });

		try {
			const site = await getCurrentSite(ctx, cookies.get(siteCookie));
			const imported = await importNotices(ctx, site.id, form.data.text, form.data.only);

			return { ...none, imported, fault: null };
		} catch (e) {
			const { status, data } = orFail(e);
			return fail(status, { ...none, fault: data.issues.form ?? null });
		}
	}
} satisfies Actions;
