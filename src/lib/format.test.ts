import { describe, expect, it } from 'vitest';
import {
	addUp,
	count,
	counted,
	decimal,
	duration,
	fileSize,
	groupedHash,
	hoursMinutes,
	inUnit,
	lifeDays,
	lifeHours,
	lifeMonths,
	minorUnitDigits,
	money,
	percent,
	range,
	shortHash,
	signed,
	temperature,
	temperatureSign,
	temperatureSpan
} from './format';

describe('figures', () => {
	it('writes a true minus and never a minus zero', () => {
		expect(decimal(-1.3, 1, 'en')).toBe('−1.3');
		expect(decimal(-0.04, 1, 'en')).toBe('0.0');
		expect(decimal(-0, 0, 'en')).toBe('0');
	});

	it('rounds halves away from zero, the same on both sides of it', () => {
		expect(decimal(0.25, 1, 'en')).toBe('0.3');
		expect(decimal(-0.25, 1, 'en')).toBe('−0.3');
	});

	it('groups thousands and follows the locale that is given', () => {
		expect(count(1120, 'en')).toBe('1,120');
		expect(count(2720, 'de')).toBe('2.720');
		expect(decimal(10.1, 1, 'de')).toBe('10,1');
	});

	it('writes shares and signed figures', () => {
		expect(percent(0.768, 1, 'en')).toBe('76.8');
		expect(signed(2, 1, 'en')).toBe('+2.0');
		expect(signed(-2, 1, 'en')).toBe('−2.0');
	});

	it.each([
		[24 * 89, null],
		// Twelfths of 365.25 days.
		[24 * 182.625, '6 months'],
		[24 * 456.5625, '15 months'],
		[24 * 730.5, '24 months'],
		[24 * 135, '4.5 months'],
		[24 * 100, '3.5 months']
	])('gives a long life in months beside its days: %d h are %s', (hours, months) => {
		expect(lifeMonths(hours, 'en')).toBe(months);
	});

	it('gives life in days or hours with one decimal', () => {
		expect(lifeDays(242.4, 'en')).toBe('10.1');
		expect(lifeDays(-12, 'en')).toBe('−0.5');
		expect(lifeHours(41.21, 'en')).toBe('41.2');
	});
});

describe('temperatures', () => {
	// Source of the relation: NIST SP 811 (2008), B.8: t/°F = 1.8 t/°C + 32; −40 is the same in both.
	it('shifts a temperature into the reader’s unit and only scales a span', () => {
		expect(temperature(-40, 'fahrenheit', 'en')).toBe('−40.0');
		expect(temperature(4, 'fahrenheit', 'en')).toBe('39.2');
		expect(temperatureSpan(0.5, 'fahrenheit', 'en')).toBe('0.9');
		expect(temperatureSpan(0.5, 'celsius', 'en')).toBe('0.5');
		expect(inUnit(0, 'kelvin')).toBe(273.15);
	});

	it('names the unit', () => {
		expect((['celsius', 'fahrenheit', 'kelvin'] as const).map(temperatureSign)).toEqual(['°C', '°F', 'K']);
	});
});

describe('ranges', () => {
	it('takes an en dash between figures', () => {
		expect(range('9.7', '10.5')).toBe('9.7–10.5');
	});

	it('says "to" where a minus would stand beside the dash', () => {
		expect(range('−0.5', '4.0')).toBe('−0.5 to 4.0');
		expect(range('−2.0', '−1.0', 'bis')).toBe('−2.0 bis −1.0');
	});

	it('says one figure where low and high print the same', () => {
		expect(range('9.7', '9.7')).toBe('9.7');
	});
});

describe('lengths of time', () => {
	it('prints minutes as hours and minutes', () => {
		expect(hoursMinutes(603)).toBe('10:03');
		expect(hoursMinutes(5700)).toBe('95:00');
		expect(hoursMinutes(-22)).toBe('−0:22');
		expect(hoursMinutes(59.6)).toBe('1:00');
	});

	it.each([
		[15_420_000, '4 h 17 min'],
		[102_600_000, '28 h 30 min'],
		[255_600_000, '2 d 23 h'],
		[172_800_000, '2 d'],
		[7_200_000, '2 h'],
		[780_000, '13 min'],
		[59_999, '0 min'],
		[9_000, '9 s'],
		[0, '0 s'],
		[-600_000, '10 min']
	])('says %i ms as %s', (ms, text) => {
		expect(duration(ms)).toBe(text);
	});
});

describe('files', () => {
	it.each([
		[0, '0 B'],
		[999, '999 B'],
		[18_200, '18 KB'],
		[1_500, '1.5 KB'],
		[412_000, '412 KB'],
		[5_800_000, '5.8 MB'],
		[999_700, '1.0 MB'],
		[50_000_000, '50 MB']
	])('says %i bytes as %s', (bytes, text) => {
		expect(fileSize(bytes, 'en')).toBe(text);
	});

	it('shortens a hash to eight and four and groups a whole one', () => {
		// Source: FIPS 180-2, appendix B.1: SHA-256 of "abc".
		const abc = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad';
		expect(shortHash(abc)).toBe('ba7816bf…15ad');
		expect(shortHash('ba7816bf')).toBe('ba7816bf');
		expect(groupedHash(abc)).toBe('ba7816bf 8f01cfea 414140de 5dae2223 b00361a3 96177a9c b410ff61 f20015ad');
	});
});

describe('money', () => {
	// Source: ISO 4217 list one, column "minor unit".
	it('has as many decimals as the currency', () => {
		expect(money(921_600, 'EUR', 'en')).toBe('9,216.00');
		expect(money(-198_400, 'EUR', 'en')).toBe('−1,984.00');
		expect(money(921_600, 'JPY', 'en')).toBe('921,600');
		expect(money(1_234, 'KWD', 'en')).toBe('1.234');
		expect(minorUnitDigits('IQD')).toBe(3);
		expect(minorUnitDigits('clf')).toBe(4);
	});
});

describe('rows that add up', () => {
	it('gives what is missing to the largest remainders', () => {
		expect(addUp([33.33, 33.33, 33.34], 0)).toEqual([33, 33, 34]);
		expect(addUp([1 / 3, 1 / 3, 1 / 3], 2)).toEqual([0.34, 0.33, 0.33]);
	});

	it('adds up for negative rows too', () => {
		const rows = addUp([-0.26, 1.13, 0.13], 1);
		expect(rows.reduce((sum, row) => sum + row, 0)).toBeCloseTo(1, 10);
	});

	it('leaves exact rows alone and takes an empty table', () => {
		expect(addUp([0.1, 0.2, 0.3], 1)).toEqual([0.1, 0.2, 0.3]);
		expect(addUp([], 1)).toEqual([]);
	});
});

describe('a count with its noun', () => {
	it('speaks of one as one', () => {
		expect(counted(1, 'gap')).toBe('1 gap');
		expect(counted(0, 'gap')).toBe('0 gaps');
		expect(counted(1120, 'box', 'boxes')).toBe('1,120 boxes');
	});
});
