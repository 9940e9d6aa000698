import { DEFAULT_BYTE_RANGE_PLACEHOLDER, SUBFILTER_ETSI_CADES_DETACHED } from '@signpdf/utils';
import { PDFArray, PDFDict, PDFDocument, PDFHexString, PDFName, PDFNumber, PDFString } from 'pdf-lib';

export interface SealWords {
	readonly reason: string;
	readonly location: string;
	readonly name: string;
	readonly signedAt: Date;
}

/** Where the field lies on page one, in points from the page's top left corner. */
export interface SealBox {
	readonly left: number;
	readonly top: number;
	readonly width: number;
	readonly height: number;
}

/** Room for the signature with a chain of certificates and a timestamp with its own, in bytes. */
const signatureBytes = 18_432;
const printFlag = 4;
/** SignaturesExist and AppendOnly. Source: ISO 32000-1, table 219. */
const signatureFlags = 3;

/**
 * Adds the signature field with room for the signature. All words go in as UTF-16 hex strings: a name with a bracket or
 * an ő would break a literal one. The box on paper is drawn by the layout; the field over it is clear.
 */
export function addSignatureField(document: PDFDocument, words: SealWords, box: SealBox | null): void {
	const { context, catalog } = document;
	const page = document.getPage(0);
	const range = PDFArray.withContext(context);
	range.push(PDFNumber.of(0));
	for (let i = 0; i < 3; i++) range.push(PDFName.of(DEFAULT_BYTE_RANGE_PLACEHOLDER));
	const signature = context.obj({
		Type: 'Sig',
		Filter: 'Adobe.PPKLite',
		SubFilter: SUBFILTER_ETSI_CADES_DETACHED,
		ByteRange: range,
		Contents: PDFHexString.of('00'.repeat(signatureBytes)),
		Reason: PDFHexString.fromText(words.reason),
		Location: PDFHexString.fromText(words.location),
		Name: PDFHexString.fromText(words.name),
		M: PDFString.fromDate(words.signedAt)
	});
	const rect = rectangle(box, page.getHeight());
	const clear = context.formXObject([], { BBox: [0, 0, box?.width ?? 0, box?.height ?? 0], Resources: {} });
	const field = context.register(
		context.obj({
			Type: 'Annot',
			Subtype: 'Widget',
			FT: 'Sig',
			T: PDFString.of('Seal'),
			TU: PDFHexString.fromText('Seal of the organisation'),
			Rect: rect,
			F: printFlag,
			P: page.ref,
			V: context.register(signature),
			AP: { N: context.register(clear) }
		})
	);
	page.node.addAnnot(field);
	const form = catalog.lookupMaybe(PDFName.of('AcroForm'), PDFDict);
	if (form !== undefined)
		throw new Error('The report already has a form: it is sealed, or was not made here');
	catalog.set(
		PDFName.of('AcroForm'),
		context.register(context.obj({ Fields: [field], SigFlags: signatureFlags }))
	);
}

function rectangle(box: SealBox | null, pageHeight: number): number[] {
	if (box === null) return [0, 0, 0, 0];
	const top = pageHeight - box.top;
	return [box.left, top - box.height, box.left + box.width, top];
}
