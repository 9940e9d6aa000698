import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { hasOpenQuote, splitRow } from './split-row';

describe('a delimited row', () => {
	// Source: RFC 4180 §2, rules 5 to 7.
	it.each([
		['aaa,bbb,ccc', ['aaa', 'bbb', 'ccc']],
		['"aaa","b""bb","ccc"', ['aaa', 'b"bb', 'ccc']],
		['"aaa","b\r\nbb","ccc"', ['aaa', 'b\r\nbb', 'ccc']],
		['"a,b",,', ['a,b', '', '']],
		['', ['']]
	])('%j gives its cells', (text, cells) => {
		expect(splitRow(text, ',')).toEqual(cells);
	});

	it('of spaces gives its cells', () => {
		expect(splitRow('  2026-04-01 10:00   4.5  ', 'spaces')).toEqual(['2026-04-01 10:00', '4.5']);
		expect(splitRow('2026-04-01 10:00 4.5', 'space')).toEqual(['2026-04-01', '10:00', '4.5']);
	});

	it('goes on in the next line while a quote is open', () => {
		expect(hasOpenQuote('"a,b', ',')).toBe(true);
		expect(hasOpenQuote('x,"a""', ',')).toBe(true);
		expect(hasOpenQuote('"a","b"', ',')).toBe(false);
		expect(hasOpenQuote('5" probe,4.5', ',')).toBe(false);
	});

	it('has the cells that csv-parse sees', () => {
		const cell = fc.oneof(
			fc.stringMatching(/^[a-z0-9 .:°-]{1,8}$/).map((s) => s.trim()),
			fc.constantFrom('a,b', 'say "no"', 'two\nlines', '')
		);
		const quoted = (text: string): string => (/[",\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text);
		fc.assert(
			fc.property(fc.array(cell, { minLength: 1, maxLength: 6 }), (cells) => {
				const row = cells.map(quoted).join(',');
				fc.pre(row !== '');
				expect(splitRow(row, ',')).toEqual((parse(row) as string[][])[0]);
			}),
			{ numRuns: 500, seed: 11 }
		);
	});
});
