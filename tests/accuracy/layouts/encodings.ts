import { clock, day, degrees, dmy, file, gzip, iso, journey, utf16, utf8, type Case } from './journey';

/** A head in its own encoding above plain rows. Bytes of the heads: Python 3.11, `text.encode(encoding).hex()`. */
function headed(hex: string, rows: string): Uint8Array {
	return Uint8Array.from(Buffer.concat([Buffer.from(hex, 'hex'), Buffer.from(rows)]));
}

const commas = file([''], (p) => `${iso(p)},${degrees(p)},61`);
const semicolons = file([''], (p) => `${dmy(p)} ${clock(p)};${degrees(p, ',')}`);
const dated = file([''], (p) => `${day(p)} ${clock(p)};${degrees(p, ',')}`);
const numbered = file([''], (p, i) => `${i + 1},${day(p)},${clock(p)},${degrees(p)}`);
const pairs = file([''], (p) => `${iso(p)},${degrees(p)}`);
const plain = file(['Zeit;Temperatur (°C)'], (p) => `${iso(p)};${degrees(p, ',')}`);

const eastern: readonly [string, string, string, string][] = [
	// 日時,温度(℃),湿度(%)
	['Shift_JIS', 'shift_jis', '93fa8e9e2c89b7937828818e292c8ebc9378282529', commas],
	// No.,日付,時刻,温度[℃]
	['Shift_JIS with a square bracket', 'shift_jis', '4e6f2e2c93fa95742c8e9e8d8f2c89b793785b818e5d', numbered],
	// 时间,温度(℃),湿度(%RH)
	['GBK', 'gb18030', 'cab1bce42ccec2b6c828a1e6292ccaaab6c82825524829', commas],
	// 時間,溫度(°C)
	['Big5', 'big5', 'aec9b6a12cb7c5abd728a2584329', pairs],
	// 시간,온도(℃)
	['EUC-KR', 'euc-kr', 'bdc3b0a32cbfc2b5b528a1c929', pairs],
	// 日時,温度(℃)
	['EUC-JP', 'euc-jp', 'c6fcbbfe2cb2b9c5d928a1ee29', pairs],
	// Datum a čas;Teplota (°C);Vlhkost (%)
	[
		'windows-1250',
		'windows-1250',
		'446174756d206120e861733b5465706c6f74612028b043293b566c686b6f737420282529',
		''
	],
	// Дата и время;Температура, °C
	['windows-1251', 'windows-1251', 'c4e0f2e020e820e2f0e5ecff3bd2e5ecefe5f0e0f2f3f0e02c20b043', semicolons],
	// Дата и время;Температура, °C
	['KOI8-R', 'koi8-r', 'e4c1d4c120c920d7d2c5cdd13bf4c5cdd0c5d2c1d4d5d2c12c209c43', semicolons],
	// Tarih ve saat;Sıcaklık (°C)
	['windows-1254', 'windows-1254', '546172696820766520736161743b53fd63616b6cfd6b2028b04329', semicolons],
	// Ημερομηνία;Θερμοκρασία (°C)
	['windows-1253', 'windows-1253', 'c7ece5f1efece7eddfe13bc8e5f1ecefeaf1e1f3dfe12028b04329', semicolons],
	// Dátum;Hőmérséklet (°C)
	['ISO 8859-2', 'windows-1250', '44e174756d3b48f56de97273e96b6c65742028b04329', dated],
	// Horodatage;Température (°C)
	['windows-1252', 'windows-1252', '486f726f6461746167653b54656d70e97261747572652028b04329', semicolons]
];

const wide: readonly Case[] = [true, false].flatMap((isBig) =>
	[true, false].map((isMarked) => ({
		name: `UTF-16 ${isBig ? 'BE' : 'LE'} ${isMarked ? 'with' : 'without'} a mark`,
		file: utf16(plain, isBig, isMarked),
		expected: { unit: 'celsius', encoding: isBig ? 'utf-16be' : 'utf-16le' }
	}))
);

/** The same rows in whatever bytes exports come in. */
export const encodings: readonly Case[] = [
	...eastern.map(([name, encoding, hex, rows]) => ({
		name,
		file: headed(hex, rows === '' ? file([''], (p) => `${dmy(p)} ${clock(p)};${degrees(p, ',')};61`) : rows),
		expected: { encoding, unit: 'celsius' }
	})),
	...wide,
	{ name: 'UTF-8 with a mark', file: utf8(`\ufeff${plain}`), expected: { encoding: 'utf-8' } },
	{ name: 'UTF-8 without a mark', file: utf8(plain), expected: { encoding: 'utf-8' } },
	{
		name: 'a mark before a quoted head',
		file: `\ufeff"Time","Temp (°C)"${commas.replace(/,61/g, '')}`,
		expected: {}
	},
	{
		name: 'DOS code page 850, whose degree sign is another letter in Windows',
		file: headed('446174653b54656d70827261747572652028f84329', semicolons),
		expected: { unit: 'celsius' }
	},
	{
		name: 'Mac Roman, whose degree sign is another letter in Windows',
		file: headed('446174653b54656d708e7261747572652028a14329', semicolons),
		expected: { unit: 'celsius' }
	},
	{ name: 'CRLF line ends', file: plain.replace(/\n/g, '\r\n'), expected: {} },
	{ name: 'line ends of old Macs', file: plain.replace(/\n/g, '\r'), expected: {} },
	{ name: 'CR CR LF, as a twice translated file has', file: plain.replace(/\n/g, '\r\r\n'), expected: {} },
	{ name: 'mixed line ends', file: plain.replace(/(\n[^\n]*)\n/g, '$1\r\n'), expected: {} },
	{ name: 'no line end after the last row', file: plain.slice(0, -1), expected: {} },
	{ name: 'blank lines between all rows', file: plain.replace(/\n/g, '\n\n'), expected: {} },
	{ name: 'NUL bytes after the end', file: utf8(plain + '\0'.repeat(200)), expected: {} },
	{ name: 'NUL bytes in the middle', file: utf8(plain.replace('\n', '\0\0\n')), expected: {} },
	{ name: 'the end mark of DOS', file: utf8(`${plain}\u001a`), expected: {} },
	{
		name: 'a sep= line for spreadsheets',
		file: `sep=;\r\n${plain.replace(/\n/g, '\r\n')}`,
		expected: { delimiter: ';' }
	},
	{ name: 'gzip of UTF-8', file: gzip(plain), expected: {} },
	{ name: 'gzip of UTF-16', file: gzip(utf16(plain, false, true)), expected: { encoding: 'utf-16le' } },
	{
		name: 'gzip of windows-1252',
		file: gzip(headed('486f726f6461746167653b54656d70e97261747572652028b04329', semicolons)),
		expected: {}
	},
	{
		name: 'UTF-16 of Chinese heads without a mark',
		file: utf16(
			file(['时间,温度(℃)'], (p) => `${iso(p)},${degrees(p)}`),
			false,
			false
		),
		expected: { encoding: 'utf-16le' }
	},
	{
		name: 'UTF-8 decoded twice on its way, so that the degree sign became two letters',
		file: file(['Time;Temperature (Â°C)'], (p) => `${iso(p)};${degrees(p)}`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'a replacement character for the degree sign',
		file: file(['Time;Temperature (\ufffdC)'], (p) => `${iso(p)};${degrees(p)}`),
		expected: { unit: 'celsius' }
	},
	{
		name: 'one broken byte in an UTF-8 comment',
		file: Buffer.concat([
			Buffer.from('Note: caf'),
			Buffer.from([0xe9]),
			Buffer.from(`\nSerial;A77\n${plain}`)
		]),
		expected: { readings: journey }
	}
];
