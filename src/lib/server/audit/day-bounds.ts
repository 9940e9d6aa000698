import { DateTime } from 'luxon';

/** The instant a calendar day begins in a zone, or that of some days after. */
export function instantOfDay(on: string, zone: string, daysAfter: number): Date {
	return DateTime.fromISO(on, { zone }).plus({ days: daysAfter }).startOf('day').toJSDate();
}
