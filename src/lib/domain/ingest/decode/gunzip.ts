import { Gunzip } from 'fflate';
import { maxFileBytes } from '../bounds';

export type Gunzipped =
	{ readonly bytes: Uint8Array } | { readonly fault: 'too-large' | 'broken-gzip' | 'truncated' };

/** A piece of this size unpacks to 1 MB at most: deflate packs no tighter than 1032 to 1. */
const pieceBytes = 1024;

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
	if (packed.length < 18) return false;
	const view = new DataView(packed.buffer, packed.byteOffset, packed.byteLength);
	const [checksum, length] = [
		view.getUint32(packed.length - 8, true),
		view.getUint32(packed.length - 4, true)
	];
	return length === plain.length && checksum === crc32(plain);
}

/** Whether the file ends inside its own checksum and length: all is there but some of those eight bytes. */
function isTrailerCut(packed: Uint8Array, plain: Uint8Array): boolean {
	const trailer = new Uint8Array(8);
	const view = new DataView(trailer.buffer);
	view.setUint32(0, crc32(plain), true);
	view.setUint32(4, plain.length, true);
	for (let kept = 7; kept >= 3; kept--) {
		const tail = packed.subarray(packed.length - kept);
		if (tail.every((byte, i) => byte === trailer[i])) return true;
	}
	return false;
}

/** fflate's code for an end inside a block. */
const unexpectedEnd = 0;

function isCutShort(error: unknown): boolean {
	return error instanceof Error && 'code' in error && error.code === unexpectedEnd;
}

function unpack(packed: Uint8Array): Gunzipped {
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
	} catch (error) {
		// fflate throws on any malformed block; what it unpacked so far cannot be trusted.
		return { fault: isCutShort(error) ? 'truncated' : 'broken-gzip' };
	}
	if (total > maxFileBytes) return { fault: 'too-large' };
	const bytes = new Uint8Array(total);
	let at = 0;
	for (const piece of pieces) {
		bytes.set(piece, at);
		at += piece.length;
	}
	if (trailerMatches(packed, bytes)) return { bytes };
	return { fault: isTrailerCut(packed, bytes) ? 'truncated' : 'broken-gzip' };
}

/** Unpacks one gzip member piece by piece, so that a small file cannot grow beyond the bound. Zeros may pad it. */
export function gunzip(packed: Uint8Array): Gunzipped {
	const whole = unpack(packed);
	if (!('fault' in whole) || whole.fault === 'too-large') return whole;
	let end = packed.length;
	while (end > 0 && packed[end - 1] === 0) end--;
	// The length in the trailer may itself end in up to four zeros: they are not padding.
	for (let own = 0; own <= 4 && end + own < packed.length; own++) {
		const bare = unpack(packed.subarray(0, end + own));
		if (!('fault' in bare)) return bare;
	}
	return whole;
}
