import { createHash, createPrivateKey, sign } from 'node:crypto';
import { BaseBlock, fromBER, ObjectIdentifier, OctetString, Sequence } from 'asn1js';
import {
	AlgorithmIdentifier,
	Attribute,
	Certificate as X509,
	ContentInfo,
	EncapsulatedContentInfo,
	IssuerAndSerialNumber,
	SignedAndUnsignedAttributes,
	SignedData,
	SignerInfo
} from 'pkijs';
import type { Certificate } from './certificate';

/** Object identifiers. Sources: RFC 5652 (data, signedData, contentType, messageDigest), RFC 5035 (signingCertificateV2), RFC 8017, RFC 3161 app. A (signatureTimeStamp). */
const oids = {
	data: '1.2.840.113549.1.7.1',
	signedData: '1.2.840.113549.1.7.2',
	contentType: '1.2.840.113549.1.9.3',
	messageDigest: '1.2.840.113549.1.9.4',
	signingCertificateV2: '1.2.840.113549.1.9.16.2.47',
	signatureTimeStamp: '1.2.840.113549.1.9.16.2.14',
	sha256: '2.16.840.1.101.3.4.2.1',
	sha256WithRsa: '1.2.840.113549.1.1.11'
} as const;
const attributeSetTag = 0x31;

/** Gets a timestamp token over a signature, or null where there is none to be had. */
export type Stamp = (signature: Uint8Array) => Promise<Uint8Array | null>;

/**
 * Detached CMS over `content` as PAdES baseline wants it: contentType, messageDigest and signingCertificateV2 signed,
 * no signing-time (the PDF's own M entry says when). Source: ETSI EN 319 142-1 V1.2.1, 6.3.
 */
export async function detachedCms(
	content: Uint8Array,
	certificate: Certificate,
	stamp: Stamp | null = null
): Promise<Uint8Array> {
	const own = X509.fromBER(arrayBuffer(certificate.certificateDer));
	const attributes = signedAttributes(content, certificate);
	const signature = signatureOver(attributes, certificate);
	const token = stamp === null ? null : await stamp(signature);
	const chain = certificate.chainDer.map((der) => X509.fromBER(arrayBuffer(der)));
	return assembled({ certificates: [own, ...chain], own, attributes, signature, token });
}

/** What a seal's CMS is put together from; everything else in it is the same in every seal. */
export interface SealParts {
	readonly own: X509;
	readonly certificates: readonly X509[];
	readonly attributes: readonly Attribute[];
	readonly signature: Uint8Array;
	readonly token: Uint8Array | null;
}

/** The whole CMS in DER. */
export function assembled({ own, certificates, attributes, signature, token }: SealParts): Uint8Array {
	const signedData = new SignedData({
		version: 1,
		digestAlgorithms: [new AlgorithmIdentifier({ algorithmId: oids.sha256 })],
		encapContentInfo: new EncapsulatedContentInfo({ eContentType: oids.data }),
		certificates: [...certificates],
		signerInfos: [
			new SignerInfo({
				version: 1,
				sid: new IssuerAndSerialNumber({ issuer: own.issuer, serialNumber: own.serialNumber }),
				digestAlgorithm: new AlgorithmIdentifier({ algorithmId: oids.sha256 }),
				signedAttrs: new SignedAndUnsignedAttributes({ type: 0, attributes: [...attributes] }),
				signatureAlgorithm: new AlgorithmIdentifier({ algorithmId: oids.sha256WithRsa }),
				signature: new OctetString({ valueHex: arrayBuffer(signature) }),
				...(token === null
					? {}
					: { unsignedAttrs: new SignedAndUnsignedAttributes({ type: 1, attributes: [stamped(token)] }) })
			})
		]
	});
	const envelope = new ContentInfo({ contentType: oids.signedData, content: signedData.toSchema(true) });
	return new Uint8Array(envelope.toSchema().toBER());
}

function stamped(token: Uint8Array): Attribute {
	return new Attribute({ type: oids.signatureTimeStamp, values: [parsed(token)] });
}

function parsed(der: Uint8Array) {
	const { result, offset } = fromBER(arrayBuffer(der));
	if (offset < 0) throw new Error('The timestamp is not DER');
	return result;
}

/** The timestamp among a signature's unsigned attributes. */
export function timestampToken(unsigned: readonly Attribute[]): Uint8Array | null {
	const [value] = unsigned.find(({ type }) => type === oids.signatureTimeStamp)?.values ?? [];
	return value instanceof BaseBlock ? new Uint8Array(value.toBER()) : null;
}

/** In the order DER wants of a SET OF: by their encodings. */
function signedAttributes(content: Uint8Array, certificate: Certificate): Attribute[] {
	const certificateHash = new OctetString({ valueHex: arrayBuffer(sha256(certificate.certificateDer)) });
	// SigningCertificateV2 { certs { ESSCertIDv2 { certHash } } }: SHA-256 is the default and so stays unsaid.
	const essCertIds = new Sequence({
		value: [new Sequence({ value: [new Sequence({ value: [certificateHash] })] })]
	});
	const attributes = [
		new Attribute({ type: oids.contentType, values: [new ObjectIdentifier({ value: oids.data })] }),
		new Attribute({
			type: oids.messageDigest,
			values: [new OctetString({ valueHex: arrayBuffer(sha256(content)) })]
		}),
		new Attribute({ type: oids.signingCertificateV2, values: [essCertIds] })
	];
	return attributes.sort((a, b) => Buffer.compare(derOf(a), derOf(b)));
}

/** The signature covers the attributes as an explicit SET. Source: RFC 5652, 5.4. */
function signatureOver(attributes: readonly Attribute[], certificate: Certificate): Uint8Array {
	const body = Buffer.concat(attributes.map(derOf));
	const signed = Buffer.concat([Buffer.from([attributeSetTag]), lengthOctets(body.length), body]);
	const key = createPrivateKey({
		key: Buffer.from(certificate.privateKeyPkcs8),
		format: 'der',
		type: 'pkcs8'
	});
	return sign('sha256', signed, key);
}

function lengthOctets(bytes: number): Buffer {
	if (bytes < 0x80) return Buffer.from([bytes]);
	return bytes < 0x100 ? Buffer.from([0x81, bytes]) : Buffer.from([0x82, bytes >> 8, bytes & 0xff]);
}

function derOf(attribute: Attribute): Buffer {
	return Buffer.from(attribute.toSchema().toBER());
}

function sha256(bytes: Uint8Array): Uint8Array {
	return createHash('sha256').update(bytes).digest();
}

function arrayBuffer(bytes: Uint8Array): ArrayBuffer {
	return new Uint8Array(bytes).buffer;
}
