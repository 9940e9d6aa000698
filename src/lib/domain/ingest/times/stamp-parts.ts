import { emptyTokens, type StampTokens } from './stamp-tokens';

/** Marks a stamp without a clock. */
export const noTime = -1;
/** Marks a stamp without an offset of its own. */
export const noOffset = -32_768;

/**
 * What a time text says, before anybody knows whether day or month stands first.
 * `shape`: `none` no date; `year-first` and `named` are settled as a year, b month, c day; `open` keeps the numbers in
 * the order of the file.
 */
export interface Stamp {
	shape: 'none' | 'year-first' | 'named' | 'open';
	a: number;
	b: number;
	c: number;
	/** Milliseconds since midnight, or {@link noTime}; 86 400 000 for 24:00. */
	msOfDay: number;
	/** Minutes east of UTC, or {@link noOffset}. */
	offsetMinutes: number;
	/** A zone named by letters that give no offset of their own (`CST`). */
	zoneWord: string | null;
	/** The date was a year and the day in it. */
	isOrdinal: boolean;
}

/** A stamp to be filled by each scan. */
export function emptyStamp(): Stamp {
	return {
		shape: 'none',
		a: 0,
		b: 0,
		c: 0,
		msOfDay: noTime,
		offsetMinutes: noOffset,
		zoneWord: null,
		isOrdinal: false
	};
}

/** The numbers and words of the text that is being read: one buffer, so that no row allocates. */
export const tokens: StampTokens = emptyTokens();
/** The number at a place of the text. */
export const value = (i: number): number => tokens.value[i] ?? 0;
/** How many digits a number was written with. */
export const digitsOf = (i: number): number => tokens.digits[i] ?? 0;
/** The character before a number, a space where only spaces stood. */
export const before = (i: number): number => tokens.before[i] ?? 0;
/** Marks a number as read. */
export const take = (i: number): void => {
	tokens.used[i] = 1;
};
export const colon = 58;
export const point = 46;
export const comma = 44;
