import { dayOfYear } from '../../format-time';
import { certificateMailWords } from '../../messages/en/certificate-mail';
import { Certificate } from '../db/models/certificate';
import { Organisation } from '../db/models/organisation';
import { User } from '../db/models/user';
import { env } from '../env';
import type { JobHandler } from '../jobs/job-kinds';
import { renderMail } from '../mail/layout';
import { sendMail } from '../mail/send-mail';

/** Mails one admin that the certificate ends; nobody is told of one that was replaced meanwhile. */
export const mailCertificateEnd: JobHandler = async (ctx, { certificateId, userId }) => {
	const certificate = await Certificate.findByPk(certificateId);
	const user = await User.findByPk(userId);
	if (!certificate || certificate.retiredAt || !user || user.switchedOffAt) return;
	const organisation = (await Organisation.findOne())?.name ?? 'Wharfinger';
	const until = `${dayOfYear(certificate.validUntil, 'UTC', 'en')} UTC`;
	const words = certificateMailWords(organisation, until);
	await sendMail({
		to: { name: user.name, address: user.email },
		fromName: organisation,
		subject: words.subject,
		...renderMail({
			kicker: organisation,
			title: words.subject,
			greeting: words.greeting(user.name),
			paragraphs: words.paragraphs,
			facts: [
				{ label: words.labels.subject, value: certificate.subject },
				{ label: words.labels.serial, value: certificate.serial, isFigure: true },
				{ label: words.labels.until, value: until }
			],
			button: { word: words.button, href: `${env().origin}/settings/certificate` },
			after: [],
			foot: words.foot
		}),
		messageId: `<certificate-${ctx.requestId}@${new URL(env().origin).hostname}>`
	});
};
