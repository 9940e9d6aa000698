import type { ReadContext } from '../ingestion';
import type { Stated } from '../layout/preamble';
import { dayNumber, fullYear, msPerDay } from '../times/calendar';
import { dayInOrder, type DateOrder } from '../times/date-order';
import { emptyStamp, noOffset, scanStamp } from '../times/stamp';
import { fixedOffsetOf, offsetText, utcOfLocal, type LocalTimes } from '../times/zone';
import type { Gathered, GatheredTimes } from './gathered';

export interface UsedZone {
	readonly zone: string;
	readonly by: 'file' | 'answer' | 'site';
}

/** The zone of local times: an answer first, then the file's own words, else the site's, assumed visibly. */
export function zoneFor(gathered: Gathered, stated: Stated, context: ReadContext): UsedZone {
	const { times, count } = gathered;
	let withOffset = 0;
	for (let i = 0; i < count; i++) if (times.offsetMinutes[i] !== noOffset) withOffset++;
	const first = times.offsetMinutes[0] ?? noOffset;
	if (count > 0 && withOffset === count) return { zone: offsetText(first), by: 'file' };
	if (context.answers.zone !== undefined) return { zone: context.answers.zone, by: 'answer' };
	const word = gathered.zoneWord ?? stated.zoneWord;
	const wordOffset = word === null ? null : fixedOffsetOf(word);
	if (wordOffset !== null) return { zone: offsetText(wordOffset), by: 'file' };
	return stated.zone === null ? { zone: context.siteZone, by: 'site' } : { zone: stated.zone, by: 'file' };
}

const stamp = emptyStamp();

/** The zone of times that run on from a stated start: the start's own offset where it has one. */
export function zoneOfStart(gathered: Gathered, stated: Stated, context: ReadContext): UsedZone {
	const { startText } = stated;
	if (startText !== null && scanStamp(startText, stamp) && stamp.offsetMinutes !== noOffset) {
		return { zone: offsetText(stamp.offsetMinutes), by: 'file' };
	}
	return zoneFor(gathered, stated, context);
}

/** One moment of the preamble in UTC, once order and zone are known; null when it is none. */
export function momentMs(text: string | null, order: DateOrder | null, zone: string): number | null {
	if (text === null || !scanStamp(text, stamp) || stamp.shape === 'none') return null;
	const day =
		stamp.shape === 'open'
			? order === null
				? NaN
				: dayInOrder(stamp.a, stamp.b, stamp.c, order)
			: dayNumber(stamp.a, stamp.b, stamp.c);
	if (Number.isNaN(day)) return null;
	const local = day * msPerDay + Math.max(0, stamp.msOfDay);
	if (stamp.offsetMinutes !== noOffset) return local - stamp.offsetMinutes * 60_000;
	return utcOfLocal(Float64Array.of(local), zone).utc[0] ?? null;
}

function dayOf(times: GatheredTimes, row: number, order: DateOrder | null): number {
	const [a, b, c] = [times.a[row] ?? 0, times.b[row] ?? 0, times.c[row] ?? 0];
	if (times.isSettled[row] !== 0) return dayNumber(fullYear(a, 4), b, c);
	return order === null ? NaN : dayInOrder(a, b, c, order);
}

/** Local milliseconds of each row; NaN where the order gives no such day. */
function localTimes(gathered: Gathered, order: DateOrder | null): Float64Array {
	const { times, count } = gathered;
	const local = new Float64Array(count);
	let day = NaN;
	for (let i = 0; i < count; i++) {
		const isSame =
			i > 0 &&
			times.a[i] === times.a[i - 1] &&
			times.b[i] === times.b[i - 1] &&
			times.c[i] === times.c[i - 1] &&
			times.isSettled[i] === times.isSettled[i - 1];
		if (!isSame) day = dayOf(times, i, order);
		local[i] = day * msPerDay + (times.msOfDay[i] ?? 0);
	}
	return local;
}

/** True where most steps of the rows go back in time. */
export function isDescending(ms: Float64Array): boolean {
	let [up, down] = [0, 0];
	for (let i = 1; i < ms.length; i++) {
		const step = (ms[i] ?? 0) - (ms[i - 1] ?? 0);
		if (step > 0) up++;
		else if (step < 0) down++;
	}
	return down > up;
}

export interface Instants {
	/** UTC of each gathered row, NaN where its date does not exist. */
	readonly ms: Float64Array;
	readonly change: LocalTimes['change'];
	readonly changeRows: readonly number[];
}

/** UTC of every row from calendar times. Rows with an offset of their own keep it. */
export function instantsOf(gathered: Gathered, order: DateOrder | null, zone: string): Instants {
	const { times, count } = gathered;
	const local = localTimes(gathered, order);
	const isBackwards = isDescending(local);
	const at = (i: number): number => (isBackwards ? count - 1 - i : i);
	// Rows without a day or with an offset are left out of the walk through the zone's changes.
	const open = new Int32Array(count);
	const openLocal = new Float64Array(count);
	let opened = 0;
	const ms = new Float64Array(count);
	for (let k = 0; k < count; k++) {
		const i = at(k);
		const offset = times.offsetMinutes[i] ?? noOffset;
		if (offset !== noOffset) ms[i] = (local[i] ?? 0) - offset * 60_000;
		else if (Number.isNaN(local[i])) ms[i] = NaN;
		else {
			openLocal[opened] = local[i] ?? 0;
			open[opened++] = i;
		}
	}
	const resolved = utcOfLocal(openLocal.subarray(0, opened), zone);
	for (let k = 0; k < opened; k++) ms[open[k] ?? 0] = resolved.utc[k] ?? NaN;
	return { ms, change: resolved.change, changeRows: resolved.rows.map((k) => open[k] ?? 0) };
}
