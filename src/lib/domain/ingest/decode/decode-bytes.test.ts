import { gzipSync } from 'node:zlib';
import { strToU8 } from 'fflate';
import { describe, expect, it } from 'vitest';
import { decodeBytes } from './decode-bytes';
import { crc32 } from './gunzip';

const latin = (text: string): Uint8Array => Uint8Array.from(text, (letter) => letter.charCodeAt(0));
function utf16(text: string, isLittle: boolean, mark: boolean): Uint8Array {
	const codes = [...(mark ? '\ufeff' : ''), ...text].map((letter) => letter.charCodeAt(0));
	return Uint8Array.from(
		codes.flatMap((code) => (isLittle ? [code & 255, code >> 8] : [code >> 8, code & 255]))
	);
}
const text = 'time;temp °C\n2026-04-01 10:00;4,5\n';

describe('bytes of an upload', () => {
	it.each([
		['UTF-8', strToU8(text), 'utf-8'],
		['UTF-8 with a mark', strToU8(`\ufeff${text}`), 'utf-8'],
		['UTF-16 LE with a mark', utf16(text, true, true), 'utf-16le'],
		['UTF-16 BE with a mark', utf16(text, false, true), 'utf-16be'],
		['UTF-16 LE without one', utf16(text, true, false), 'utf-16le'],
		['UTF-16 BE without one', utf16(text, false, false), 'utf-16be'],
		['windows-1252', latin(text), 'windows-1252'],
		['gzip', gzipSync(strToU8(text)), 'utf-8'],
		['UTF-8 cut inside a character', strToU8(`${text}°`).slice(0, -1), 'utf-8']
	])('in %s become the same text', (_name, bytes, encoding) => {
		expect(decodeBytes(bytes)).toMatchObject({ encoding, text: expect.stringContaining(text) });
	});

	it('in Shift_JIS are told by their header words', () => {
		// 日時,温度 in Shift_JIS. Source: JIS X 0208 rows 3892, 2794, 1839, 3750.
		const bytes = Uint8Array.from([0x93, 0xfa, 0x8e, 0x9e, 0x2c, 0x89, 0xb7, 0x93, 0x78, 0x0a]);
		expect(decodeBytes(bytes)).toEqual({ text: '日時,温度\n', encoding: 'shift_jis' });
	});

	it('lose stray NULs and a final SUB, nothing else', () => {
		expect(decodeBytes(latin('time,c\u0000\n1,2\n\u001a'))).toMatchObject({ text: 'time,c\n1,2\n' });
	});

	it.each([
		['nothing', new Uint8Array(0), 'empty'],
		['blanks only', latin(' \r\n\t'), 'empty'],
		['a PDF', latin('%PDF-1.4 …'), 'pdf'],
		['an old spreadsheet', Uint8Array.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1]), 'spreadsheet'],
		['a new spreadsheet', latin('PK\u0003\u0004........xl/workbook.xml'), 'spreadsheet'],
		['an archive', latin('PK\u0003\u0004........readings.csv'), 'zip'],
		['a JPEG', Uint8Array.from([0xff, 0xd8, 0xff, 0xe0]), 'image'],
		['a web page', latin('<!doctype html><title>Sign in</title>'), 'html'],
		['XML', latin('<?xml version="1.0"?><log/>'), 'xml'],
		['a program', Uint8Array.from({ length: 400 }, (_, i) => (i * 7) % 256), 'binary']
	])('of %s are refused by name', (_name, bytes, code) => {
		expect(decodeBytes(bytes)).toMatchObject({ code });
	});
});

describe('gzip', () => {
	it('has the checksum of its specification', () => {
		// Source: the CRC-32 check value of "123456789" (ITU-T V.42), CBF43926.
		expect(crc32(latin('123456789'))).toBe(0xcbf43926);
	});

	it('that is damaged or cut is refused', () => {
		const packed = gzipSync(strToU8(text.repeat(50)));
		expect(decodeBytes(packed.slice(0, -6))).toMatchObject({ code: 'broken-gzip' });
		const flipped = Uint8Array.from(packed);
		flipped[packed.length - 6] = (flipped[packed.length - 6] ?? 0) ^ 1;
		expect(decodeBytes(flipped)).toMatchObject({ code: 'broken-gzip' });
	});

	it('may be padded with zeros', () => {
		const packed = gzipSync(strToU8(text));
		expect(decodeBytes(Uint8Array.from([...packed, 0, 0, 0, 0]))).toMatchObject({ text });
	});

	it('that unpacks beyond the bound is refused without unpacking it all', () => {
		const bomb = gzipSync(new Uint8Array(52 * 1024 * 1024), { level: 1 });
		expect(bomb.length).toBeLessThan(1_000_000);
		expect(decodeBytes(bomb)).toMatchObject({ code: 'too-large' });
	}, 30_000);
});
