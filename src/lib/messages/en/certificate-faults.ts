/** What is wrong with an uploaded certificate file, and what to do. */
export const certificateFaultText = {
	'not-a-store': 'This is not a PKCS#12 file. Export key and certificate together, as .p12 or .pfx.',
	'wrong-password': 'The password does not open this file. Nothing was changed.',
	'no-key': 'There is no private key in this file. Export it with its key.',
	'not-rsa': 'The key is not an RSA key. Reports are sealed with RSA, 2048 bits or more.',
	'key-too-short': 'The key is shorter than 2048 bits. Ask the issuer for a longer one.',
	'no-certificate': 'None of the certificates in this file belongs to its key.',
	'is-authority': 'This is the certificate of an authority. Sealing needs one that signs documents.',
	'wrong-usage':
		'This certificate is not for signing documents. Its key usage must name digital signature or non-repudiation, and its purposes, where it has any, documents or e-mail.',
	'not-yet-valid': 'This certificate is not valid yet. Upload it on the day it begins.',
	expired: 'This certificate has ended. Ask the issuer for a new one.'
} as const;
