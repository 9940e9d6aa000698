import { fixedOffsetOf, ianaWithin, offsetText, zoneNamedBy } from '../times/zone';
import { zoneMeanings } from '../times/zone-words';
import type { Entry } from './table';

/** A zone named outside the readings: settled, or by letters whose meaning depends on the dates or the place. */
export interface StatedZone {
	readonly zone: string | null;
	readonly word: string | null;
}

const none: StatedZone = { zone: null, word: null };

const zoneKey =
	/\b(time ?zone|zone|tz|zeitzone|fuseau( horaire)?|zona horaria|fuso( horario| orario)?|tijdzone|strefa czasowa|saat dilimi|tidszon[ae]?|tidssone|aikavyohyke|idozona|casove pasmo|utc offset|gmt offset|utc|gmt|time offset|dst offset)\b|时区|時區|タイムゾーン|часовой пояс/;

/** Words that open a sentence about times: "All times in", "Zeiten in", "Heures en". */
const sentence =
	/\b(?:times?|timestamps?|zeiten|uhrzeiten|zeitangaben|heures|horas|orari|tijden|godziny)\b[^\n\d]{0,40}?(?:\b((?:UTC|GMT)(?:\s?[+\-−]\s?\d{1,2}(?::?\d{2})?)?)(?![\w/])|\b([A-Z][a-z]+\/[A-Z]\w+(?:\/\w+)?))/i;
const bracketed = /\((?:UTC|GMT)\s?[+\-−]\s?\d{1,2}(?::?\d{2})?\)/;

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

/** What the lines around the readings say of the zone. Keys are folded. */
export function zoneStatedIn(entries: readonly Entry[], freeText: string): StatedZone {
	for (const { key, value } of entries) {
		if (!zoneKey.test(key) || value === '') continue;
		const stated = zoneOfText(value, key);
		if (stated.zone !== null || stated.word !== null) return stated;
	}
	const isOwnKey = (line: string): boolean =>
		/[:=;](?!\d)/.test(line) && zoneKey.test(line.toLowerCase().split(/[:=;](?!\d)/)[0] ?? '');
	for (const line of freeText.split('\n')) {
		if (isOwnKey(line)) continue;
		const match = sentence.exec(line);
		const text = match?.[1] ?? match?.[2] ?? bracketed.exec(line)?.[0];
		if (text !== undefined) return { zone: zoneNamedBy(text), word: null };
	}
	return none;
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
	const last = /\s([A-Z]{3,5})$/.exec(head.trim())?.[1];
	for (const text of [inside, last]) {
		if (text === undefined || /^(s|m|h|d|min|a|p|am|pm)$/i.test(text)) continue;
		const found = zoneOfText(text);
		if (found.zone !== null || found.word !== null) return found;
	}
	return none;
}
