import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { instantOf, localText } from './local-time';

// Clock changes of 2026. Source: Directive 2000/84/EC, Articles 2 and 3: at 01:00 UTC on 29 March and 25 October;
// 15 U.S. Code § 260a: at 02:00 local time on 8 March and 1 November.
describe('a time by the clock of the site', () => {
	it.each([
		['2026-03-30T08:10', 'Europe/Berlin', '2026-03-30T06:10:00Z'],
		['2026-03-29T01:59', 'Europe/Berlin', '2026-03-29T00:59:00Z'],
		['2026-03-29T03:00', 'Europe/Berlin', '2026-03-29T01:00:00Z'],
		['2026-03-29T02:30', 'Europe/Berlin', null],
		['2026-10-25T02:30', 'Europe/Berlin', null],
		['2026-10-25T03:00', 'Europe/Berlin', '2026-10-25T02:00:00Z'],
		['2026-03-08T01:59', 'America/New_York', '2026-03-08T06:59:00Z'],
		['2026-03-08T02:00', 'America/New_York', null],
		['2026-11-01T01:30', 'America/New_York', null],
		['2026-07-01T12:00:30', 'Asia/Kolkata', '2026-07-01T06:30:30Z'],
		['2026-02-30T10:00', 'UTC', null],
		['2026-13-01T10:00', 'UTC', null],
		['tomorrow', 'UTC', null],
		['', 'UTC', null]
	])('%s in %s is %s', (text, zone, instant) => {
		expect(instantOf(text, zone)).toBe(instant === null ? null : Date.parse(instant));
	});

	it.each([
		['2026-03-30T06:10:00Z', 'Europe/Berlin', '2026-03-30T08:10'],
		['2026-03-30T06:10:05Z', 'Europe/Berlin', '2026-03-30T08:10:05'],
		['2026-01-01T03:59:00Z', 'America/New_York', '2025-12-31T22:59']
	])('%s is written in %s as %s', (instant, zone, text) => {
		expect(localText(Date.parse(instant), zone)).toBe(text);
	});

	it('comes back from what is written, but in the hour that comes twice', () => {
		const seconds = fc.integer({ min: 1_700_000_000, max: 1_900_000_000 });
		fc.assert(
			fc.property(
				seconds,
				fc.constantFrom('Europe/Berlin', 'America/New_York', 'Australia/Lord_Howe'),
				(s, zone) => {
					const back = instantOf(localText(s * 1000, zone), zone);
					expect(back === null || back === s * 1000).toBe(true);
				}
			)
		);
	});
});
