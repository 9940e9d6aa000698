import { isoDay, timeWithSeconds, zoneOffsetMinutes } from '$lib/format-time';

const dayMs = 86_400_000;
const minuteMs = 60_000;

/** An instant as a field for day and time has it, by the clock of the zone; seconds only where there are any. */
export function localText(ms: number, zone: string): string {
	return `${isoDay(ms, zone)}T${timeWithSeconds(ms, zone).replace(/:00$/, '')}`;
}

/** The instant of a day and time by the clock of the zone; null where there is none, or where the clock strikes it twice. */
export function instantOf(text: string, zone: string): number | null {
	const found = /^(\d{4})-(\d{2})-(\d{2})T(\d{2}):(\d{2})(?::(\d{2})(?:\.\d+)?)?$/.exec(text);
	if (!found) return null;
	const [year, month, day, hour, minute, second] = found.slice(1).map((part) => Number(part ?? 0)) as [
		number,
		number,
		number,
		number,
		number,
		number
	];
	const wallMs = Date.UTC(year, month - 1, day, hour, minute, second || 0);
	const wall = new Date(wallMs);
	if (wall.getUTCMonth() !== month - 1 || wall.getUTCDate() !== day || hour > 23) return null;
	// No zone changes twice within two days, and no offset is longer than one.
	const offsets = [wallMs - dayMs, wallMs + dayMs].map((near) => zoneOffsetMinutes(near, zone));
	const instants = [...new Set(offsets)]
		.map((minutes) => ({ minutes, ms: wallMs - minutes * minuteMs }))
		.filter(({ minutes, ms }) => zoneOffsetMinutes(ms, zone) === minutes);
	return instants.length === 1 ? (instants[0]?.ms ?? null) : null;
}
