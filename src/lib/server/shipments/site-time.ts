import { DateTime, IANAZone } from 'luxon';
import { msPerHour, msPerMinute } from '../../domain/units';

export type SiteTime = { ok: true; at: Date } | { ok: false; fault: string };

/**
 * The instant of a time as typed: with its offset as it says, otherwise by the clock of the zone. A time that the
 * clocks leap over, or strike twice, is asked about, never guessed.
 */
export function siteTime(typed: string, zone: string): SiteTime {
	const iso = typed.trim().replace(' ', 'T').replace(' ', '');
	const wall = DateTime.fromISO(iso, { zone: 'utc', setZone: false });
	if (!wall.isValid) return { ok: false, fault: 'There is no such day or time.' };
	if (/(Z|[+-]\d{2}:?\d{2})$/.test(iso)) return { ok: true, at: wall.toJSDate() };

	const candidates = offsetsAround(wall.toMillis(), zone)
		.map((minutes) => ({ minutes, ms: wall.toMillis() - minutes * msPerMinute }))
		.filter(({ minutes, ms }) => IANAZone.create(zone).offset(ms) === minutes)
		.sort((a, b) => a.ms - b.ms);
	const [first, second] = candidates;
	const clock = wall.toFormat('HH:mm');
	if (!first)
		return {
			ok: false,
			fault: `${clock} does not come on that day: the clocks are put forward over it. Write the time before or after.`
		};
	if (!second) return { ok: true, at: new Date(first.ms) };
	const local = wall.toFormat("yyyy-MM-dd'T'HH:mm");
	return {
		ok: false,
		fault: `${clock} comes twice on that day. Write ${local}${offset(first.minutes)} for the first, ${local}${offset(second.minutes)} for the second.`
	};
}

function offsetsAround(wallMs: number, zone: string): number[] {
	const iana = IANAZone.create(zone);
	// No zone changes twice within two days, and no offset is longer than one.
	return [...new Set([-24, 24].map((hours) => iana.offset(wallMs + hours * msPerHour)))];
}

function offset(minutes: number): string {
	const whole = Math.abs(minutes);
	const clock = [Math.floor(whole / 60), whole % 60].map((part) => String(part).padStart(2, '0')).join(':');
	return (minutes < 0 ? '-' : '+') + clock;
}

/** The instant as a `datetime-local` field of that zone shows it; with its offset where the clock strikes it twice. */
export function typedTime(at: Date | null, zone: string): string {
	if (at === null) return '';
	const local = DateTime.fromJSDate(at, { zone });
	const typed = local.toFormat("yyyy-MM-dd'T'HH:mm");
	return siteTime(typed, zone).ok ? typed : local.toFormat("yyyy-MM-dd'T'HH:mmZZ");
}
