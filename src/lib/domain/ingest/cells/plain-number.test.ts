import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { emptyNumber, scanNumber } from './number-text';
import { readPlainNumber } from './plain-number';

const read = (text: string) => {
	const into = emptyNumber();
	return readPlainNumber(text, 0, text.length, into) ? into : null;
};

describe('a plain number', () => {
	it.each([
		['4.5', 45, 1, false],
		['-0,1', -1, 1, true],
		['  12 ', 12, 0, false],
		['-0.0', 0, 1, false],
		['007.1234', 71_234, 4, false],
		['999999999999999', 999_999_999_999_999, 0, false]
	])('%j is read in place', (text, mantissa, decimals, hasComma) => {
		expect(read(text)).toEqual({ mantissa, decimals, hasComma, unit: null });
	});

	it.each([
		'',
		' ',
		'-',
		'.5',
		'5.',
		'1.2.3',
		'1,234.5',
		'1.23456',
		'+4',
		'4.5°C',
		'4e1',
		'−4',
		'1 2',
		'n/a'
	])('%j is left to the whole reader', (text) => {
		expect(read(text)).toBeNull();
	});

	it('is never read otherwise than the whole reader reads it', () => {
		const piece = fc.constantFrom('-', '+', ' ', '.', ',', '0', '1', '9', '42', '127', '°C', 'e2', '\u00a0');
		fc.assert(
			fc.property(fc.array(piece, { maxLength: 8 }), (pieces) => {
				const text = pieces.join('');
				const mine = read(text);
				const whole = emptyNumber();
				if (mine !== null) expect([scanNumber(text, whole), whole]).toEqual(['number', mine]);
			}),
			{ numRuns: 5000, seed: 11 }
		);
	});

	it('ends where it is told to', () => {
		const into = emptyNumber();
		expect([readPlainNumber('x;4.5;9', 2, 5, into), into.mantissa]).toEqual([true, 45]);
	});
});
