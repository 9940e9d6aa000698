import { sha256Hex } from '../storage/sha256';

/** A layout's name as its column holds it, whatever length the reader's own name has. */
export function fingerprintColumn(fingerprint: string): string {
	return /^[0-9a-f]{64}$/.test(fingerprint) ? fingerprint : sha256Hex(fingerprint);
}
