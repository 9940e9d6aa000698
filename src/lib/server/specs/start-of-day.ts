import { DateTime } from 'luxon';

/**
 * When a calendar day begins at a site, for a version that is to hold from then; null for today, which means from the
 * moment of signing, since the day's beginning is over.
 */
export function startOfDay(on: string | null, zone: string, now: Date): Date | null {
	if (on === null) return null;
	const start = DateTime.fromISO(on, { zone }).startOf('day');
	const isToday = start.hasSame(DateTime.fromJSDate(now, { zone }), 'day');
	return isToday ? null : start.toJSDate();
}
