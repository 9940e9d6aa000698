import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { hashFile, isPdf } from './hash-file';

describe('a file dropped to be checked', () => {
	it('is hashed as every other tool hashes it, whatever its length', async () => {
		for (const length of [0, 1, 55, 56, 64, 65, 100_000, 3_000_001]) {
			const bytes = Uint8Array.from({ length }, (_, i) => (i * 31) % 256);
			const expected = createHash('sha256').update(bytes).digest('hex');
			expect(await hashFile(new Blob([bytes]))).toBe(expected);
		}
	});

	// Source: FIPS 180-4 example, SHA-256 of "abc".
	it('gives the published digest of three letters', async () => {
		expect(await hashFile(new Blob(['abc']))).toBe(
			'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'
		);
	});

	it('is known by its first bytes, not by its name', async () => {
		expect(await isPdf(new File(['%PDF-1.7\n'], 'report.txt'))).toBe(true);
		expect(await isPdf(new File(['time;celsius'], 'report.pdf'))).toBe(false);
		expect(await isPdf(new File(['%PD'], 'report.pdf'))).toBe(false);
	});
});
