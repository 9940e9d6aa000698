import type { Context } from '../context';
import { Partner } from '../db/models/partner';
import { Product } from '../db/models/product';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import { refuseClosed } from '../shipments/lock-docket';
import { getOwnSite } from '../shipments/own-site';
import { typedTime } from '../shipments/site-time';
import { docksOf } from './site-day';

/** What the form at the door shows of a docket. */
export type ArrivalForm = Awaited<ReturnType<typeof getArrivalForm>>;

/** The papers as the dock checks them. @throws Refusal `already-arrived` */
export async function getArrivalForm(ctx: Context, number: string) {
	const shipment = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, 'arrival.log', shipment);
	refuseClosed(shipment);
	if (shipment.arrivedAt) throw new Refusal('already-arrived');
	const site = await getOwnSite(ctx, shipment.siteId);
	const lines = await ShipmentLine.findAll({ where: { shipmentId: shipment.id }, order: ['ordinal'] });
	const [supplier, carrier, products] = await Promise.all([
		Partner.findByPk(shipment.supplierId),
		shipment.carrierId ? Partner.findByPk(shipment.carrierId) : null,
		Product.findAll({ where: { id: lines.map((line) => line.productId) } })
	]);
	const { title, seal, vehicle, dock } = shipment;
	return {
		...{ number, title, seal, vehicle, dock },
		supplier: supplier?.name ?? '',
		carrier: carrier?.name ?? null,
		zone: site.zone,
		docks: docksOf(site),
		now: typedTime(ctx.now, site.zone),
		lines: lines.map(({ id, ordinal, lot, description, casesAdvised, palletsAdvised, productId }) => ({
			...{ id, ordinal, lot, description, casesAdvised, palletsAdvised },
			unit: products.find((product) => product.id === productId)?.countUnit ?? 'case'
		}))
	};
}
