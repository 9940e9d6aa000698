import type { TemperatureUnit } from '../../units';

/** Times of all rows as numbers, before the order of day and month and the zone are known. Parallel to the rows kept. */
export interface GatheredTimes {
	/** Date numbers as they stand. `isSettled`: 0 order open, 1 year first, 2 month by name; a, b, c are then year, month, day. */
	readonly a: Int16Array;
	readonly b: Uint8Array;
	readonly c: Int16Array;
	readonly isSettled: Uint8Array;
	readonly hasDate: Uint8Array;
	readonly msOfDay: Int32Array;
	readonly offsetMinutes: Int16Array;
	/** UTC, or ms since the start for elapsed times; NaN where the row's time is a calendar one. */
	readonly ms: Float64Array;
}

/** One value column over the rows kept. */
export interface GatheredValues {
	readonly column: number;
	readonly mantissa: Float64Array;
	readonly decimals: Uint8Array;
	/** 0 a number, 1 no value, 2 none due at that moment. */
	readonly isMissing: Uint8Array;
	/** Unit written beside the values, where one is; null when none or several. */
	readonly unit: TemperatureUnit | null;
	readonly hasMixedUnits: boolean;
	readonly commaCount: number;
}

export interface RowFault {
	readonly code: 'bad-time' | 'short-row' | 'header-repeated' | 'cut-short';
	readonly line: number;
}

/** All that one pass over the rows brings together. */
export interface Gathered {
	readonly count: number;
	readonly lines: Int32Array;
	/** Row of the table each kept row came from. */
	readonly rows: Int32Array;
	readonly times: GatheredTimes;
	readonly values: readonly GatheredValues[];
	readonly faults: readonly RowFault[];
	/** First of the rows after the last reading that were left out, with how many. */
	readonly footerFrom: number;
	readonly footerLines: readonly number[];
	readonly zoneWord: string | null;
}
