import { Gunzip } from 'fflate';
import { maxFileBytes } from '../bounds';

export type Gunzipped = { readonly bytes: Uint8Array } | { readonly fault: 'too-large' | 'broken-gzip' };

const pieceBytes = 64 * 1024;

const crcTable = Int32Array.from({ length: 256 }, (_, byte) => {
	let c = byte;
	for (let bit = 0; bit < 8; bit++) c = c & 1 ? (c >>> 1) ^ 0xedb88320 : c >>> 1;
	return c;
});

/** CRC-32 as gzip's trailer holds it. Source: RFC 1952 §8. */
export function crc32(bytes: Uint8Array): number {
	let c = -1;
	for (let i = 0; i < bytes.length; i++) {
		c = (crcTable[(c ^ (bytes[i] ?? 0)) & 0xff] ?? 0) ^ (c >>> 8);
	}
	return ~c >>> 0;
}

function trailerMatches(packed: Uint8Array, plain: Uint8Array): boolean {
	let end = packed.length;
	const view = new DataView(packed.buffer, packed.byteOffset, packed.byteLength);
	// A length that is a multiple of 256 ends in a zero byte, so padding is tried byte by byte.
	for (let padding = 0; padding <= 512 && end >= 18; padding++, end--) {
		const isMatch =
			view.getUint32(end - 4, true) === plain.length && view.getUint32(end - 8, true) === crc32(plain);
		if (isMatch) return true;
		if (packed[end - 1] !== 0) return false;
	}
	return false;
}

/** Unpacks one gzip member piece by piece, so that a small file cannot grow beyond the bound. */
export function gunzip(packed: Uint8Array): Gunzipped {
	const pieces: Uint8Array[] = [];
	let total = 0;
	const stream = new Gunzip((piece) => {
		pieces.push(piece);
		total += piece.length;
	});
	try {
		for (let at = 0; at < packed.length && total <= maxFileBytes; at += pieceBytes) {
			stream.push(packed.subarray(at, at + pieceBytes), at + pieceBytes >= packed.length);
		}
	} catch {
		// fflate throws on any malformed block; what it unpacked so far cannot be trusted.
		return { fault: 'broken-gzip' };
	}
	if (total > maxFileBytes) return { fault: 'too-large' };
	const bytes = new Uint8Array(total);
	let at = 0;
	for (const piece of pieces) {
		bytes.set(piece, at);
		at += piece.length;
	}
	return trailerMatches(packed, bytes) ? { bytes } : { fault: 'broken-gzip' };
}
