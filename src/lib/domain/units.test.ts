import { describe, expect, it } from 'vitest';
import {
	celsiusFromFahrenheit,
	celsiusFromKelvin,
	celsiusFromScaled,
	fahrenheitFromCelsius,
	kelvinFromCelsius
} from './units';

// Source: UCUM, [degF], factor 5 K/9 and offset 459.67; the pairs follow exactly.
const pairs = [
	[28, -20 / 9],
	[32, 0],
	[33, 5 / 9],
	[34, 10 / 9],
	[40, 40 / 9],
	[41, 5],
	[45, 65 / 9],
	[50, 10],
	[72, 200 / 9],
	[77, 25],
	[104, 40],
	[0, -160 / 9],
	[-0.4, -18],
	[-4, -20],
	[44.6, 7]
] as const;

describe('degrees Fahrenheit', () => {
	it.each(pairs)('%d °F is %d °C', (fahrenheit, celsius) => {
		expect(celsiusFromFahrenheit(fahrenheit)).toBeCloseTo(celsius, 12);
		expect(celsiusFromScaled(Math.round(fahrenheit * 10), 1, 'fahrenheit')).toBeCloseTo(celsius, 12);
		expect(fahrenheitFromCelsius(celsius)).toBeCloseTo(fahrenheit, 12);
	});

	it('41.0 is exactly the 5 °C a limit is written in, 41.1 is over it', () => {
		// Source: FDA Food Code 3-202.11(A), 41 °F (5 °C).
		expect(celsiusFromScaled(410, 1, 'fahrenheit')).toBe(5);
		expect(celsiusFromScaled(411, 1, 'fahrenheit')).toBeGreaterThan(5);
		expect(celsiusFromScaled(41, 0, 'fahrenheit')).toBe(5);
	});

	it('are the same double as the Celsius reading wherever that is exact in tenths', () => {
		for (let tenths = -400; tenths <= 600; tenths++) {
			const fahrenheitHundredths = (tenths * 18 + 3200) / 1;
			expect(celsiusFromScaled(fahrenheitHundredths, 2, 'fahrenheit')).toBe(
				celsiusFromScaled(tenths, 1, 'celsius')
			);
		}
	});
});

describe('a scaled reading', () => {
	it('is divided once', () => {
		expect(celsiusFromScaled(-183, 1, 'celsius')).toBe(-18.3);
		expect(celsiusFromScaled(501, 2, 'celsius')).toBe(5.01);
		expect(celsiusFromScaled(7, 0, 'celsius')).toBe(7);
	});

	it('in kelvin has its zero at 273.15', () => {
		// Source: SI Brochure, 9th edition, 2.3.1.
		expect(celsiusFromScaled(27_315, 2, 'kelvin')).toBe(0);
		expect(celsiusFromScaled(2781, 1, 'kelvin')).toBe(4.95);
		expect(kelvinFromCelsius(0)).toBe(273.15);
		expect(celsiusFromKelvin(kelvinFromCelsius(25))).toBeCloseTo(25, 12);
	});
});
