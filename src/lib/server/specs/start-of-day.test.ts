import { describe, expect, it } from 'vitest';
import { startOfDay } from './start-of-day';

const now = new Date('2026-04-03T23:30:00Z');

describe('the day a version is to hold from', () => {
	it('begins at the site’s own midnight', () => {
		expect(startOfDay('2026-04-10', 'Europe/Amsterdam', now)).toEqual(new Date('2026-04-09T22:00:00Z'));
		expect(startOfDay('2026-04-10', 'America/Los_Angeles', now)).toEqual(new Date('2026-04-10T07:00:00Z'));
	});

	it('is now where none is given or it is today there', () => {
		expect(startOfDay(null, 'UTC', now)).toBeNull();
		expect(startOfDay('2026-04-04', 'Europe/Amsterdam', now)).toBeNull();
		expect(startOfDay('2026-04-03', 'America/Los_Angeles', now)).toBeNull();
	});

	it('stays in the past where it is, for the signing to refuse', () => {
		expect(startOfDay('2026-04-01', 'UTC', now)).toEqual(new Date('2026-04-01T00:00:00Z'));
	});
});
