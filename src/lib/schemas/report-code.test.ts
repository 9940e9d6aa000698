import { describe, expect, it } from 'vitest';
import { reportCode } from './report-code';

const code = '9d4020be66864093';
const whole = code.repeat(4);

describe('a report’s code as it comes', () => {
	it.each([
		['as printed', code],
		['in groups', '9d40 20be 6686 4093'],
		['in capitals', '9D4020BE66864093'],
		['with dashes of any length', '9d40-20be–6686—4093'],
		['with a letter O and an l for digits', '9d4O2Obe66864O93'],
		['with its address', `https://pellstaithe.example/verify/${code}`],
		['with the address as it breaks on paper', 'pellstaithe.example/\nverify/\n9d4020be66864093'],
		['with an older address and a trailing slash', `http://pellstaithe.example:3000/check/${code}/?a=1#b`],
		['between spaces, non-breaking ones too', `  ${code.slice(0, 8)}\u00a0${code.slice(8)}\n`],
		['in full-width digits', '９d4020be66864093']
	])('is read %s', (_, typed) => {
		expect(reportCode(typed)).toBe(code);
	});

	it('may be a whole digest, of the record or of the file', () => {
		expect(reportCode(whole)).toBe(whole);
	});

	it.each([
		['nothing', ''],
		['one digit short', code.slice(1)],
		['longer than a digest', `${whole}0`],
		['letters that are no digits', '9d4020be6686409g'],
		['a wildcard', '9d4020be6686409%'],
		['a path', '../../etc/passwd'],
		['only an address', 'https://pellstaithe.example/']
	])('is not one: %s', (_, typed) => {
		expect(reportCode(typed)).toBeNull();
	});
});
