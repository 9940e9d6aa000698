import { describe, expect, it } from 'vitest';
import { siteTime, typedTime } from './site-time';

// Changes of the clock: IANA time zone database, rules EU (last Sundays of March and October, 01:00 UTC) and US.
const amsterdam = 'Europe/Amsterdam';

function instant(typed: string, zone: string): string | undefined {
	const found = siteTime(typed, zone);
	return found.ok ? found.at.toISOString() : undefined;
}

function fault(typed: string, zone: string): string | undefined {
	const found = siteTime(typed, zone);
	return found.ok ? undefined : found.fault;
}

describe('a time by the site’s clock', () => {
	it('is the instant at which that clock shows it', () => {
		expect(instant('2026-04-03T09:22', amsterdam)).toBe('2026-04-03T07:22:00.000Z');
		expect(instant('2026-01-15T09:22', amsterdam)).toBe('2026-01-15T08:22:00.000Z');
		expect(instant('2026-07-01 23:30', 'America/Chicago')).toBe('2026-07-02T04:30:00.000Z');
		expect(instant('2026-07-01T05:45', 'Asia/Kathmandu')).toBe('2026-07-01T00:00:00.000Z');
	});

	it('keeps the offset that was written with it', () => {
		expect(instant('2026-04-03T09:22Z', amsterdam)).toBe('2026-04-03T09:22:00.000Z');
		expect(instant('2026-10-25T02:30+01:00', amsterdam)).toBe('2026-10-25T01:30:00.000Z');
	});

	it('is refused when the clocks leap over it', () => {
		expect(fault('2026-03-29T02:30', amsterdam)).toContain('02:30 does not come on that day');
		expect(instant('2026-03-29T03:00', amsterdam)).toBe('2026-03-29T01:00:00.000Z');
		expect(fault('2026-03-08T02:15', 'America/Chicago')).toContain('put forward');
	});

	it('is asked about when the clocks strike it twice, with both ways to write it', () => {
		expect(fault('2026-10-25T02:30', amsterdam)).toContain(
			'2026-10-25T02:30+02:00 for the first, 2026-10-25T02:30+01:00 for the second'
		);
		expect(instant('2026-10-25T03:00', amsterdam)).toBe('2026-10-25T02:00:00.000Z');
	});

	it('is refused when the calendar has no such day', () => {
		expect(fault('2026-02-30T10:00', amsterdam)).toContain('no such day');
	});

	it('goes back into its field as it was typed', () => {
		expect(typedTime(new Date('2026-04-03T07:22:00Z'), amsterdam)).toBe('2026-04-03T09:22');
		expect(typedTime(new Date('2026-10-25T01:30:00Z'), amsterdam)).toBe('2026-10-25T02:30+01:00');
		expect(typedTime(null, amsterdam)).toBe('');
	});
});
