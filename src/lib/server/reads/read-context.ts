import type { Answers, ReadContext } from '../../domain/ingest/ingestion';
import { Handover } from '../db/models/handover';
import type { Shipment } from '../db/models/shipment';
import { Site } from '../db/models/site';

/** What the dock knows beside the file: its zone, the journey, the moment of the upload. */
export async function readContextOf(
	shipment: Shipment,
	uploadedAt: Date,
	answers: Answers
): Promise<ReadContext> {
	const site = await Site.findByPk(shipment.siteId);
	if (!site) throw new Error(`The site of docket ${shipment.number} is missing.`);
	const handovers = await Handover.findAll({ where: { shipmentId: shipment.id }, order: ['ordinal'] });
	const instants = handovers
		.map(({ actualAt, plannedAt }) => actualAt ?? plannedAt)
		.filter((at) => at !== null);
	const last = shipment.arrivedAt ?? instants[instants.length - 1];
	return {
		uploadedMs: uploadedAt.getTime(),
		siteZone: site.zone,
		journeyFromMs: instants[0]?.getTime() ?? null,
		journeyToMs: last?.getTime() ?? null,
		answers
	};
}
