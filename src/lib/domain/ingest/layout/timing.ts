import type { EpochUnit } from '../cells/cell-kind';
import { isDayHalf } from '../times/day-halves';
import type { Column } from './columns';
import { partsOf, type DateParts } from './date-parts';
import { zoneOfHead, zoneOfText, type StatedZone } from './stated-zone';

/** How a column of bare digits writes the clock: `1430`, the hour alone, or a fraction of the day. */
export type ClockForm = 'clock' | 'hour' | 'fraction';

/** Which columns hold the time of a row, and in what form. */
export type Timing =
	| {
			readonly kind: 'moment';
			readonly column: number;
			readonly zone: number | null;
			/** Its dates are a year and the day in it; a single such date among others is a damaged one. */
			readonly isOrdinal: boolean;
	  }
	| {
			readonly kind: 'date-and-time';
			readonly date: number;
			readonly time: number;
			/** Null where the time is written with colons. */
			readonly form: ClockForm | null;
			readonly zone: number | null;
			/** Column of AM and PM, where they stand apart. */
			readonly half: number | null;
	  }
	| { readonly kind: 'parts'; readonly parts: DateParts }
	| { readonly kind: 'date'; readonly column: number }
	| { readonly kind: 'time-of-day'; readonly column: number }
	| { readonly kind: 'epoch'; readonly column: number; readonly unit: EpochUnit }
	| { readonly kind: 'serial-day'; readonly column: number; readonly time: number | null }
	| { readonly kind: 'elapsed'; readonly column: number; readonly unitMs: number | null }
	/** Running numbers whose head names no unit. */
	| { readonly kind: 'counted'; readonly column: number }
	/** Day of the year, or of the trip, and a clock: both count from the first row. */
	| { readonly kind: 'day-and-clock'; readonly day: number; readonly time: number; readonly form: ClockForm }
	| { readonly kind: 'none'; readonly index: number | null };

const mostly = 0.5;
const mainly = 0.9;

/** `2024-061` of ISO 8601, before anything else. */
const isOrdinalText = (text: string): boolean => /^\d{4}-?\d{3}(?!\d)/.test(text);
const areOrdinal = (texts: readonly string[]): boolean =>
	texts.filter(isOrdinalText).length * 2 > texts.filter((text) => text !== '').length;

/** A second clock (received, exported) yields to the one that says when it was measured; UTC yields to nothing. */
function preferred(columns: readonly Column[]): Column | undefined {
	const rank = (column: Column): number =>
		(column.meaning.isOtherClock ? 4 : 0) +
		(column.meaning.isTime || column.name === '' ? 0 : 2) +
		(/utc|gmt/i.test(column.name) ? -1 : 0);
	return [...columns].sort((a, b) => rank(a) - rank(b) || a.index - b.index)[0];
}

function elapsedUnitMs(column: Column): number | null {
	const text = column.name.toLowerCase();
	if (/\bms\b|milli/.test(text)) return 1;
	if (/(\b|_)s\b|sec|sek|seg|\[s\]|秒/.test(text)) return 1000;
	if (/(\b|_)min|分/.test(text)) return 60_000;
	if (/(\b|_)h\b|hour|hrs|stund|std|heure|hora|ore\b|uur|godz/.test(text)) return 3_600_000;
	return /\bd\b|day|tag|jour/.test(text) ? 86_400_000 : null;
}

const unitHead =
	/^\W*(ms|milliseconds?|s|sec|secs|seconds?|sek|sekunden|secondes|segundos|min|mins|minutes?|minuten|minutos|minuti|h|hrs?|hours?|stunden|heures|horas|ore)\W*$/i;

const offsetText = /^(?:utc|gmt)?\s*[+\-−]\d{1,2}(?::?\d{2})?$/i;

/** A column that holds nothing but zones or offsets, beside the time of each row. */
function isZoneColumn(column: Column): boolean {
	const texts = column.texts.filter((text) => text !== '');
	if (texts.length === 0 || texts.length >= 6) return false;
	const isNamed = /zone|\btz\b|offset|utc|gmt|fuseau|fuso|huso|strefa|dilimi|时区|時區|タイムゾーン/i.test(
		column.name
	);
	const isZone = (text: string): boolean => {
		const { zone, word } = zoneOfText(text, isNamed ? 'offset' : '');
		return (zone !== null || word !== null) && (isNamed || /[a-z:]/i.test(text));
	};
	return (
		(isNamed || !texts.every((text) => offsetText.test(text) && !/[a-z:]/i.test(text))) && texts.every(isZone)
	);
}

const isHalfColumn = (column: Column): boolean => {
	const texts = column.texts.filter((text) => text !== '');
	return texts.length > 0 && texts.length <= 2 && texts.every(isDayHalf);
};

/** A column of bare digits that can be the clock beside a date. */
function digitsForm(column: Column): ClockForm | null {
	const { meaning, share, low, high } = column;
	if (!(meaning.isTime || unitHead.test(column.name)) || share.number <= mostly || low < 0) return null;
	const isHour = /^\W*(h|hr|hrs|hour|hours|stunde|heure|hora|ora|uur|godz\w*|saat|时|時)\W*$/i.test(
		column.name
	);
	const areWhole = column.texts.every((text) => /^\d*(?:\.0+)?$/.test(text));
	if (column.texts.every((text) => /^\d{1,2}\.[0-5]\d$/.test(text)) && high <= 24) return 'clock';
	if (isHour && high <= 24 && areWhole) return 'hour';
	if (!areWhole) return high <= 1 ? 'fraction' : null;
	return high > 59 && high <= 235_959 ? 'clock' : null;
}

/** `06.00.00` under a head that speaks of the clock, not of the day: written like a date, and none. */
function isDottedClock({ name, meaning, share, texts }: Column): boolean {
	if (!meaning.isTime || share.date <= mostly || /dat|fech|day|tag|jour|dia|giorno|日/i.test(name))
		return false;
	return texts.every((text) => text === '' || /^([01]?\d|2[0-4])\.[0-5]\d\.[0-5]\d$/.test(text));
}

/** Columns that hold a date and a clock apart from each other. */
function apart(columns: readonly Column[], zone: number | null): Timing | null {
	const dated = (c: Column): boolean =>
		c.share.date > mostly ||
		(c.share.moment > mostly && c.isIdleClock) ||
		(c.share.date > 0 && c.share.date + c.share.blank > mainly);
	const timed = (c: Column): boolean =>
		c.share.time > mostly || (c.share.moment > mostly && c.isIdleDate && !c.isIdleClock);
	const dates = columns.filter((c) => dated(c) && !c.isIdleDate);
	const dotted = dates.find(isDottedClock);
	const date = preferred(dates.length > 1 ? dates.filter((c) => c !== dotted) : dates);
	if (date === undefined) return null;
	const rest = columns.filter((c) => c.index !== date.index && !c.meaning.isElapsed);
	const half = rest.find(isHalfColumn)?.index ?? null;
	const time = preferred(rest.filter(timed));
	const parts = { date: date.index, zone, half };
	if (time !== undefined) return { kind: 'date-and-time', ...parts, time: time.index, form: null };
	if (dotted !== undefined && dotted !== date)
		return { kind: 'date-and-time', ...parts, time: dotted.index, form: 'clock' };
	for (const column of rest) {
		const form = digitsForm(column);
		if (form !== null) return { kind: 'date-and-time', ...parts, time: column.index, form };
	}
	return null;
}

/** A day counted in numbers (of the year, of the trip) with a clock beside it. */
function dayAndClock(columns: readonly Column[]): Timing | null {
	const day = columns.find(
		(c) =>
			/^\W*(day|doy|julian( day)?|day of year|tag|jour|dia|dag|giorno)\W*$/i.test(c.name) &&
			c.share.number > mostly &&
			c.low >= 0 &&
			c.high <= 4000
	);
	if (day === undefined) return null;
	for (const column of columns) {
		const form = column.index === day.index ? null : digitsForm(column);
		if (form !== null) return { kind: 'day-and-clock', day: day.index, time: column.index, form };
	}
	return null;
}

function serialDay(columns: readonly Column[]): Timing | null {
	const serial = columns.find(
		(c) => c.meaning.isTime && c.share.number > mostly && c.low > 20_000 && c.high < 80_000 && !c.isCounter
	);
	if (serial === undefined) return null;
	const time = columns.find((c) => c.index !== serial.index && digitsForm(c) === 'fraction');
	return { kind: 'serial-day', column: serial.index, time: time?.index ?? null };
}

/** Finds the time of a row among the columns; what the cells are counts before what the heads say. */
export function findTiming(all: readonly Column[]): Timing {
	const zone = all.find(isZoneColumn)?.index ?? null;
	const columns = all.filter((c) => c.index !== zone);
	const elapsed = columns.find(
		(c) =>
			c.meaning.isElapsed && !c.meaning.isOtherClock && c.share.number + c.share.time + c.share.text > mostly
	);
	const moment = preferred(columns.filter((c) => c.share.moment > mostly));
	const separate = apart(columns, zone);
	const isIdle = moment !== undefined && (moment.isIdleClock || moment.isIdleDate);
	if (separate !== null && isIdle) return separate;
	if (moment !== undefined && !moment.isIdleDate)
		return { kind: 'moment', column: moment.index, zone, isOrdinal: areOrdinal(moment.texts) };
	const epoch = preferred(
		columns.filter(
			(c) =>
				c.epochUnit !== null &&
				(c.meaning.isTime || c.name === '' || c.isCounter || c.meaning.quantity === null)
		)
	);
	if (epoch !== undefined && epoch.epochUnit !== null)
		return { kind: 'epoch', column: epoch.index, unit: epoch.epochUnit };
	if (separate !== null) return separate;
	const parts = partsOf(columns);
	if (parts !== null) return { kind: 'parts', parts };
	if (elapsed !== undefined) {
		const unitMs = elapsedUnitMs(elapsed);
		const isBare = unitMs === null && elapsed.share.number > mostly;
		return isBare
			? { kind: 'counted', column: elapsed.index }
			: { kind: 'elapsed', column: elapsed.index, unitMs };
	}
	const date = preferred(columns.filter((c) => c.share.date > mostly));
	if (date !== undefined) return { kind: 'date', column: date.index };
	const time = preferred(
		columns.filter((c) => c.share.time > mostly || (c.share.moment > mostly && c.isIdleDate))
	);
	if (time !== undefined) return { kind: 'time-of-day', column: time.index };
	return serialDay(columns) ?? dayAndClock(columns) ?? counted(columns);
}

/** Times that run on: a column of seconds or minutes, or nothing but the place of a row. */
function counted(columns: readonly Column[]): Timing {
	const isCounted = (c: Column): boolean => c.share.number > mostly && (c.isCounter || c.isRising);
	const running =
		columns.find((c) => c.meaning.isTime && isCounted(c) && elapsedUnitMs(c) !== null) ??
		columns.find((c) => unitHead.test(c.name) && c.unit === null && isCounted(c) && c.low >= 0);
	if (running !== undefined)
		return { kind: 'elapsed', column: running.index, unitMs: elapsedUnitMs(running) };
	const bare = columns.find((c) => c.meaning.isTime && isCounted(c) && c.low >= 0 && c.unit === null);
	if (bare !== undefined) return { kind: 'counted', column: bare.index };
	const isPlace = (c: Column): boolean => c.share.number > mostly && c.low >= 0;
	const index =
		columns.find((c) => c.meaning.isIndex && isPlace(c)) ??
		columns.find(
			(c) => c.isCounter && isPlace(c) && c.meaning.quantity === null && c.unit === null && c.low <= 1
		);
	return { kind: 'none', index: index?.index ?? null };
}

/** The columns a timing takes for itself. */
export function columnsOf(timing: Timing): readonly number[] {
	switch (timing.kind) {
		case 'none':
			return [];
		case 'parts':
			return timing.parts.columns;
		case 'date-and-time':
			return [timing.date, timing.time, timing.zone, timing.half].filter((column) => column !== null);
		case 'day-and-clock':
			return [timing.day, timing.time];
		case 'serial-day':
			return timing.time === null ? [timing.column] : [timing.column, timing.time];
		case 'moment':
			return timing.zone === null ? [timing.column] : [timing.column, timing.zone];
		default:
			return [timing.column];
	}
}

/** The zone that the heads of the time's own columns name. */
export function zoneOfTiming(columns: readonly Column[], timing: Timing): StatedZone {
	for (const index of columnsOf(timing)) {
		const column = columns.find((one) => one.index === index);
		for (const text of [column?.name ?? '', column?.unitText ?? '']) {
			const head = zoneOfHead(text);
			if (head.zone !== null || head.word !== null) return head;
		}
	}
	return { zone: null, word: null };
}
