import { systemContext } from '../../context';
import { Clock } from '../../db/models/clock';
import { Contact } from '../../db/models/contact';
import { Disposition } from '../../db/models/disposition';
import { Job } from '../../db/models/job';
import { Notice } from '../../db/models/notice';
import { inTransaction } from '../../db/transaction';
import { noticeSubject } from '../../notices/notice-mail';
import { supplierFacts } from '../../notices/supplier-facts';
import { frozenDocketOf } from '../../reports/frozen-docket';

/**
 * Marks an old notice as sent when it would have been: its mail would only flood a mailbox that is days too late, so
 * its job is done without one.
 */
export async function settleNotice(shipmentId: string, atMs: number): Promise<void> {
	const now = new Date(atMs);
	const notice = await Notice.findOne({ where: { shipmentId }, rejectOnEmpty: true });
	const contact = await Contact.findByPk(notice.contactId ?? '', { rejectOnEmpty: true });
	const disposition = await Disposition.findByPk(notice.dispositionId, { rejectOnEmpty: true });
	const docket = supplierFacts(frozenDocketOf(disposition));
	const answerByAt = notice.answerByAt?.toISOString() ?? null;
	const messageId = `<${notice.id}@demo.wharfinger.example>`;
	await inTransaction(systemContext(now, 'demo-notices'), async ({ transaction, record }) => {
		await notice.update(
			{
				state: 'sent',
				sentAt: now,
				subject: noticeSubject({ docket, answerByAt }).slice(0, 300),
				messageId,
				firstOpenedAt: now
			},
			{ transaction }
		);
		await Clock.update(
			{ metAt: now, metBy: `notice ${notice.number}` },
			{ where: { shipmentId, noticeId: null, claimId: null, metAt: null }, transaction }
		);
		await Job.update({ doneAt: now }, { where: { dedupeKey: `notice ${notice.id}` }, transaction });
		record(
			'notice.sent',
			{ scope: 'shipment', id: shipmentId },
			{ noticeId: notice.id, messageId, to: contact.email }
		);
	});
}
