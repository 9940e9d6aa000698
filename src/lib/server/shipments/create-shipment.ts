import { v7 as uuid } from 'uuid';
import type { ShipmentInput } from '../../schemas/shipment-form';
import { isSystem, type Context } from '../context';
import { Handover } from '../db/models/handover';
import { LoggerTrip } from '../db/models/logger-trip';
import { Pallet } from '../db/models/pallet';
import { Shipment } from '../db/models/shipment';
import { ShipmentLine } from '../db/models/shipment-line';
import { inTransaction } from '../db/transaction';
import { authorize } from '../policies';
import { Refusal } from '../refusals';
import { inCompartments } from './compartments';
import { docketRows, type DocketRows } from './docket-rows';
import { nextNumber } from '../sites/next-number';
import { getOwnSite } from './own-site';
import { preparePapers } from './prepare-papers';
import type { Transaction } from 'sequelize';

/** How a docket is named in an answer. */
export interface DocketName {
	id: string;
	number: string;
}

async function insertRows(shipmentId: string, rows: DocketRows, transaction: Transaction): Promise<void> {
	const docket = { id: shipmentId, visitId: null };
	await ShipmentLine.bulkCreate(await inCompartments(docket, rows.lines, transaction), { transaction });
	await Pallet.bulkCreate(rows.pallets, { transaction });
	await Handover.bulkCreate(rows.handovers, { transaction });
	await LoggerTrip.bulkCreate(await inCompartments(docket, rows.trips, transaction), { transaction });
}

/** Opens a docket from its papers, under the next number of the site. The same id again answers the docket it made. */
export async function createShipment(
	ctx: Context,
	siteId: string,
	input: ShipmentInput,
	by: 'hand' | 'import' | 'seed' = 'hand'
): Promise<DocketName> {
	authorize(ctx, 'shipment.create');
	const site = await getOwnSite(ctx, siteId);
	// Rows of another docket are nobody's to take over.
	const prepared = withoutIds(await preparePapers(site, input));
	const id = input.id ?? uuid();
	const rows = docketRows(prepared, id);

	return inTransaction(ctx, async ({ transaction, record }) => {
		const number = await nextNumber(site.id, 'docket', ctx.now, transaction);
		// The series' lock has made requests that were sent twice wait for each other.
		const known = await Shipment.findByPk(id, { transaction });
		if (known && known.siteId !== site.id) throw new Refusal('duplicate');
		if (known) return { id, number: known.number };
		const createdBy = isSystem(ctx.actor) ? null : ctx.actor.id;
		await Shipment.create(
			{ ...prepared.papers, id, siteId: site.id, number, createdBy, createdAt: ctx.now },
			{ transaction }
		);
		await insertRows(id, rows, transaction);
		record('shipment.created', { scope: 'shipment', id }, { number, by });
		return { id, number };
	});
}

function withoutIds(prepared: Awaited<ReturnType<typeof preparePapers>>): typeof prepared {
	const blank = <Row extends { id: string | null }>(rows: Row[]) => rows.map((row) => ({ ...row, id: null }));
	return {
		...prepared,
		lines: blank(prepared.lines),
		handovers: blank(prepared.handovers),
		loggers: blank(prepared.loggers)
	};
}
