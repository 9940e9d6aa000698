import { Op } from 'sequelize';
import type { Verdict } from '../../schemas/docket';
import type { Context } from '../context';
import { Notice } from '../db/models/notice';
import { NoticeAnswer } from '../db/models/notice-answer';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { Site } from '../db/models/site';
import { authorize } from '../policies';

export interface LoadRow {
	id: string;
	number: string;
	title: string;
	siteName: string;
	zone: string;
	purchaseOrder: string | null;
	dueAt: string | null;
	arrivedAt: string | null;
	verdict: Verdict | null;
	cases: number;
	notice: { number: string; answerByAt: string | null; isAnswered: boolean } | null;
}

const shown = 200;

/** A supplier's own loads, newest first: what is decided can be opened. */
export async function listLoads(ctx: Context): Promise<LoadRow[]> {
	authorize(ctx, 'load.list');
	const { partnerId, shipmentId } = ctx.actor;
	if (!partnerId) return [];
	const shipments = await Shipment.findAll({
		where: { supplierId: partnerId, cancelledAt: null, ...(shipmentId ? { id: shipmentId } : {}) },
		order: [['dueAt', 'DESC']],
		limit: shown
	});
	const ids = shipments.map((shipment) => shipment.id);
	const [sites, lines, notices] = await Promise.all([
		Site.findAll({ where: { id: shipments.map((shipment) => shipment.siteId) } }),
		ShipmentLine.findAll({ where: { shipmentId: ids } }),
		Notice.findAll({ where: { shipmentId: ids, partnerId }, order: ['createdAt'] })
	]);
	const answered = new Set(
		(
			await NoticeAnswer.findAll({ where: { noticeId: { [Op.in]: notices.map((notice) => notice.id) } } })
		).map((row) => row.noticeId)
	);
	return shipments.map((shipment) => {
		const site = sites.find((candidate) => candidate.id === shipment.siteId);
		const notice = notices.filter((candidate) => candidate.shipmentId === shipment.id).at(-1);
		return {
			id: shipment.id,
			number: shipment.number,
			title: shipment.title,
			siteName: site?.name ?? '',
			zone: site?.zone ?? 'UTC',
			purchaseOrder: shipment.purchaseOrder,
			dueAt: shipment.dueAt?.toISOString() ?? null,
			arrivedAt: shipment.arrivedAt?.toISOString() ?? null,
			verdict: shipment.verdict,
			cases: lines
				.filter((line) => line.shipmentId === shipment.id)
				.reduce((sum, line) => sum + line.casesAdvised, 0),
			notice: notice
				? {
						number: notice.number,
						answerByAt: notice.answerByAt?.toISOString() ?? null,
						isAnswered: answered.has(notice.id)
					}
				: null
		};
	});
}
