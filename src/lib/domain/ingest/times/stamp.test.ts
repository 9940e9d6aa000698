import { describe, expect, it } from 'vitest';
import { emptyStamp, noOffset, noTime, scanStamp } from './stamp';

const stamp = emptyStamp();
const clock = (h: number, m = 0, s = 0, ms = 0): number => ((h * 60 + m) * 60 + s) * 1000 + ms;

function scanned(text: string): unknown {
	if (!scanStamp(text, stamp)) return null;
	const { shape, a, b, c, msOfDay, offsetMinutes } = stamp;
	return {
		date: shape === 'none' ? null : [shape, a, b, c],
		at: msOfDay === noTime ? null : msOfDay,
		offset: offsetMinutes === noOffset ? null : offsetMinutes
	};
}

describe('a time text', () => {
	it.each([
		['2026-04-03T10:30:15Z', ['year-first', 2026, 4, 3], clock(10, 30, 15), 0],
		['2026-04-03t10:30:15.250z', ['year-first', 2026, 4, 3], clock(10, 30, 15, 250), 0],
		['2026-04-03 10:30', ['year-first', 2026, 4, 3], clock(10, 30), null],
		['2026-04-03T10:30:00+02:00', ['year-first', 2026, 4, 3], clock(10, 30), 120],
		['2026-04-03 10:30:00 -0800', ['year-first', 2026, 4, 3], clock(10, 30), -480],
		['2026-04-03 10:30 UTC+2', ['year-first', 2026, 4, 3], clock(10, 30), 120],
		['2026/4/3 9:05', ['year-first', 2026, 4, 3], clock(9, 5), null],
		['20260403T103015', ['year-first', 2026, 4, 3], clock(10, 30, 15), null],
		['20260403103015', ['year-first', 2026, 4, 3], clock(10, 30, 15), null],
		['03/04/2026 10:30', ['open', 3, 4, 2026], clock(10, 30), null],
		['3.4.26 10:30', ['open', 3, 4, 26], clock(10, 30), null],
		['10:30 03/04/2026', ['open', 3, 4, 2026], clock(10, 30), null],
		['03-Apr-2026 10:30', ['named', 2026, 4, 3], clock(10, 30), null],
		['Apr 3, 2026 1:30 PM', ['named', 2026, 4, 3], clock(13, 30), null],
		['3. April 2026 10:30 Uhr', ['named', 2026, 4, 3], clock(10, 30), null],
		['3 avr. 2026 10h30', ['named', 2026, 4, 3], clock(10, 30), null],
		['3 de abril de 2026 10:30', ['named', 2026, 4, 3], clock(10, 30), null],
		['Fri, 03 Apr 2026 10:30:00 GMT', ['named', 2026, 4, 3], clock(10, 30), 0],
		['03-kwi-26 10:30', ['named', 2026, 4, 3], clock(10, 30), null],
		['2026年4月3日 10時30分', ['year-first', 2026, 4, 3], clock(10, 30), null],
		['03/04/2026 12:00 AM', ['open', 3, 4, 2026], 0, null],
		['03/04/2026 12:00 p.m.', ['open', 3, 4, 2026], clock(12), null],
		['03/04/2026 下午 3:00', ['open', 3, 4, 2026], clock(15), null],
		['2026-04-03 24:00', ['year-first', 2026, 4, 3], clock(24), null],
		['03.04.2026 10.30', ['open', 3, 4, 2026], clock(10, 30), null],
		['2026-04-03', ['year-first', 2026, 4, 3], null, null],
		['10:30:15', null, clock(10, 30, 15), null],
		['1:05 pm', null, clock(13, 5), null]
	])('%j is taken apart', (text, date, at, offset) => {
		expect(scanned(text)).toEqual({ date, at, offset });
	});

	// Source: RFC 3339 §5.8, examples.
	it.each([
		['1985-04-12T23:20:50.52Z', clock(23, 20, 50, 520), 0],
		['1996-12-19T16:39:57-08:00', clock(16, 39, 57), -480],
		['1990-12-31T23:59:60Z', clock(24), 0],
		['1937-01-01T12:00:27.87+00:20', clock(12, 0, 27, 870), 20]
	])('%j of the standard is read', (text, at, offset) => {
		expect(scanned(text)).toMatchObject({ at, offset });
	});

	it.each([
		'',
		'hello',
		'4.5',
		'12',
		'10:75',
		'25:00',
		'2026-13-01',
		'2026-04-32',
		'Temperature',
		'1.2',
		'33/44/2026',
		'05-kwi-0026 08:00',
		'10:30 and more words here'
	])('%j is none', (text) => {
		expect(scanned(text)).toBeNull();
	});
});
