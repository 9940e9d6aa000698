import { createHash } from 'node:crypto';

/** SHA-256 of text (as UTF-8) or bytes, lower-case hex. */
export function sha256Hex(content: string | Uint8Array): string {
	return createHash('sha256').update(content).digest('hex');
}
