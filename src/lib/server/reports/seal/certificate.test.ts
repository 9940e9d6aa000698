import { execFileSync } from 'node:child_process';
import { X509Certificate } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { inFolder } from '../../../../../tests/helpers/pdf-tools';
import { createCertificate, loadCertificate } from './certificate';

const now = new Date('2026-04-01T00:00:00Z');
const wanted = { organisation: 'Őrség Fresh (Łódź)', country: 'HU', now, passphrase: 'a long passphrase' };

describe('the organisation’s certificate', () => {
	let made: Awaited<ReturnType<typeof createCertificate>>;
	beforeAll(async () => {
		made = await createCertificate(wanted);
	});

	it('is self-signed, of 3072 bits, for signing and nothing else', () => {
		const certificate = new X509Certificate(made.certificateDer);
		expect(certificate.verify(certificate.publicKey)).toBe(true);
		expect(certificate.ca).toBe(false);
		expect(certificate.publicKey.asymmetricKeyDetails?.modulusLength).toBe(3072);
		expect(certificate.publicKey.asymmetricKeyType).toBe('rsa');
	});

	it('names the organisation in its own letters and lasts ten years', () => {
		const certificate = new X509Certificate(made.certificatePem);
		expect(certificate.subject).toContain('O=Őrség Fresh (Łódź)');
		expect(certificate.subject).toContain('C=HU');
		expect(new Date(certificate.validFrom)).toEqual(now);
		expect(new Date(certificate.validTo)).toEqual(new Date('2036-04-01T00:00:00Z'));
	});

	it('comes back from its store with its key', () => {
		const loaded = loadCertificate(made.p12, wanted.passphrase);
		expect(Buffer.from(loaded.certificateDer)).toEqual(Buffer.from(made.certificateDer));
		expect(loaded.holder).toBe('Őrség Fresh (Łódź) receiving reports');
		expect(loaded.chainDer).toEqual([]);
	});

	it('stays shut to a wrong passphrase', () => {
		expect(() => loadCertificate(made.p12, 'guessed')).toThrow(/password/iu);
	});

	it('is refused when the store is cut short or no store at all', () => {
		expect(() => loadCertificate(made.p12.subarray(0, 400), wanted.passphrase)).toThrow();
		expect(() => loadCertificate(new Uint8Array([1, 2, 3]), wanted.passphrase)).toThrow();
	});

	it('may be replaced by a store that openssl made, with its issuer', () => {
		const p12 = inFolder((folder) => {
			const at = (name: string) => join(folder, name);
			const openssl = (...args: string[]) => execFileSync('openssl', args, { stdio: 'pipe' });
			openssl(
				'req',
				'-x509',
				'-newkey',
				'rsa:2048',
				'-nodes',
				'-keyout',
				at('ca.key'),
				'-out',
				at('ca.pem'),
				'-subj',
				'/CN=Root'
			);
			openssl(
				'req',
				'-newkey',
				'rsa:2048',
				'-nodes',
				'-keyout',
				at('own.key'),
				'-out',
				at('own.csr'),
				'-subj',
				'/CN=Seal'
			);
			openssl(
				'x509',
				'-req',
				'-in',
				at('own.csr'),
				'-CA',
				at('ca.pem'),
				'-CAkey',
				at('ca.key'),
				'-CAcreateserial',
				'-out',
				at('own.pem')
			);
			openssl(
				'pkcs12',
				'-export',
				'-inkey',
				at('own.key'),
				'-in',
				at('own.pem'),
				'-certfile',
				at('ca.pem'),
				'-passout',
				'pass:word',
				'-out',
				at('own.p12')
			);
			return readFileSync(at('own.p12'));
		});
		const loaded = loadCertificate(p12, 'word');
		expect(loaded.holder).toBe('Seal');
		expect(loaded.chainDer).toHaveLength(1);
	});
});
