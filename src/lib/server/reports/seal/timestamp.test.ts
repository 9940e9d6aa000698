import { spawnSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { inFolder, opensslVerifies, pdfsig, signatureOf } from '../../../../../tests/helpers/pdf-tools';
import { reportInput } from '../../../../../tests/helpers/report-fixture';
import {
	startTimestampAuthority,
	type Manner,
	type TimestampAuthority
} from '../../../../../tests/helpers/timestamp-authority';
import { sha256Hex } from '../../storage/sha256';
import { sealedReport } from '../pdf/sealed-report';
import { createCertificate } from './certificate';
import { checkSeal } from './check-seal';
import { timestampToken } from './cms';
import { checkSigner, readSignedData } from './signed-data';
import { stampingBy } from './stamping';
import { readTimestamp, requestTimestamp } from './timestamp';

const bytes = Buffer.from('the signature of a report');

/** `openssl ts -verify` over the bytes, with the authority's own certificate as anchor. */
function opensslVerifiesToken(token: Uint8Array, stamped: Uint8Array, anchorPem: string): string {
	return inFolder((folder) => {
		const at = (name: string) => join(folder, name);
		writeFileSync(at('token'), token);
		writeFileSync(at('stamped'), stamped);
		writeFileSync(at('anchor.pem'), anchorPem);
		const files = ['-in', at('token'), '-token_in', '-data', at('stamped'), '-CAfile', at('anchor.pem')];
		const { stdout, stderr } = spawnSync('openssl', ['ts', '-verify', ...files], { encoding: 'utf8' });
		return stdout + stderr;
	});
}

let authority: TimestampAuthority;
beforeAll(async () => {
	authority = await startTimestampAuthority();
});
afterAll(() => authority.stop());

describe('a timestamp from an authority', () => {
	it('is one that openssl verifies over the same bytes and no others', async () => {
		authority.manner = 'answers';
		const { token, at } = await requestTimestamp(bytes, authority.url);
		expect(opensslVerifiesToken(token, bytes, authority.certificatePem)).toContain('Verification: OK');
		expect(opensslVerifiesToken(token, Buffer.from('other'), authority.certificatePem)).toContain('FAILED');
		expect(Math.abs(Date.now() - at.getTime())).toBeLessThan(600_000);
	});

	it('stands for nothing but the bytes it was asked for', async () => {
		authority.manner = 'answers';
		const { token } = await requestTimestamp(bytes, authority.url);
		expect(readTimestamp(token, bytes).at).toBeInstanceOf(Date);
		expect(() => readTimestamp(token, Buffer.from('other'))).toThrow(/other bytes/u);
	});

	it('does not stand once a byte of it has changed', async () => {
		authority.manner = 'answers';
		const { token } = await requestTimestamp(bytes, authority.url);
		// Signature, signed content, certificate: wherever it is changed.
		for (const share of [0.1, 0.5, 0.99]) {
			const changed = Uint8Array.from(token);
			const at = Math.floor(share * changed.length);
			changed[at] = (changed[at] ?? 0) ^ 1;
			expect(() => readTimestamp(changed, bytes)).toThrow();
		}
	});

	it.each<[Manner, RegExp]>([
		['refuses', /refused with status 2/u],
		['repeats', /another question|other bytes/u],
		['fails', /answered 503/u],
		['babbles', /./u]
	])('is not taken from an authority that %s', async (manner, why) => {
		authority.manner = 'answers';
		await requestTimestamp(Buffer.from('first'), authority.url);
		authority.manner = manner;
		const before = authority.asked();
		await expect(requestTimestamp(bytes, authority.url)).rejects.toThrow(why);
		expect(authority.asked() - before).toBe(2);
	});

	it('is waited for some seconds and no longer', async () => {
		authority.manner = 'hangs';
		await expect(requestTimestamp(bytes, authority.url)).rejects.toThrow(/timeout|aborted/iu);
	});
});

describe('a report sealed with an authority', () => {
	let made: Awaited<ReturnType<typeof createCertificate>>;
	beforeAll(async () => {
		const now = new Date('2026-04-01T00:00:00Z');
		made = await createCertificate({ organisation: 'Pell Staithe', country: 'DE', now, passphrase: 'word' });
	});
	const order = (timestampUrl: string | null) => ({
		input: reportInput({}, 1),
		p12: made.p12,
		passphrase: 'word',
		timestampUrl
	});
	const own = () => new Set([sha256Hex(made.certificateDer)]);

	it('carries the timestamp over its signature as an unsigned attribute, and stays valid', async () => {
		authority.manner = 'answers';
		const { pdf, timestamp } = await sealedReport(order(authority.url));
		expect(timestamp).toMatchObject({ state: 'stamped', authority: new URL(authority.url).host });
		expect(pdfsig(pdf)).toContain('Signature is Valid.');
		expect(pdfsig(pdf)).toContain('Total document signed');
		const { cms, content } = signatureOf(pdf);
		expect(opensslVerifies(cms, content, made.certificatePem)).toContain('Verification successful');
		const { unsigned, signature } = checkSigner(readSignedData(cms), content);
		const token = timestampToken(unsigned) ?? Buffer.alloc(0);
		expect(opensslVerifiesToken(token, signature, authority.certificatePem)).toContain('Verification: OK');
		const stampedAt = timestamp.state === 'stamped' ? timestamp.at : '';
		expect(checkSeal(pdf, own())).toMatchObject({ fault: null, timestampAt: stampedAt });
	});

	it('is sealed without where the authority fails, and says so', async () => {
		authority.manner = 'fails';
		const { pdf, timestamp } = await sealedReport(order(authority.url));
		expect(timestamp).toEqual({
			state: 'failed',
			authority: expect.any(String),
			why: expect.stringContaining('503')
		});
		expect(pdfsig(pdf)).toContain('Signature is Valid.');
		expect(checkSeal(pdf, own())).toMatchObject({ fault: null, timestampAt: null });
	});

	it.each<Manner>(['refuses', 'babbles'])('goes on without where it %s', async (manner) => {
		authority.manner = manner;
		const { stamp, outcome } = stampingBy(authority.url);
		expect(await stamp(bytes)).toBeNull();
		expect(outcome()).toMatchObject({ state: 'failed', why: expect.stringMatching(/./u) });
	});

	it('goes on without where nobody listens', async () => {
		const { stamp, outcome } = stampingBy('http://127.0.0.1:9/tsa');
		expect(await stamp(bytes)).toBeNull();
		expect(outcome()).toMatchObject({ state: 'failed', authority: '127.0.0.1:9' });
	});

	it('asks nobody where none is set', async () => {
		const before = authority.asked();
		const { stamp, outcome } = stampingBy(null);
		expect(await stamp(bytes)).toBeNull();
		expect(outcome()).toEqual({ state: 'off' });
		expect(authority.asked()).toBe(before);
	});
});
