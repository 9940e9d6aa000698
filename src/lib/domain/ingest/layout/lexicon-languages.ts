import { foldWord } from '../times/month-names';
import type { Lexeme } from './lexicon';

/** Words of further languages as they are spelled there; they are folded once, as heads are. */
function spelled(
	stems: readonly string[],
	whole: readonly string[] = [],
	within: readonly string[] = []
): Lexeme {
	return { stems: stems.map(foldWord), whole: whole.map(foldWord), within: within.map(foldWord) };
}

/** Both lists of words. */
export function joinedLexeme(a: Lexeme, b: Lexeme): Lexeme {
	return {
		stems: [...a.stems, ...b.stems],
		whole: [...a.whole, ...b.whole],
		within: [...(a.within ?? []), ...(b.within ?? [])]
	};
}

/** da sv no fi cs sk hu ro el ru uk bg hr sl et lv lt he ar th vi id beside the languages of the lexicon. */
export const further = {
	temperature: spelled(
		['θερμοκρ', 'nhiệt', 'suhu', 'hőfok', 'kuumus', 'centigrad'],
		[],
		['טמפרטורה', 'حرارة', 'อุณหภูมิ']
	),
	humidity: spelled(
		[
			'luftfugt',
			'luftfukt',
			'fugtig',
			'kosteus',
			'υγρασ',
			'вологіст',
			'wilgoc',
			'vlažnost',
			'vlaga',
			'niiskus',
			'mitrum',
			'drėgm',
			'kelemba',
			'nedves'
		],
		['nem', 'rv'],
		['לחות', 'رطوبة', 'ความชื้น', 'đo am']
	),
	dewPoint: spelled(
		['dugpunkt', 'daggpunkt', 'duggpunkt', 'kastepiste', 'harmatpont', 'rosisť', 'rosiste'],
		[],
		['точка росы', 'точка роси', 'punct de roua', '結露']
	),
	light: spelled(
		[
			'lys',
			'ljus',
			'valo',
			'světlo',
			'fény',
			'lumin',
			'φωτειν',
			'свет',
			'освещ',
			'svjetlo',
			'svetlob',
			'cahaya',
			'işık'
		],
		[],
		['조도', '光', 'แสง']
	),
	index: spelled(
		['sorszám', 'broj zap', 'märknr', 'järjek'],
		['nro', 'stt', 'rb', 'crt', 'lopnr', 'løpenr', 'løbenr'],
		['מספר', 'رقم', 'ลำดับ', '순번', 'α/α', '№']
	),
	time: spelled(
		[
			'dato',
			'klokke',
			'tidspunkt',
			'päivä',
			'kellon',
			'aikale',
			'dátum',
			'ημερομ',
			'vrijeme',
			'kuupäev',
			'kellaaeg',
			'datums',
			'laiks',
			'laikas',
			'tanggal',
			'waktu',
			'čas',
			'ngày',
			'giờ',
			'thời gian'
		],
		['aika', 'pvm', 'idő', 'ώρα', 'ura', 'aeg', 'час', 'tid', 'vreme', 'nap', 'thời', 'jam'],
		['תאריך', 'שעה', 'تاريخ', 'وقت', 'วันที่', 'เวลา', 'วันเวลา']
	),
	elapsed: spelled([
		'forløb',
		'förflut',
		'förlup',
		'kulunut',
		'uplynul',
		'eltelt',
		'scurs',
		'proteklo',
		'geçen',
		'прошедш',
		'прошло',
		'минало'
	]),
	lowest: spelled(
		[
			'laveste',
			'lägst',
			'alin',
			'nejniž',
			'legkis',
			'legalacs',
			'ελάχ',
			'миним',
			'мінім',
			'najniž',
			'najmanj',
			'madal',
			'zemāk',
			'žemiaus',
			'terendah',
			'thấp nhất'
		],
		['мин', 'мін', 'ελαχ'],
		['최저', '최소', 'en dusuk']
	),
	highest: spelled(
		[
			'højest',
			'høyest',
			'högst',
			'ylin',
			'nejvyš',
			'legmagas',
			'legnagy',
			'μέγισ',
			'максим',
			'najviš',
			'kõrgei',
			'augstāk',
			'aukščiaus',
			'tertinggi',
			'cao nhất'
		],
		['макс', 'μεγ'],
		['최고', '최대', 'en yuksek']
	),
	average: spelled(
		[
			'gennemsn',
			'genomsn',
			'gjennomsn',
			'medel',
			'middel',
			'keskiarv',
			'průměr',
			'priemer',
			'átlag',
			'средн',
			'середн',
			'prosjek',
			'povpreč',
			'keskmi',
			'vidēj',
			'vidurk',
			'ortalam',
			'rata-rata',
			'trung bình',
			'μέσ'
		],
		['snitt', 'medie', 'średnia'],
		['평균']
	)
} satisfies Record<string, Lexeme>;
