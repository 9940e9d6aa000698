import { describe, expect, it } from 'vitest';
import {
	calendarDay,
	day,
	dayOfYear,
	dayTime,
	isoDay,
	longDay,
	monthOfYear,
	shortDay,
	time,
	timeWithSeconds,
	wholeInstant,
	zoneName,
	zoneOffset,
	zoneOffsetMinutes
} from './format-time';

const at = '2026-04-03T07:44:18Z';
const zone = 'Europe/Berlin';

describe('instants', () => {
	it('shows an instant in the zone that is given, by the 24-hour clock', () => {
		expect(time(at, zone)).toBe('09:44');
		expect(timeWithSeconds(at, zone)).toBe('09:44:18');
		expect(time('2026-04-02T22:00:00Z', zone)).toBe('00:00');
		expect(time(new Date(at), 'America/New_York')).toBe('03:44');
	});

	it('names the day from shortest to whole', () => {
		expect(shortDay(at, zone, 'en')).toBe('3 Apr');
		expect(day(at, zone, 'en')).toBe('Fri 3 Apr');
		expect(dayOfYear(at, zone, 'en')).toBe('Fri 3 Apr 2026');
		expect(longDay(at, zone, 'en')).toBe('Friday 3 April');
		expect(dayTime(at, zone, 'en')).toBe('Fri 3 Apr 09:44');
		expect(wholeInstant(at, zone, 'en')).toBe('Fri 3 Apr 2026, 09:44:18');
	});

	it('takes the day of the zone, not of UTC', () => {
		expect(isoDay('2026-04-02T23:30:00Z', zone)).toBe('2026-04-03');
		expect(isoDay('2026-04-02T23:30:00Z', 'UTC')).toBe('2026-04-02');
	});
});

describe('calendar days', () => {
	it('never moves with a zone', () => {
		expect(calendarDay('2026-04-03', 'en')).toBe('Fri 3 Apr 2026');
		expect(monthOfYear('2026-11-30', 'en')).toBe('Nov 2026');
	});
});

describe('zones', () => {
	// Source: IANA tz database 2025b: EU rule (last Sundays of March and October), Asia/Kolkata, Asia/Kathmandu.
	it.each([
		[at, zone, 'CEST', '+02:00'],
		['2026-01-03T07:44:18Z', zone, 'CET', '+01:00'],
		[at, 'America/New_York', 'EDT', '−04:00'],
		[at, 'Europe/London', 'BST', '+01:00'],
		[at, 'Australia/Sydney', 'AEDT', '+11:00'],
		[at, 'Asia/Kolkata', 'IST', '+05:30'],
		[at, 'UTC', 'UTC', '+00:00'],
		[at, 'Asia/Kathmandu', '+05:45', '+05:45']
	])('at %s %s is %s, %s', (instant, name, short, offset) => {
		expect(zoneName(instant, name)).toBe(short);
		expect(zoneOffset(instant, name)).toBe(offset);
	});

	it('counts the offset on both sides of a change of clocks', () => {
		expect(zoneOffsetMinutes('2026-03-29T00:59:59Z', zone)).toBe(60);
		expect(zoneOffsetMinutes('2026-03-29T01:00:00Z', zone)).toBe(120);
	});
});
