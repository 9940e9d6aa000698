import { describe, expect, it } from 'vitest';
import { composedSscc, formattedSscc, ssccOf } from './sscc';

// Source: GS1 EPCIS 2.0 repository: urn:epc:id:sscc:0614141.1234567890 and 4012345.0111111111; the first digit after
// the dot is the extension digit and moves to the front (GS1 Tag Data Standard 2.0, 6.3.2).
const published = '106141412345678908';

describe('an SSCC', () => {
	it('is printed in its parts', () => {
		expect(formattedSscc(published)).toBe('1 0614141 234567890 8');
		expect(formattedSscc(published, 9)).toBe('1 061414123 4567890 8');
	});

	it('stays as it is where it is none', () => {
		expect(formattedSscc('106141412345678907')).toBe('106141412345678907');
		expect(formattedSscc('pallet 4')).toBe('pallet 4');
	});

	it('is read with spaces, brackets and its identifier', () => {
		for (const text of [published, `(00)${published}`, `00${published}`, '(00) 1 0614141 234567890 8']) {
			expect(ssccOf(text)).toBe(published);
		}
		expect(ssccOf('106141412345678907')).toBeNull();
		expect(ssccOf('')).toBeNull();
	});

	it('is composed with the extension digit in front', () => {
		expect(composedSscc(1, '0614141', 234_567_890)).toBe(published);
		expect(composedSscc(0, '4012345', 111_111_111)).toBe('040123451111111110');
	});

	it('is none where the parts do not fit', () => {
		expect(composedSscc(1, '0614141', 12_345_678_901)).toBeNull();
		expect(composedSscc(1, '0614141', -1)).toBeNull();
		expect(composedSscc(12, '0614141', 1)).toBeNull();
	});
});
