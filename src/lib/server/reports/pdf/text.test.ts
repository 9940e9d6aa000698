import { describe, expect, it } from 'vitest';
import { calendar, hashLines, thermometer } from './text';

describe('text of the report', () => {
	it('breaks a hash into lines of whole groups and loses none of it', () => {
		const hash = '0123456789abcdef'.repeat(4);
		const lines = hashLines(hash, 4);
		expect(lines.split('\n')).toHaveLength(2);
		expect(lines.replace(/\s/gu, '')).toBe(hash);
	});

	// Source of the relation: UCUM, [degF]: 5 K to 9 °F.
	it('shifts a temperature, scales a difference and degree-minutes', () => {
		const fahrenheit = thermometer('fahrenheit');
		expect(fahrenheit.reading(0)).toBe('32.0');
		expect(fahrenheit.difference(0.5)).toBe('0.9');
		expect(fahrenheit.degreeMinutes(1000)).toBe('1,800');
		expect(fahrenheit.celsius(212)).toBeCloseTo(100, 9);
	});

	it('says instants in the zone, across a clock change', () => {
		const berlin = calendar('Europe/Berlin');
		expect(berlin.time('2026-03-29T00:59:00Z')).toBe('01:59');
		expect(berlin.time('2026-03-29T01:00:00Z')).toBe('03:00');
		expect(berlin.zoneName('2026-03-29T00:59:00Z')).toBe('CET');
		expect(berlin.zoneName('2026-03-29T01:00:00Z')).toBe('CEST');
		expect(berlin.offset('2026-03-29T01:00:00Z')).toBe('+02:00');
	});

	it('names American zones by letters, and others by themselves', () => {
		expect(calendar('America/New_York').zoneName('2026-07-01T00:00:00Z')).toBe('EDT');
		expect(calendar('America/New_York').offset('2026-07-01T00:00:00Z')).toBe('−04:00');
		expect(calendar('Asia/Kathmandu').zoneName('2026-07-01T00:00:00Z')).toBe('Asia/Kathmandu');
	});
});
