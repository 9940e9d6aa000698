import { loadCertificate } from '../seal/certificate';
import { sealPdf } from '../seal/seal-pdf';
import type { ReportInput } from './report-input';
import { reportPdf } from './report-pdf';
import { sheetOf } from './sheet';

/** What the worker is asked: structured-cloneable, with the key still under its passphrase. */
export interface ReportOrder {
	readonly input: ReportInput;
	readonly p12: Uint8Array;
	readonly passphrase: string;
}

/** Lays out the report and seals it; the field lies over the box that says who signed. */
export async function sealedReport({ input, p12, passphrase }: ReportOrder): Promise<Uint8Array> {
	const certificate = loadCertificate(p12, passphrase);
	const { signature, frozen } = input;
	const sheet = sheetOf(input.pageSize);
	const pdf = await reportPdf(input);
	const words = {
		reason: `Receiving report ${frozen.docket.number}, version ${signature.version}: ${signature.meaning} by ${signature.signedBy}`,
		location: frozen.docket.site.name,
		name: input.organisation,
		signedAt: new Date(signature.signedAt)
	};
	return sealPdf(pdf, certificate, words, {
		left: sheet.stubLeft,
		top: sheet.sealTop,
		width: sheet.stubWidth,
		height: sheet.sealHeight
	});
}
