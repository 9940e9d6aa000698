import { DateTime } from 'luxon';
import { msPerMinute } from '../../../domain/units';
import type { When } from './load';

/** From this long after the docks opened, what is done today is drawn together so that it falls on today. */
const enoughOfTheDay = 150;
const earliestDone = 330;

/** The instant of a moment, by the clock of the zone. */
export function instantOf(when: When, anchor: Date, zone: string): number {
	if ('minutes' in when) return anchor.getTime() + when.minutes * msPerMinute;
	const day = DateTime.fromJSDate(anchor, { zone }).plus({ days: when.day }).toFormat('yyyy-MM-dd');
	return DateTime.fromISO(`${day}T${when.clock}`, { zone }).toMillis();
}

/** By how much the hours since the docks opened must be drawn together to hold a morning's work; 1 where there are enough. */
export function drawnTogether(anchor: Date, zone: string, opensAt: string): number {
	const here = DateTime.fromJSDate(anchor, { zone });
	const opened = DateTime.fromISO(`${here.toFormat('yyyy-MM-dd')}T${opensAt}`, { zone });
	const minutes = here.diff(opened, 'minutes').minutes;
	return minutes < enoughOfTheDay ? 1 : Math.min(1, (minutes - 10) / earliestDone);
}

const office = { opens: 9, closes: 17, friday: 5 } as const;

/** The moment itself where an office works then, else the next morning one does; never later than now. */
export function inOffice(ms: number, zone: string, anchor: Date): number {
	let at = DateTime.fromMillis(ms, { zone });
	if (at.hour >= office.closes) at = at.plus({ days: 1 }).set({ hour: office.opens });
	if (at.hour < office.opens) at = at.set({ hour: office.opens });
	while (at.weekday > office.friday) at = at.plus({ days: 1 });
	return Math.min(at.toMillis(), anchor.getTime() - msPerMinute);
}
