import type { Quantity } from '../../trace/trace';
import { foldWord } from '../times/month-names';

/** Header text as plain words: folded, camel case and punctuation apart, CJK kept. */
export function wordsOf(text: string): string[] {
	const apart = text.replace(/([a-z])([A-Z])/g, '$1 $2');
	return foldWord(apart)
		.split(/[^\p{L}\p{N}#%+]+/u)
		.filter((word) => word !== '');
}

/**
 * One meaning's words: `stems` match the start of a word, `whole` a whole word, `within` any part (scripts without
 * spaces). Languages: en de fr es pt it nl pl cs hu tr sv ru zh ja ko.
 */
interface Lexeme {
	readonly stems: readonly string[];
	readonly whole: readonly string[];
	readonly within?: readonly string[];
}

function says(words: readonly string[], text: string, lexeme: Lexeme): boolean {
	return (
		words.some((word) => lexeme.whole.includes(word) || lexeme.stems.some((stem) => word.startsWith(stem))) ||
		(lexeme.within ?? []).some((part) => text.includes(part))
	);
}

const temperature: Lexeme = {
	stems: [
		'temper',
		'celsius',
		'fahrenheit',
		'teplot',
		'homersek',
		'sicakl',
		'lampotil',
		'температур',
		'kerntemp'
	],
	whole: [
		'temp',
		'temp1',
		'temp2',
		'temp3',
		'temp4',
		'tempc',
		'tempf',
		't',
		't1',
		't2',
		'tmp',
		'degc',
		'degf',
		'kelvin',
		'thermo'
	],
	within: ['温度', '溫度', '気温', '气温', '온도', 'temperat', '℃', '℉']
};
const humidity: Lexeme = {
	stems: [
		'humid',
		'feucht',
		'luftfeucht',
		'humed',
		'umid',
		'vocht',
		'luchtvocht',
		'wilgot',
		'vlhkost',
		'paratart',
		'fukt',
		'влажн',
		'relfeucht',
		'higro',
		'hygro'
	],
	whole: ['rh', 'hum', 'hr', 'rf', 'ur', 'rv', 'nem', '%rh', '%rf', '%'],
	within: ['湿度', '濕度', '습도']
};
const dewPoint: Lexeme = {
	stems: ['dew', 'taupunkt', 'rosee', 'rocio', 'orvalho', 'rugiada', 'dauwpunt', 'rosy', 'rosny'],
	whole: [],
	within: ['露点', '露點']
};
const light: Lexeme = {
	stems: ['light', 'licht', 'lumi', 'lux', 'swiatl', 'illumin', 'helligk'],
	whole: ['lx', 'luz', 'luce'],
	within: ['光照', '照度']
};
const shock: Lexeme = {
	stems: ['shock', 'accel', 'beschleun', 'vibrat', 'stoss', 'choc', 'golpe', 'impact', 'tilt', 'urto'],
	whole: ['g'],
	within: ['冲击', '振动', '衝撃']
};
const other: Lexeme = {
	stems: [
		'batter',
		'akku',
		'volt',
		'spannung',
		'press',
		'druck',
		'luftdruck',
		'co2',
		'signal',
		'speed',
		'lat',
		'lon',
		'altit',
		'ethyl',
		'door',
		'tur',
		'porte',
		'puerta',
		'alarm',
		'event',
		'ereignis',
		'status',
		'flag',
		'mark',
		'comment',
		'bemerk',
		'remark',
		'wind',
		'rain',
		'precip',
		'mkt',
		'activ',
		'dose',
		'quality',
		'firmware',
		'version',
		'rssi',
		'ppm',
		'weight',
		'gewicht',
		'crc',
		'checksum',
		'elevat'
	],
	whole: [
		'o2',
		'ah',
		'abs',
		'v',
		'mv',
		'hpa',
		'mbar',
		'bat',
		'pa',
		'kpa',
		'note',
		'notes',
		'gps',
		'power',
		'user',
		'f0',
		'pu'
	],
	within: ['电池', '電池', '电压', '位置', '报警', '警報']
};
const limit: Lexeme = {
	stems: [
		'limit',
		'thresh',
		'grenz',
		'schwell',
		'seuil',
		'umbral',
		'sogli',
		'setpoint',
		'sollwert',
		'consign',
		'consigna',
		'target',
		'ziel'
	],
	whole: ['set', 'sp', 'prog', 'grens', 'alarm', 'lsl', 'usl', 'lcl', 'ucl'],
	within: ['上限', '下限', '设定', '設定']
};
const index: Lexeme = {
	stems: ['index', 'lfd', 'numer', 'numm', 'record', 'sample', 'sequen', 'readingno', 'kayit', 'zapis'],
	whole: [
		'no',
		'nr',
		'n',
		'#',
		'num',
		'idx',
		'rec',
		'id',
		'line',
		'seq',
		'lp',
		'count',
		'zeile',
		'poz',
		'poradi',
		'sira',
		'row',
		'point',
		'pt'
	],
	within: ['序号', '序號', '番号', '编号', '번호', 'n°', 'nº']
};
const time: Lexeme = {
	stems: [
		'time',
		'date',
		'zeit',
		'datum',
		'uhr',
		'heure',
		'horodat',
		'fecha',
		'tijd',
		'godz',
		'czas',
		'tarih',
		'saat',
		'orario',
		'timestamp',
		'datetime',
		'idopont',
		'время',
		'дата',
		'klock',
		'tidpunkt',
		'epoch',
		'unix',
		'logged',
		'recorded',
		'messzeit',
		'instant'
	],
	whole: [
		'hora',
		'data',
		'ora',
		'cas',
		'tid',
		'dia',
		'jour',
		'day',
		'utc',
		'gmt',
		'ts',
		'when',
		'clock',
		'momento',
		'moment',
		'horario',
		'dt',
		'tempo',
		'temps',
		'at'
	],
	within: ['时间', '時間', '日期', '日時', '日付', '時刻', '时刻', '시간', '날짜', '일시']
};
const elapsed: Lexeme = {
	stems: [
		'elaps',
		'verstrich',
		'laufzeit',
		'duree',
		'duration',
		'ecoul',
		'transcurr',
		'decorrid',
		'trascors',
		'verstrek',
		'uplyn',
		'runtime',
		'dauer',
		'relativ',
		'offset'
	],
	whole: ['since'],
	within: ['経過', '经过']
};
const otherClock: Lexeme = {
	stems: [
		'receiv',
		'upload',
		'server',
		'sync',
		'export',
		'creat',
		'modif',
		'empfang',
		'sent',
		'transmit',
		'download',
		'insert'
	],
	whole: []
};
const lowest: Lexeme = {
	stems: ['minim', 'lowest', 'niedrig', 'tiefst', 'najniz'],
	whole: ['min', 'mini', 'low', 'lo', 'mn', 'minimum'],
	within: ['最低', '最小']
};
const highest: Lexeme = {
	stems: ['maxim', 'highest', 'hochst', 'hoechst', 'najwyz'],
	whole: ['max', 'maxi', 'high', 'hi', 'mx'],
	within: ['最高', '最大']
};
const average: Lexeme = {
	stems: ['mean', 'averag', 'mittel', 'durchschn', 'moyen', 'promed', 'gemidd', 'sredn'],
	whole: ['avg', 'ave', 'moy', 'media', 'mw', 'mean'],
	within: ['平均']
};

export interface HeaderMeaning {
	readonly quantity: Quantity | null;
	readonly isTime: boolean;
	readonly isElapsed: boolean;
	readonly isOtherClock: boolean;
	readonly isIndex: boolean;
	readonly isLimit: boolean;
	readonly statistic: 'min' | 'max' | 'mean' | null;
}

function quantityOf(words: readonly string[], text: string): Quantity | null {
	if (says(words, text, dewPoint)) return 'dew-point';
	// "Temp/RH sensor" style heads name the temperature first; a percent sign settles it the other way.
	const isHumid = says(words, text, humidity);
	if (isHumid && (text.includes('%') || !says(words, text, temperature))) return 'humidity';
	if (says(words, text, temperature)) return 'temperature';
	if (says(words, text, light)) return 'light';
	if (says(words, text, shock)) return 'shock';
	return says(words, text, other) ? 'other' : null;
}

/** What a column head says about its column, in any of the languages known. */
export function meaningOf(header: string): HeaderMeaning {
	const text = foldWord(header);
	const words = wordsOf(header);
	const quantity = quantityOf(words, text);
	const isValue = quantity !== null;
	return {
		quantity,
		isTime: !isValue && says(words, text, time),
		isElapsed: !isValue && says(words, text, elapsed),
		isOtherClock: says(words, text, otherClock),
		isIndex: !isValue && says(words, text, index),
		isLimit: says(words, text, limit),
		statistic: says(words, text, average)
			? 'mean'
			: says(words, text, lowest)
				? 'min'
				: says(words, text, highest)
					? 'max'
					: null
	};
}
