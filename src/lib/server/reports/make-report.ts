import { UniqueConstraintError } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { Context } from '../context';
import { Disposition } from '../db/models/disposition';
import { Report } from '../db/models/report';
import { Shipment } from '../db/models/shipment';
import { inTransaction } from '../db/transaction';
import { organisationCertificate } from '../certificates/organisation-certificate';
import { env } from '../env';
import { log } from '../log';
import { keepBytes } from '../storage/store';
import { buildSealedReport } from './pdf/run-worker';
import { reportOrder } from './report-order';

/** `PS-26-1184-v1.pdf` */
export function reportFileName(number: string, version: number): string {
	return `${number}-v${version}.pdf`;
}

/** The sealed report of a signed version: the one there is, else made now. Sealed bytes are kept, never made again. */
export async function ensureReport(ctx: Context, dispositionId: string): Promise<Report> {
	const known = await Report.findOne({ where: { dispositionId } });
	if (known) return known;
	const disposition = await Disposition.findByPk(dispositionId, { rejectOnEmpty: true });
	const shipment = await Shipment.findByPk(disposition.shipmentId, { rejectOnEmpty: true });
	const { row: certificate, key } = await organisationCertificate(ctx);
	const order = await reportOrder(disposition);
	const { pdf, timestamp } = await buildSealedReport(order, key, env().timestampUrl);
	if (timestamp.state === 'failed') log().warn({ disposition: dispositionId, ...timestamp }, 'no timestamp');
	const file = await keepBytes(pdf, 'application/pdf', ctx.now);
	const id = uuid();
	try {
		return await inTransaction(ctx, async ({ transaction, record }) => {
			const report = await Report.create(
				{
					id,
					dispositionId,
					shipmentId: shipment.id,
					fileId: file.id,
					fileName: reportFileName(shipment.number, disposition.version),
					certificateId: certificate.id,
					madeAt: ctx.now
				},
				{ transaction }
			);
			record(
				'report.sealed',
				{ scope: 'shipment', id: shipment.id },
				{ reportId: id, fileSha256: file.sha256, bytes: file.bytes, timestamp }
			);
			return report;
		});
	} catch (error) {
		// Another worker was quicker: its report stands.
		if (error instanceof UniqueConstraintError)
			return Report.findOne({ where: { dispositionId }, rejectOnEmpty: true });
		throw error;
	}
}
