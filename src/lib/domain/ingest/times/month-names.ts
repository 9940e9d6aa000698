/**
 * Month names as they stand in exports, folded to plain lower-case letters. A name counts when it starts with one of
 * these, so that "Sept.", "septembre" and "September" need one entry. Source: Unicode CLDR month names.
 */
const stems: readonly (readonly string[])[] = [
	['jan', 'ene', 'gen', 'sty', 'oca', 'led', 'янв', 'ιαν', 'ian', 'jaa', 'tammi', 'січ'],
	['feb', 'fev', 'lut', 'sub', 'uno', 'фев', 'φεβ', 'vee', 'helmi', 'лют'],
	['mar', 'maa', 'mrt', 'mrz', 'maer', 'bre', 'мар', 'μαρ', 'бер'],
	['apr', 'avr', 'abr', 'kwi', 'nis', 'dub', 'апр', 'απρ', 'huhti', 'кві'],
	['may', 'mai', 'mei', 'mag', 'maj', 'kve', 'мая', 'май', 'μαι', 'touko', 'тра'],
	['jun', 'juin', 'giu', 'cze', 'haz', 'июн', 'ιουν', 'iun', 'juun', 'kesa', 'чер', 'cvn'],
	['jul', 'juil', 'lug', 'lip', 'tem', 'июл', 'ιουλ', 'iul', 'juul', 'heina', 'лип', 'cvc'],
	['aug', 'aou', 'ago', 'sie', 'agu', 'srp', 'авг', 'αυγ', 'elo', 'сер'],
	['sep', 'set', 'wrz', 'eyl', 'zar', 'сен', 'σεπ', 'szep', 'syys', 'вер'],
	['oct', 'okt', 'out', 'ott', 'paz', 'eki', 'rij', 'окт', 'οκτ', 'loka', 'жов'],
	['nov', 'lis', 'kas', 'ноя', 'νοε', 'noi', 'лис'],
	['dec', 'dez', 'dic', 'gru', 'ara', 'pro', 'дек', 'δεκ', 'joulu', 'гру', 'det', 'des']
];

/** Words that begin like a month's name and are another's, or none (temperature): looked up before the stems. */
const longer: readonly (readonly [string, number])[] = [
	['marras', 11],
	['temp', 0],
	['cervenec', 7],
	['cervence', 7],
	['cerven', 6],
	['cervn', 6]
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
	const exact = longer.find(([name]) => folded.startsWith(name))?.[1];
	const found =
		exact ??
		(folded.length < 3 ? 0 : stems.findIndex((names) => names.some((name) => folded.startsWith(name))) + 1);
	if (remembered.size < 1000) remembered.set(word, found);
	return found;
}

export function isWeekday(word: string): boolean {
	return weekdays.test(foldWord(word).replace(/\.$/, ''));
}
