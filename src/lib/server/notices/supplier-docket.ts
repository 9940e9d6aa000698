import { z } from 'zod';
import type { NoticeView, SupplierDocketView } from '../../schemas/supplier';
import type { Context } from '../context';
import { Disposition } from '../db/models/disposition';
import { Notice } from '../db/models/notice';
import { NoticeAnswer } from '../db/models/notice-answer';
import { Report } from '../db/models/report';
import { Shipment } from '../db/models/shipment';
import { StoredFile } from '../db/models/stored-file';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import { frozenDocketOf } from '../reports/frozen-docket';
import { supplierFacts } from './supplier-facts';

async function noticeView(dispositionId: string, partnerId: string): Promise<NoticeView | null> {
	const notice = await Notice.findOne({ where: { dispositionId, partnerId } });
	if (!notice) return null;
	const answers = await NoticeAnswer.findAll({ where: { noticeId: notice.id }, order: ['answeredAt'] });
	return {
		id: notice.id,
		number: notice.number,
		answerByAt: notice.answerByAt?.toISOString() ?? null,
		answers: answers.map((answer) => ({
			kind: answer.kind,
			disputed: z.array(z.string()).parse(answer.disputed),
			whatIsWrong: answer.whatIsWrong,
			whatWillBeDone: answer.whatWillBeDone,
			who: answer.who,
			doneByOn: answer.doneByOn,
			at: answer.answeredAt.toISOString(),
			by: answer.answeredBy
		}))
	};
}

async function reportOf(dispositionId: string): Promise<SupplierDocketView['report']> {
	const report = await Report.findOne({ where: { dispositionId } });
	const file = report ? await StoredFile.findByPk(report.fileId) : null;
	return report && file ? { id: report.id, fileName: report.fileName, bytes: file.bytes } : null;
}

/** A supplier's own load as signed, by its current version. @throws Refusal `not-found` also while nothing is signed */
export async function getSupplierDocket(ctx: Context, shipmentId: string): Promise<SupplierDocketView> {
	const shipment = await Shipment.findByPk(shipmentId);
	authorizeShipment(ctx, 'shipment.view', shipment);
	const disposition = await Disposition.findOne({ where: { shipmentId }, order: [['version', 'DESC']] });
	if (!disposition) throw new Refusal('not-found', 'Nothing has been decided about this load yet.');
	return {
		...supplierFacts(frozenDocketOf(disposition)),
		report: await reportOf(disposition.id),
		notice: await noticeView(disposition.id, shipment.supplierId)
	};
}
