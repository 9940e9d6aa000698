import { createHash, randomBytes } from 'node:crypto';
import { Integer, OctetString } from 'asn1js';
import { AlgorithmIdentifier, MessageImprint, TimeStampReq, TimeStampResp, TSTInfo } from 'pkijs';
import { checkSigner, readSignedData } from './signed-data';

const sha256Oid = '2.16.840.1.101.3.4.2.1';
/** Key purpose of a timestamp's certificate. Source: RFC 3161, 2.3. */
const timeStamping = '1.3.6.1.5.5.7.3.8';
/** granted and grantedWithMods. Source: RFC 3161, 2.4.2. */
const granted = [0, 1];
const tries = 2;
const patienceMs = 4_000;
const tokenBytesAtMost = 10_000;

/** A timestamp token over bytes, and the moment it states. */
export interface Timestamp {
	readonly token: Uint8Array;
	readonly at: Date;
}

/**
 * Asks an RFC 3161 authority for a token over the SHA-256 of `bytes`, twice at most, and believes only what answers
 * this very question with a right signature. @throws where the authority fails, refuses or answers something else
 */
export async function requestTimestamp(bytes: Uint8Array, authority: string): Promise<Timestamp> {
	for (let attempt = 1; ; attempt++) {
		try {
			return await ask(bytes, authority);
		} catch (error) {
			if (attempt >= tries) throw error;
		}
	}
}

async function ask(bytes: Uint8Array, authority: string): Promise<Timestamp> {
	const hash = createHash('sha256').update(bytes).digest();
	// A leading 0x40 keeps the number positive and of full length.
	const nonce = Buffer.concat([Buffer.from([0x40]), randomBytes(8)]);
	const query = new TimeStampReq({
		version: 1,
		messageImprint: new MessageImprint({
			hashAlgorithm: new AlgorithmIdentifier({ algorithmId: sha256Oid }),
			hashedMessage: new OctetString({ valueHex: bufferOf(hash) })
		}),
		nonce: new Integer({ valueHex: bufferOf(nonce) }),
		certReq: true
	});
	const answer = await fetch(authority, {
		method: 'POST',
		headers: { 'content-type': 'application/timestamp-query', accept: 'application/timestamp-reply' },
		body: new Uint8Array(query.toSchema().toBER()),
		redirect: 'error',
		signal: AbortSignal.timeout(patienceMs)
	});
	if (!answer.ok) throw new Error(`The timestamp authority answered ${answer.status}`);
	const reply = TimeStampResp.fromBER(await answer.arrayBuffer());
	if (!granted.includes(reply.status.status) || !reply.timeStampToken)
		throw new Error(`The timestamp authority refused with status ${reply.status.status}`);
	const token = new Uint8Array(reply.timeStampToken.toSchema().toBER());
	if (token.byteLength > tokenBytesAtMost)
		throw new Error('The timestamp is larger than the room left for it');
	const { info, at } = readTimestamp(token, bytes);
	if (!info.nonce || !Buffer.from(info.nonce.valueBlock.valueHexView).equals(nonce))
		throw new Error('The timestamp answers another question');
	return { token, at };
}

/** Reads a token and holds it against the bytes it speaks of. @throws where it does not stand */
export function readTimestamp(token: Uint8Array, bytes: Uint8Array): { info: TSTInfo; at: Date } {
	const signedData = readSignedData(token);
	const content = signedData.encapContentInfo.eContent?.getValue();
	if (!content) throw new Error('The timestamp is empty');
	const info = TSTInfo.fromBER(content);
	const check = checkSigner(signedData, new Uint8Array(content));
	if (!check.isContentSame || !check.isSignatureRight)
		throw new Error('The timestamp’s signature is not right');
	if (!check.certificate.keyUsage?.includes(timeStamping))
		throw new Error('The timestamp’s certificate is not for timestamps');
	const { hashAlgorithm, hashedMessage } = info.messageImprint;
	const hash = createHash('sha256').update(bytes).digest();
	if (hashAlgorithm.algorithmId !== sha256Oid || !hash.equals(Buffer.from(hashedMessage.getValue())))
		throw new Error('The timestamp is over other bytes');
	return { info, at: info.genTime };
}

function bufferOf(bytes: Uint8Array): ArrayBuffer {
	return new Uint8Array(bytes).buffer;
}
