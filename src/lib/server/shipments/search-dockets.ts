import { Op } from 'sequelize';
import type { Stage, Verdict } from '../../schemas/docket';
import { stageOf } from '../arrivals/stage-of';
import type { Context } from '../context';
import { Hold } from '../db/models/hold';
import { LoggerTrip } from '../db/models/logger-trip';
import { Pallet } from '../db/models/pallet';
import { Partner } from '../db/models/partner';
import { Product } from '../db/models/product';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { Site } from '../db/models/site';
import { authorize } from '../policies';

/** A docket among what was found, and by what. */
export interface FoundDocket {
	id: string;
	number: string;
	title: string;
	stage: Stage;
	verdict: Verdict | null;
	/** Of its own site: what is found may lie in another zone than the one worked in. */
	zone: string;
	supplier: string;
	vehicle: string | null;
	dueAt: string | null;
	arrivedAt: string | null;
}

/** More hits than this on one kind of mark are no find. */
const mostMarks = 500;

function containing(q: string) {
	return { [Op.like]: `%${q.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%` };
}

/** Dockets whose lines, pallets or loggers carry the text, and suppliers and carriers of that name. */
async function findMarks(q: string) {
	const like = containing(q);
	const digits = q.replace(/[\s()]/g, '').replace(/^00(?=\d{18}$)/, '');
	const limit = mostMarks;
	const pallets = /^\d{6,18}$/.test(digits)
		? await Pallet.findAll({ where: { sscc: containing(digits) }, limit })
		: [];
	const products = await Product.findAll({ where: { name: like }, limit, attributes: ['id'] });
	const byLine = [
		{ lot: like },
		{ productId: { [Op.in]: products.map((product) => product.id) } },
		{ id: { [Op.in]: pallets.map((pallet) => pallet.lineId) } }
	];
	const gtin = /^\d{8,14}$/.test(digits) ? [{ gtin: digits.padStart(14, '0') }] : [];
	const [lines, trips, partners] = await Promise.all([
		ShipmentLine.findAll({ where: { [Op.or]: [...byLine, ...gtin] }, limit, attributes: ['shipmentId'] }),
		LoggerTrip.findAll({ where: { serial: like }, limit, attributes: ['shipmentId'] }),
		Partner.findAll({ where: { name: like }, limit, attributes: ['id'] })
	]);
	return {
		shipmentIds: [...new Set([...lines, ...trips].map((row) => row.shipmentId))],
		partnerIds: partners.map((partner) => partner.id)
	};
}

/** Dockets of the actor's sites by number, lot, SSCC, GTIN, seal, trailer, papers, logger or party; newest due first. */
export async function searchDockets(ctx: Context, q: string, limit = 20): Promise<FoundDocket[]> {
	authorize(ctx, 'shipment.list');
	if (q.trim() === '') return [];
	const { shipmentIds, partnerIds } = await findMarks(q.trim());
	const like = containing(q.trim());
	const own = ['number', 'title', 'seal', 'vehicle', 'purchaseOrder', 'billOfLading'];
	const found = await Shipment.findAll({
		where: {
			siteId: { [Op.in]: [...ctx.actor.siteIds] },
			cancelledAt: null,
			[Op.or]: [
				...own.map((name) => ({ [name]: like })),
				{ id: { [Op.in]: shipmentIds } },
				{ supplierId: { [Op.in]: partnerIds } },
				{ carrierId: { [Op.in]: partnerIds } }
			]
		},
		order: [
			['dueAt', 'DESC'],
			['number', 'DESC']
		],
		limit
	});
	return foundViews(found);
}

async function foundViews(found: Shipment[]): Promise<FoundDocket[]> {
	const ids = found.map((shipment) => shipment.id);
	const [holds, suppliers, sites] = await Promise.all([
		Hold.findAll({ where: { shipmentId: { [Op.in]: ids }, liftedAt: null } }),
		Partner.findAll({ where: { id: { [Op.in]: found.map((shipment) => shipment.supplierId) } } }),
		Site.findAll({ where: { id: { [Op.in]: found.map((shipment) => shipment.siteId) } } })
	]);
	const zones = new Map(sites.map((site) => [site.id, site.zone]));
	const names = new Map(suppliers.map((partner) => [partner.id, partner.name]));
	return found.map((shipment) => ({
		id: shipment.id,
		number: shipment.number,
		title: shipment.title,
		stage: stageOf({
			...shipment.get(),
			isHeld: holds.some((hold) => hold.shipmentId === shipment.id)
		}),
		verdict: shipment.verdict,
		zone: zones.get(shipment.siteId) ?? 'UTC',
		supplier: names.get(shipment.supplierId) ?? '',
		vehicle: shipment.vehicle,
		dueAt: shipment.dueAt?.toISOString() ?? null,
		arrivedAt: shipment.arrivedAt?.toISOString() ?? null
	}));
}
