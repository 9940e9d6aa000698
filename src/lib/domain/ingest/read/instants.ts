import { dayNumber, fullYear, msPerDay } from '../times/calendar';
import { dayInOrder, type DateOrder } from '../times/date-order';
import { emptyStamp, noOffset, scanStamp } from '../times/stamp';
import { utcOfLocal, type LocalTimes } from '../times/local-times';
import type { Gathered, GatheredTimes } from './gathered';

const stamp = emptyStamp();

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

/** Local milliseconds of each row, or of the first few; NaN where the order gives no such day. */
export function localTimes(gathered: Gathered, order: DateOrder | null, rows = gathered.count): Float64Array {
	const { times } = gathered;
	const count = Math.min(rows, gathered.count);
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
