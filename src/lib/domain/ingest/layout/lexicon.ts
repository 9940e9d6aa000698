/**
 * One meaning's words: `stems` match the start of a word, `whole` a whole word, `within` any part (scripts without
 * spaces). Languages: en de fr es pt it nl pl cs hu tr sv ru zh ja ko.
 */
export interface Lexeme {
	readonly stems: readonly string[];
	readonly whole: readonly string[];
	readonly within?: readonly string[];
}

export const temperature: Lexeme = {
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
export const humidity: Lexeme = {
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
export const dewPoint: Lexeme = {
	stems: ['dew', 'taupunkt', 'rosee', 'rocio', 'orvalho', 'rugiada', 'dauwpunt', 'rosy', 'rosny'],
	whole: [],
	within: ['露点', '露點']
};
export const light: Lexeme = {
	stems: ['light', 'licht', 'lumi', 'lux', 'swiatl', 'illumin', 'helligk'],
	whole: ['lx', 'luz', 'luce'],
	within: ['光照', '照度']
};
export const shock: Lexeme = {
	stems: ['shock', 'accel', 'beschleun', 'vibrat', 'stoss', 'choc', 'golpe', 'impact', 'tilt', 'urto'],
	whole: ['g'],
	within: ['冲击', '振动', '衝撃']
};
export const other: Lexeme = {
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
export const limit: Lexeme = {
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
export const index: Lexeme = {
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
export const time: Lexeme = {
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
export const elapsed: Lexeme = {
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
export const otherClock: Lexeme = {
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
export const lowest: Lexeme = {
	stems: ['minim', 'lowest', 'niedrig', 'tiefst', 'najniz'],
	whole: ['min', 'mini', 'low', 'lo', 'mn', 'minimum'],
	within: ['最低', '最小']
};
export const highest: Lexeme = {
	stems: ['maxim', 'highest', 'hochst', 'hoechst', 'najwyz'],
	whole: ['max', 'maxi', 'high', 'hi', 'mx'],
	within: ['最高', '最大']
};
export const average: Lexeme = {
	stems: ['mean', 'averag', 'mittel', 'durchschn', 'moyen', 'promed', 'gemidd', 'sredn'],
	whole: ['avg', 'ave', 'moy', 'media', 'mw', 'mean'],
	within: ['平均']
};
