import { gzipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import type { Channel, ReadContext } from './ingestion';
import { longestShown, originalLines, readingAt } from './original-lines';
import { readExport } from './read-export';

const utf8 = (text: string) => new TextEncoder().encode(text);
const context: ReadContext = {
	uploadedMs: Date.UTC(2026, 3, 20, 12),
	siteZone: 'Europe/Berlin',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};

describe('the original lines of a file', () => {
	const text = 'Trip;7\n\ntime;°C\n2026-04-03T10:00:00Z;4,5\n2026-04-03T10:10:00Z;4,6\n';

	it.each([
		['as they are', utf8(text)],
		['from gzip', gzipSync(utf8(text))],
		['with CRLF', utf8(text.replaceAll('\n', '\r\n'))],
		['with CR alone', utf8(text.replaceAll('\n', '\r'))],
		[
			'from UTF-16',
			new Uint8Array([
				0xff,
				0xfe,
				...new Uint8Array(Uint16Array.from([...text], (c) => c.charCodeAt(0)).buffer)
			])
		]
	])('are counted from one and shown unchanged, %s', (_, bytes) => {
		expect(originalLines(bytes, 3, 2)).toEqual({
			total: 5,
			lines: [
				{ line: 3, text: 'time;°C', isCut: false },
				{ line: 4, text: '2026-04-03T10:00:00Z;4,5', isCut: false }
			]
		});
	});

	it.each([
		['before the first', -3, 5, [1]],
		['from the last on', 5, 50, [5]],
		['past the end', 6, 10, []],
		['none', 2, 0, []]
	])('are bounded by the file: %s', (_, from, count, expected) => {
		expect(originalLines(utf8(text), from, count)?.lines.map(({ line }) => line)).toEqual(expected);
	});

	it('are cut where one is too long to show, and say so', () => {
		const [line] = originalLines(utf8(`${'x'.repeat(3_000_000)}\ny\n`), 1, 1)?.lines ?? [];
		expect(line).toEqual({ line: 1, text: 'x'.repeat(longestShown), isCut: true });
	});

	it('hold nothing that steers a screen or turns letters about', () => {
		const bytes = utf8('a\u001b[31mb\u202ec\td<script>\n2\n3\n');
		expect(originalLines(bytes, 1, 1)?.lines[0]?.text).toBe('a\ufffd[31mb\ufffdc\td<script>');
	});

	it.each([
		['nothing', new Uint8Array()],
		['a PDF', utf8('%PDF-1.7\n1 0 obj\n')],
		['random bytes', Uint8Array.from({ length: 4000 }, (_, i) => (i * 7919) % 256)]
	])('are none of a file that is no text: %s', (_, bytes) => {
		expect(originalLines(bytes, 1, 10)).toBeNull();
	});

	it('hold each reading at the line the reader names for it', () => {
		const rows = [10, 0, 20, 30].map((m) => `2026-04-03T10:${String(m).padStart(2, '0')}:00Z;${4 + m / 100}`);
		const bytes = utf8(['time;celsius', ...rows].join('\n'));
		const found = readExport(bytes, context);
		if (found.kind !== 'ok') throw new Error('not read');
		const channel = found.understanding.channels[0] as Channel;
		const at = readingAt(channel, Date.UTC(2026, 3, 3, 10, 0));
		expect(at).toBe(0);
		const line = channel.lines?.[at] ?? 0;
		expect(originalLines(bytes, line, 1)?.lines).toEqual([{ line: 3, text: rows[1], isCut: false }]);
		for (const ms of [Date.UTC(2026, 3, 3, 10, 5), 0, Number.MAX_SAFE_INTEGER])
			expect(readingAt(channel, ms)).toBe(-1);
	});
});
