/**
 * Month names as they stand in exports, folded to plain lower-case letters. A name counts when it starts with one of
 * these, so that "Sept.", "septembre" and "September" need one entry. Source: Unicode CLDR month names.
 */
const stems: readonly (readonly string[])[] = [
	[
		'jan',
		'ene',
		'gen',
		'sty',
		'oca',
		'led',
		'янв',
		'яну',
		'ιαν',
		'ian',
		'jaa',
		'tammi',
		'січ',
		'sij',
		'sau',
		'ינו',
		'يناير'
	],
	['feb', 'fev', 'lut', 'sub', 'uno', 'фев', 'φεβ', 'vee', 'helmi', 'лют', 'velj', 'vas', 'פבר', 'فبراير'],
	['mar', 'maa', 'mrt', 'mrz', 'maer', 'bre', 'мар', 'μαρ', 'бер', 'ozu', 'kov', 'מרץ', 'مارس'],
	[
		'apr',
		'avr',
		'abr',
		'kwi',
		'nis',
		'dub',
		'апр',
		'απρ',
		'huhti',
		'кві',
		'tra',
		'bal',
		'אפר',
		'أبريل',
		'ابريل'
	],
	[
		'may',
		'mai',
		'mei',
		'mag',
		'maj',
		'kve',
		'мая',
		'май',
		'маи',
		'μαι',
		'touko',
		'тра',
		'svi',
		'geg',
		'מאי',
		'مايو'
	],
	[
		'jun',
		'juin',
		'giu',
		'cze',
		'haz',
		'июн',
		'юни',
		'ιουν',
		'iun',
		'juun',
		'kesa',
		'чер',
		'cvn',
		'bir',
		'יונ',
		'يونيو'
	],
	[
		'jul',
		'juil',
		'lug',
		'tem',
		'июл',
		'юли',
		'ιουλ',
		'iul',
		'juul',
		'heina',
		'лип',
		'cvc',
		'lie',
		'יול',
		'يوليو'
	],
	[
		'aug',
		'avg',
		'aou',
		'ago',
		'sie',
		'agu',
		'agt',
		'авг',
		'αυγ',
		'elo',
		'сер',
		'kol',
		'rugp',
		'אוג',
		'أغسطس',
		'اغسطس'
	],
	[
		'sep',
		'set',
		'wrz',
		'eyl',
		'zar',
		'сен',
		'сеп',
		'σεπ',
		'szep',
		'syys',
		'вер',
		'ruj',
		'rugs',
		'ספט',
		'سبتمبر'
	],
	[
		'oct',
		'okt',
		'out',
		'ott',
		'paz',
		'eki',
		'rij',
		'окт',
		'οκτ',
		'loka',
		'жов',
		'spa',
		'אוק',
		'أكتوبر',
		'اكتوبر'
	],
	['nov', 'kas', 'ноя', 'ное', 'νοε', 'noi', 'лис', 'stu', 'lap', 'נוב', 'نوفمبر'],
	['dec', 'dez', 'dic', 'gru', 'ara', 'pro', 'дек', 'δεκ', 'joulu', 'гру', 'det', 'des', 'דצמ', 'ديسمبر']
].map((names) => names.map(foldWord));

/**
 * Names that are one month in Polish, Czech and Ukrainian and the one before it in Croatian: which, only the file as a
 * whole can tell. Until then they count as months behind the twelfth.
 */
export const twofoldMonths = { lip: 13, lis: 14, srp: 15 } as const;
const twofoldFirst = 13;
/** The months each of them may be, the Croatian one last. */
const meanings: readonly (readonly [elsewhere: number, croatian: number])[] = [
	[7, 6],
	[11, 10],
	[8, 7]
];

/** The two months that a month behind the twelfth may be; null for one that is settled. */
export function monthsMeant(month: number): readonly [elsewhere: number, croatian: number] | null {
	return meanings[month - twofoldFirst] ?? null;
}

/** Words that begin like a month's name and are another's, or none (temperature): looked up before the stems. */
const longer: readonly (readonly [string, number])[] = [
	['marras', 11],
	['temp', 0],
	['cervenec', 7],
	['cervence', 7],
	['cerven', 6],
	['cervn', 6],
	['lipie', 7],
	['lipca', 7],
	['lipa', 6],
	['lipn', 6],
	['srpan', 7],
	['srpnja', 7],
	['srpen', 8],
	['srpna', 8],
	['listopadu', 11],
	['lip', twofoldMonths.lip],
	['lis', twofoldMonths.lis],
	['srp', twofoldMonths.srp]
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

/** Month 1–12 of a name or abbreviation in a main language of the trade, over 12 where two are meant; 0 for none. */
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
