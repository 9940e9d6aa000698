/**
 * Month names as they stand in exports, folded to plain lower-case letters. A name counts when it starts with one of
 * these, so that "Sept.", "septembre" and "September" need one entry. Source: Unicode CLDR month names.
 */
const stems: readonly (readonly string[])[] = [
	['jan', 'ene', 'gen', 'sty', 'oca', 'led', 'янв'],
	['feb', 'fev', 'lut', 'sub', 'uno', 'фев'],
	['mar', 'maa', 'mrt', 'mrz', 'maer', 'bre', 'мар'],
	['apr', 'avr', 'abr', 'kwi', 'nis', 'dub', 'апр'],
	['may', 'mai', 'mei', 'mag', 'maj', 'kve', 'мая', 'май'],
	['jun', 'juin', 'giu', 'cze', 'haz', 'июн'],
	['jul', 'juil', 'lug', 'lip', 'tem', 'июл'],
	['aug', 'aou', 'ago', 'sie', 'agu', 'srp', 'авг'],
	['sep', 'set', 'wrz', 'eyl', 'zar', 'сен'],
	['oct', 'okt', 'out', 'ott', 'paz', 'eki', 'rij', 'окт'],
	['nov', 'lis', 'kas', 'ноя'],
	['dec', 'dez', 'dic', 'gru', 'ara', 'pro', 'дек']
];

/** Weekdays may stand before a date and say nothing more. */
const weekdays =
	/^(mon|tue|wed|thu|fri|sat|sun|mo|di|mi|do|fr|sa|so|lun|mar|mer|jeu|ven|sam|dim|mie|jue|vie|sab|dom|seg|ter|qua|qui|sex|gio|maa|din|woe|don|vri|zat|zon|pon|wto|sro|czw|pia|nie)[a-z]*$/;

/** Letters without accents, lower case; ł and ß have no decomposition of their own. */
export function foldWord(word: string): string {
	const lower = word.toLowerCase();
	// eslint-disable-next-line no-control-regex
	if (/^[\x00-\x7f]*$/.test(lower)) return lower;
	return lower
		.normalize('NFD')
		.replace(/[\u0300-\u036f]/g, '')
		.normalize('NFC')
		.replace(/ł/g, 'l')
		.replace(/ß/g, 'ss')
		.replace(/ø/g, 'o')
		.replace(/ı/g, 'i');
}

const remembered = new Map<string, number>();

/** Month 1–12 of a name or abbreviation in a main language of the trade; 0 when it is none. */
export function monthOfName(word: string): number {
	const known = remembered.get(word);
	if (known !== undefined) return known;
	const folded = foldWord(word).replace(/\.$/, '');
	const found =
		folded.length < 3 ? 0 : stems.findIndex((names) => names.some((name) => folded.startsWith(name))) + 1;
	if (remembered.size < 1000) remembered.set(word, found);
	return found;
}

export function isWeekday(word: string): boolean {
	return weekdays.test(foldWord(word).replace(/\.$/, ''));
}
