import { literal, Op, type Order, type WhereOptions } from 'sequelize';
import type { ShipmentListQuery, ShipmentRow } from '../../schemas/shipment-list';
import { dayBefore, spanOfDay } from '../arrivals/site-day';
import { stageOf } from '../arrivals/stage-of';
import { pageOf, searchIn } from '../catalogue/search';
import type { Context } from '../context';
import { Hold } from '../db/models/hold';
import { Partner } from '../db/models/partner';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import type { Site } from '../db/models/site';
import { authorize } from '../policies';
import { getOwnSite } from './own-site';

const openHold = '(SELECT shipment_id FROM holds WHERE lifted_at IS NULL)';

function inStage(stage: ShipmentListQuery['stage']): WhereOptions<Shipment> {
	const open = { cancelledAt: null, decidedAt: null };
	if (stage === 'cancelled') return { cancelledAt: { [Op.not]: null } };
	if (stage === 'done') return { cancelledAt: null, decidedAt: { [Op.not]: null } };
	if (stage === 'expected') return { ...open, arrivedAt: null };
	if (stage === 'on-hold') return { ...open, id: { [Op.in]: literal(openHold) } };
	if (stage === 'at-the-door')
		return { ...open, arrivedAt: { [Op.not]: null }, id: { [Op.notIn]: literal(openHold) } };
	return { cancelledAt: null };
}

/** From the first to the last day, whole days by the site's calendar. */
function dueWithin(query: ShipmentListQuery, site: Site): WhereOptions<Shipment> {
	const from = query.from ? { [Op.gte]: spanOfDay(query.from, site.zone).from } : {};
	const to = query.to ? { [Op.lt]: spanOfDay(dayBefore(query.to, -1), site.zone).from } : {};
	return query.from || query.to ? { dueAt: { ...from, ...to } } : {};
}

function orderOf({ sort, dir }: ShipmentListQuery): Order {
	const name = (column: string) => literal(`(SELECT name FROM partners WHERE partners.id = ${column})`);
	const columns = {
		due: 'dueAt',
		number: 'number',
		arrived: 'arrivedAt',
		supplier: name('Shipment.supplier_id'),
		carrier: name('Shipment.carrier_id')
	};
	return [
		[columns[sort], dir],
		['number', dir]
	];
}

/** A docket by its own words, by its supplier's or carrier's name, or by a lot. */
async function matching(q: string): Promise<WhereOptions<Shipment>> {
	const attributes = ['id'];
	const partners = await Partner.findAll({ where: searchIn<Partner>(['name'], q), attributes });
	const lines = await ShipmentLine.findAll({
		where: searchIn<ShipmentLine>(['lot'], q),
		attributes: ['shipmentId']
	});
	const partnerIds = partners.map(({ id }) => id);
	return {
		[Op.or]: [
			searchIn<Shipment>(['number', 'title', 'vehicle', 'seal', 'purchaseOrder', 'billOfLading'], q),
			{ supplierId: partnerIds },
			{ carrierId: partnerIds },
			{ id: lines.map(({ shipmentId }) => shipmentId) }
		]
	};
}

async function whereOf(query: ShipmentListQuery, site: Site): Promise<WhereOptions<Shipment>> {
	const lines =
		query.product === null
			? null
			: await ShipmentLine.findAll({ where: { productId: query.product }, attributes: ['shipmentId'] });
	return {
		siteId: site.id,
		[Op.and]: [
			inStage(query.stage),
			dueWithin(query, site),
			query.q === '' ? {} : await matching(query.q),
			query.supplier ? { supplierId: query.supplier } : {},
			query.carrier ? { carrierId: query.carrier } : {},
			lines ? { id: { [Op.in]: lines.map((line) => line.shipmentId) } } : {}
		]
	};
}

/** All dockets of one of the actor's sites, by page. */
export async function listShipments(
	ctx: Context,
	siteId: string,
	query: ShipmentListQuery
): Promise<{ items: ShipmentRow[]; total: number }> {
	authorize(ctx, 'shipment.list');
	const site = await getOwnSite(ctx, siteId);
	const { rows, count } = await Shipment.findAndCountAll({
		where: await whereOf(query, site),
		order: orderOf(query),
		...pageOf(query)
	});
	return { items: await shipmentRows(rows), total: count };
}

async function shipmentRows(shipments: Shipment[]): Promise<ShipmentRow[]> {
	const where = { shipmentId: { [Op.in]: shipments.map((shipment) => shipment.id) } };
	const parties = shipments.flatMap((row) => [row.supplierId, row.carrierId]).filter((id) => id !== null);
	const [lines, holds, partners] = await Promise.all([
		ShipmentLine.findAll({ where, attributes: ['shipmentId', 'casesAdvised', 'casesReceived'] }),
		Hold.findAll({ where: { ...where, liftedAt: null } }),
		Partner.findAll({ where: { id: { [Op.in]: [...new Set(parties)] } } })
	]);
	const names = new Map(partners.map((partner) => [partner.id, partner.name]));
	return shipments.map((row) => ({
		id: row.id,
		number: row.number,
		title: row.title,
		stage: stageOf({ ...row.get(), isHeld: holds.some((hold) => hold.shipmentId === row.id) }),
		isCancelled: row.cancelledAt !== null,
		verdict: row.verdict,
		supplier: names.get(row.supplierId) ?? '',
		carrier: row.carrierId === null ? null : (names.get(row.carrierId) ?? null),
		vehicle: row.vehicle,
		purchaseOrder: row.purchaseOrder,
		dueAt: row.dueAt?.toISOString() ?? null,
		arrivedAt: row.arrivedAt?.toISOString() ?? null,
		decidedAt: row.decidedAt?.toISOString() ?? null,
		cases: lines
			.filter((line) => line.shipmentId === row.id)
			.reduce((sum, line) => sum + (line.casesReceived ?? line.casesAdvised), 0)
	}));
}
