import { bytes, file, gzip, iso, degrees, journey, utf8, utf16, type Case } from './journey';

const ascii = (text: string): Uint8Array => utf8(text);
const joined = (...parts: readonly Uint8Array[]): Uint8Array => Buffer.concat(parts);
const zero = (count: number): Uint8Array => new Uint8Array(count);
/** Local file header of a ZIP archive, with the name of its first entry (APPNOTE 4.3.7). */
const zipped = (entry: string): Uint8Array =>
	joined(bytes(0x50, 0x4b, 3, 4, 20, 0), zero(20), bytes(entry.length, 0, 0, 0), ascii(entry), zero(64));
const noise = Uint8Array.from({ length: 4000 }, (_, i) => (i * 7919 + (i >> 3) * 104_729) & 255);
const row = (p: (typeof journey)[number]): string => `${iso(p)};${degrees(p)}`;

export const refusals: readonly Case[] = [
	{ name: 'an empty file', file: '', expected: { refused: 'empty' } },
	{ name: 'a file of spaces and line ends', file: ' \r\n \r\n\t', expected: { refused: 'empty' } },
	{ name: 'a lone byte order mark', file: bytes(0xef, 0xbb, 0xbf), expected: { refused: 'empty' } },
	{ name: 'a file of NUL bytes', file: zero(4096), expected: { refused: ['empty', 'binary'] } },
	{ name: 'gzip of nothing', file: gzip(''), expected: { refused: 'empty' } },
	{
		name: 'gzip cut short',
		file: gzip(file(['Time;Temp °C'], row)).subarray(0, 120),
		expected: { refused: ['truncated', 'broken-gzip'] }
	},
	{ name: 'gzip of a PDF', file: gzip('%PDF-1.7\n%\u00e2'), expected: { refused: 'pdf' } },
	{ name: 'gzip of a workbook', file: gzip(zipped('xl/workbook.xml')), expected: { refused: 'spreadsheet' } },
	{ name: 'a PDF', file: '%PDF-1.4\n1 0 obj <<>>', expected: { refused: 'pdf' } },
	{ name: 'a PDF behind an empty line', file: '\r\n%PDF-1.4\n1 0 obj <<>>', expected: { refused: 'pdf' } },
	{
		name: 'a workbook',
		file: zipped('[Content_Types].xml'),
		expected: { refused: 'spreadsheet', found: 'XLSX' }
	},
	{
		name: 'an OpenDocument sheet',
		file: zipped('mimetypeapplication/vnd.oasis.opendocument.spreadsheet'),
		expected: { refused: 'spreadsheet', found: 'ODS' }
	},
	{
		name: 'an old binary workbook',
		file: joined(bytes(0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1), zero(600)),
		expected: { refused: 'spreadsheet' }
	},
	{
		name: 'a workbook older still',
		file: joined(bytes(0x09, 0x08, 0x10, 0x00, 0x00, 0x06, 0x05, 0x00), zero(600)),
		expected: { refused: 'spreadsheet' }
	},
	{
		name: 'a workbook as XML',
		file: '<?xml version="1.0"?>\n<?mso-application progid="Excel.Sheet"?>\n<Workbook xmlns="urn:schemas-microsoft-com:office:spreadsheet">',
		expected: { refused: 'spreadsheet' }
	},
	{
		name: 'a flat OpenDocument sheet',
		file: '<?xml version="1.0"?>\n<office:document xmlns:office="urn:oasis:names:tc:opendocument:xmlns:office:1.0" office:mimetype="application/vnd.oasis.opendocument.spreadsheet">',
		expected: { refused: 'spreadsheet' }
	},
	{
		name: 'a word processor document',
		file: zipped('word/document.xml'),
		expected: { refused: ['zip', 'binary'] }
	},
	{ name: 'a ZIP archive', file: zipped('logger-export.csv'), expected: { refused: 'zip' } },
	{
		name: 'a 7z archive',
		file: joined(bytes(0x37, 0x7a, 0xbc, 0xaf, 0x27, 0x1c), zero(60)),
		expected: { refused: 'zip' }
	},
	{
		name: 'a RAR archive',
		file: joined(ascii('Rar!'), bytes(0x1a, 7, 1, 0), zero(60)),
		expected: { refused: 'zip' }
	},
	{
		name: 'a bzip2 archive',
		file: joined(ascii('BZh9'), bytes(0x31, 0x41, 0x59, 0x26, 0x53, 0x59), zero(60)),
		expected: { refused: 'zip' }
	},
	{
		name: 'an xz archive',
		file: joined(bytes(0xfd, 0x37, 0x7a, 0x58, 0x5a, 0), zero(60)),
		expected: { refused: 'zip' }
	},
	{
		name: 'a PNG',
		file: joined(bytes(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a), zero(60)),
		expected: { refused: 'image' }
	},
	{ name: 'a JPEG', file: joined(bytes(0xff, 0xd8, 0xff, 0xe0), zero(60)), expected: { refused: 'image' } },
	{
		name: 'a photo in HEIC',
		file: joined(bytes(0, 0, 0, 24), ascii('ftypheic'), zero(60)),
		expected: { refused: 'image' }
	},
	{
		name: 'a bitmap',
		file: joined(ascii('BM'), bytes(0x36, 0, 9, 0, 0, 0, 0, 0, 54, 0, 0, 0), zero(60)),
		expected: { refused: 'image' }
	},
	{
		name: 'an SVG',
		file: '<svg xmlns="http://www.w3.org/2000/svg"></svg>',
		expected: { refused: ['image', 'xml'] }
	},
	{
		name: 'a web page',
		file: '<!DOCTYPE html>\n<html><body>Please sign in</body></html>',
		expected: { refused: 'html' }
	},
	{
		name: 'a web page behind a mark and blank lines',
		file: '\ufeff\n\n<html lang="en"><head>',
		expected: { refused: 'html' }
	},
	{
		name: 'a web page that begins with a script',
		file: '<script>location="/login"</script>',
		expected: { refused: 'html' }
	},
	{
		name: 'a web page that holds the rows',
		file: `<table><tr><td>Time</td><td>°C</td></tr>${journey.map((p) => `<tr><td>${iso(p)}</td><td>${degrees(p)}</td></tr>`).join('\n')}</table>`,
		expected: { refused: 'html' }
	},
	{
		name: 'a page in UTF-16',
		file: utf16('<!DOCTYPE html><html></html>', false, true),
		expected: { refused: 'html' }
	},
	{
		name: 'XML of readings',
		file: '<?xml version="1.0"?><readings><r t="2026-03-14T18:00:00Z">2.1</r></readings>',
		expected: { refused: 'xml' }
	},
	{ name: 'rich text', file: '{\\rtf1\\ansi Time;Temp}', expected: { refused: 'binary', found: 'RTF' } },
	{ name: 'noise', file: noise, expected: { refused: 'binary' } },
	{ name: 'a program', file: joined(bytes(0x7f, 0x45, 0x4c, 0x46), noise), expected: { refused: 'binary' } },
	{
		name: 'a Windows program',
		file: joined(
			ascii('MZ'),
			bytes(0x90, 0, 3, 0, 0, 0),
			zero(40),
			ascii('This program cannot be run in DOS mode.'),
			noise
		),
		expected: { refused: 'binary' }
	},
	{
		name: 'a database file',
		file: joined(ascii('SQLite format 3\0'), noise),
		expected: { refused: 'binary' }
	},
	{ name: 'heads and no row', file: 'Time;Temperature (°C)\n', expected: { refused: 'header-only' } },
	{
		name: 'a preamble, heads and no row',
		file: 'Serial;A1\nStart;2026-03-14 18:00\n\nTime;Temperature (°C)\n',
		expected: { refused: ['header-only', 'no-readings'] }
	},
	{
		name: 'one reading',
		file: `Time;Temp (°C)\n${row(journey[0] as (typeof journey)[number])}\n`,
		expected: { refused: 'one-reading' }
	},
	{
		name: 'a letter',
		file: 'Dear receiver,\nplease find the export attached.\nKind regards\n',
		expected: { refused: 'no-readings' }
	},
	{
		name: 'a program text',
		file: 'function read(file) {\n  return file.rows.map((row) => row.temp);\n}\n',
		expected: { refused: 'no-readings' }
	},
	{
		name: 'times without temperatures',
		file: file(['Time;Event'], (p) => `${iso(p)};door`),
		expected: { refused: ['no-temperature', 'no-readings'] }
	},
	{
		name: 'humidity only',
		file: file(['Time;RH (%)'], (p) => `${iso(p)};61`),
		expected: { refused: 'no-temperature' }
	},
	{
		name: 'temperatures without times',
		file: file(['Temp (°C);RH (%)'], (p) => `${degrees(p)};61`),
		expected: { refused: 'no-time' }
	},
	{
		name: 'one moment for all rows',
		file: file(['Time;Temp (°C)'], (p) => `2026-03-14T18:00:00Z;${degrees(p)}`),
		expected: { refused: 'no-time-progress' }
	},
	{
		name: 'only faults in the temperature',
		file: file(['Time;Temp (°C)'], (p) => `${iso(p)};ERR`),
		expected: { refused: ['no-readings', 'no-temperature'] }
	},
	{
		name: 'a quote that never closes, with its line',
		file: file(['Time;Temp (°C);Note'], (p, i) => `${row(p)};${i === 5 ? '"door' : ''}`),
		expected: { refused: 'unclosed-quote', line: 7 }
	},
	{
		name: 'a line longer than any row',
		file: `Time;Temp\n${'1;'.repeat(40_000)}\n`,
		expected: { refused: 'line-too-long', line: 2 }
	}
];
