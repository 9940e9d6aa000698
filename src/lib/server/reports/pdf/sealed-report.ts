import { loadCertificate } from '../seal/certificate';
import { sealPdf } from '../seal/seal-pdf';
import { stampingBy, type TimestampOutcome } from '../seal/stamping';
import type { ReportInput } from './report-input';
import { reportPdf } from './report-pdf';
import { sheetOf } from './sheet';

/** What the worker is asked: structured-cloneable, with the key still under its passphrase. */
export interface ReportOrder {
	readonly input: ReportInput;
	readonly p12: Uint8Array;
	readonly passphrase: string;
	/** Address of an RFC 3161 authority; null asks none. */
	readonly timestampUrl: string | null;
}

/** A sealed report, and what became of its timestamp. */
export interface SealedReport {
	readonly pdf: Uint8Array;
	readonly timestamp: TimestampOutcome;
}

/** Lays out the report and seals it; the field lies over the box that says who signed. */
export async function sealedReport({
	input,
	p12,
	passphrase,
	timestampUrl
}: ReportOrder): Promise<SealedReport> {
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
	const box = {
		left: sheet.stubLeft,
		top: sheet.sealTop,
		width: sheet.stubWidth,
		height: sheet.sealHeight
	};
	const { stamp, outcome } = stampingBy(timestampUrl);
	const sealed = await sealPdf(pdf, certificate, words, box, stamp);
	return { pdf: sealed, timestamp: outcome() };
}
