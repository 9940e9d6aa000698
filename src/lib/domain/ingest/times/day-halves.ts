/**
 * Words for the two halves of the day, folded by the tokeniser: without full stops, lower case.
 * Source: Unicode CLDR day periods (am, pm) of the languages named; the letters a and p stand for themselves.
 */
const mornings: ReadonlySet<string> = new Set([
	...['am', 'vorm', 'vormittag', 'vormittags', '上午', '午前', '오전', '凌晨', '早上', 'öö', 'πμ', 'ص'],
	...['dop', 'dopo', 'дп', 'formiddag', 'προ', 'vm']
]);
const evenings: ReadonlySet<string> = new Set([
	...['pm', 'nachm', 'nachmittag', 'nachmittags', '下午', '午後', '오후', '中午', 'ös', 'μμ', 'م'],
	...['odp', 'пп', 'eftermiddag', 'nm']
]);

/** Words that mean something else elsewhere (Saturday, "of", "in"): they count beside the clock only. */
const morningsBesideClock: ReadonlySet<string> = new Set(['a', 'de', 'fm', 'pd', 'sa', 'ap', 'pg']);
const eveningsBesideClock: ReadonlySet<string> = new Set(['p', 'du', 'em', 'md', 'ch', 'ip', 'ptg']);
/** Weekdays and articles that may stand just before a clock all the same. */
const onlyAfterClock: ReadonlySet<string> = new Set(['a', 'p', 'sa', 'ch', 'md', 'pd']);

export type DayHalf = 'morning' | 'evening';

/** Which half of the day a word names; `side` is where it stands to the clock: 0 away from it, −1 before, 1 after. */
export function dayHalfOf(word: string, side: -1 | 0 | 1): DayHalf | null {
	if (mornings.has(word)) return 'morning';
	if (evenings.has(word)) return 'evening';
	if (side === 0 || (side === -1 && onlyAfterClock.has(word))) return null;
	if (morningsBesideClock.has(word)) return 'morning';
	return eveningsBesideClock.has(word) ? 'evening' : null;
}

/** Whether a whole cell is nothing but a half of the day. */
export function isDayHalf(cell: string): boolean {
	const word = cell
		.trim()
		.toLowerCase()
		.replace(/[.\s\u00a0\u202f]/g, '');
	return dayHalfOf(word, 1) !== null;
}
