import { maxFileBytes } from '../bounds';
import type { RefusalCode } from '../ingestion';
import { foreignKindOf, foreignTextOf } from './file-kind';
import { gunzip } from './gunzip';
import { decodeText, type DecodedText } from './text-encoding';

export type Decoded = DecodedText | { readonly code: RefusalCode; readonly found: string | null };

/** Share of control characters above which bytes are no text: random bytes have over 10 %. */
const controlFraction = 0.01;

/** Begins each value of a JSON text sequence. Source: RFC 7464 §2.2. */
const recordSeparator = 0x1e;

function isMostlyText(text: string): boolean {
	let controls = 0;
	const end = Math.min(text.length, 65_536);
	for (let i = 0; i < end; i++) {
		const code = text.charCodeAt(i);
		if (
			(code < 32 && (code < 9 || code > 13) && code !== recordSeparator) ||
			code === 0xfffd ||
			(code >= 0x7f && code < 0xa0)
		)
			controls++;
	}
	return controls <= Math.max(2, end * controlFraction);
}

/** Bytes of an upload to text, or the name of what they are instead. */
export function decodeBytes(bytes: Uint8Array): Decoded {
	if (bytes.length === 0) return { code: 'empty', found: null };
	if (bytes.length > maxFileBytes) return { code: 'too-large', found: String(bytes.length) };
	if (bytes[0] === 0x1f && bytes[1] === 0x8b) {
		const plain = gunzip(bytes);
		if ('fault' in plain) return { code: plain.fault, found: 'gzip' };
		if (plain.bytes[0] === 0x1f && plain.bytes[1] === 0x8b) return { code: 'zip', found: 'gzip' };
		return plain.bytes.length === 0 ? { code: 'empty', found: null } : decodePlain(plain.bytes);
	}
	return decodePlain(bytes);
}

function decodePlain(bytes: Uint8Array): Decoded {
	const foreign = foreignKindOf(bytes);
	if (foreign !== null) return foreign;
	const { text: raw, encoding } = decodeText(bytes);
	// Some loggers pad their memory with NUL; DOS programs end a file with SUB.
	// eslint-disable-next-line no-control-regex
	const text = raw.includes('\0') || raw.endsWith('\u001a') ? raw.replace(/\0|\u001a+$/g, '') : raw;
	if (text.trim() === '') return { code: 'empty', found: null };
	if (!isMostlyText(text) || text.length < raw.length / 2) return { code: 'binary', found: null };
	return foreignTextOf(text) ?? { text, encoding };
}
