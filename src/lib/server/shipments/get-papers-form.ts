import { minorUnitDigits } from '../../format';
import { hoursPerDay } from '../../domain/units';
import { docksOf } from '../arrivals/site-day';
import type { Context } from '../context';
import { Handover } from '../db/models/handover';
import { LoggerTrip } from '../db/models/logger-trip';
import { Pallet } from '../db/models/pallet';
import { Partner } from '../db/models/partner';
import { Product } from '../db/models/product';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import type { Site } from '../db/models/site';
import { listLaneChoices } from '../lanes/list-lanes';
import { authorize, authorizeShipment } from '../policies';
import { listCompartments } from './compartments';
import { refuseClosed } from './lock-docket';
import { getOwnSite } from './own-site';
import { typedTime } from './site-time';

/** What the form of the papers offers to choose from. */
export type PapersChoices = Awaited<ReturnType<typeof getPapersChoices>>;

/** Suppliers, carriers, lanes and products in use, and what the site brings. */
export async function getPapersChoices(ctx: Context, siteId: string, ownLaneId: string | null = null) {
	authorize(ctx, 'shipment.create');
	const site = await getOwnSite(ctx, siteId);
	const [partners, products] = await Promise.all([
		Partner.findAll({ where: { switchedOffAt: null }, order: ['name'] }),
		Product.findAll({ where: { switchedOffAt: null }, order: ['name'] })
	]);
	const named = (rows: readonly { id: string; name: string }[]) => rows.map(({ id, name }) => ({ id, name }));
	return {
		suppliers: named(partners.filter((partner) => partner.isSupplier)),
		carriers: named(partners.filter((partner) => partner.isCarrier)),
		lanes: await listLaneChoices(ctx, site.id, ownLaneId),
		partners: named(partners),
		products: named(products),
		docks: docksOf(site),
		zone: site.zone,
		site: site.name,
		currency: site.currency
	};
}

function lineValues(line: ShipmentLine, pallets: Pallet[], zone: string) {
	const { currency, valueMinor, neededHours } = line;
	return {
		...line.get(),
		cases: line.casesAdvised,
		pallets: line.palletsAdvised,
		ssccs: pallets.flatMap((pallet) => (pallet.lineId === line.id && pallet.sscc ? [pallet.sscc] : [])),
		value:
			valueMinor === null || currency === null
				? null
				: (Number(valueMinor) / 10 ** minorUnitDigits(currency)).toFixed(minorUnitDigits(currency)),
		neededDays: neededHours === null ? null : neededHours / hoursPerDay,
		openingSince: typedTime(line.openingSinceAt, zone)
	};
}

async function valuesOf(shipment: Shipment, site: Site) {
	const of = { where: { shipmentId: shipment.id }, order: ['ordinal'] };
	const lines = await ShipmentLine.findAll(of);
	const pallets = await Pallet.findAll({
		where: { lineId: lines.map((line) => line.id) },
		order: ['ordinal']
	});
	const handovers = await Handover.findAll(of);
	const trips = await LoggerTrip.findAll(of);
	const chambers = new Map((await listCompartments(shipment)).map(({ id, name }) => [id, name]));
	const compartmentOf = (row: { compartmentId: string | null }) =>
		chambers.get(row.compartmentId ?? '') ?? null;
	return {
		...shipment.get(),
		due: typedTime(shipment.dueAt, site.zone),
		lines: lines.map((line) => ({
			...lineValues(line, pallets, site.zone),
			compartment: compartmentOf(line)
		})),
		handovers: handovers.map((row) => ({
			...row.get(),
			planned: typedTime(row.plannedAt, site.zone),
			actual: typedTime(row.actualAt, site.zone)
		})),
		loggers: trips.map((trip) => ({
			...trip.get(),
			compartment: compartmentOf(trip),
			line: lines.findIndex((line) => line.id === trip.lineId) + 1 || null
		}))
	};
}

/** A docket's papers as its form shows them, with the version they were read at. */
export async function getPapersForm(ctx: Context, number: string) {
	const shipment = await Shipment.findOne({ where: { number } });
	authorizeShipment(ctx, 'shipment.change', shipment);
	refuseClosed(shipment);
	const site = await getOwnSite(ctx, shipment.siteId);
	return {
		...{ number, title: shipment.title, hasArrived: shipment.arrivedAt !== null },
		choices: await getPapersChoices(ctx, site.id, shipment.laneId),
		// Plain text and numbers: dates and the like have been turned into what fields hold.
		values: JSON.parse(JSON.stringify(await valuesOf(shipment, site))) as Record<string, unknown>
	};
}
