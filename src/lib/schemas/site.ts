import { z } from 'zod';
import { glnField, neededDay, neededText, revisionField } from './field';
import { choice, listQuery } from './list';

export const weekdays = ['mon', 'tue', 'wed', 'thu', 'fri', 'sat', 'sun'] as const;
export type Weekday = (typeof weekdays)[number];

/** From and to on each day it is open, by the site's own clock. */
export type Opening = Partial<Record<Weekday, readonly [string, string]>>;

const clock = /^([01]\d|2[0-3]):[0-5]\d$/;

/** The opening column; a day that cannot be read counts as closed. */
export const storedOpening = z
	.partialRecord(z.enum(weekdays), z.tuple([z.string(), z.string()]))
	.catch({}) satisfies z.ZodType<Opening>;

/** The docks column. */
export const storedDocks = z.array(z.string()).catch([]);

const openingDay = z
	.object({ from: z.string().trim().default(''), to: z.string().trim().default('') })
	.default({ from: '', to: '' })
	.transform(({ from, to }, context): readonly [string, string] | null => {
		if (!from && !to) return null;
		if (!clock.test(from) || !(clock.test(to) || to === '24:00'))
			context.addIssue({
				code: 'custom',
				message: 'Write both times as 04:00 and 15:00, or leave both empty.'
			});
		else if (to <= from)
			context.addIssue({ code: 'custom', message: `It closes at ${to}, before it opens at ${from}.` });
		return [from, to];
	});

const openingWeek = z
	.object(Object.fromEntries(weekdays.map((day) => [day, openingDay])) as Record<Weekday, typeof openingDay>)
	.default(() => ({ mon: null, tue: null, wed: null, thu: null, fri: null, sat: null, sun: null }))
	.transform((week): Opening => {
		const open: Opening = {};
		for (const day of weekdays) if (week[day]) open[day] = week[day];
		return open;
	});

function isZone(name: string): boolean {
	try {
		return new Intl.DateTimeFormat('en', { timeZone: name }).resolvedOptions().timeZone !== '';
	} catch {
		return false;
	}
}

export const siteForm = z.object({
	code: z
		.string()
		.trim()
		.toUpperCase()
		.regex(/^[A-Z]{2,4}$/, 'Two to four letters; dockets are numbered with them, such as PS-26-1184.'),
	name: neededText(120, 'Enter the site’s name.'),
	address: neededText(300, 'Enter the address; it stands on every report.'),
	gln: glnField,
	zone: z.string().max(64).refine(isZone, 'Choose a time zone from the list.'),
	temperatureUnit: z.enum(['celsius', 'fahrenheit'], 'Choose the unit.'),
	pageSize: z.enum(['a4', 'letter'], 'Choose the paper.'),
	currency: z
		.string()
		.trim()
		.toUpperCase()
		.refine(
			(code) => Intl.supportedValuesOf('currency').includes(code),
			'Three letters of ISO 4217, such as EUR.'
		),
	opening: openingWeek,
	docks: z
		.string()
		.default('')
		.transform((text) => [...new Set(text.split(/[\n,]/).map((dock) => dock.trim()))].filter((dock) => dock))
		.refine((docks) => docks.length > 0, 'Name at least one dock.')
		.refine((docks) => docks.length <= 60 && docks.every((dock) => dock.length <= 40), {
			message: 'At most 60 docks, each of at most 40 characters.'
		}),
	revision: revisionField
});
export type SiteForm = z.output<typeof siteForm>;

export const holidayForm = z.object({ heldOn: neededDay, name: neededText(120, 'Enter what the day is.') });
export const holidayRef = z.object({ holidayId: z.uuid('There is no such holiday.') });

export const siteQuery = listQuery(['name', 'code', 'zone']).extend({
	state: choice(['in-use', 'off', 'all'])
});
export type SiteQuery = z.output<typeof siteQuery>;
