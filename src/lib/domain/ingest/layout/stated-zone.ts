import { emptyStamp, scanStamp } from '../times/stamp';
import { fixedOffsetOf, ianaWithin, offsetText, zoneNamedBy } from '../times/zone';
import { zoneMeanings } from '../times/zone-words';
import { isKeyOf } from './key-words';
import type { Entry } from './table';

/** A zone named outside the readings: settled, or by letters whose meaning depends on the dates or the place. */
export interface StatedZone {
	readonly zone: string | null;
	readonly word: string | null;
}

/** What all lines around the readings say of it. */
export interface ZoneStatement extends StatedZone {
	/** Each zone that is named, where several are. */
	readonly named: readonly string[];
	/** A text that names a zone nobody knows. */
	readonly unknown: string | null;
	/** The text that was taken. */
	readonly text: string | null;
}

const none: StatedZone = { zone: null, word: null };

/** Keys that speak of a clock's zone and of nothing else: a bare "zone" may be a cold store's. */
const isOwnKey = (key: string): boolean =>
	isKeyOf('zone', key) && !/^\W*(zone\W*\w{0,2}|utc|gmt)\W*$/.test(key);

/** What stands where a zone should and says no more than nothing would. */
const sayingNothing =
	/^\W*$|^\W*(local|lokal\w*|device|logger|system|default|standard|auto\w*|unknown|none|n\/?a|not set|undefined|null|ortszeit|geraet|gerat|locale?|heure locale|hora local|ora locale|lokale tijd|yerel|本地\p{L}*|現地\p{L}*|当地\p{L}*|местное|время устройства)\b/u;

/** A text that is a zone and nothing else, whatever its key is called: `UTC+02:00`, `Europe/Berlin`. */
const plainZone = /^\(?\s*(?:UTC|GMT)\s?[+\-−–]\s?\d{1,2}(?::?\d{2})?\s*\)?$/i;

/** Words that open a sentence about times: "All times in", "Zeiten in", "Heures en". */
const sentence =
	/\b(?:times?|timestamps?|zeiten|uhrzeiten|zeitangaben|heures|horas|orari|tijden|godziny)\b[^\n\d]{0,40}?(?:\b((?:UTC|GMT)(?:\s?[+\-−]\s?\d{1,2}(?::?\d{2})?)?)(?![\w/])|\b([A-Z][a-z]+\/[A-Z]\w+(?:\/\w+)?))/i;

/** Letters that name no zone with certainty: one that has a season's sibling, or several meanings. */
function lettersOf(text: string): string | null {
	const word = text.trim().replace(/^[([]|[)\]]$/g, '');
	const meanings = zoneMeanings(word);
	return meanings.length > 0 && meanings[0]?.region !== 'UTC' ? word.toUpperCase() : null;
}

/** `UTC offset: -5`, `Time zone offset: 120 min`, `GMT offset (hours): 5.5`: a number whose key says what it is. */
function zoneOfNumber(value: string, key: string): string | null {
	const match =
		/^\s*([+\-−–]?)\s*(\d{1,4})(?:[.,](\d+))?\s*(h|hours?|hrs?|min|minutes?|s|sec|seconds)?\s*$/i.exec(value);
	if (match === null || !/offset|zone|utc|gmt|tz/.test(key)) return null;
	const amount = Number(`${match[2] ?? ''}.${match[3] ?? '0'}`);
	const unit = (match[4] ?? '').toLowerCase();
	const isSeconds = unit.startsWith('s') || amount > 14 * 60;
	const isMinutes = unit.startsWith('m') || (unit === '' && amount > 14);
	const minutes = isSeconds ? amount / 60 : isMinutes ? amount : amount * 60;
	if (minutes > 14 * 60 || !Number.isInteger(minutes) || minutes % 15 !== 0) return null;
	return offsetText(match[1] === '' || match[1] === '+' ? minutes : -minutes);
}

/** The zone of one text, as a name, an offset or letters. */
export function zoneOfText(text: string, key = ''): StatedZone {
	const bare = text.trim();
	const word = lettersOf(bare);
	if (word !== null) return { zone: null, word };
	const zone = zoneNamedBy(bare) ?? zoneOfNumber(bare, key);
	if (zone !== null) return { zone, word: null };
	const within = /(?:utc|gmt)\s*(?:offset)?\s*[+\-−–]\s*\d{1,2}(?::?\d{2})?/i.exec(bare)?.[0];
	if (within !== undefined) return { zone: zoneNamedBy(within), word: null };
	const inside = /[([]([A-Za-z]{2,5})[)\]]/.exec(bare)?.[1];
	return inside === undefined ? none : { zone: null, word: lettersOf(inside) };
}

const stamp = emptyStamp();
const isDated = (value: string): boolean => scanStamp(value, stamp) && stamp.shape !== 'none';

/** Zones in lines that are no key and value, or whose key says nothing of a zone. */
function zoneInText(entries: readonly Entry[], freeText: string): string | null {
	for (const { value } of entries) {
		const zone = plainZone.test(value.trim()) || ianaWithin(value.trim()) === value.trim() ? value : null;
		if (zone !== null) return zone.trim();
	}
	const isTaken = (line: string): boolean =>
		/[:=;](?!\d)/.test(line) && isKeyOf('zone', line.toLowerCase().split(/[:=;](?!\d)/)[0] ?? '');
	for (const line of freeText.split('\n')) {
		if (isTaken(line)) continue;
		const match = sentence.exec(line);
		const text = match?.[1] ?? match?.[2];
		if (text !== undefined) return text;
		// The zone of a moment that stands in the line is that moment's.
		const within = /(?:UTC|GMT)\s?[+\-−–]\s?\d{1,2}(?::?\d{2})?/.exec(line)?.[0] ?? ianaWithin(line);
		if (within !== null && !/\d:\d\d/.test(line.replace(within, ''))) return within;
	}
	return null;
}

/** Three digits behind a sign are hours and minutes, or minutes: -300 is three hours or five. */
function readingsOfDigits(value: string): readonly string[] {
	const digits = /^\s*([+\-−–])(\d{3})\s*$/.exec(value);
	if (digits === null) return [];
	const [number, sign] = [Number(digits[2]), digits[1] === '+' ? 1 : -1];
	const clock = Math.floor(number / 100) * 60 + (number % 100);
	const isOffset = (minutes: number): boolean => minutes % 15 === 0 && minutes <= 14 * 60;
	return [...new Set([number % 100 < 60 ? clock : NaN, number])]
		.filter(isOffset)
		.map((m) => offsetText(sign * m));
}

/** What the lines around the readings say of the zone. Keys are folded. */
export function zoneStatedIn(entries: readonly Entry[], freeText: string): ZoneStatement {
	const nothing: ZoneStatement = { ...none, named: [], unknown: null, text: null };
	let first: ZoneStatement | null = null;
	let unknown: string | null = null;
	const named = new Set<string>();
	for (const { key, value } of entries) {
		if (!isKeyOf('zone', key) || value === '' || isDated(value)) continue;
		const digits = readingsOfDigits(value);
		const stated = digits.length > 0 ? { zone: digits[0] ?? null, word: null } : zoneOfText(value, key);
		const isKnown = stated.zone !== null || stated.word !== null;
		if (isKnown) first ??= { ...nothing, ...stated, text: value };
		else if (isOwnKey(key) && !sayingNothing.test(value.trim().toLowerCase())) unknown ??= value.trim();
		for (const zone of digits.length > 0 ? digits : stated.zone === null ? [] : [stated.zone])
			named.add(zone);
	}
	if (first !== null) return { ...first, named: named.size > 1 ? [...named] : [] };
	const text = zoneInText(entries, freeText);
	if (text !== null) return { ...nothing, zone: zoneNamedBy(text), text };
	return { ...nothing, unknown };
}

/** The zone a column head names: `Time (UTC+2)`, `Zeit (MESZ)`, `Time EST`, `time_utc`. */
export function zoneOfHead(head: string): StatedZone {
	const iana = ianaWithin(head);
	if (iana !== null) return { zone: iana, word: null };
	const universal = /(?:^|[^a-z])(?:utc|gmt)\s*(?:[+\-−–]\s*\d{1,2}(?::?\d{2})?)?|utc(?=[A-Z_])/i.exec(
		head
	)?.[0];
	if (universal !== undefined) {
		const bare = universal.replace(/^[^a-z]+/i, '');
		return { zone: offsetText(fixedOffsetOf(bare) ?? 0), word: null };
	}
	const inside = /[([]\s*([A-Za-z]{1,5}|[+\-−]\d{1,2}(?::?\d{2})?)\s*[)\]]/.exec(head)?.[1];
	const last = /\s([A-Z]{3,5}|Z)$/.exec(head.trim())?.[1];
	for (const text of [inside, last]) {
		if (text === undefined || /^(s|m|h|d|min|a|p|am|pm)$/i.test(text)) continue;
		const found = zoneOfText(text);
		if (found.zone !== null || found.word !== null) return found;
	}
	return none;
}
