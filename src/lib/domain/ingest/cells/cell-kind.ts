import { emptyStamp, noTime, scanStamp } from '../times/stamp';
import { emptyNumber, scanNumber } from './number-text';

export type CellKind = 'blank' | 'missing' | 'number' | 'moment' | 'date' | 'time' | 'text';

const stamp = emptyStamp();
const number = emptyNumber();

/** What a single cell looks like, before anything is known of its column. */
export function cellKindOf(cell: string): CellKind {
	const bare = cell.trim();
	if (bare === '') return 'blank';
	const state = scanNumber(bare, number);
	// 20240301103000 and 20240301 are numbers too; whether they are dates only a column can tell.
	if (state === 'number')
		return /^(19|20)\d{6}(\d{4}|\d{6})?$/.test(bare) && scanStamp(bare, stamp) ? kindOfStamp() : 'number';
	if (scanStamp(bare, stamp)) return kindOfStamp();
	return state;
}

function kindOfStamp(): CellKind {
	if (stamp.shape === 'none') return 'time';
	return stamp.msOfDay === noTime ? 'date' : 'moment';
}

/** A count of seconds, milliseconds or microseconds since 1970 that falls between 1990 and 2070; null otherwise. */
export function epochUnitOf(value: number): 's' | 'ms' | 'us' | null {
	if (value >= 631e6 && value < 3.16e9) return 's';
	if (value >= 631e9 && value < 3.16e12) return 'ms';
	return value >= 631e12 && value < 3.16e15 ? 'us' : null;
}
