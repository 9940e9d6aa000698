import { describe, expect, it } from 'vitest';
import { emptyNumber, scanNumber } from './number-text';

const number = emptyNumber();
const scanned = (text: string): unknown => {
	const state = scanNumber(text, number);
	return state === 'number' ? [number.mantissa, number.decimals, number.unit] : state;
};

describe('a cell read as a number', () => {
	it.each([
		['4.5', [45, 1, null]],
		['4,5', [45, 1, null]],
		['-0.5', [-5, 1, null]],
		['0', [0, 0, null]],
		['-0.0', [0, 1, null]],
		['+12', [12, 0, null]],
		['\u221219.5', [-195, 1, null]],
		['\u201319,5', [-195, 1, null]],
		['- 3.2', [-32, 1, null]],
		[' 4.5\u00a0', [45, 1, null]],
		['4.5 °C', [45, 1, 'celsius']],
		['40.1°F', [401, 1, 'fahrenheit']],
		['277.65 K', [27765, 2, 'kelvin']],
		['4.5C', [45, 1, 'celsius']],
		['4.5 ℃', [45, 1, 'celsius']],
		['81 %', [81, 0, null]],
		['.5', [5, 1, null]],
		['1.234,5', [12345, 1, null]],
		['1,234.5', [12345, 1, null]],
		['1,234,567', [1234567, 0, null]],
		['4.56789', [45679, 4, null]],
		// Rounded digit by digit it would be 2.1777.
		['2.1776477000', [21776, 4, null]],
		['4.1e0', [41, 1, null]],
		['4.5E-1', [45, 2, null]]
	])('%j keeps its digits and unit', (text, expected) => {
		expect(scanned(text)).toEqual(expected);
	});

	it.each([
		'',
		' ',
		'-',
		'---',
		'n/a',
		'NaN',
		'null',
		'ERR',
		'Fehler',
		'kein Wert',
		'sin dato',
		'brak danych',
		'****',
		'欠測',
		'No sensor',
		'--.-'
	])('%j stands for no value', (text) => {
		expect(scanned(text)).toBe('missing');
	});

	it.each([
		'abc',
		'12.',
		'1.2.3',
		'4 5',
		'10:30',
		'2026-04-01',
		'4.5 apples',
		'1,23,4',
		// A raised digit is a footnote's, and no decimal.
		'1.³',
		'4.5²',
		'½',
		'12345678901234567890'
	])('%j is text, not a number', (text) => {
		expect(scanned(text)).toBe('text');
	});
});
