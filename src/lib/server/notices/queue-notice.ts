import { v7 as uuid } from 'uuid';
import type { Context } from '../context';
import { Clock } from '../db/models/clock';
import { Contact } from '../db/models/contact';
import { Notice } from '../db/models/notice';
import type { Shipment } from '../db/models/shipment';
import type { Writing } from '../db/transaction';
import { nextNumber } from '../sites/next-number';

const answerWithinMs = 7 * 24 * 3_600_000;

/** Who at a supplier hears of excursions: the first contact marked so, else the first there is. */
async function contactOf(partnerId: string, { transaction }: Writing): Promise<Contact | null> {
	return Contact.findOne({
		where: { partnerId, switchedOffAt: null },
		order: [
			['isNotified', 'DESC'],
			['id', 'ASC']
		],
		transaction
	});
}

/** Writes a notice to the supplier about a decision, with the job that mails it, in the decision's own transaction. */
export async function queueNotice(
	w: Writing,
	ctx: Context,
	shipment: Shipment,
	dispositionId: string
): Promise<void> {
	const { transaction } = w;
	const contact = await contactOf(shipment.supplierId, w);
	const noticeId = uuid();
	const answerByAt = new Date(ctx.now.getTime() + answerWithinMs);
	const number = await nextNumber(shipment.siteId, 'notice', ctx.now, transaction);
	await Notice.create(
		{
			id: noticeId,
			number,
			shipmentId: shipment.id,
			dispositionId,
			partnerId: shipment.supplierId,
			contactId: contact?.id ?? null,
			// Without anybody to write to, the notice stands and says so; an admin adds the contact and sends it again.
			state: contact ? 'queued' : 'failed',
			subject: '',
			answerByAt,
			createdAt: ctx.now
		},
		{ transaction }
	);
	await Clock.create(
		{
			id: uuid(),
			shipmentId: shipment.id,
			noticeId,
			name: 'Answer of the supplier',
			basis: '7 days from the notice',
			startsAt: ctx.now,
			deadlineAt: answerByAt
		},
		{ transaction }
	);
	w.record(
		'notice.queued',
		{ scope: 'shipment', id: shipment.id },
		{ noticeId, number, partnerId: shipment.supplierId }
	);
	if (contact) w.enqueue('notice', { noticeId }, `notice ${noticeId}`);
}
