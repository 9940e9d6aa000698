import { DateTime } from 'luxon';
import { msPerMinute } from '../../../domain/units';
import type { When } from './load';

/** From this much of the day on, what is done today is drawn together so that it falls on today. */
const enoughOfTheDay = 150;
const earliestDone = 330;

/** The instant of a moment, by the clock of the zone. */
export function instantOf(when: When, anchor: Date, zone: string): number {
	if ('minutes' in when) return anchor.getTime() + when.minutes * msPerMinute;
	const day = DateTime.fromJSDate(anchor, { zone }).plus({ days: when.day }).toFormat('yyyy-MM-dd');
	return DateTime.fromISO(`${day}T${when.clock}`, { zone }).toMillis();
}

/** By how much the hours since midnight must be drawn together to hold a morning's work; 1 where there are enough. */
export function drawnTogether(anchor: Date, zone: string): number {
	const here = DateTime.fromJSDate(anchor, { zone });
	const minutes = here.diff(here.startOf('day'), 'minutes').minutes;
	return minutes < enoughOfTheDay ? 1 : Math.min(1, (minutes - 10) / earliestDone);
}
