import { describe, expect, it } from 'vitest';
import { dayRange } from './life-ends';
import { calendar } from './text';

const at = (text: string) => Date.parse(text);
const range = (low: string, high: string, zone = 'UTC') =>
	dayRange(calendar(zone), at('2026-04-03T05:00Z'), at(low), at(high));

describe('the days on which life ends', () => {
	it('are one day, or name the month once', () => {
		expect(range('2026-04-14T01:00Z', '2026-04-14T20:00Z')).toBe('14 Apr');
		expect(range('2026-04-15T01:00Z', '2026-04-16T20:00Z')).toBe('15–16 Apr');
	});

	it('name both months across their turn, and the year where it is another', () => {
		expect(range('2026-04-30T01:00Z', '2026-05-02T20:00Z')).toBe('30 Apr–2 May');
		expect(range('2026-12-30T01:00Z', '2027-01-02T20:00Z')).toBe('30 Dec 26–2 Jan 27');
		expect(range('2027-01-02T01:00Z', '2027-01-04T20:00Z')).toBe('2–4 Jan 27');
	});

	it('are the site’s days', () => {
		expect(range('2026-04-14T23:30Z', '2026-04-14T23:40Z', 'Europe/Berlin')).toBe('15 Apr');
		expect(range('2026-04-14T23:30Z', '2026-04-14T23:40Z', 'America/New_York')).toBe('14 Apr');
	});
});
