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
	{ code: 'image', found: 'PNG', at: 0, bytes: [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a] },
	{ code: 'image', found: 'JPEG', at: 0, bytes: [0xff, 0xd8, 0xff] },
	{ code: 'image', found: 'GIF', at: 0, bytes: ascii('GIF8') },
	{ code: 'image', found: 'TIFF', at: 0, bytes: [0x49, 0x49, 0x2a, 0x00] },
	{ code: 'image', found: 'TIFF', at: 0, bytes: [0x4d, 0x4d, 0x00, 0x2a] },
	{ code: 'image', found: 'WebP', at: 8, bytes: ascii('WEBP') },
	{ code: 'image', found: 'HEIC', at: 4, bytes: ascii('ftyphei') },
	{ code: 'image', found: 'HEIC', at: 4, bytes: ascii('ftypmif1') },
	{ code: 'zip', found: '7z', at: 0, bytes: [0x37, 0x7a, 0xbc, 0xaf, 0x27, 0x1c] },
	{ code: 'zip', found: 'RAR', at: 0, bytes: ascii('Rar!\u001a\u0007') },
	{ code: 'binary', found: 'program', at: 0, bytes: [0x7f, 0x45, 0x4c, 0x46] }
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

/** A file that is plainly something else than text, named; null when it may be text. */
export function foreignKindOf(bytes: Uint8Array): { code: RefusalCode; found: string } | null {
	if (hasBytes(bytes, 0, [0x50, 0x4b, 0x03, 0x04]) || hasBytes(bytes, 0, [0x50, 0x4b, 0x05, 0x06])) {
		// Office files are ZIP archives; their first entries name the parts.
		if (holds(bytes, 'opendocument.spreadsheet', 256)) return { code: 'spreadsheet', found: 'ODS' };
		const isOffice = holds(bytes, 'xl/', 8192) || holds(bytes, '[Content_Types].xml', 8192);
		return isOffice ? { code: 'spreadsheet', found: 'XLSX' } : { code: 'zip', found: 'ZIP' };
	}
	const hit = signatures.find((signature) => hasBytes(bytes, signature.at, signature.bytes));
	return hit === undefined ? null : { code: hit.code, found: hit.found };
}

/** Text that is a web page, or a spreadsheet or document written as XML. */
export function foreignTextOf(text: string): { code: RefusalCode; found: string } | null {
	const head = text.slice(0, 2048).trimStart().toLowerCase();
	if (/^(<!--.*?-->\s*)?(<!doctype html|<html|<head|<body|<table)/s.test(head))
		return { code: 'html', found: 'HTML' };
	if (!head.startsWith('<?xml') && !/^<[a-z][\w:-]*[\s>]/.test(head)) {
		return head.startsWith('{\\rtf') ? { code: 'binary', found: 'RTF' } : null;
	}
	if (head.includes('excel.sheet') || head.includes('office:spreadsheet'))
		return { code: 'spreadsheet', found: 'XML' };
	if (head.includes('<html')) return { code: 'html', found: 'HTML' };
	return { code: 'xml', found: 'XML' };
}
