import { DateTime } from 'luxon';
import { z } from 'zod';
import { SiteHoliday } from '../db/models/site-holiday';
import type { Site } from '../db/models/site';

const weekdays = ['mon', 'tue', 'wed', 'thu', 'fri', 'sat', 'sun'] as const;
const hoursOfDay = z.tuple([z.string(), z.string()]);
const openingSchema = z.partialRecord(z.enum(weekdays), hoursOfDay.nullish());
const docksSchema = z.array(z.string());

/** A JSON column, which some drivers hand over as text. */
function parsed<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> | null {
	const found = schema.safeParse(typeof value === 'string' ? JSON.parse(value) : value);
	return found.success ? found.data : null;
}

export function docksOf(site: Site): string[] {
	return parsed(docksSchema, site.docks) ?? [];
}

/** From the day's first instant to the next day's, by the site's clock: 23 to 25 hours. */
export function spanOfDay(dayOn: string, zone: string): { from: Date; to: Date } {
	const start = DateTime.fromISO(dayOn, { zone }).startOf('day');
	return { from: start.toJSDate(), to: start.plus({ days: 1 }).toJSDate() };
}

export function dayBefore(dayOn: string, days = 1): string {
	return DateTime.fromISO(dayOn, { zone: 'utc' }).minus({ days }).toISODate() ?? dayOn;
}

/** When the docks are open that day, and why not when it is a holiday. */
export async function openingOf(site: Site, dayOn: string) {
	const start = DateTime.fromISO(dayOn, { zone: site.zone });
	const weekday = weekdays[start.weekday - 1] ?? 'mon';
	const hours = parsed(openingSchema, site.opening)?.[weekday] ?? null;
	const holiday = await SiteHoliday.findOne({ where: { siteId: site.id, heldOn: dayOn } });
	const at = (clock: string) =>
		DateTime.fromISO(`${dayOn}T${clock}`, { zone: site.zone }).toUTC().toJSDate().toISOString();
	return {
		holiday: holiday?.name ?? null,
		opensAt: hours ? at(hours[0]) : null,
		closesAt: hours ? at(hours[1]) : null
	};
}
