import type { RefusalCode } from '../ingestion';

interface Signature {
	readonly code: RefusalCode;
	readonly found: string;
	readonly at: number;
	readonly bytes: readonly number[];
}

const ascii = (text: string): number[] => [...text].map((letter) => letter.charCodeAt(0));

/** First bytes of what people upload by mistake. Source: each format's own specification. */
const signatures: readonly Signature[] = [
	{ code: 'pdf', found: 'PDF', at: 0, bytes: ascii('%PDF-') },
	{ code: 'spreadsheet', found: 'XLS', at: 0, bytes: [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1] },
	// Workbooks from before they were put into compound files begin with their first record.
	{ code: 'spreadsheet', found: 'XLS', at: 0, bytes: [0x09, 0x08, 0x10, 0x00, 0x00, 0x06] },
	{ code: 'spreadsheet', found: 'XLS', at: 0, bytes: [0x09, 0x08, 0x08, 0x00, 0x00, 0x05] },
	{ code: 'spreadsheet', found: 'XLS', at: 0, bytes: [0x09, 0x04, 0x06, 0x00, 0x00, 0x00] },
	{ code: 'spreadsheet', found: 'XLS', at: 0, bytes: [0x09, 0x02, 0x06, 0x00, 0x00, 0x00] },
	{ code: 'image', found: 'PNG', at: 0, bytes: [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a] },
	{ code: 'image', found: 'JPEG', at: 0, bytes: [0xff, 0xd8, 0xff] },
	{ code: 'image', found: 'GIF', at: 0, bytes: ascii('GIF8') },
	{ code: 'image', found: 'TIFF', at: 0, bytes: [0x49, 0x49, 0x2a, 0x00] },
	{ code: 'image', found: 'TIFF', at: 0, bytes: [0x4d, 0x4d, 0x00, 0x2a] },
	{ code: 'image', found: 'WebP', at: 8, bytes: ascii('WEBP') },
	{ code: 'image', found: 'HEIC', at: 4, bytes: ascii('ftyphei') },
	{ code: 'image', found: 'HEIC', at: 4, bytes: ascii('ftypmif1') },
	{ code: 'image', found: 'AVIF', at: 4, bytes: ascii('ftypavif') },
	{ code: 'zip', found: '7z', at: 0, bytes: [0x37, 0x7a, 0xbc, 0xaf, 0x27, 0x1c] },
	{ code: 'zip', found: 'RAR', at: 0, bytes: ascii('Rar!\u001a\u0007') },
	{ code: 'zip', found: 'bzip2', at: 4, bytes: [0x31, 0x41, 0x59, 0x26, 0x53, 0x59] },
	{ code: 'zip', found: 'xz', at: 0, bytes: [0xfd, 0x37, 0x7a, 0x58, 0x5a, 0x00] },
	{ code: 'zip', found: 'Zstandard', at: 0, bytes: [0x28, 0xb5, 0x2f, 0xfd] },
	{ code: 'zip', found: 'tar', at: 257, bytes: ascii('ustar') },
	{ code: 'binary', found: 'program', at: 0, bytes: [0x7f, 0x45, 0x4c, 0x46] },
	{ code: 'binary', found: 'program', at: 0, bytes: [0x4d, 0x5a, 0x90, 0x00] },
	{ code: 'binary', found: 'database', at: 0, bytes: ascii('SQLite format 3\0') }
];

function hasBytes(bytes: Uint8Array, at: number, wanted: readonly number[]): boolean {
	return bytes.length >= at + wanted.length && wanted.every((byte, i) => bytes[at + i] === byte);
}

function holds(bytes: Uint8Array, text: string, withinBytes: number): boolean {
	const wanted = ascii(text);
	const end = Math.min(bytes.length, withinBytes) - wanted.length;
	for (let at = 0; at <= end; at++) if (hasBytes(bytes, at, wanted)) return true;
	return false;
}

/** Office files are ZIP archives: their first entries, and the list of all at the end, name the parts. */
function archiveKindOf(bytes: Uint8Array): { code: RefusalCode; found: string } {
	const ends = [bytes.subarray(0, 8192), bytes.subarray(-16_384)];
	const names = (entry: string): boolean => ends.some((end) => holds(end, entry, end.length));
	if (names('opendocument.spreadsheet')) return { code: 'spreadsheet', found: 'ODS' };
	if (names('word/') || names('ppt/') || names('opendocument.text'))
		return { code: 'binary', found: 'document' };
	if (names('xl/') || names('[Content_Types].xml')) return { code: 'spreadsheet', found: 'XLSX' };
	return names('Index/Tables/') ? { code: 'spreadsheet', found: 'Numbers' } : { code: 'zip', found: 'ZIP' };
}

/** A bitmap's head holds its size and two reserved zeros. Source: BITMAPFILEHEADER. */
const isBitmap = (bytes: Uint8Array): boolean =>
	hasBytes(bytes, 0, ascii('BM')) && hasBytes(bytes, 6, [0, 0, 0, 0]) && hasBytes(bytes, 11, [0, 0, 0]);

/** Readers of PDF look for its mark in the first kilobyte; only what may stand before a text is skipped here. */
function isLatePdf(bytes: Uint8Array): boolean {
	let at = 0;
	while (at < 1024 && [9, 10, 13, 32, 0xef, 0xbb, 0xbf].includes(bytes[at] ?? 0)) at++;
	return at > 0 && hasBytes(bytes, at, ascii('%PDF-'));
}

/** A file that is plainly something else than text, named; null when it may be text. */
export function foreignKindOf(bytes: Uint8Array): { code: RefusalCode; found: string } | null {
	if (hasBytes(bytes, 0, [0x50, 0x4b, 0x03, 0x04]) || hasBytes(bytes, 0, [0x50, 0x4b, 0x05, 0x06]))
		return archiveKindOf(bytes);
	if (isBitmap(bytes)) return { code: 'image', found: 'BMP' };
	if (isLatePdf(bytes)) return { code: 'pdf', found: 'PDF' };
	const hit = signatures.find((signature) => hasBytes(bytes, signature.at, signature.bytes));
	return hit === undefined ? null : { code: hit.code, found: hit.found };
}

const webTags =
	/^(?:<!--.*?-->\s*)*<(?:!doctype html|(?:html|head|body|table|script|meta|title|style|div|form|p|br|h1)\b)/s;

/** Text that is a web page, or a spreadsheet, picture or document written in letters. */
export function foreignTextOf(text: string): { code: RefusalCode; found: string } | null {
	const head = text
		.slice(0, 4096)
		.replace(/^[\s\ufeff]+/, '')
		.toLowerCase();
	if (webTags.test(head)) return { code: 'html', found: 'HTML' };
	if (head.startsWith('mime-version:') && head.includes('text/html')) return { code: 'html', found: 'HTML' };
	if (!head.startsWith('<?xml') && !/^<(?:!doctype\s|[a-z][\w:-]*[\s>/])/.test(head))
		return head.startsWith('{\\rtf') ? { code: 'binary', found: 'RTF' } : null;
	if (/excel\.sheet|office:spreadsheet|opendocument\.spreadsheet/.test(head))
		return { code: 'spreadsheet', found: 'XML' };
	if (head.includes('<html')) return { code: 'html', found: 'HTML' };
	return /<svg[\s>]/.test(head) ? { code: 'image', found: 'SVG' } : { code: 'xml', found: 'XML' };
}
