import { foldWord } from '../times/month-names';
import { isKeyOf } from './key-words';
import type { Entry } from './table';

/** Units of a length of time by how their words begin, folded. */
const units: readonly (readonly [RegExp, number])[] = [
	[/^(ms|milli|мс|毫秒|ミリ)/, 1 / 60_000],
	[/^(months?|mont|mes|мес)/, NaN],
	[
		/^(s|sec|sek|seg|secs|сек\p{L}*|с|sn|saniye|δευτ\p{L}*|秒\p{L}*|초|วินาที|giay|detik|masodperc)$|^(second|sekund|segund|secon|sekun)/u,
		1 / 60
	],
	[
		/^(m|mi|min|mn|mins|мин\p{L}*|хв\p{L}*|dk|dak\p{L}*|perc\p{L}*|λεπ\p{L}*|分\p{L}*|분|นาที|phut|menit|minit)$|^(minut|minuut)/u,
		1
	],
	[
		/^(h|hr|hrs|std|час\p{L}*|ч|год\p{L}*|sa|saat|ora|ore|ur|ωρ\p{L}*|小时|小時|時間?|时|시간|ชั่วโมง|gio|jam|timer?|timmar?|tunti\p{L}*|hod\p{L}*|uur|uren|godz\p{L}*|sat\p{L}?)$|^(hour|stund|heure|hora)/u,
		60
	],
	[/^(d|j|day|days|tag\p{L}*|jours?|dias?|giorn\p{L}*|dag\p{L}*|dni|dzien|gun|дн\p{L}*|天|日|일)$/u, 1440]
];

const minutesOfUnit = (word: string): number | undefined => units.find(([unit]) => unit.test(word))?.[1];

/** `00:10:00`, `0:15`, `0 days 00:10:00`, in minutes; null when the text is no clock. */
function clockMinutes(value: string, key: string): number | null {
	const clock =
		/^\s*(?:(\d{1,3})\s*(?:d|days?|tage?|jours?)[\s,]+)?(\d{1,3}):(\d{2})(?::(\d{2}))?\s*(?:h|min|hh:mm(:ss)?)?\s*$/i.exec(
			value
		);
	if (clock === null) return null;
	const [days, h, m, s] = [1, 2, 3, 4].map((group) => Number(clock[group] ?? 0));
	const isShort = clock[4] === undefined && clock[1] === undefined && /mm:ss/i.test(key);
	return isShort ? (h ?? 0) + (m ?? 0) / 60 : ((days ?? 0) * 24 + (h ?? 0)) * 60 + (m ?? 0) + (s ?? 0) / 60;
}

/** `10 min`, `0h 10m 0s`, `PT10M`, `10 мин`: the sum of its parts; null where a part has no unit that is known. */
function spokenMinutes(value: string): number | null {
	const text = foldWord(value.trim())
		.replace(/^p(?=t?\d)/, '')
		.replace(/^t(?=\d)/, '');
	let [sum, seen] = [0, 0];
	for (const [, amount = '', word = ''] of text.matchAll(/(\d+(?:[.,]\d+)?)\s*(\p{L}*)/gu)) {
		const minutes = minutesOfUnit(word);
		if (minutes === undefined) return null;
		sum += Number(amount.replace(',', '.')) * minutes;
		seen++;
	}
	return seen === 0 ? null : sum;
}

/** The unit that a key names for a bare number: `interval (s)`, `sampling minutes`. */
function unitOfKey(key: string): number | undefined {
	const words = foldWord(key)
		.split(/[^\p{L}]+/u)
		.filter((word) => word !== '' && !isKeyOf('interval', word));
	return words.map(minutesOfUnit).find((minutes) => minutes !== undefined);
}

/** Minutes of an interval text: `10 min`, `00:10:00`, `600 s`, or a bare number whose unit the key names. */
export function intervalOf(value: string, key: string): number | null {
	const amount = /^\s*(\d+(?:[.,]\d+)?)\s*$/.exec(value)?.[1];
	const minutes =
		amount === undefined
			? (clockMinutes(value, key) ?? spokenMinutes(value))
			: Number(amount.replace(',', '.')) * (unitOfKey(key) ?? NaN);
	return minutes !== null && minutes > 0 ? minutes : null;
}

/** Intervals of something else than the readings. */
const elsewhere =
	/transmi|transfer|upload|report|send|sync|alarm|alert|display|screen|gps|position|heartbeat|ubertrag|sende|delay|verzog|retard|retraso|ritardo|averag|mittelung/;
const ofReadings =
	/log|record|sampl|meas|mess|aufz|enreg|mesure|regist|medic|misur|grab|meet|zapis|pomiar|kayit|记录|記録|記錄|기록|測定|测量/;

/** The intervals that lines outside the readings name: one where they agree or one speaks of the readings. */
export function intervalsIn(entries: readonly Entry[]): readonly number[] {
	const named = entries.flatMap(({ key, value }) => {
		const minutes = isKeyOf('interval', key) && !elsewhere.test(key) ? intervalOf(value, key) : null;
		return minutes === null ? [] : [{ minutes, isOwn: ofReadings.test(key) }];
	});
	const own = named.filter(({ isOwn }) => isOwn);
	return [...new Set((own.length > 0 ? own : named).map(({ minutes }) => minutes))];
}
