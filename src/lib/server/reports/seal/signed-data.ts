import { createHash, verify, X509Certificate } from 'node:crypto';
import { ObjectIdentifier, OctetString, Sequence } from 'asn1js';
import { ContentInfo, IssuerAndSerialNumber, SignedData, type Attribute, type SignerInfo } from 'pkijs';

/** Sources: RFC 5652 (signedData, contentType, messageDigest), RFC 5035 (signingCertificate, V2), RFC 5754 (digests). */
const oids = {
	signedData: '1.2.840.113549.1.7.2',
	messageDigest: '1.2.840.113549.1.9.4',
	signingCertificate: '1.2.840.113549.1.9.16.2.12',
	signingCertificateV2: '1.2.840.113549.1.9.16.2.47'
} as const;
/** What we trust a digest by; SHA-1 and older are not among them. */
const digests: Readonly<Record<string, 'sha256' | 'sha384' | 'sha512'>> = {
	'2.16.840.1.101.3.4.2.1': 'sha256',
	'2.16.840.1.101.3.4.2.2': 'sha384',
	'2.16.840.1.101.3.4.2.3': 'sha512'
};

/** What the one signer of a CMS says, held against the content. */
export interface SignerCheck {
	/** The content is what was digested. */
	readonly isContentSame: boolean;
	/** The signature over the attributes is by the certificate's key, and the attributes name that certificate. */
	readonly isSignatureRight: boolean;
	readonly certificate: X509Certificate;
	readonly signature: Uint8Array;
	readonly unsigned: readonly Attribute[];
}

/** A CMS as SignedData with one signer. @throws where it is none */
export function readSignedData(der: Uint8Array): SignedData {
	const envelope = ContentInfo.fromBER(new Uint8Array(der).buffer);
	if (envelope.contentType !== oids.signedData) throw new Error('The CMS holds no signed data');
	const signedData = new SignedData({ schema: envelope.content });
	if (signedData.signerInfos.length !== 1) throw new Error('The CMS has not exactly one signer');
	return signedData;
}

/** Checks digest, signature and the naming of the certificate. @throws where an attribute is missing or strange */
export function checkSigner(signedData: SignedData, content: Uint8Array): SignerCheck {
	const [signer] = signedData.signerInfos;
	const attributes = signer?.signedAttrs?.attributes;
	if (!signer || !attributes) throw new Error('The signer signed no attributes');
	const algorithm = digests[signer.digestAlgorithm.algorithmId];
	if (!algorithm) throw new Error('The digest is not one that is trusted');
	const certificate = certificateOf(signedData, signer);
	const digest = firstValue(attributes, oids.messageDigest, OctetString);
	const signature = new Uint8Array(signer.signature.getValue());
	const signed = new Uint8Array(signer.signedAttrs?.encodedValue ?? new ArrayBuffer(0));
	return {
		isContentSame: createHash(algorithm).update(content).digest().equals(Buffer.from(digest.getValue())),
		isSignatureRight:
			namesCertificate(attributes, certificate) &&
			verify(algorithm, signed, certificate.publicKey, signature),
		certificate,
		signature,
		unsigned: signer.unsignedAttrs?.attributes ?? []
	};
}

function certificateOf(signedData: SignedData, signer: SignerInfo): X509Certificate {
	const { sid } = signer;
	if (!(sid instanceof IssuerAndSerialNumber))
		throw new Error('The signer is not named by issuer and serial');
	for (const candidate of signedData.certificates ?? []) {
		if (!('serialNumber' in candidate) || !('issuer' in candidate)) continue;
		if (candidate.serialNumber.isEqual(sid.serialNumber) && candidate.issuer.isEqual(sid.issuer))
			return new X509Certificate(Buffer.from(candidate.toSchema(true).toBER()));
	}
	throw new Error('The CMS does not bring its signer’s certificate');
}

/** Without it another certificate of the same key could be put in its place. */
function namesCertificate(attributes: readonly Attribute[], certificate: X509Certificate): boolean {
	const isVersionTwo = attributes.some(({ type }) => type === oids.signingCertificateV2);
	const list = firstValue(
		attributes,
		isVersionTwo ? oids.signingCertificateV2 : oids.signingCertificate,
		Sequence
	);
	const id = sequenceIn(sequenceIn(list, 0), 0);
	const [first, second] = id.valueBlock.value;
	// ESSCertIDv2 may begin with its digest's algorithm; unsaid it is SHA-256, in the older attribute always SHA-1.
	const hash = first instanceof OctetString ? first : second;
	const algorithm = isVersionTwo ? namedDigest(first) : 'sha1';
	if (!(hash instanceof OctetString)) return false;
	return createHash(algorithm).update(certificate.raw).digest().equals(Buffer.from(hash.getValue()));
}

function namedDigest(algorithm: unknown): string {
	if (!(algorithm instanceof Sequence)) return 'sha256';
	const [oid] = algorithm.valueBlock.value;
	const name = oid instanceof ObjectIdentifier ? digests[oid.valueBlock.toString()] : undefined;
	if (!name) throw new Error('The certificate is named by a digest that is not trusted');
	return name;
}

function sequenceIn(sequence: Sequence, index: number): Sequence {
	const found = sequence.valueBlock.value[index];
	if (!(found instanceof Sequence)) throw new Error('The attribute that names the certificate is malformed');
	return found;
}

function firstValue<Kind>(
	attributes: readonly Attribute[],
	type: string,
	kind: new (...parameters: never[]) => Kind
): Kind {
	const values: readonly unknown[] = attributes.find((attribute) => attribute.type === type)?.values ?? [];
	const [value] = values;
	if (!(value instanceof kind)) throw new Error(`The signed attribute ${type} is missing`);
	return value;
}
