import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from 'node:crypto';
import { env } from '../../env';

/** AES-256-GCM under a key of this installation: a copy of the database alone gives no codes. */
const algorithm = 'aes-256-gcm';

function key(): Buffer {
	return Buffer.from(hkdfSync('sha256', env().authSecret, '', 'second factor', 32));
}

/** The secret as it is stored: nonce, tag and text in one. */
export function sealSecret(secret: string): string {
	const nonce = randomBytes(12);
	const cipher = createCipheriv(algorithm, key(), nonce);
	const text = Buffer.concat([cipher.update(secret, 'utf8'), cipher.final()]);
	return Buffer.concat([nonce, cipher.getAuthTag(), text]).toString('base64url');
}

/** The secret again. Throws when it was sealed by another installation, or was touched. */
export function openSecret(sealed: string): string {
	const bytes = Buffer.from(sealed, 'base64url');
	const decipher = createDecipheriv(algorithm, key(), bytes.subarray(0, 12));
	decipher.setAuthTag(bytes.subarray(12, 28));
	return Buffer.concat([decipher.update(bytes.subarray(28)), decipher.final()]).toString('utf8');
}
