import { describe, expect, it } from 'vitest';
import { readLifeTable, type LifeTableUnits } from './life-table-text';

const days: LifeTableUnits = { temperature: 'celsius', life: 'days' };
const pairs = (text: string, units = days) =>
	readLifeTable(text, units).points.map(({ celsius, lifeHours }) => [celsius, lifeHours]);
const codes = (text: string, units = days) =>
	readLifeTable(text, units).faults.map(({ line, code }) => [line, code]);

describe('a pasted table of life against temperature', () => {
	it.each([
		['tabs', '0\t28\n5\t14\n10\t5'],
		['semicolons', '0;28\n5;14\n10;5'],
		['blanks', '0 28\n 5   14\n10 5 '],
		['commas', '0,28\n5,14\n10,5'],
		['a comma and a blank', '0, 28\n5, 14\n10, 5'],
		['signs of degrees', '0 °C 28\n5°C 14\n10 ° 5'],
		['a heading and empty lines', 'Temperature;Life\n\n0;28\n5;14\n\n10;5\n'],
		['the ends of lines of another system', '0;28\r\n5;14\r10;5']
	])('is read by %s', (_, text) => {
		expect(pairs(text)).toEqual([
			[0, 672],
			[5, 336],
			[10, 120]
		]);
		expect(codes(text)).toEqual([]);
	});

	it('takes decimal commas where something else parts the figures', () => {
		expect(pairs('−0,5;2,5\n-1.5\t3.25')).toEqual([
			[-0.5, 60],
			[-1.5, 78]
		]);
		expect(pairs('0,5 2,5')).toEqual([[0.5, 60]]);
	});

	it('takes both ends of a range of lives, and a temperature below zero beside it', () => {
		expect(pairs('-0.5 21-28\n5;14 – 16\n7 3 to 4')).toEqual([
			[-0.5, 504],
			[-0.5, 672],
			[5, 336],
			[5, 384],
			[7, 72],
			[7, 96]
		]);
	});

	// UCUM: 41 °F is 5 °C. A month is a twelfth of 365.25 days: 30.4375.
	it.each([
		[{ temperature: 'fahrenheit', life: 'days' }, '41 14', [[5, 336]]],
		[{ temperature: 'celsius', life: 'hours' }, '5 336', [[5, 336]]],
		[{ temperature: 'celsius', life: 'months' }, '-18 6', [[-18, 4383]]]
	] as const)('is read in %j', (units, text, expected) => {
		expect(pairs(text, units)).toEqual(expected);
	});

	it.each([
		['0', 'not-two-figures'],
		['0 28 5', 'not-two-figures'],
		['zero 28x', 'not-two-figures'],
		['0;28;5', 'not-two-figures'],
		['0 1-2-3', 'not-two-figures'],
		['1,5,28', 'ambiguous-commas'],
		['5 0', 'life-not-positive'],
		['5;-2', 'life-not-positive'],
		['-274 5', 'below-absolute-zero']
	])('names the line of %j', (line, code) => {
		expect(codes(`0;28\n${line}`)).toEqual([[2, code]]);
		expect(pairs(`0;28\n${line}`)).toEqual([[0, 672]]);
	});

	it('stops at more lines than any table has', () => {
		expect(codes('0 28\n'.repeat(600))).toEqual([[501, 'too-many-lines']]);
	});
});
