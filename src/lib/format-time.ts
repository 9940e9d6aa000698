/* Every date to text. An instant is shown in a named zone, which is always given; a calendar day has no zone. */

type Instant = Date | string | number;

const formatters = new Map<string, Intl.DateTimeFormat>();

function dateFormat(locale: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
	const key = locale + JSON.stringify(options);
	const known = formatters.get(key);
	if (known) return known;
	const made = new Intl.DateTimeFormat(locale, options);
	formatters.set(key, made);
	return made;
}

function parts(at: Instant, zone: string, locale: string): Record<string, string> {
	const format = dateFormat(locale, {
		timeZone: zone,
		weekday: 'short',
		day: 'numeric',
		month: 'short',
		year: 'numeric',
		hour: '2-digit',
		minute: '2-digit',
		second: '2-digit',
		hourCycle: 'h23'
	});
	return Object.fromEntries(format.formatToParts(new Date(at)).map((part) => [part.type, part.value]));
}

/** `09:35` */
export function time(at: Instant, zone: string): string {
	const { hour, minute } = parts(at, zone, 'en');
	return `${hour}:${minute}`;
}

/** `09:44:18` */
export function timeWithSeconds(at: Instant, zone: string): string {
	const { hour, minute, second } = parts(at, zone, 'en');
	return `${hour}:${minute}:${second}`;
}

/** `3 Apr` */
export function shortDay(at: Instant, zone: string, locale: string): string {
	const { day, month } = parts(at, zone, locale);
	return `${day} ${month}`;
}

/** `Fri 3 Apr` */
export function day(at: Instant, zone: string, locale: string): string {
	return `${parts(at, zone, locale).weekday} ${shortDay(at, zone, locale)}`;
}

/** `Fri 3 Apr 2026` */
export function dayOfYear(at: Instant, zone: string, locale: string): string {
	return `${day(at, zone, locale)} ${parts(at, zone, locale).year}`;
}

/** `Friday 3 April` */
export function longDay(at: Instant, zone: string, locale: string): string {
	const format = dateFormat(locale, { timeZone: zone, weekday: 'long', day: 'numeric', month: 'long' });
	const found = Object.fromEntries(format.formatToParts(new Date(at)).map((part) => [part.type, part.value]));
	return `${found.weekday} ${found.day} ${found.month}`;
}

/** `Fri 3 Apr 09:35` */
export function dayTime(at: Instant, zone: string, locale: string): string {
	return `${day(at, zone, locale)} ${time(at, zone)}`;
}

/** As a signature states it: `Fri 3 Apr 2026, 09:44:18`. */
export function wholeInstant(at: Instant, zone: string, locale: string): string {
	return `${dayOfYear(at, zone, locale)}, ${timeWithSeconds(at, zone)}`;
}

/** `Nov 2026`, of a calendar day. */
export function monthOfYear(on: string, locale: string): string {
	const { month, year } = parts(`${on}T00:00:00Z`, 'UTC', locale);
	return `${month} ${year}`;
}

/** `Fri 3 Apr 2026`, of a calendar day. */
export function calendarDay(on: string, locale: string): string {
	return dayOfYear(`${on}T00:00:00Z`, 'UTC', locale);
}

/** The day in the zone as YYYY-MM-DD, for comparing and for links. */
export function isoDay(at: Instant, zone: string): string {
	return dateFormat('sv-SE', { timeZone: zone, year: 'numeric', month: '2-digit', day: '2-digit' }).format(
		new Date(at)
	);
}

/** Minutes the zone's clocks are ahead of UTC at that instant. */
export function zoneOffsetMinutes(at: Instant, zone: string): number {
	const instant = new Date(at);
	const format = dateFormat('en-US', {
		timeZone: zone,
		year: 'numeric',
		month: 'numeric',
		day: 'numeric',
		hour: 'numeric',
		minute: 'numeric',
		second: 'numeric',
		hourCycle: 'h23',
		era: 'short'
	});
	const found = Object.fromEntries(format.formatToParts(instant).map((part) => [part.type, part.value]));
	const wall = Date.UTC(
		Number(found.year),
		Number(found.month) - 1,
		Number(found.day),
		Number(found.hour),
		Number(found.minute),
		Number(found.second)
	);
	return Math.round((wall - Math.floor(instant.getTime() / 1000) * 1000) / 60_000);
}

/** `+02:00` */
export function zoneOffset(at: Instant, zone: string): string {
	const minutes = zoneOffsetMinutes(at, zone);
	const whole = Math.abs(minutes);
	const sign = minutes < 0 ? '−' : '+';
	return `${sign}${String(Math.floor(whole / 60)).padStart(2, '0')}:${String(whole % 60).padStart(2, '0')}`;
}

/**
 * The zone's short name where English has one (`CEST`, `EDT`, `AEST`), otherwise its offset. No one locale knows
 * them all: British English names European zones, American its own, Australian its own.
 */
export function zoneName(at: Instant, zone: string): string {
	for (const locale of ['en-GB', 'en-US', 'en-AU', 'en-CA', 'en-IN', 'en-NZ', 'en-ZA']) {
		const format = dateFormat(locale, { timeZone: zone, timeZoneName: 'short' });
		const name = format.formatToParts(new Date(at)).find((part) => part.type === 'timeZoneName')?.value;
		if (name && !/^(GMT|UTC)[+−-]/.test(name)) return name;
	}
	return zoneOffset(at, zone);
}
