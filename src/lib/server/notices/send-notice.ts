import { newSecret, saveToken } from '../accounts/tokens';
import type { Context } from '../context';
import { Clock } from '../db/models/clock';
import { Contact } from '../db/models/contact';
import { Disposition } from '../db/models/disposition';
import { Notice } from '../db/models/notice';
import { StoredFile } from '../db/models/stored-file';
import { inTransaction } from '../db/transaction';
import { env } from '../env';
import { sendMail } from '../mail/send-mail';
import { frozenDocketOf } from '../reports/frozen-docket';
import { ensureReport } from '../reports/make-report';
import { fileStore } from '../storage/store';
import type { FrozenDocket } from '../../schemas/docket';
import { amendedLines } from './amended-lines';
import { noticeMail, type NoticeFacts } from './notice-mail';
import { supplierFacts } from './supplier-facts';

const linkValidMs = 30 * 24 * 3_600_000;

async function attachmentOf(ctx: Context, dispositionId: string) {
	const report = await ensureReport(ctx, dispositionId);
	const file = await StoredFile.findByPk(report.fileId, { rejectOnEmpty: true });
	return {
		filename: report.fileName,
		content: await (await fileStore()).read(file.sha256),
		contentType: file.mediaType
	};
}

/** What a new version changes against the one before, and why; null for a first version. */
async function amendmentOf(disposition: Disposition, frozen: FrozenDocket): Promise<NoticeFacts['amended']> {
	const { shipmentId, version, amendmentReason } = disposition;
	const before = await Disposition.findOne({ where: { shipmentId, version: version - 1 } });
	if (!before) return null;
	const changes = amendedLines(frozenDocketOf(before).docket.lines, frozen.docket.lines);
	return { version, reason: amendmentReason ?? '', changes };
}

/** Mails a notice with a fresh link and the sealed report. Done once it is sent; a crash before that sends it again. */
export async function sendNotice(ctx: Context, noticeId: string): Promise<void> {
	const notice = await Notice.findByPk(noticeId, { rejectOnEmpty: true });
	if (notice.state === 'sent' || !notice.contactId) return;
	const contact = await Contact.findByPk(notice.contactId, { rejectOnEmpty: true });
	const disposition = await Disposition.findByPk(notice.dispositionId, { rejectOnEmpty: true });
	const attachment = await attachmentOf(ctx, disposition.id);

	const secret = newSecret();
	await saveToken(
		secret,
		{ kind: 'notice', contactId: contact.id, shipmentId: notice.shipmentId, noticeId, validMs: linkValidMs },
		ctx.now
	);
	const frozen = frozenDocketOf(disposition);
	const docket = supplierFacts(frozen);
	const { subject, html, text } = noticeMail({
		docket,
		noticeNumber: notice.number,
		answerByAt: notice.answerByAt?.toISOString() ?? null,
		contactName: contact.name,
		link: `${env().origin}/link/${secret}`,
		hasReport: true,
		amended: await amendmentOf(disposition, frozen)
	});
	const messageId = `<${noticeId}@${new URL(env().origin).hostname}>`;
	await sendMail({
		to: { name: contact.name, address: contact.email },
		fromName: `${docket.siteName} receiving`,
		subject,
		html,
		text,
		attachments: [attachment],
		messageId
	});
	await markSent(ctx, notice, subject, messageId, contact.email);
}

/** A notice that is out meets the clocks that run on the refusal: the document is what counts, not the signature. */
async function markSent(
	ctx: Context,
	notice: Notice,
	subject: string,
	messageId: string,
	to: string
): Promise<void> {
	await inTransaction(ctx, async ({ transaction, record }) => {
		await notice.update(
			{ state: 'sent', sentAt: ctx.now, subject: subject.slice(0, 300), messageId },
			{ transaction }
		);
		await Clock.update(
			{ metAt: ctx.now, metBy: `notice ${notice.number}` },
			{ where: { shipmentId: notice.shipmentId, noticeId: null, claimId: null, metAt: null }, transaction }
		);
		record(
			'notice.sent',
			{ scope: 'shipment', id: notice.shipmentId },
			{ noticeId: notice.id, messageId, to }
		);
	});
}
