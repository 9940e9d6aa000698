import { generateKeyPair, randomBytes, X509Certificate } from 'node:crypto';
import { promisify } from 'node:util';
import forge from 'node-forge';

const keyBits = 3072;
const validYears = 10;
/** Rounds of the store’s key derivation; its check value is derived in plain JavaScript at every opening. */
const keyRounds = 2048;
/** id-kp-documentSigning. Source: RFC 9336. */
const documentSigning = '1.3.6.1.5.5.7.3.36';

/** A key with its certificate, ready to seal. */
export interface Certificate {
	readonly certificateDer: Uint8Array;
	/** Issuers found beside it, so that a checker can build the chain. */
	readonly chainDer: readonly Uint8Array[];
	readonly privateKeyPkcs8: Uint8Array;
	readonly certificatePem: string;
	/** Common name of the holder. */
	readonly holder: string;
	readonly notAfterAt: Date;
}

export interface NewCertificate {
	readonly organisation: string;
	/** ISO 3166-1 alpha-2. */
	readonly country: string;
	readonly now: Date;
	readonly passphrase: string;
}

/** A self-signed certificate of the organisation's own with its key, as PKCS#12; made once, at first start. */
export async function createCertificate(wanted: NewCertificate): Promise<{
	readonly p12: Uint8Array;
	readonly certificatePem: string;
	readonly certificateDer: Uint8Array;
}> {
	const pair = await promisify(generateKeyPair)('rsa', {
		modulusLength: keyBits,
		publicKeyEncoding: { type: 'spki', format: 'pem' },
		privateKeyEncoding: { type: 'pkcs8', format: 'pem' }
	});
	const privateKey = forge.pki.privateKeyFromPem(pair.privateKey);
	const certificate = selfSigned(wanted, forge.pki.publicKeyFromPem(pair.publicKey));
	certificate.sign(privateKey, forge.md.sha256.create());
	return {
		p12: storeBytes(privateKey, [certificate], wanted.passphrase),
		certificatePem: forge.pki.certificateToPem(certificate),
		certificateDer: derOf(certificate)
	};
}

/** A key with its certificates as a PKCS#12 store under a passphrase. */
export function storeBytes(
	key: forge.pki.rsa.PrivateKey,
	certificates: forge.pki.Certificate[],
	passphrase: string
): Uint8Array {
	const store = forge.pkcs12.toPkcs12Asn1(key, certificates, passphrase, {
		algorithm: 'aes256',
		count: keyRounds,
		friendlyName: 'report seal'
	});
	return bytesOf(forge.asn1.toDer(store).getBytes());
}

function selfSigned(
	{ organisation, country, now }: NewCertificate,
	publicKey: forge.pki.PublicKey
): forge.pki.Certificate {
	const certificate = forge.pki.createCertificate();
	certificate.publicKey = publicKey;
	// A leading 0x40 keeps the number positive and of full length.
	certificate.serialNumber = `40${randomBytes(15).toString('hex')}`;
	certificate.validity.notBefore = now;
	certificate.validity.notAfter = new Date(
		Date.UTC(now.getUTCFullYear() + validYears, now.getUTCMonth(), now.getUTCDate())
	);
	const utf8 = forge.asn1.Type.UTF8;
	const subject = [
		{ name: 'commonName', value: `${organisation.slice(0, 40)} receiving reports`, valueTagClass: utf8 },
		{ name: 'organizationName', value: organisation.slice(0, 64), valueTagClass: utf8 },
		{ name: 'countryName', value: country }
	];
	certificate.setSubject(subject as forge.pki.CertificateField[]);
	certificate.setIssuer(subject as forge.pki.CertificateField[]);
	certificate.setExtensions([
		{ name: 'basicConstraints', cA: false, critical: true },
		{ name: 'keyUsage', digitalSignature: true, nonRepudiation: true, critical: true },
		{ name: 'extKeyUsage', [documentSigning]: true, emailProtection: true },
		{ name: 'subjectKeyIdentifier' }
	]);
	return certificate;
}

/** Opens a PKCS#12 store, ours or one that replaced it; throws where passphrase or content do not serve. */
export function loadCertificate(p12: Uint8Array, passphrase: string): Certificate {
	const store = forge.pkcs12.pkcs12FromAsn1(
		forge.asn1.fromDer(Buffer.from(p12).toString('binary')),
		passphrase
	);
	const keyBag = [forge.pki.oids.pkcs8ShroudedKeyBag, forge.pki.oids.keyBag].flatMap((type) =>
		type === undefined ? [] : (store.getBags({ bagType: type })[type] ?? [])
	)[0];
	const certBag = forge.pki.oids.certBag ?? '';
	const certificates = (store.getBags({ bagType: certBag })[certBag] ?? []).flatMap((bag) =>
		bag.cert === undefined ? [] : [bag.cert]
	);
	const key = keyBag?.key;
	if (key === undefined || key === null) throw new Error('The certificate store holds no RSA private key');
	const modulus = (key as forge.pki.rsa.PrivateKey).n;
	const own = certificates.find((certificate) =>
		(certificate.publicKey as forge.pki.rsa.PublicKey).n.equals(modulus)
	);
	if (own === undefined) throw new Error('The certificate store holds no certificate of its key');
	return {
		certificateDer: derOf(own),
		chainDer: certificates.filter((certificate) => certificate !== own).map(derOf),
		privateKeyPkcs8: bytesOf(
			forge.asn1.toDer(forge.pki.wrapRsaPrivateKey(forge.pki.privateKeyToAsn1(key))).getBytes()
		),
		certificatePem: forge.pki.certificateToPem(own),
		holder: commonName(derOf(own)),
		notAfterAt: own.validity.notAfter
	};
}

/** Read by OpenSSL, which knows each string type's letters. */
function commonName(der: Uint8Array): string {
	return /^CN=(.*)$/mu.exec(new X509Certificate(der).subject)?.[1] ?? '';
}

function derOf(certificate: forge.pki.Certificate): Uint8Array {
	return bytesOf(forge.asn1.toDer(forge.pki.certificateToAsn1(certificate)).getBytes());
}

function bytesOf(binary: string): Uint8Array {
	return new Uint8Array(Buffer.from(binary, 'binary'));
}
