import { describe, expect, it } from 'vitest';
import { isUnitCell, unitWithin, wholeUnitOf } from './unit-words';

describe('a temperature unit', () => {
	// Codes: UN/ECE Recommendation 20 (CEL, FAH, KEL), UCUM (Cel, [degF], K).
	it.each([
		['°C', 'celsius'],
		['ºC', 'celsius'],
		['℃', 'celsius'],
		['Cel', 'celsius'],
		['CEL', 'celsius'],
		['degC', 'celsius'],
		['[°C]', 'celsius'],
		['°F', 'fahrenheit'],
		['[degF]', 'fahrenheit'],
		['FAH', 'fahrenheit'],
		['Fahrenheit', 'fahrenheit'],
		['K', 'kelvin'],
		['KEL', 'kelvin'],
		['%RH', null],
		['V', null],
		['', null],
		['constructor', null]
	])('as a whole cell: %j', (text, unit) => {
		expect(wholeUnitOf(text)).toBe(unit);
	});

	it.each([
		['Temperature (°C)', 'celsius'],
		['Temp. [C]', 'celsius'],
		['temp_c', 'celsius'],
		['temp_f', 'fahrenheit'],
		['tempF', 'fahrenheit'],
		['Temperature °F', 'fahrenheit'],
		['Temperature, deg F', 'fahrenheit'],
		['Temperatur in Grad Celsius', 'celsius'],
		['T/K', 'kelvin'],
		['T (K)', 'kelvin'],
		['Temperature', null],
		['Sonde C1', null],
		['Channel', null],
		['Check', null],
		['Humidity %', null],
		['Temperature \ufffdC', 'celsius']
	])('inside a head: %j', (text, unit) => {
		expect(unitWithin(text)).toBe(unit);
	});

	it('or of anything else makes a row of units', () => {
		expect(['°C', '%RH', '%', 'lx', 'V', '[%]'].every(isUnitCell)).toBe(true);
		expect(['Time', '4.5', 'Temperature'].some(isUnitCell)).toBe(false);
	});
});
