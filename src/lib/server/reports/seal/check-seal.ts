import { createHash } from 'node:crypto';
import { Certificate as X509 } from 'pkijs';
import { checkSigner, readSignedData, type SignerCheck } from './signed-data';
import { assembled, timestampToken } from './cms';
import { readTimestamp } from './timestamp';

/** What is wrong with a sealed file, in the order it is looked for. */
export type SealFault =
	| 'not-sealed'
	/** Bytes stand behind or between what the seal covers: a later revision, or another signature. */
	| 'appended'
	| 'cut-short'
	| 'malformed'
	/** A covered byte is not what it was. */
	| 'changed'
	/** The signature is not by the key of the certificate it names. */
	| 'forged'
	/** Signed rightly, but by a certificate that was never this organisation's. */
	| 'other-certificate'
	| 'timestamp-wrong';

export interface SealCheck {
	readonly fault: SealFault | null;
	readonly certificateSha256: string | null;
	/** When an authority saw the signature; null where none was asked. */
	readonly timestampAt: string | null;
}

interface Sealed {
	readonly content: Uint8Array;
	readonly cms: Buffer;
}

/** Checks a sealed report without any other program; `known` are the SHA-256 of the organisation's certificates. */
export function checkSeal(pdf: Uint8Array, known: ReadonlySet<string>): SealCheck {
	const sealed = sealedParts(pdf);
	if (typeof sealed === 'string') return faulty(sealed);
	const check = signerOf(sealed);
	if (check === null) return faulty('malformed');
	const certificateSha256 = createHash('sha256').update(check.certificate.raw).digest('hex');
	const found = { certificateSha256, timestampAt: null };
	if (!check.isContentSame) return { fault: 'changed', ...found };
	if (!check.isSignatureRight) return { fault: 'forged', ...found };
	if (!known.has(certificateSha256)) return { fault: 'other-certificate', ...found };
	if (!isAsMadeHere(sealed.cms)) return { fault: 'malformed', ...found };
	return { ...found, ...timestampOf(check) };
}

/** Null for whatever the readers stumble over: it is not one that was made here. */
function signerOf({ cms, content }: Sealed): SignerCheck | null {
	try {
		return checkSigner(readSignedData(cms), content);
	} catch {
		return null;
	}
}

/** What of a CMS no signature covers must be as we write it, so that no byte of a report can change unseen. */
function isAsMadeHere(cms: Buffer): boolean {
	const { signerInfos, certificates = [] } = readSignedData(cms);
	const [signer] = signerInfos;
	const all = certificates.filter((one) => one instanceof X509);
	const [own] = all;
	if (!signer || !own) return false;
	const again = assembled({
		own,
		certificates: all,
		attributes: signer.signedAttrs?.attributes ?? [],
		signature: new Uint8Array(signer.signature.getValue()),
		token: timestampToken(signer.unsignedAttrs?.attributes ?? [])
	});
	return Buffer.from(again).equals(cms);
}

function faulty(fault: SealFault): SealCheck {
	return { fault, certificateSha256: null, timestampAt: null };
}

function timestampOf(check: SignerCheck): Pick<SealCheck, 'fault' | 'timestampAt'> {
	const token = timestampToken(check.unsigned);
	if (token === null) return { fault: null, timestampAt: null };
	try {
		return { fault: null, timestampAt: readTimestamp(token, check.signature).at.toISOString() };
	} catch {
		return { fault: 'timestamp-wrong', timestampAt: null };
	}
}

const byteRange = /\/ByteRange\s*\[\s*(\d+)\s+(\d+)\s+(\d+)\s+(\d+)\s*\]/gu;
const contents = '/Contents ';

/** Ranges that leave out the contents of a signature; words of a file that speak of ranges are none. */
function rangesIn(bytes: Buffer): { before: number; after: number; end: number }[] {
	return [...bytes.toString('latin1').matchAll(byteRange)].flatMap((match) => {
		const [from = 0, before = 0, after = 0, rest = 0] = match.slice(1).map(Number);
		const lead = bytes.subarray(Math.max(before - contents.length, 0), before).toString('latin1');
		const isGap = from === 0 && after > before + 1 && lead === contents && bytes[before] === 0x3c;
		return isGap ? [{ before, after, end: after + rest }] : [];
	});
}

/** One signature whose ranges leave out nothing but itself. */
function sealedParts(pdf: Uint8Array): Sealed | SealFault {
	const bytes = Buffer.from(pdf.buffer, pdf.byteOffset, pdf.byteLength);
	const ranges = rangesIn(bytes);
	const [range] = ranges;
	if (!range) return 'not-sealed';
	const { before, after, end } = range;
	if (ranges.length > 1 || end < bytes.length) return 'appended';
	if (end > bytes.length) return 'cut-short';
	const hex = bytes.subarray(before + 1, after - 1).toString('latin1');
	if (bytes[after - 1] !== 0x3e || !/^(?:[0-9a-f]{2})+$/u.test(hex)) return 'malformed';
	const padded = Buffer.from(hex, 'hex');
	const cms = withoutPadding(padded);
	if (padded.subarray(cms.length).some((byte) => byte !== 0)) return 'malformed';
	return { content: Buffer.concat([bytes.subarray(0, before), bytes.subarray(after)]), cms };
}

/** The room for the signature is filled up with zeros; DER says its own length. */
function withoutPadding(padded: Buffer): Buffer {
	const octets = (padded[1] ?? 0) & 0x7f;
	const isLong = ((padded[1] ?? 0) & 0x80) !== 0;
	if (!isLong || octets === 0 || octets > 4 || padded.length < 2 + octets) return padded;
	return padded.subarray(0, 2 + octets + padded.readUIntBE(2, octets));
}
