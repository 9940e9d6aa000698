import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkDigit, completedKey, gtin14Of, isValidGtin, isValidKey, type Gs1Key } from './check-digit';

// Sources: gs1.org check digit calculator page (first), gs1.se (second), GS1 EPCIS 2.0 repository, JSON/WithSensorData
// (4012345.…, 9506000…), GS1 Tag Data Standard 2.0 examples (0614141, 8061414112345), GS1 General Specifications 7.9.
const published: readonly (readonly [Gs1Key, string, number])[] = [
	['gtin13', '629104150021', 3],
	['gtin13', '730001100001', 7],
	['gln', '401234500005', 4],
	['gln', '950600013430', 7],
	['gln', '061414112345', 2],
	['gtin14', '0950600013435', 2],
	['gtin14', '0401234511111', 8],
	['gtin14', '8061414112345', 8],
	['sscc', '10614141234567890', 8],
	['sscc', '04012345111111111', 0],
	['gtin12', '03600029145', 2],
	['gtin8', '9638507', 4]
];

describe('a check digit', () => {
	it.each(published)('of %s %s is %d', (key, without, digit) => {
		expect(checkDigit(without)).toBe(digit);
		expect(completedKey(key, without)).toBe(`${without}${digit}`);
		expect(isValidKey(key, `${without}${digit}`)).toBe(true);
	});

	it('is nought where the sum is a multiple of ten already', () => {
		expect(checkDigit('0000000')).toBe(0);
		expect(checkDigit('04012345111111111')).toBe(0);
	});

	it('finds any single wrong digit', () => {
		for (const [key, without, digit] of published) {
			const whole = `${without}${digit}`;
			for (let at = 0; at < whole.length; at++) {
				for (let other = 0; other < 10; other++) {
					if (Number(whole[at]) === other) continue;
					expect(isValidKey(key, whole.slice(0, at) + String(other) + whole.slice(at + 1))).toBe(false);
				}
			}
		}
	});

	it('completes any digits to a valid key', () => {
		const seventeen = fc.array(fc.integer({ min: 0, max: 9 }), { minLength: 17, maxLength: 17 });
		fc.assert(
			fc.property(seventeen, (digits) => {
				expect(isValidKey('sscc', completedKey('sscc', digits.join('')) ?? '')).toBe(true);
			})
		);
	});

	it('is none of what is not digits', () => {
		for (const text of ['', '12a', '12 3', '١٢٣', '-1', '1.5']) expect(checkDigit(text)).toBeNull();
		expect(completedKey('gln', '12345')).toBeNull();
	});
});

describe('a GTIN', () => {
	it('may have 8, 12, 13 or 14 digits and no other number', () => {
		for (const gtin of ['96385074', '036000291452', '6291041500213', '09506000134352']) {
			expect(isValidGtin(gtin)).toBe(true);
		}
		expect(isValidGtin('106141412345678908')).toBe(false);
		expect(isValidGtin('')).toBe(false);
		expect(isValidGtin('6291041500214')).toBe(false);
	});

	it('is held in fourteen digits, whose check digit is the same', () => {
		expect(gtin14Of('6291041500213')).toBe('06291041500213');
		expect(gtin14Of('96385074')).toBe('00000096385074');
		expect(gtin14Of('96385075')).toBeNull();
	});
});
