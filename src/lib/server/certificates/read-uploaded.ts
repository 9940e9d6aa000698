import { X509Certificate } from 'node:crypto';
import forge from 'node-forge';

/** Why a PKCS#12 file cannot seal reports. */
export type StoreFault =
	| 'not-a-store'
	| 'wrong-password'
	| 'no-key'
	| 'not-rsa'
	| 'key-too-short'
	| 'no-certificate'
	| 'is-authority'
	| 'wrong-usage'
	| 'not-yet-valid'
	| 'expired';

/** A store that was opened and found fit: its key with the certificate of that key, and any issuers beside it. */
export interface FitStore {
	readonly key: forge.pki.rsa.PrivateKey;
	readonly own: forge.pki.Certificate;
	readonly chain: readonly forge.pki.Certificate[];
}

const leastBits = 2048;
/** Purposes that speak of documents or of persons' signatures. Sources: RFC 9336, RFC 5280 4.2.1.12, vendors' registers. */
const fitPurposes = [
	'1.3.6.1.5.5.7.3.36',
	'1.3.6.1.5.5.7.3.4',
	'1.2.840.113583.1.1.5',
	'1.3.6.1.4.1.311.10.3.12',
	'2.5.29.37.0'
];

/** Opens an uploaded PKCS#12 file and says what is wrong with it, the first fault first. */
export function readUploadedStore(p12: Uint8Array, password: string, now: Date): FitStore | StoreFault {
	const store = opened(p12, password);
	if (typeof store === 'string') return store;
	const bags = [forge.pki.oids.pkcs8ShroudedKeyBag, forge.pki.oids.keyBag].flatMap((type) =>
		type === undefined ? [] : (store.getBags({ bagType: type })[type] ?? [])
	);
	const [bag] = bags;
	if (!bag) return 'no-key';
	// The reader knows RSA alone: a key of another kind comes back as null.
	if (!bag.key) return 'not-rsa';
	const key = bag.key as forge.pki.rsa.PrivateKey;
	if (key.n.bitLength() < leastBits) return 'key-too-short';
	const certificates = certificatesIn(store);
	const own = certificates.find((one) => (one.publicKey as forge.pki.rsa.PublicKey).n.equals(key.n));
	if (!own) return 'no-certificate';
	return faultOf(own, now) ?? { key, own, chain: certificates.filter((certificate) => certificate !== own) };
}

function opened(p12: Uint8Array, password: string): forge.pkcs12.Pkcs12Pfx | StoreFault {
	const parsed = () => forge.asn1.fromDer(Buffer.from(p12).toString('binary'));
	try {
		return forge.pkcs12.pkcs12FromAsn1(parsed(), password);
	} catch (error) {
		if (error instanceof Error && /password/iu.test(error.message)) return 'wrong-password';
	}
	try {
		return forge.pkcs12.pkcs12FromAsn1(withoutMac(parsed()), forge.util.encodeUtf8(password));
	} catch {
		return 'not-a-store';
	}
}

/**
 * Newer stores lock their key under the password's UTF-8 bytes, and their check value under UTF-16. The library takes
 * one password for both, so one with an ø needs a second look, after its check value was found right.
 */
function withoutMac(pfx: forge.asn1.Asn1): forge.asn1.Asn1 {
	if (!Array.isArray(pfx.value)) throw new Error('This is not a PKCS#12 file');
	return { ...pfx, value: pfx.value.slice(0, 2) };
}

function certificatesIn(store: forge.pkcs12.Pkcs12Pfx): forge.pki.Certificate[] {
	const type = forge.pki.oids.certBag ?? '';
	return (store.getBags({ bagType: type })[type] ?? []).flatMap((bag) => (bag.cert ? [bag.cert] : []));
}

function faultOf(own: forge.pki.Certificate, now: Date): StoreFault | null {
	const x509 = new X509Certificate(forge.pki.certificateToPem(own));
	if (x509.ca) return 'is-authority';
	const usage = own.getExtension('keyUsage') as
		{ digitalSignature?: boolean; nonRepudiation?: boolean } | null | undefined;
	if (usage && !usage.digitalSignature && !usage.nonRepudiation) return 'wrong-usage';
	const purposes = x509.keyUsage as readonly string[] | undefined;
	if (purposes && !purposes.some((purpose) => fitPurposes.includes(purpose))) return 'wrong-usage';
	if (own.validity.notBefore > now) return 'not-yet-valid';
	return own.validity.notAfter <= now ? 'expired' : null;
}
