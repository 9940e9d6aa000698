import { spawnSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import {
	inFolder,
	opensslVerifies,
	pdfsig,
	said,
	signatureOf,
	textOf
} from '../../../../../tests/helpers/pdf-tools';
import { reportInput } from '../../../../../tests/helpers/report-fixture';
import type { ReportInput } from '../pdf/report-input';
import { sealedReport } from '../pdf/sealed-report';
import { createCertificate, loadCertificate } from './certificate';
import { sealPdf } from './seal-pdf';

function cmsPrinted(cms: Buffer): string {
	return inFolder((folder) => {
		const file = join(folder, 'cms.der');
		writeFileSync(file, cms);
		return spawnSync('openssl', ['cms', '-cmsout', '-print', '-inform', 'DER', '-in', file], {
			encoding: 'utf8'
		}).stdout;
	});
}

async function seal(input: ReportInput, p12: Uint8Array): Promise<Uint8Array> {
	return (await sealedReport({ input, p12, passphrase: 'word', timestampUrl: null })).pdf;
}

describe('a sealed report', () => {
	let sealed: Uint8Array;
	let made: Awaited<ReturnType<typeof createCertificate>>;
	beforeAll(async () => {
		const now = new Date('2026-04-01T00:00:00Z');
		made = await createCertificate({
			organisation: 'Pell Staithe Fresh',
			country: 'DE',
			now,
			passphrase: 'word'
		});
		sealed = await seal(reportInput(), made.p12);
	});

	it('is valid and signed as a whole, says pdfsig', () => {
		const verdict = pdfsig(sealed);
		expect(verdict).toContain('Signature is Valid.');
		expect(verdict).toContain('Total document signed');
		expect(verdict).not.toContain('Not total document signed');
		expect(verdict).toContain('Signature Type: ETSI.CAdES.detached');
		expect(verdict).toContain('Signing Hash Algorithm: SHA-256');
		expect(verdict.match(/Signature #/gu)).toHaveLength(1);
	});

	it('is valid over its byte ranges, says openssl', () => {
		const { cms, content } = signatureOf(sealed);
		expect(opensslVerifies(cms, content, made.certificatePem)).toContain('Verification successful');
		content[100] = (content[100] ?? 0) ^ 1;
		expect(opensslVerifies(cms, content, made.certificatePem)).toContain('Verification failure');
	});

	it('is broken by one changed byte anywhere', () => {
		const { content } = signatureOf(sealed);
		for (const share of [0.1, 0.5, 0.7]) {
			const changed = Uint8Array.from(sealed);
			const at = Math.floor(share * content.length * 0.9);
			changed[at] = (changed[at] ?? 0) ^ 1;
			expect(pdfsig(changed)).not.toContain('Signature is Valid.');
		}
	});

	it('shows appended bytes as not signed', () => {
		const appended = Buffer.concat([sealed, Buffer.from('\n% one more line\n')]);
		expect(pdfsig(appended)).toContain('Not total document signed');
	});

	it('lends its signature to no other report', async () => {
		const other = await seal(reportInput({ organisation: 'Pell Staithe Other' }), made.p12);
		const hex = signatureOf(sealed).cms.toString('hex');
		const text = Buffer.from(other).toString('latin1');
		const from = text.indexOf('/Contents <') + '/Contents <'.length;
		const transplanted = Buffer.from(text.slice(0, from) + hex + text.slice(from + hex.length), 'latin1');
		expect(pdfsig(transplanted)).toContain('Digest Mismatch');
		expect(
			opensslVerifies(signatureOf(sealed).cms, signatureOf(other).content, made.certificatePem)
		).toContain('Verification failure');
	});

	// Source: ETSI EN 319 142-1 V1.2.1, 6.3: signing-certificate-v2 shall, signing-time shall not be present.
	it('carries signing-certificate-v2, contentType and messageDigest, and no signing time', () => {
		const printed = cmsPrinted(signatureOf(sealed).cms);
		expect(printed).toContain('id-smime-aa-signingCertificateV2');
		expect(printed).toContain('object: contentType');
		expect(printed).toContain('object: messageDigest');
		expect(printed).not.toContain('signingTime');
		expect(printed).toContain('eContent: <ABSENT>');
	});

	it('is sound in structure, keeps its PDF/A mark, its files and its words', () => {
		expect(said(sealed, 'qpdf', (file) => ['--check', file])).toContain(
			'No syntax or stream encoding errors found'
		);
		expect(said(sealed, 'pdfinfo', (file) => ['-meta', file])).toMatch(/pdfaid:part>3</u);
		expect(said(sealed, 'pdfdetach', (file) => ['-list', file])).toContain('SB-30413.csv');
		expect(textOf(sealed)).toContain('Ruth Calloway');
	});

	it('has its field over the box that says who signed', () => {
		const shown = said(sealed, 'pdftotext', (file) => [
			'-f',
			'1',
			'-l',
			'1',
			'-x',
			'485',
			'-y',
			'615',
			'-W',
			'100',
			'-H',
			'80',
			file,
			'-'
		]);
		expect(shown).toContain('Ruth Calloway');
		expect(Buffer.from(sealed).toString('latin1')).toMatch(/\/Subtype \/Widget[\s\S]*?\/Rect \[ 487\./u);
	});

	it('comes out byte for byte the same from the same input and key', async () => {
		const again = await seal(reportInput(), made.p12);
		expect(Buffer.from(again).equals(Buffer.from(sealed))).toBe(true);
	});

	it('takes brackets, backslashes and any letters in its words', async () => {
		const words = {
			reason: 'Fine (mostly) \\ ő 出荷',
			location: 'Łódź)',
			name: '(Őrség',
			signedAt: new Date('2026-04-03T07:44:18Z')
		};
		const certificate = loadCertificate(made.p12, 'word');
		const { reportPdf } = await import('../pdf/report-pdf');
		const verdict = pdfsig(await sealPdf(await reportPdf(reportInput()), certificate, words));
		expect(verdict).toContain('Signature is Valid.');
		expect(verdict).toContain('Total document signed');
	});

	it('is not sealed twice', async () => {
		const words = { reason: '', location: '', name: '', signedAt: new Date('2026-04-03T07:44:18Z') };
		await expect(sealPdf(sealed, loadCertificate(made.p12, 'word'), words)).rejects.toThrow(
			/already has a form/u
		);
	});
});
