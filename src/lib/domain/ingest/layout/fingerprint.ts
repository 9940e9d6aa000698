import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import { foldWord } from '../times/month-names';

/** The same for every file of one make: kind, delimiter and column heads, not their figures. */
export function layoutFingerprint(kind: string, delimiter: string | null, header: readonly string[]): string {
	const words = header.map((cell) => foldWord(cell.trim()).replace(/\s+/g, ' '));
	const text = JSON.stringify([kind, delimiter, words]);
	return bytesToHex(sha256(utf8ToBytes(text))).slice(0, 16);
}
