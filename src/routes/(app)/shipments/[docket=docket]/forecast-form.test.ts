import { describe, expect, it } from 'vitest';
import { typedCelsius, typedFigure, typedLegs, typedSpan } from './forecast-form';

describe('a figure typed for the forecast', () => {
	it.each([
		['4', 4],
		[' −1,5 ', -1.5],
		['+0.5', 0.5],
		['.5', 0.5],
		['', null],
		['4 °C', null],
		['1e3', null]
	])('%j is %j', (text, value) => {
		expect(typedFigure(text)).toBe(value);
	});

	it('is in the reader’s unit, and nothing beyond what food travels at', () => {
		// UCUM: 41 °F is 5 °C; a difference of 9 °F is 5 °C.
		expect(typedCelsius('41', 'fahrenheit')).toBe(5);
		expect(typedSpan('9', 'fahrenheit')).toBe(5);
		expect(typedCelsius('61', 'celsius')).toBeNull();
		expect(typedCelsius('61', 'fahrenheit')).not.toBeNull();
		expect(typedSpan('-1', 'celsius')).toBeNull();
		expect(typedSpan('', 'celsius')).toBe(0);
	});
});

describe('legs typed for the onward trip', () => {
	it('are those filled in, in order', () => {
		const legs = [
			{ hours: '12', degrees: '2', plusMinus: '1' },
			{ hours: '', degrees: ' ', plusMinus: '' },
			{ hours: '0,5', degrees: '8', plusMinus: '' }
		];
		expect(typedLegs(legs, 'celsius')).toEqual([
			{ hours: 12, celsius: 2, plusMinusCelsius: 1 },
			{ hours: 0.5, celsius: 8, plusMinusCelsius: 0 }
		]);
	});

	it.each([
		{ hours: '-1', degrees: '2', plusMinus: '' },
		{ hours: '5', degrees: '', plusMinus: '' },
		{ hours: '5', degrees: '2', plusMinus: 'x' }
	])('are not read at all while one is %j', (leg) => {
		expect(typedLegs([{ hours: '1', degrees: '1', plusMinus: '' }, leg], 'celsius')).toBeNull();
	});
});
