import { SignPdf } from '@signpdf/signpdf';
import { Signer } from '@signpdf/utils';
import { PDFDocument } from 'pdf-lib';
import type { Certificate } from './certificate';
import { detachedCms, type Stamp } from './cms';
import { addSignatureField, type SealBox, type SealWords } from './signature-field';

class CmsSigner extends Signer {
	constructor(
		private readonly certificate: Certificate,
		private readonly stamp: Stamp | null
	) {
		super();
	}

	override async sign(content: Buffer): Promise<Buffer> {
		return Buffer.from(await detachedCms(content, this.certificate, this.stamp));
	}
}

/** The same report with a PAdES signature by the organisation's certificate over every byte of it. */
export async function sealPdf(
	pdf: Uint8Array,
	certificate: Certificate,
	words: SealWords,
	box: SealBox | null = null,
	stamp: Stamp | null = null
): Promise<Uint8Array> {
	// Metadata stays as the layout wrote it: PDF/A wants it to agree with the XMP packet.
	const document = await PDFDocument.load(pdf, { updateMetadata: false });
	addSignatureField(document, words, box);
	const prepared = await document.save({
		useObjectStreams: false,
		addDefaultPage: false,
		updateFieldAppearances: false
	});
	const sealed = await new SignPdf().sign(Buffer.from(prepared), new CmsSigner(certificate, stamp));
	return new Uint8Array(sealed);
}
