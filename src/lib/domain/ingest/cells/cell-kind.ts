import { isRunningTime } from '../times/running-time';
import { emptyStamp, noTime, scanStamp } from '../times/stamp';
import { emptyNumber, scanNumber } from './number-text';

export type CellKind = 'blank' | 'missing' | 'number' | 'moment' | 'date' | 'time' | 'text';

/** No figure and no moment is written this long. */
const longestKnown = 200;
const stamp = emptyStamp();
const number = emptyNumber();

/** What a single cell looks like, before anything is known of its column. */
export function cellKindOf(cell: string): CellKind {
	const bare = cell.trim();
	if (bare === '') return 'blank';
	if (bare.length > longestKnown) return 'text';
	const state = scanNumber(bare, number);
	// 20240301103000 and 20240301 are numbers too; whether they are dates only a column can tell.
	if (state === 'number')
		return /^(19|20)\d{6}(\d{4}|\d{6})?$/.test(bare) && scanStamp(bare, stamp) ? kindOfStamp() : 'number';
	if (scanStamp(bare, stamp)) return kindOfStamp();
	// Microseconds and nanoseconds since 1970 have more digits than any measured value.
	if (/^\d{16,19}$/.test(bare) && epochUnitOf(Number(bare)) !== null) return 'number';
	return state === 'text' && isRunningTime(bare) ? 'time' : state;
}

function kindOfStamp(): CellKind {
	if (stamp.shape === 'none') return 'time';
	return stamp.msOfDay === noTime ? 'date' : 'moment';
}

export type EpochUnit = 's' | 'ms' | 'us' | 'ns';

/** A count of seconds to nanoseconds since 1970 that falls between 1990 and 2070; null otherwise. */
export function epochUnitOf(value: number): EpochUnit | null {
	if (value >= 631e6 && value < 3.16e9) return 's';
	if (value >= 631e9 && value < 3.16e12) return 'ms';
	if (value >= 631e12 && value < 3.16e15) return 'us';
	return value >= 631e15 && value < 3.16e18 ? 'ns' : null;
}
