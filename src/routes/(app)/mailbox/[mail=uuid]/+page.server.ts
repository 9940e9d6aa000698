import { getMail, linkedText } from '$lib/server/mail/read-mailbox';
import { contextOf, orError } from '$lib/server/request';
import type { PageServerLoad } from './$types';

export const load: PageServerLoad = async ({ locals, params }) => {
	const ctx = contextOf(locals);

	const mail = await orError(getMail(ctx, params.mail));

	return { mail, textParts: linkedText(mail.text), back: { href: '/mailbox', word: 'Mailbox' } };
};
