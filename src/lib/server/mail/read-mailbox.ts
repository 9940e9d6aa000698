import type { Context } from '../context';
import { env } from '../env';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { findMailboxMail, listMailbox, type MailboxEntry, type MailboxMail } from './local-mailbox';

/** The stand-in's mails are open to staff only while it stands in for a mail server. */
function assertOpen(ctx: Context): void {
	if (!env().isLocalMailbox) throw new Refusal('not-found');
	authorize(ctx, 'mailbox.view');
}

/** Mails the local stand-in was given, newest first. @throws Refusal `not-found` where a real mail server is set, `not-allowed` */
export async function listMails(ctx: Context): Promise<MailboxEntry[]> {
	assertOpen(ctx);
	const mails = await listMailbox(env().mailFolder);
	return mails.map(({ id, receivedAt, from, to, subject }) => ({ id, receivedAt, from, to, subject }));
}

/** One of them. @throws Refusal `not-found`, `not-allowed` */
export async function getMail(ctx: Context, mailId: string): Promise<MailboxMail> {
	assertOpen(ctx);
	const mail = await findMailboxMail(env().mailFolder, mailId);
	if (!mail) throw new Refusal('not-found');
	return mail;
}

/** The parts of a text between our own links, and those links, so that a page can make them work. */
export function linkedText(text: string): { text: string; href: string | null }[] {
	const own = new RegExp(`(${env().origin.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')}/[\\w\\-/?=&%.#]*)`, 'g');
	return text
		.split(own)
		.filter((part) => part !== '')
		.map((part) => ({ text: part, href: part.startsWith(`${env().origin}/`) ? part : null }));
}
