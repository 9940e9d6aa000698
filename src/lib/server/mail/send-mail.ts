import { createTransport, type Transporter } from 'nodemailer';
import { env } from '../env';

export interface Mail {
	to: { name: string; address: string };
	fromName: string;
	subject: string;
	html: string;
	text: string;
	attachments?: { filename: string; content: Buffer; contentType: string }[];
	/** Stable per message, so that a retry after a lost answer is recognised as the same mail. */
	messageId: string;
}

let transport: Transporter | null = null;

/** Hands a mail to the configured server. @throws when the server does not take it: the job tries again. */
export async function sendMail(mail: Mail): Promise<void> {
	transport ??= createTransport(env().smtpUrl, { connectionTimeout: 10_000, greetingTimeout: 10_000 });
	await transport.sendMail({
		from: { name: mail.fromName, address: env().mailFrom },
		to: mail.to,
		subject: mail.subject,
		html: mail.html,
		text: mail.text,
		attachments: mail.attachments,
		messageId: mail.messageId,
		// No image, link or file of a stranger's address is ever fetched for a mail.
		disableFileAccess: true,
		disableUrlAccess: true
	});
}
