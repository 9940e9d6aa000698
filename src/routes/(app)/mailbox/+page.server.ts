import { listMails } from '$lib/server/mail/read-mailbox';
import { contextOf, orError } from '$lib/server/request';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals }) => {
	const ctx = contextOf(locals);

	return {
		mails: await orError(listMails(ctx)),
		back: { href: '/settings', word: 'Settings', title: 'Mailbox' }
	};
};
