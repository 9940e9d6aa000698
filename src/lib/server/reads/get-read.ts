import type { LoggerChoice, ReadView } from '../../schemas/read';
import type { Context } from '../context';
import type { Compartment } from '../db/models/compartment';
import { Logger } from '../db/models/logger';
import { LoggerTrip } from '../db/models/logger-trip';
import { Partner } from '../db/models/partner';
import { Product } from '../db/models/product';
import { RememberedLayout } from '../db/models/remembered-layout';
import { ShipmentLine } from '../db/models/shipment-line';
import { Site } from '../db/models/site';
import { TraceRow } from '../db/models/trace-row';
import { layoutViews } from '../layouts/views';
import { listCompartments } from '../shipments/compartments';
import { clockCorrectionsOf } from '../traces/clock-views';
import { getReadFor, isSigned } from './find-read';
import { parseUnderstanding } from './stored-understanding';
import { alsoOnDockets, readRowView } from './views';

/** A read with what was understood, or asked, and what is proposed for its logger. */
export async function getRead(ctx: Context, readId: string): Promise<ReadView> {
	const { read, shipment } = await getReadFor(ctx, readId, 'docket.view');
	const site = await Site.findByPk(shipment.siteId);
	const row = await readRowView(read);
	const traces = await TraceRow.findAll({
		where: { readId },
		attributes: ['id', 'tripId'],
		order: ['ordinal']
	});
	const chambers = await listCompartments(shipment);
	const expected = await expectedLoggers(shipment.id, chambers);
	const tripId = traces.find((trace) => trace.tripId)?.tripId;
	const layout = read.layoutId ? await RememberedLayout.findByPk(read.layoutId) : null;
	const [remembered = null] = await layoutViews(layout ? [layout] : []);
	const [clockCorrection = null] = await clockCorrectionsOf([readId]);
	return {
		...row,
		supplierName: (await Partner.findByPk(shipment.supplierId))?.name ?? '',
		remembered: remembered && { ...remembered, isFromHere: layout?.sourceReadId === readId },
		docket: { number: shipment.number, title: shipment.title, isSigned: await isSigned(shipment.id) },
		zone: site?.zone ?? 'UTC',
		ingestion: parseUnderstanding(read.understanding),
		alsoOn: await alsoOnDockets(ctx, read),
		lines: await linesOf(shipment.id),
		compartments: chambers.map(({ name }) => name),
		expected: expected.map(({ choice }) => choice),
		proposed: await proposedLogger(row.serial, tripId ?? null, expected),
		traceIds: traces.map(({ id }) => id),
		clockCorrection
	};
}

interface Expected {
	tripId: string;
	isOpen: boolean;
	choice: LoggerChoice;
}

async function expectedLoggers(shipmentId: string, chambers: readonly Compartment[]): Promise<Expected[]> {
	const trips = await LoggerTrip.findAll({ where: { shipmentId }, order: ['ordinal'] });
	const found: Expected[] = [];
	for (const { id, status, serial, lineId, compartmentId, position, placement } of trips) {
		const accuracyCelsius = await accuracyOf(serial);
		const compartment = chambers.find((chamber) => chamber.id === compartmentId)?.name ?? null;
		const choice = { serial, lineId, compartment, position, placement, accuracyCelsius };
		found.push({ tripId: id, isOpen: status !== 'found', choice });
	}
	return found;
}

async function accuracyOf(serial: string): Promise<number | null> {
	return (await Logger.findOne({ where: { serial } }))?.accuracyCelsius ?? null;
}

/** The logger it was kept for, else the one the file names, else the only one still expected; to be confirmed. */
async function proposedLogger(
	serial: string | null,
	tripId: string | null,
	expected: readonly Expected[]
): Promise<LoggerChoice> {
	const open = expected.filter(({ isOpen }) => isOpen);
	const own = expected.find((one) => one.tripId === tripId);
	const named = expected.find(({ choice }) => choice.serial === serial);
	const only = serial === null && open.length === 1 ? open[0] : undefined;
	const found = own ?? named ?? only;
	if (found) return found.choice;
	const accuracyCelsius = serial === null ? null : await accuracyOf(serial);
	const nowhere = { lineId: null, compartment: null, position: null };
	return { serial: serial ?? '', ...nowhere, placement: 'between-cases', accuracyCelsius };
}

async function linesOf(shipmentId: string): Promise<ReadView['lines']> {
	const lines = await ShipmentLine.findAll({ where: { shipmentId }, order: ['ordinal'] });
	const products = await Product.findAll({ where: { id: lines.map(({ productId }) => productId) } });
	const nameOf = new Map(products.map(({ id, name }) => [id, name]));
	return lines.map(({ id, ordinal, productId, description, lot }) => ({
		id,
		ordinal,
		product: description || (nameOf.get(productId) ?? ''),
		lot
	}));
}
