import { z } from 'zod';

/** A store with a long chain of issuers weighs a tenth of this. */
const bytesAtMost = 200_000;

/** A certificate with its key, as PKCS#12; the password opens it once. */
export const certificateForm = z.object({
	store: z
		.file('Choose the file with key and certificate, .p12 or .pfx.')
		.min(1, 'Choose the file with key and certificate, .p12 or .pfx.')
		.max(bytesAtMost, 'This file is too large to be a certificate. Choose the .p12 or .pfx file.'),
	password: z.string().max(1000, 'This password is too long.').default('')
});
