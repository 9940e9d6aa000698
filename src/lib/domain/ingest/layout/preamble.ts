import type { TemperatureUnit } from '../../units';
import { unitWithin, wholeUnitOf } from '../cells/unit-words';
import { foldWord } from '../times/month-names';
import { orderNamedIn, type DateOrder } from '../times/date-order';
import { emptyStamp, scanStamp } from '../times/stamp';
import { zoneStatedIn } from './stated-zone';
import type { Entry } from './table';

/** Facts stated outside the readings, as text where they still depend on the order of dates. */
export interface Stated {
	readonly serial: string | null;
	readonly tripName: string | null;
	readonly startText: string | null;
	readonly stopText: string | null;
	/** A date that stands alone under the word for it: the day of times that carry none. */
	readonly dateText: string | null;
	readonly intervalMinutes: number | null;
	readonly zone: string | null;
	/** A zone the file names by letters that mean several. */
	readonly zoneWord: string | null;
	readonly unit: TemperatureUnit | null;
	readonly order: DateOrder | null;
	/** Every date outside the readings: one with a day over 12 shows the order the program writes. */
	readonly momentTexts: readonly string[];
}

const keys = {
	serial:
		/\b(serial|s\/?n|seriennummer|serien ?nr|serie|serienummer|matricola|seryjny|seri no|device id|logger id|sensor id|imei|mac|device ?sn|unit id|numero de serie|n de serie)\b|序列号|序列號|製造番号|シリアル|机号|设备编号/,
	device:
		/\b(device|logger|geraet|gerat|recorder|appareil|dispositivo|rejestrator|urzadzenie|bn|instrument|tag)\b|设备|設備/,
	trip: /\b(trip|shipment|consignment|reise|sendung|fahrt|bezeichnung|trajet|voyage|expedition|viaje|viagem|viaggio|spedizione|envio|rit|reis|zending|przesylka|podroz|description|title|lot name|order)\b|行程|运单/,
	start:
		/\b(start(ed|zeit|datum|tid)?|begin+(n|time|ning|zeit)?|debut|inicio|inizio|aanvang|poczatek|rozpoczecie|baslangic|first (reading|record|log|sample)|erste messung|premiere? (mesure|lecture)|from|von)\b|开始|開始|首次/,
	stop: /\b(stop(ped|zeit)?|end(ed|e|zeit|time)?|fin|ende|fine|final|einde|koniec|zakonczenie|bitis|last (reading|record|log|sample)|letzte messung|to|bis)\b|结束|終了|停止/,
	interval:
		/\b(\w*interval\w*|intervalo|intervallo|interwal\w*|cadence|messtakt|takt|sampling|sample (rate|period|every)|log(ging)? (rate|period|cycle|every)|rate|period(o|e|icidad)?|aufzeichnungsrate|messrate|czestotliwosc|aralik|every)\b|间隔|間隔/,
	unit: /\b(unit|units|einheit|unite|unidad|unidade|unita|eenheid|jednostka|birim|scale|temperatureinheit|temperatureenheid|uom)\b|单位|單位|単位/,
	format: /\b(date ?format|datumsformat|format)\b/
} as const;

const minuteFactors: readonly [RegExp, number][] = [
	[/\b(ms|milli\w*)\b/, 1 / 60_000],
	[/(\d|\b)(s|sec\w*|sek\w*|seg\w*|秒)(\b|$)/, 1 / 60],
	[/(\d|\b)(m|mi|min\w*|mn|分\w*)(\b|$)/, 1],
	[/(\d|\b)(h|hr|hrs|hour\w*|std|stunde\w*|heure\w*|hora\w*|ore|ora|uur|godz\w*)(\b|$)/, 60]
];

/** Minutes of an interval text: `10 min`, `00:10:00`, `600 s`, or a bare number whose unit the key names. */
export function intervalOf(value: string, key: string): number | null {
	const clock = /^\s*(\d{1,3}):(\d{2})(?::(\d{2}))?\s*(?:h|min|hh:mm(:ss)?)?\s*$/.exec(value);
	if (clock !== null) {
		const [h, m, s] = [Number(clock[1]), Number(clock[2]), Number(clock[3] ?? 0)];
		const minutes = clock[3] === undefined && /mm:ss/i.test(key) ? h + m / 60 : h * 60 + m + s / 60;
		return minutes > 0 ? minutes : null;
	}
	const amount = /(\d+(?:[.,]\d+)?)/.exec(value);
	if (amount === null) return null;
	const count = Number((amount[1] ?? '').replace(',', '.'));
	const iso = /^PT(\d+)([HMS])$/i.exec(value.trim());
	const text = iso !== null ? `1 ${iso[2]}`.toLowerCase() : foldWord(value);
	const factor = (minuteFactors.find(([unit]) => unit.test(text)) ??
		minuteFactors.find(([unit]) => unit.test(foldWord(key).replace(/[()[\]_.]/g, ' '))))?.[1];
	return factor === undefined || count <= 0 ? null : count * factor;
}

const stamp = emptyStamp();

function hasStamp(text: string): boolean {
	return scanStamp(text, stamp) && stamp.shape !== 'none';
}

/** A moment, or a date and a time given in two lines that are put together. */
function momentOf(entries: readonly Entry[], pattern: RegExp): string | null {
	let date: string | null = null;
	for (const { key, value } of entries) {
		if (!pattern.test(key)) continue;
		const isStamp = scanStamp(value, stamp);
		if (isStamp && stamp.shape !== 'none' && stamp.msOfDay >= 0) return value;
		if (isStamp && stamp.shape !== 'none') date ??= value;
		else if (isStamp && date !== null) return `${date} ${value}`;
	}
	return date;
}

function serialOf(entries: readonly Entry[]): string | null {
	const isSerial = (value: string): boolean => /[\d]/.test(value) && value.length <= 40 && !hasStamp(value);
	const exact = entries.find(({ key, value }) => keys.serial.test(key) && isSerial(value));
	const device =
		exact ??
		entries.find(
			({ key, value }) =>
				keys.device.test(key) && isSerial(value) && !/interval|model|type|version|unit/.test(key)
		);
	return device === undefined ? null : device.value.trim();
}

/** A unit that the entries name; null where they name none or two, of which neither speaks of temperature alone. */
function unitInEntries(entries: readonly Entry[]): TemperatureUnit | null | undefined {
	const named = entries.flatMap(({ key, value }) => {
		const unit = keys.unit.test(key) ? (wholeUnitOf(value) ?? unitWithin(value)) : null;
		return unit === null ? [] : [{ unit, isOwn: /temp/.test(key) }];
	});
	const own = named.filter(({ isOwn }) => isOwn);
	const units = new Set((own.length > 0 ? own : named).map(({ unit }) => unit));
	const [only] = units;
	return units.size === 0 ? undefined : units.size === 1 ? only : null;
}

function unitOf(entries: readonly Entry[], freeText: string): TemperatureUnit | null {
	const stated = unitInEntries(entries);
	if (stated !== undefined) return stated;
	const seen = new Set(
		[...freeText.matchAll(/(?:°|º|˚|(?<!\p{L})[ø¡]|℃|℉|\ufffd|\bdeg\.?)\s?([CF])?(?!\p{L})/giu)]
			.map((hit) => unitWithin(hit[0]))
			.filter((unit) => unit !== null)
	);
	const [only] = [...seen];
	return seen.size === 1 && only !== undefined ? only : null;
}

/** Reads what the lines around the readings say. Limits and alarms name a unit, never a reading. */
export function statedIn(entries: readonly Entry[], freeText: string, header: readonly string[]): Stated {
	const folded = entries.map((entry) => ({
		...entry,
		key: foldWord(entry.key.replace(/(\p{Ll})(\p{Lu})/gu, '$1 $2')).replace(/[_.°]/g, ' ')
	}));
	const interval = folded
		.map(({ key, value }) => (keys.interval.test(key) ? intervalOf(value, key) : null))
		.find((minutes) => minutes !== null);
	const zone = zoneStatedIn(folded, freeText);
	const trip = folded.find(
		({ key, value }) => keys.trip.test(key) && value !== '' && !hasStamp(value) && !keys.start.test(key)
	);
	const format = [
		...folded.filter(({ key }) => keys.format.test(key)).map(({ value }) => value),
		...header
	].map(orderNamedIn);
	return {
		serial: serialOf(folded),
		tripName: trip?.value.trim() ?? null,
		startText: momentOf(folded, keys.start),
		stopText: momentOf(folded, keys.stop),
		dateText: momentOf(folded, /^(date|datum|fecha|data|dato|tarih|pvm)$|^(日期|日付|날짜)$/),
		intervalMinutes: interval ?? null,
		zone: zone.zone,
		zoneWord: zone.word,
		unit: unitOf(folded, freeText),
		order: format.find((order) => order !== null) ?? null,
		momentTexts: folded.map(({ value }) => value).filter(hasStamp)
	};
}
