import { IANAZone } from 'luxon';
import { msPerDay } from './calendar';

const msPerMinute = 60_000;

/** Letters that name one offset only. Those that name several (CST, IST, BST) are not here: they decide nothing. */
const abbreviations: Readonly<Record<string, number>> = {
	z: 0,
	utc: 0,
	gmt: 0,
	wet: 0,
	cet: 60,
	mez: 60,
	cest: 120,
	mesz: 120,
	eet: 120,
	eest: 180,
	msk: 180,
	est: -300,
	edt: -240,
	cdt: -300,
	mdt: -360,
	pst: -480,
	pdt: -420,
	jst: 540,
	kst: 540,
	aest: 600,
	nzst: 720
};

export function offsetOfWord(word: string): number | null {
	const lower = word.toLowerCase();
	return Object.hasOwn(abbreviations, lower) ? (abbreviations[lower] ?? null) : null;
}

/** Offset text such as `+02:00` of minutes east of UTC. */
export function offsetText(minutes: number): string {
	const positive = Math.abs(minutes);
	const two = (n: number): string => String(n).padStart(2, '0');
	return `${minutes < 0 ? '-' : '+'}${two(Math.floor(positive / 60))}:${two(positive % 60)}`;
}

/** Minutes of a fixed offset (`+02:00`, `UTC+2`, `Z`, `CET`), or null. */
export function fixedOffsetOf(text: string): number | null {
	const word = offsetOfWord(text.trim());
	if (word !== null) return word;
	const match = /^\(?(?:utc|gmt)?\s*([+\-−])\s*(\d{1,2})(?::?(\d{2}))?\)?(?:\s|$|\()/i.exec(text.trim());
	if (match === null) return null;
	const minutes = Number(match[2]) * 60 + Number(match[3] ?? 0);
	if (minutes > 14 * 60) return null;
	return match[1] === '+' ? minutes : -minutes;
}

/** The zone a text names, as an IANA name or a fixed offset; null when it names none that is known. */
export function zoneNamedBy(text: string): string | null {
	const bare = text.trim().replace(/^["']|["']$/g, '');
	const iana = /\b[A-Z][A-Za-z_]+\/[A-Za-z_]+(?:\/[A-Za-z_]+)?\b/.exec(bare)?.[0];
	if (iana !== undefined && IANAZone.isValidZone(iana)) return iana;
	const fixed = fixedOffsetOf(bare);
	return fixed === null ? null : offsetText(fixed);
}

export type OffsetAt = (utcMs: number) => number;

/** Minutes east of UTC at an instant in a zone; fixed offsets and IANA names alike. */
export function offsetAtOf(zone: string): OffsetAt {
	const fixed = fixedOffsetOf(zone);
	if (fixed !== null) return () => fixed;
	const iana = IANAZone.create(zone);
	if (!iana.isValid) return () => 0;
	return (utcMs) => iana.offset(utcMs);
}

export interface LocalTimes {
	readonly utc: Float64Array;
	/** `changed`: the clock was put forward or back in the file; `kept`: it was not, though the zone's was. */
	readonly change: 'changed' | 'kept' | null;
	/** Rows inside the hour that occurs twice or not at all. */
	readonly rows: readonly number[];
}

interface Transition {
	readonly beforeMinutes: number;
	readonly afterMinutes: number;
}

function transitionOn(dayStart: number, offsetAt: OffsetAt): Transition {
	const middle = offsetAt(dayStart) * msPerMinute;
	return {
		beforeMinutes: offsetAt(dayStart - middle - 2 * 3_600_000),
		afterMinutes: offsetAt(dayStart + msPerDay - middle + 2 * 3_600_000)
	};
}

/**
 * Local times, in the order in which they were logged, to UTC. In the hour that occurs twice the order decides; where
 * the clock runs on evenly through a change that the zone made, the logger kept its old offset and so do we.
 */
export function utcOfLocal(local: Float64Array, zone: string): LocalTimes {
	const offsetAt = offsetAtOf(zone);
	const utc = new Float64Array(local.length);
	const rows: number[] = [];
	let change: LocalTimes['change'] = null;
	let day = NaN;
	let lastMinutes = NaN;
	let today: Transition = { beforeMinutes: 0, afterMinutes: 0 };
	for (let i = 0; i < local.length; i++) {
		const at = local[i] ?? 0;
		const start = Math.floor(at / msPerDay) * msPerDay;
		if (start !== day) {
			day = start;
			today = transitionOn(start, offsetAt);
			const isChange = today.beforeMinutes !== today.afterMinutes;
			if (isChange && change === null && keepsClock(local, i, today, offsetAt)) {
				return { utc: shifted(local, utc, i, today.beforeMinutes), change: 'kept', rows: [i] };
			}
		}
		const minutes = minutesOn(at, today, offsetAt, i > 0 ? (utc[i - 1] ?? 0) : -Infinity, rows, i);
		utc[i] = at - minutes * msPerMinute;
		if (i > 0 && minutes !== lastMinutes) change = 'changed';
		lastMinutes = minutes;
	}
	return { utc, change, rows };
}

/** Offset of one local time on a day when it may have changed. */
function minutesOn(
	at: number,
	day: Transition,
	offsetAt: OffsetAt,
	lastUtc: number,
	rows: number[],
	row: number
): number {
	const { beforeMinutes, afterMinutes } = day;
	if (beforeMinutes === afterMinutes) return beforeMinutes;
	const early = at - beforeMinutes * msPerMinute;
	const isEarly = offsetAt(early) === beforeMinutes;
	const isLate = offsetAt(at - afterMinutes * msPerMinute) === afterMinutes;
	if (isEarly === isLate) rows.push(row);
	if (isEarly && isLate) return early <= lastUtc ? afterMinutes : beforeMinutes;
	return isLate ? afterMinutes : beforeMinutes;
}

function shifted(local: Float64Array, utc: Float64Array, from: number, minutes: number): Float64Array {
	for (let i = from; i < local.length; i++) utc[i] = (local[i] ?? 0) - minutes * msPerMinute;
	return utc;
}

/** True where the written clock steps evenly past the moment at which the zone's clock jumped. */
function keepsClock(local: Float64Array, from: number, change: Transition, offsetAt: OffsetAt): boolean {
	const first = Math.max(1, from);
	const end = Math.min(local.length, first + 20_000);
	for (let i = first; i < end; i++) {
		const at = local[i] ?? 0;
		if (at >= (local[from] ?? 0) + 2 * msPerDay) return false;
		const last = local[i - 1] ?? 0;
		const wasBefore = offsetAt(last - change.beforeMinutes * msPerMinute) === change.beforeMinutes;
		const isAfterOnly = offsetAt(at - change.beforeMinutes * msPerMinute) !== change.beforeMinutes;
		if (!wasBefore || !isAfterOnly || i + 1 >= local.length) continue;
		// The step across the change is measured against the one that follows it.
		const across = at - last;
		const usual = (local[i + 1] ?? 0) - at;
		return across === usual && across > 0 && !hasStepBack(local, i);
	}
	return false;
}

/** Whether the clock was put back within the three hours up to a row. */
function hasStepBack(local: Float64Array, at: number): boolean {
	for (let i = at; i > 0 && (local[at] ?? 0) - (local[i] ?? 0) < 3 * 3_600_000; i--) {
		if ((local[i] ?? 0) <= (local[i - 1] ?? 0)) return true;
	}
	return false;
}
