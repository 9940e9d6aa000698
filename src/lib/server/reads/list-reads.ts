import type { ReadContext } from '../../domain/ingest/ingestion';
import type { DeviceInputs, ReadRowView } from '../../schemas/read';
import type { Context } from '../context';
import { LoggerRead } from '../db/models/logger-read';
import { Site } from '../db/models/site';
import { deviceInputs } from './device-inputs';
import { getShipmentFor, isSigned } from './find-read';
import { readContextOf } from './read-context';
import { readRowView } from './views';

/** A docket's reads for the page where more are uploaded. */
export interface DocketReads {
	docket: { number: string; title: string; isSigned: boolean };
	zone: string;
	reads: ReadRowView[];
	/** What a file uploaded now is read by. */
	context: ReadContext;
	/** What it is assessed by, on the device that holds it. */
	inputs: DeviceInputs;
}

/** The reads of a docket, newest first; those withdrawn stay visible. */
export async function listReads(ctx: Context, number: string): Promise<DocketReads> {
	const shipment = await getShipmentFor(ctx, number, 'docket.view');
	const site = await Site.findByPk(shipment.siteId);
	const rows = await LoggerRead.findAll({
		where: { shipmentId: shipment.id },
		order: [
			['uploadedAt', 'DESC'],
			['id', 'DESC']
		]
	});
	const reads: ReadRowView[] = [];
	for (const row of rows) reads.push(await readRowView(row));
	return {
		docket: { number, title: shipment.title, isSigned: await isSigned(shipment.id) },
		zone: site?.zone ?? 'UTC',
		reads,
		context: await readContextOf(shipment, ctx.now, {}),
		inputs: await deviceInputs(ctx, shipment)
	};
}
