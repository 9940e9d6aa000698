import { v7 as uuid } from 'uuid';
import type { AnswerInput } from '../../schemas/supplier';
import type { Context } from '../context';
import { Clock } from '../db/models/clock';
import { Notice } from '../db/models/notice';
import { NoticeAnswer } from '../db/models/notice-answer';
import { Shipment } from '../db/models/shipment';
import { inTransaction } from '../db/transaction';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';

/** Keeps a supplier's answer to a notice; a later answer stands beside the earlier one. @throws Refusal `not-found`, `not-allowed` */
export async function answerNotice(
	ctx: Context,
	shipmentId: string,
	noticeId: string,
	input: AnswerInput
): Promise<void> {
	const shipment = await Shipment.findByPk(shipmentId);
	authorizeShipment(ctx, 'notice.answer', shipment);
	const id = uuid();
	await inTransaction(ctx, async ({ transaction, record }) => {
		const notice = await Notice.findOne({
			where: { id: noticeId, shipmentId, partnerId: shipment.supplierId },
			transaction
		});
		if (!notice) throw new Refusal('not-found');
		await NoticeAnswer.create(
			{ id, noticeId, ...input, answeredBy: ctx.actor.email, answeredAt: ctx.now },
			{ transaction }
		);
		await Clock.update(
			{ metAt: ctx.now, metBy: `answer of ${input.who}` },
			{ where: { noticeId, metAt: null }, transaction }
		);
		record(
			'answer.given',
			{ scope: 'shipment', id: shipmentId },
			{ noticeId, kind: input.kind, by: ctx.actor.email }
		);
	});
}
