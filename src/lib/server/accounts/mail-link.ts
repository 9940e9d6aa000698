import { createHmac } from 'node:crypto';
import { dayOfYear, time, zoneName } from '../../format-time';
import { linkMailLabels, linkMailWords } from '../../messages/en/link-mails';
import { isSystem, type Context } from '../context';
import { Organisation } from '../db/models/organisation';
import { Partner } from '../db/models/partner';
import { Site } from '../db/models/site';
import { UserSite } from '../db/models/user-site';
import { inTransaction } from '../db/transaction';
import { env } from '../env';
import type { JobHandler } from '../jobs/job-kinds';
import { renderMail, type MailContent } from '../mail/layout';
import { sendMail } from '../mail/send-mail';
import { findLinkRecipient, type LinkRecipient } from './link-recipient';
import { findToken, saveToken, type TokenKind } from './tokens';

const hourMs = 3_600_000;
const validMs = {
	invitation: 7 * 24 * hourMs,
	welcome: 7 * 24 * hourMs,
	'sign-in': hourMs,
	notice: 7 * 24 * hourMs
};
const tokenKinds = {
	invitation: 'invitation',
	welcome: 'sign-in',
	'sign-in': 'sign-in',
	notice: 'notice'
} as const satisfies Record<LinkRecipient['kind'], TokenKind>;

/** One secret per job: a mail that is sent again after a crash carries the link it carried before. */
function secretOf(jobName: string): string {
	return createHmac('sha256', env().authSecret)
		.update(`mailed link ${jobName}`)
		.digest('base64url')
		.slice(0, 32);
}

async function keepToken(ctx: Context, secret: string, recipient: LinkRecipient): Promise<Date> {
	const known = await findToken(secret);
	if (known) return known.expiresAt;
	const { kind, userId, contactId, shipment, noticeId } = recipient;
	await inTransaction(ctx, async ({ transaction, record }) => {
		const subject = {
			kind: tokenKinds[kind],
			userId: userId ?? undefined,
			contactId: contactId ?? undefined,
			shipmentId: shipment?.id,
			noticeId: noticeId ?? undefined,
			validMs: validMs[kind]
		};
		await saveToken(secret, subject, ctx.now, transaction);
		const chain = shipment
			? ({ scope: 'shipment', id: shipment.id } as const)
			: ({ scope: 'account', id: userId ?? '' } as const);
		record('link.sent', chain, { kind, contactId, userId });
	});
	return new Date(ctx.now.getTime() + validMs[kind]);
}

/** The zone its reader thinks in, as far as we know: the docket's site, else their own, else any. */
async function zoneFor({ shipment, userId }: LinkRecipient): Promise<string> {
	const own = userId ? await UserSite.findOne({ where: { userId } }) : null;
	const siteId = shipment?.siteId ?? own?.siteId;
	const site = siteId ? await Site.findByPk(siteId) : await Site.findOne({ order: [['createdAt', 'asc']] });
	return site?.zone ?? 'UTC';
}

async function factsOf(recipient: LinkRecipient, until: string): Promise<MailContent['facts']> {
	const { shipment, partnerId, email } = recipient;
	const partner = partnerId ? await Partner.findByPk(partnerId) : null;
	return [
		...(shipment ? [{ label: linkMailLabels.docket, value: shipment.number, isFigure: true }] : []),
		{ label: linkMailLabels.signsIn, value: email },
		...(partner ? [{ label: linkMailLabels.firm, value: partner.name }] : []),
		{ label: linkMailLabels.works, value: until }
	];
}

/** Mails a link that signs somebody in once; whoever has gone since it was asked for gets nothing. */
export const mailLink: JobHandler = async (ctx, payload) => {
	if (!isSystem(ctx.actor)) throw new Error('Links are mailed by jobs only.');
	const recipient = await findLinkRecipient(payload);
	if (!recipient) return;
	const secret = secretOf(ctx.requestId);
	const expiresAt = await keepToken(ctx, secret, recipient);
	const organisation = (await Organisation.findOne())?.name ?? 'Wharfinger';
	const zone = await zoneFor(recipient);
	const until = `${dayOfYear(expiresAt, zone, 'en')}, ${time(expiresAt, zone)} ${zoneName(expiresAt, zone)}`;
	const docket = recipient.shipment?.number ?? '';
	const words = linkMailWords(recipient.kind, {
		organisation,
		by: payload.by ?? organisation,
		docket,
		until
	});
	const path = recipient.kind === 'invitation' ? 'invitation' : 'link';
	const content: MailContent = {
		kicker: organisation,
		title: words.title,
		greeting: linkMailLabels.greeting(recipient.name),
		paragraphs: words.paragraphs,
		facts: await factsOf(recipient, until),
		button: { word: words.button, href: `${env().origin}/${path}/${secret}` },
		after: [words.after],
		foot: linkMailLabels.foot(organisation)
	};
	await sendMail({
		to: { name: recipient.name, address: recipient.email },
		fromName: organisation,
		subject: words.subject,
		...renderMail(content),
		messageId: `<link-${ctx.requestId}@${new URL(env().origin).hostname}>`
	});
};
