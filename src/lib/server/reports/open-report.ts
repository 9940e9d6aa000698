import type { Readable } from 'node:stream';
import type { Context } from '../context';
import { Report } from '../db/models/report';
import { Shipment } from '../db/models/shipment';
import { StoredFile } from '../db/models/stored-file';
import { inTransaction } from '../db/transaction';
import { authorizeShipment } from '../policies';
import { Refusal } from '../refusals';
import { fileStore } from '../storage/store';

/** A file on its way out: bytes, and what the browser is told about them. */
export interface OutgoingFile {
	fileName: string;
	mediaType: string;
	bytes: number;
	sha256: string;
	open: () => Promise<Readable>;
}

/** The sealed report as it was kept. Who opened it goes on the docket's record. @throws Refusal `not-found`, `not-allowed` */
export async function openReport(ctx: Context, reportId: string): Promise<OutgoingFile> {
	const report = await Report.findByPk(reportId);
	const shipment = report ? await Shipment.findByPk(report.shipmentId) : null;
	authorizeShipment(ctx, 'report.open', shipment);
	const file = report ? await StoredFile.findByPk(report.fileId) : null;
	if (!report || !file) throw new Refusal('not-found');
	await inTransaction(ctx, async ({ record }) =>
		record('report.opened', { scope: 'shipment', id: report.shipmentId }, { reportId })
	);
	const store = await fileStore();
	return {
		fileName: report.fileName,
		mediaType: file.mediaType,
		bytes: file.bytes,
		sha256: file.sha256,
		open: () => store.open(file.sha256)
	};
}
