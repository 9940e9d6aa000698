/** An instant in two exact parts: whole seconds since 1970 and what is over, so that differences lose nothing. */
export interface SplitInstant {
	readonly seconds: number;
	/** 0 to under 1. */
	readonly fraction: number;
}

/** Why a time is none. */
export type InstantFault =
	'not-a-time' | 'no-offset' | 'no-such-time' | 'leap-second' | 'milliseconds' | 'too-far';

// Years 0000 to 9999: what RFC 3339 can write.
const earliestSeconds = -62_167_219_200;
const latestSeconds = 253_402_300_799;

// Source of the form: RFC 3339, 5.6; a blank for the T and a comma for the point are allowed as ISO 8601 has them.
const stamp =
	/^(\d{4})-(\d\d)-(\d\d)[Tt ](\d\d):(\d\d)(?::(\d\d)(?:[.,](\d{1,12}))?)?(?:([Zz])|([+-])(\d\d):?(\d\d))?$/;

/** An instant from epoch seconds, or from a date and time with its offset from UTC. */
export function instantOf(value: unknown): SplitInstant | InstantFault {
	if (typeof value === 'number') return ofEpoch(value);
	return typeof value === 'string' ? ofText(value) : 'not-a-time';
}

function ofEpoch(value: number): SplitInstant | InstantFault {
	if (!Number.isFinite(value)) return 'not-a-time';
	if (value > latestSeconds || value < earliestSeconds) {
		const isMilliseconds = Math.abs(value / 1000) <= latestSeconds;
		return isMilliseconds ? 'milliseconds' : 'too-far';
	}
	const seconds = Math.floor(value);
	return { seconds, fraction: value - seconds };
}

function ofText(text: string): SplitInstant | InstantFault {
	const found = stamp.exec(text);
	if (!found) return 'not-a-time';
	const part = (at: number) => Number(found[at] ?? 0);
	if (!found[8] && !found[9]) return 'no-offset';
	if (part(6) === 60) return 'leap-second';
	const isTime = part(4) < 24 && part(5) < 60 && part(6) < 60 && part(10) < 24 && part(11) < 60;
	const utc = utcSeconds(part(1), part(2), part(3));
	if (!isTime || utc === null) return 'no-such-time';
	const offset = (found[9] === '-' ? -1 : 1) * (part(10) * 3600 + part(11) * 60);
	const seconds = utc + part(4) * 3600 + part(5) * 60 + part(6) - offset;
	if (seconds < earliestSeconds || seconds > latestSeconds) return 'too-far';
	return { seconds, fraction: found[7] ? Number(`0.${found[7]}`) : 0 };
}

/** Seconds of a day's beginning; null of a day the calendar does not have. */
function utcSeconds(year: number, month: number, day: number): number | null {
	const date = new Date(0);
	date.setUTCFullYear(year, month - 1, day);
	const isSame = date.getUTCMonth() === month - 1 && date.getUTCDate() === day;
	return isSame ? date.getTime() / 1000 : null;
}
