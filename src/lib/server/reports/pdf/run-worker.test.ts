import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { build } from 'vite';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { pdfsig } from '../../../../../tests/helpers/pdf-tools';
import { reportInput } from '../../../../../tests/helpers/report-fixture';
import { createCertificate } from '../seal/certificate';
import { buildSealedReport, type SealKey } from './run-worker';

const now = new Date('2026-04-01T00:00:00Z');

describe('a report built in a worker', () => {
	let folder: string;
	let key: SealKey;
	beforeAll(async () => {
		// Inside the project, so that the built program finds its packages.
		mkdirSync('build', { recursive: true });
		folder = mkdtempSync(resolve('build', 'worker-test-'));
		await build({
			configFile: false,
			logLevel: 'error',
			publicDir: false,
			build: {
				ssr: true,
				target: 'node20',
				outDir: join(folder, 'build', 'node'),
				rollupOptions: {
					input: { 'report-worker': 'src/lib/server/workers/report-worker.ts' },
					output: { entryFileNames: '[name].js' }
				}
			}
		});
		const { p12 } = await createCertificate({
			organisation: 'Pell Staithe Fresh',
			country: 'DE',
			now,
			passphrase: 'word'
		});
		key = { p12, passphrase: 'word' };
	});
	afterAll(() => rmSync(folder, { recursive: true, force: true }));

	it('comes back sealed and valid', async () => {
		const verdict = pdfsig((await buildSealedReport(reportInput(), key, null, folder)).pdf);
		expect(verdict).toContain('Signature is Valid.');
		expect(verdict).toContain('Total document signed');
	});

	it('fails with the worker’s own reason', async () => {
		await expect(
			buildSealedReport(reportInput(), { ...key, passphrase: 'guessed' }, null, folder)
		).rejects.toThrow(/password/iu);
	});

	it('says what to run when the worker was never built', async () => {
		await expect(buildSealedReport(reportInput(), key, null, join(folder, 'elsewhere'))).rejects.toThrow(
			/npm run build/u
		);
	});
});
