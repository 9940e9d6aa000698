import { v7 as uuid } from 'uuid';
import type { Context } from '../../src/lib/server/context';
import { organisationCertificate } from '../../src/lib/server/certificates/organisation-certificate';
import { Arrival } from '../../src/lib/server/db/models/arrival';
import { Disposition } from '../../src/lib/server/db/models/disposition';
import { Report } from '../../src/lib/server/db/models/report';
import { evidenceSha256 } from '../../src/lib/server/dispositions/freeze';
import { signDisposition } from '../../src/lib/server/dispositions/sign-disposition';
import { getDocket } from '../../src/lib/server/dockets/get-docket';
import { reportFileName } from '../../src/lib/server/reports/make-report';
import { sealedReport } from '../../src/lib/server/reports/pdf/sealed-report';
import { reportOrder } from '../../src/lib/server/reports/report-order';
import { keepBytes } from '../../src/lib/server/storage/store';
import { buildShipment, buildSite, buildUser, contextFor, testNow, testPassword } from './factories';

/** A load that has arrived and can be signed by QA. */
export async function arrivedDocket() {
	const site = await buildSite();
	const load = await buildShipment({ site, lines: [{}, {}], arrivedAt: testNow });
	const qa = await buildUser(['qa'], { sites: [site] });
	await Arrival.create({
		id: uuid(),
		shipmentId: load.shipment.id,
		arrivedAt: testNow,
		isSealIntact: true,
		loggedBy: qa.id,
		loggedAt: testNow
	});
	return { ...load, site, ctx: await contextFor(qa) };
}

export type ArrivedDocket = Awaited<ReturnType<typeof arrivedDocket>>;

/** Signs every line as accepted, the second time as an amendment. */
export async function signed({ ctx, shipment, lines }: ArrivedDocket): Promise<Disposition> {
	const docket = await getDocket(ctx, shipment.number);
	const isAmended = docket.signatures.length > 0;
	const { version } = await signDisposition(ctx, shipment.number, {
		lines: lines.map(({ id }) => ({ lineId: id, outcome: 'accept', condition: null, reason: null })),
		reasons: 'Cold throughout.',
		meaning: 'approval',
		password: testPassword,
		evidenceSha256: evidenceSha256(docket),
		amendmentReason: isAmended ? 'Counted again' : null,
		notify: false
	});
	return Disposition.findOne({
		where: { shipmentId: shipment.id, version: version ?? 0 },
		rejectOnEmpty: true
	});
}

/** The report of a signed version, sealed in this process as the worker does it. */
export async function sealedFor(ctx: Context, number: string, disposition: Disposition) {
	const { row: certificate, key } = await organisationCertificate(ctx);
	const { pdf } = await sealedReport({ input: await reportOrder(disposition), ...key, timestampUrl: null });
	const file = await keepBytes(pdf, 'application/pdf', testNow);
	const report = await Report.create({
		id: uuid(),
		dispositionId: disposition.id,
		shipmentId: disposition.shipmentId,
		fileId: file.id,
		fileName: reportFileName(number, disposition.version),
		certificateId: certificate.id,
		madeAt: testNow
	});
	return { report, pdf, sha256: file.sha256 };
}
