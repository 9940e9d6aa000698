import { crc32 as nodeCrc32 } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { crc32 } from './crc32';

const ascii = (text: string) => new TextEncoder().encode(text);

describe('crc32', () => {
	it('gives the published check value', () => {
		// Source: ITU-T V.42 as catalogued for CRC-32/ISO-HDLC: check value of "123456789".
		expect(crc32(ascii('123456789'))).toBe(0xcbf43926);
		expect(crc32(ascii(''))).toBe(0);
	});

	it('goes on where it stopped', () => {
		expect(crc32(ascii('56789'), crc32(ascii('1234')))).toBe(0xcbf43926);
	});

	it('agrees with zlib', () => {
		const bytes = Uint8Array.from({ length: 5000 }, (_, i) => (i * 7919) % 251);
		if (nodeCrc32) expect(crc32(bytes)).toBe(nodeCrc32(bytes));
		expect(crc32(bytes.subarray(0, 1000))).not.toBe(crc32(bytes.subarray(1, 1001)));
	});
});
