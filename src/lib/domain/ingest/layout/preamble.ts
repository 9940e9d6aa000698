import type { TemperatureUnit } from '../../units';
import { epochUnitOf } from '../cells/cell-kind';
import { unitWithin, wholeUnitOf } from '../cells/unit-words';
import { orderNamedIn, type DateOrder } from '../times/date-order';
import { emptyStamp, scanStamp } from '../times/stamp';
import { daylightIn } from './daylight';
import { intervalsIn } from './interval-text';
import { foldedKey, isKeyOf, type KeyMeaning } from './key-words';
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
	/** All that the file names where it names several. */
	readonly intervalsNamed: readonly number[];
	readonly zone: string | null;
	/** A zone the file names by letters that mean several. */
	readonly zoneWord: string | null;
	/** Several zones that the file names, where they differ. */
	readonly zonesNamed: readonly string[];
	/** What stands where a zone should, where nobody can tell what it means. */
	readonly zoneUnknown: string | null;
	/** Whether the file says that its clock keeps summer time; null where it does not speak of it. */
	readonly isDaylight: boolean | null;
	readonly unit: TemperatureUnit | null;
	/** Whether its words are Croatian, not Polish or Czech; null where they are neither. */
	readonly isCroatian: boolean | null;
	readonly order: DateOrder | null;
	/** Every date outside the readings: one with a day over 12 shows the order the program writes. */
	readonly momentTexts: readonly string[];
}

const stamp = emptyStamp();
const isKey =
	(meaning: KeyMeaning) =>
	(key: string): boolean =>
		isKeyOf(meaning, key);

/** UTC ms of a bare count since 1970. */
function epochMs(text: string): number {
	const count = Number(text);
	return Math.round(count * { s: 1000, ms: 1, us: 0.001, ns: 0.000_001 }[epochUnitOf(count) ?? 'ms']);
}

function hasStamp(text: string): boolean {
	return scanStamp(text, stamp) && stamp.shape !== 'none';
}

/** A moment, or a date and a time given in two lines that are put together. */
function momentOf(entries: readonly Entry[], isKey: (key: string) => boolean): string | null {
	let [date, clock]: (string | null)[] = [null, null];
	for (const { key, value } of entries) {
		if (!isKey(key)) continue;
		if (epochUnitOf(Number(value)) !== null) return new Date(epochMs(value)).toISOString();
		if (!scanStamp(value, stamp)) continue;
		if (stamp.shape !== 'none' && stamp.msOfDay >= 0) return value;
		if (stamp.shape !== 'none') date ??= value;
		else clock ??= value;
	}
	return date === null || clock === null ? (date ?? null) : `${date} ${clock}`;
}

function serialOf(entries: readonly Entry[]): string | null {
	const isSerial = (value: string): boolean => /[\d]/.test(value) && value.length <= 40 && !hasStamp(value);
	const exact = entries.find(({ key, value }) => isKeyOf('serial', key) && isSerial(value));
	const device =
		exact ??
		entries.find(
			({ key, value }) =>
				isKeyOf('device', key) && isSerial(value) && !/interval|model|type|version|unit/.test(key)
		);
	return device === undefined ? null : device.value.trim();
}

/** A unit that the entries name; null where they name none or two, of which neither speaks of temperature alone. */
function unitInEntries(entries: readonly Entry[]): TemperatureUnit | null | undefined {
	const named = entries.flatMap(({ key, value }) => {
		const unit = isKeyOf('unit', key) ? (wholeUnitOf(value) ?? unitWithin(value)) : null;
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

const croatian = /vrijeme|vlažnost|početak|serijsk|mjerenj|očitanj|uređaj|vremensk/i;
const polishOrCzech =
	/godzin|wilgotno|seryjny|czas|odczyt|pomiar|rozpocz|teplota|vlhkost|sériov|začátek|časov|zařízení|przesy|urządz/i;

function isCroatian(text: string): boolean | null {
	const [is, isOther] = [croatian.test(text), polishOrCzech.test(text)];
	return is === isOther ? null : is;
}

/** Reads what the lines around the readings say. Limits and alarms name a unit, never a reading. */
export function statedIn(entries: readonly Entry[], freeText: string, header: readonly string[]): Stated {
	const folded = entries.map((entry) => ({ ...entry, key: foldedKey(entry.key) }));
	const intervals = intervalsIn(folded);
	const [interval] = intervals;
	const zone = zoneStatedIn(folded, freeText);
	const trip = folded.find(
		({ key, value }) => isKeyOf('trip', key) && value !== '' && !hasStamp(value) && !isKeyOf('start', key)
	);
	const format = [
		...folded.filter(({ key }) => isKeyOf('format', key)).map(({ value }) => value),
		...header
	].map(orderNamedIn);
	return {
		serial: serialOf(folded),
		tripName: trip?.value.trim() ?? null,
		startText: momentOf(folded, isKey('start')),
		stopText: momentOf(folded, isKey('stop')),
		dateText: momentOf(folded, (key) =>
			/^(date|datum|fecha|data|dato|tarih|pvm)$|^(日期|日付|날짜)$/.test(key)
		),
		intervalMinutes: intervals.length === 1 ? (interval ?? null) : null,
		intervalsNamed: intervals,
		zone: zone.zone,
		zoneWord: zone.word,
		zonesNamed: zone.named,
		zoneUnknown: zone.unknown,
		isDaylight: daylightIn(folded, zone.text),
		unit: unitOf(folded, freeText),
		isCroatian: isCroatian([...header, freeText].join('\n')),
		order: format.find((order) => order !== null) ?? null,
		momentTexts: folded.map(({ value }) => value).filter(hasStamp)
	};
}
