import { foldWord } from '../times/month-names';

/** What the key of a line outside the readings speaks of. */
export type KeyMeaning =
	'serial' | 'device' | 'trip' | 'start' | 'stop' | 'interval' | 'unit' | 'format' | 'zone';

/** Patterns over folded Latin letters; word borders are those of ASCII. */
const patterns: Readonly<Record<KeyMeaning, RegExp>> = {
	serial:
		/\b(serial|s\/?n|seriennummer|serien ?nr|serie|serienummer|matricola|seryjny|seri no|device id|logger id|sensor id|imei|mac|device ?sn|unit id|numero de serie|n de serie)\b/,
	device:
		/\b(device|logger|geraet|gerat|recorder|appareil|dispositivo|rejestrator|urzadzenie|bn|instrument|tag)\b/,
	trip: /\b(trip|shipment|consignment|reise|sendung|fahrt|bezeichnung|trajet|voyage|expedition|viaje|viagem|viaggio|spedizione|envio|rit|reis|zending|przesylka|podroz|description|title|lot name|order)\b/,
	start:
		/\b(start\w*|begin\w*|debut|inicio|inizio|aanvang\w*|poczatek|rozpoczecie|rozpoczecia|baslangic|activat(ed|ion)|aktivier\w*|activation|first (reading|record|log|logged|sample|measurement)|logged from|erste messung|premiere? (mesure|lecture)|from|von)\b/,
	stop: /\b(stop\w*|finish(ed)?|complet(ed|ion)|terminat(ed|ion)|termine|abgeschlossen|end(ed|e|zeit|time|datum)?|fin|ende|fine|final|einde|koniec|zakonczenie|bitis|last (reading|record|log|logged|sample|measurement)|letzte messung|to|bis)\b/,
	interval:
		/\b(\w*interval\w*|intervalo|intervallo|interwal\w*|cadence|messtakt|takt|cycle|zyklus|sampling|sample (rate|period|every)|log(ging)? (rate|period|cycle|every)|rate|period(o|e|icidad)?|aufzeichnungsrate|messrate|czestotliwosc|aralik|araligi|every)\b/,
	unit: /\b(unit|units|einheit|unite|unidad|unidade|unita|eenheid|jednostka|birim|scale|temperatureinheit|temperatureenheid|uom)\b/,
	format: /\b(date ?format|datumsformat|format)\b/,
	zone: /\b(time ?zone|zone|tz|zeitzone|fuseau( horaire)?|zona horaria|fuso( horario| orario)?|tijdzone|strefa czasowa|saat dilimi|tidszon[ae]?|tidssone|aikavyohyke|utc offset|gmt offset|utc|gmt|time offset|dst offset)\b/
};

/** Words of further languages and scripts, each the beginning of a word. */
const stems: Readonly<Record<KeyMeaning, readonly string[]>> = {
	serial: [
		'sarjanumero',
		'sériové',
		'sorozatszám',
		'gyártási szám',
		'număr de serie',
		'seria',
		'serijsk',
		'seerianumber',
		'sērijas',
		'serijos num',
		'серийн',
		'серійн',
		'заводск',
		'сериен',
		'σειριακ',
		'nomor seri',
		'số sê-ri',
		'số seri'
	],
	device: [
		'enhed',
		'enhet',
		'laite',
		'zařízení',
		'készülék',
		'eszköz',
		'dispozitiv',
		'uređaj',
		'naprava',
		'устройств',
		'прибор',
		'регистратор',
		'пристр',
		'συσκευ'
	],
	trip: [
		'forsendelse',
		'sändning',
		'försändelse',
		'lähetys',
		'zásilka',
		'szállítmány',
		'pošiljka',
		'рейс',
		'перевоз',
		'доставк',
		'αποστολ'
	],
	start: [
		'aloitus',
		'alku',
		'začátek',
		'začiatok',
		'začetek',
		'zahájení',
		'kezdés',
		'kezdet',
		'indítás',
		'început',
		'pornire',
		'početak',
		'početno',
		'algus',
		'sākums',
		'pradžia',
		'начал',
		'старт',
		'почат',
		'έναρξ',
		'mulai',
		'bắt đầu',
		'thời gian bắt đầu',
		'första',
		'første',
		'waktu mulai',
		'kayit baslang'
	],
	stop: [
		'lopetus',
		'loppu',
		'konec',
		'ukončení',
		'vége',
		'befejezés',
		'sfârșit',
		'kraj',
		'završetak',
		'konec',
		'lõpp',
		'beigas',
		'pabaiga',
		'конец',
		'оконч',
		'кінець',
		'край',
		'λήξη',
		'τέλος',
		'selesai',
		'slut',
		'kết thúc'
	],
	interval: [
		'mittausväli',
		'tallennusväli',
		'időköz',
		'mérési',
		'διάστημα',
		'интервал',
		'інтервал',
		'период',
		'sıklı',
		'kayıt aralığı',
		'kayıt sıklığı',
		'intervāl',
		'khoảng thời gian',
		'perioda'
	],
	unit: [
		'yksikkö',
		'enhed',
		'enhet',
		'jednotk',
		'jedinic',
		'mértékegység',
		'unitate',
		'единиц',
		'одиниц',
		'μονάδ',
		'satuan',
		'đơn vị'
	],
	format: [],
	zone: [
		'időzóna',
		'časové pásmo',
		'časový pás',
		'časovni pas',
		'fus orar',
		'vremenska zona',
		'ajavöönd',
		'laika josla',
		'laiko juosta',
		'часовой пояс',
		'часовий пояс',
		'часова зона',
		'временная зона',
		'ζώνη ώρας',
		'zona waktu',
		'múi giờ',
		'tidzon'
	]
};

/** Parts of words in scripts that set no spaces between them. */
const parts: Readonly<Record<KeyMeaning, readonly string[]>> = {
	serial: [
		'序列号',
		'序列號',
		'製造番号',
		'シリアル',
		'机号',
		'设备编号',
		'일련',
		'מספר סידורי',
		'الرقم التسلسلي',
		'หมายเลขเครื่อง'
	],
	device: ['设备', '設備', '장치', '記録計'],
	trip: ['行程', '运单', '運單', '配送'],
	start: ['开始', '開始', '首次', '启动', '啟動', '시작', 'התחל', 'البداية', 'بدء', 'เริ่ม'],
	stop: ['结束', '結束', '終了', '停止', '종료', 'סיום', 'النهاية', 'สิ้นสุด'],
	interval: ['间隔', '間隔', '周期', '간격', 'מרווח', 'الفاصل', 'ช่วงเวลา'],
	unit: ['单位', '單位', '単位', '단위'],
	format: [],
	zone: ['时区', '時區', 'タイムゾーン', '시간대', 'אזור זמן', 'المنطقة الزمنية', 'เขตเวลา']
};

const escaped = (words: readonly string[]): string => words.map((word) => foldWord(word)).join('|');

function matcherOf(meaning: KeyMeaning): RegExp | null {
	const [own, inside] = [escaped(stems[meaning]), escaped(parts[meaning])];
	const all = [own === '' ? '' : `(?<!\\p{L})(?:${own})`, inside].filter((part) => part !== '');
	return all.length === 0 ? null : new RegExp(all.join('|'), 'u');
}

const matchers = {
	serial: matcherOf('serial'),
	device: matcherOf('device'),
	trip: matcherOf('trip'),
	start: matcherOf('start'),
	stop: matcherOf('stop'),
	interval: matcherOf('interval'),
	unit: matcherOf('unit'),
	format: matcherOf('format'),
	zone: matcherOf('zone')
} satisfies Record<KeyMeaning, RegExp | null>;

/** Whether a folded key speaks of something, in any of the languages known. */
export function isKeyOf(meaning: KeyMeaning, key: string): boolean {
	return patterns[meaning].test(key) || matchers[meaning]?.test(key) === true;
}

/** A key as {@link isKeyOf} reads it: camel case apart, folded, signs as spaces. */
export function foldedKey(key: string): string {
	return foldWord(key.replace(/(\p{Ll})(\p{Lu})/gu, '$1 $2')).replace(/[_.°]/g, ' ');
}
