import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** Runs `work` in a folder of its own that is gone afterwards. */
export function inFolder<Result>(work: (folder: string) => Result): Result {
	const folder = mkdtempSync(join(tmpdir(), 'report-'));
	try {
		return work(folder);
	} finally {
		rmSync(folder, { recursive: true, force: true });
	}
}

/** What a program of Debian's poppler-utils, qpdf or openssl says about a PDF; both streams. */
export function said(pdf: Uint8Array, program: string, args: (file: string) => string[]): string {
	return inFolder((folder) => {
		const file = join(folder, 'report.pdf');
		writeFileSync(file, pdf);
		const { stdout, stderr, error } = spawnSync(program, args(file), { encoding: 'utf8' });
		if (error) throw error;
		return `${stdout}${stderr}`;
	});
}

/** The text of a PDF as a reader would copy it. */
export function textOf(pdf: Uint8Array): string {
	return said(pdf, 'pdftotext', (file) => ['-layout', file, '-']).replace(/[ \u00a0]+/gu, ' ');
}

export function pdfsig(pdf: Uint8Array): string {
	return said(pdf, 'pdfsig', (file) => [file]);
}

/** The files inside a PDF by name, as `pdfdetach` takes them out. */
export function detached(pdf: Uint8Array, names: readonly string[]): Map<string, Buffer> {
	return inFolder((folder) => {
		const file = join(folder, 'report.pdf');
		writeFileSync(file, pdf);
		execFileSync('pdfdetach', ['-saveall', '-o', folder, file]);
		return new Map(names.map((name) => [name, readFileSync(join(folder, name))]));
	});
}

/** Signed ranges and CMS of the first signature. */
export function signatureOf(pdf: Uint8Array): { readonly content: Buffer; readonly cms: Buffer } {
	const bytes = Buffer.from(pdf);
	const range = /\/ByteRange \[\s*(\d+) (\d+) (\d+) (\d+)/u.exec(bytes.toString('latin1'));
	const [from = 0, before = 0, after = 0, rest = 0] = (range?.slice(1) ?? []).map(Number);
	const hex = bytes.subarray(before + 1, after - 1).toString('latin1');
	const padded = Buffer.from(hex, 'hex');
	// DER says its own length: a SEQUENCE with two length octets.
	const cms = padded.subarray(0, 4 + padded.readUInt16BE(2));
	return { content: Buffer.concat([bytes.subarray(from, before), bytes.subarray(after, after + rest)]), cms };
}

/** What `openssl cms -verify` says of a detached CMS and its content; the certificate is its own anchor. */
export function opensslVerifies(cms: Uint8Array, content: Uint8Array, certificatePem: string): string {
	return inFolder((folder) => {
		const at = (name: string) => join(folder, name);
		writeFileSync(at('cms.der'), cms);
		writeFileSync(at('content'), content);
		writeFileSync(at('anchor.pem'), certificatePem);
		const files = [
			'-in',
			at('cms.der'),
			'-content',
			at('content'),
			'-CAfile',
			at('anchor.pem'),
			'-out',
			at('out')
		];
		const args = ['cms', '-verify', '-inform', 'DER', '-binary', '-purpose', 'any', ...files];
		return spawnSync('openssl', args, { encoding: 'utf8' }).stderr;
	});
}
