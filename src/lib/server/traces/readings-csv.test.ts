import { describe, expect, it } from 'vitest';
import { csvRows, csvText } from './readings-csv';

const text = (rows: Iterable<string>) => [...rows].join('');

describe('readings as CSV', () => {
	it('writes UTC and local times, negative figures as figures, and ends lines as RFC 4180 has them', () => {
		const trace = {
			unit: 'celsius' as const,
			decimals: 1,
			times: Float64Array.from([Date.parse('2026-03-29T00:50:00Z'), Date.parse('2026-03-29T01:00:00Z')]),
			scaled: Int32Array.from([-13, 5])
		};
		// The clocks of Amsterdam go from 02:00 to 03:00 at 01:00 UTC that night. Source: Directive 2000/84/EC, Article 2.
		expect(text(csvRows(trace, 'Europe/Amsterdam', ['PS-26-1184', 'WH-1', 'Temp', 'a.csv']))).toBe(
			'time_utc,time_local,celsius,as_written,unit,docket,logger,channel,file\r\n' +
				'2026-03-29T00:50:00Z,2026-03-29T01:50:00+01:00,-1.3,-1.3,celsius,PS-26-1184,WH-1,Temp,a.csv\r\n' +
				'2026-03-29T01:00:00Z,2026-03-29T03:00:00+02:00,0.5,0.5,celsius,PS-26-1184,WH-1,Temp,a.csv\r\n'
		);
	});

	it('writes a Fahrenheit file in both units, as it was written', () => {
		const trace = {
			unit: 'fahrenheit' as const,
			decimals: 1,
			times: Float64Array.from([0]),
			scaled: Int32Array.from([320])
		};
		expect(text(csvRows(trace, 'America/New_York', ['a', 'b', 'c', 'd']))).toContain(
			'1970-01-01T00:00:00Z,1969-12-31T19:00:00-05:00,0,32.0,fahrenheit,'
		);
	});

	it('loses no reading of a long trace', () => {
		const times = Float64Array.from({ length: 4321 }, (_, i) => i * 60_000);
		const trace = { unit: 'celsius' as const, decimals: 0, times, scaled: new Int32Array(4321) };
		expect(text(csvRows(trace, 'UTC', ['a'])).split('\r\n')).toHaveLength(4321 + 2);
	});

	// Source of the dangerous beginnings: OWASP, CSV Injection.
	it.each([
		['=HYPERLINK("x")', `"'=HYPERLINK(""x"")"`],
		['+1', "'+1"],
		['-1', "'-1"],
		['@SUM(A1)', "'@SUM(A1)"],
		['\tx', "'\tx"],
		['a,b', '"a,b"'],
		['line\nbreak', '"line\nbreak"'],
		['plain', 'plain']
	])('takes the danger out of the text cell %j', (given, written) => {
		expect(csvText(given)).toBe(written);
	});
});
