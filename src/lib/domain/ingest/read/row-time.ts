import { emptyNumber, scanNumber } from '../cells/number-text';
import type { Timing } from '../layout/timing';
import { zoneOfText } from '../layout/stated-zone';
import { msPerDay } from '../times/calendar';
import { dayHalfOf } from '../times/day-halves';
import { clockOfDigits, elapsedMs } from '../times/running-time';
import { emptyStamp, noOffset, noTime, scanStamp, type Stamp } from '../times/stamp';
import { fixedOffsetOf } from '../times/zone';
import { dateCarrier, type DateCarrier } from './date-carrier';

/** The time of one row; filled anew by each `read`. */
export interface RowTime {
	readonly stamp: Stamp;
	/** Epoch, serial or elapsed time in ms, place of the row; NaN where the stamp holds all. */
	ms: number;
}

export interface RowTimeReader extends RowTime {
	read(cells: readonly string[]): boolean;
}

type Read = (cells: readonly string[]) => boolean;
type TimingOf<K extends Timing['kind']> = Extract<Timing, { kind: K }>;

const number = emptyNumber();
const epochFactors = { s: 1000, ms: 1, us: 0.001, ns: 0.000_001 } as const;

/** UTC of a count since 1970. */
export function epochMsOf(count: number, unit: keyof typeof epochFactors): number {
	return Math.round(count * epochFactors[unit]);
}
/** Day 25 569 of the spreadsheet calendar is 1970-01-01. Source: ECMA-376 part 1 §18.17.4.1. */
const serialOf1970 = 25_569;

function numberOf(cell: string | undefined): number {
	// Epoch milliseconds with a fraction have more digits than a reading may; text to number once.
	const text = (cell ?? '').trim();
	return scanNumber(text, number) === 'number' || /^\d+(\.\d+)?$/.test(text)
		? Number(text.replace(',', '.'))
		: NaN;
}

function readElapsed(cell: string | undefined, unitMs: number | null): number {
	const running = elapsedMs(cell ?? '');
	if (!Number.isNaN(running)) return running;
	const count = numberOf(cell);
	// A bare count without a unit says nothing of its length.
	return unitMs === null ? NaN : Math.round(count * unitMs);
}

/** A zone in a cell of its own: an offset is the row's, a name or ambiguous letters are kept for the whole file. */
function readZone(stamp: Stamp, cell: string | undefined): void {
	const text = (cell ?? '').trim();
	if (text === '' || stamp.offsetMinutes !== noOffset) return;
	const offset = fixedOffsetOf(text);
	const stated = offset === null ? zoneOfText(text, 'offset') : null;
	const minutes = offset ?? (stated?.zone === null || stated === null ? null : fixedOffsetOf(stated.zone));
	if (minutes !== null) stamp.offsetMinutes = minutes;
	else stamp.zoneWord = stated?.zone ?? stated?.word ?? null;
}

const separateTime = emptyStamp();

function readClock(timing: TimingOf<'date-and-time'>, cells: readonly string[]): boolean {
	const cell = (cells[timing.time] ?? '').trim();
	if (timing.form === null) {
		if (!scanStamp(cell, separateTime) || separateTime.msOfDay === noTime) return false;
	} else {
		const ms = clockOfDigits(cell, timing.form);
		if (Number.isNaN(ms)) return false;
		separateTime.msOfDay = ms;
		separateTime.offsetMinutes = noOffset;
		separateTime.zoneWord = null;
	}
	if (timing.half === null) return true;
	const word = (cells[timing.half] ?? '').toLowerCase().replace(/[.\s\u00a0\u202f]/g, '');
	const half = dayHalfOf(word, 1);
	const hours = Math.floor(separateTime.msOfDay / 3_600_000);
	if (half === 'evening' && hours < 12) separateTime.msOfDay += msPerDay / 2;
	if (half === 'morning' && hours === 12) separateTime.msOfDay -= msPerDay / 2;
	return true;
}

function readDateAndTime(
	timing: TimingOf<'date-and-time'>,
	stamp: Stamp,
	cells: readonly string[],
	carrier: DateCarrier
): boolean {
	// The stamp still holds the row before, also where that one was read in place.
	carrier.see(stamp.msOfDay);
	const date = (cells[timing.date] ?? '').trim();
	const isReadable = date === '' || (scanStamp(date, stamp) && stamp.shape !== 'none');
	if (!readClock(timing, cells) || !isReadable) {
		// What this row's date was nobody can tell, nor that of the rows that leave theirs blank below it.
		if (/\d/.test(date)) carrier.lose();
		return false;
	}
	if (date === '') {
		if (!carrier.carryTo(stamp, separateTime.msOfDay)) return false;
	} else {
		stamp.msOfDay = separateTime.msOfDay;
		carrier.keep(stamp);
	}
	// A date cell may carry the zone of an idle midnight; the clock's own counts first.
	if (separateTime.offsetMinutes !== noOffset) stamp.offsetMinutes = separateTime.offsetMinutes;
	stamp.zoneWord = separateTime.zoneWord ?? stamp.zoneWord;
	if (timing.zone !== null) readZone(stamp, cells[timing.zone]);
	return true;
}

/** Milliseconds since midnight of a clock that stands alone; NaN where it is none. */
function clockMs(cell: string | undefined): number {
	const isClock = scanStamp((cell ?? '').trim(), separateTime) && separateTime.shape === 'none';
	return isClock && separateTime.msOfDay !== noTime ? separateTime.msOfDay : NaN;
}

function readParts({ parts }: TimingOf<'parts'>, stamp: Stamp, cells: readonly string[]): boolean {
	const at = (column: number | null): number => (column === null ? 0 : numberOf(cells[column]));
	const [year, month, day, hour] = [at(parts.year), at(parts.month), at(parts.day), at(parts.hour)];
	const ms =
		parts.clock === null
			? Math.round(((hour * 60 + at(parts.minute)) * 60 + at(parts.second)) * 1000)
			: clockMs(cells[parts.clock]);
	if (![year, month, day].every(Number.isInteger) || Number.isNaN(ms)) return false;
	stamp.shape = 'year-first';
	stamp.a = year < 100 ? (year < 80 ? 2000 : 1900) + year : year;
	stamp.b = month;
	stamp.c = day;
	stamp.msOfDay = ms;
	stamp.offsetMinutes = noOffset;
	stamp.zoneWord = null;
	return month >= 1 && month <= 12 && day >= 1 && day <= 31 && ms <= msPerDay;
}

function serialMs({ column, time }: TimingOf<'serial-day'>, cells: readonly string[]): number {
	const day = numberOf(cells[column]);
	const clock = time === null ? 0 : clockOfDigits(cells[time] ?? '', 'fraction');
	return Math.round((day - serialOf1970) * 86_400) * 1000 + clock;
}

function atMidnight(stamp: Stamp): boolean {
	if (stamp.msOfDay === noTime) stamp.msOfDay = 0;
	if (stamp.offsetMinutes === noOffset) stamp.zoneWord = null;
	return true;
}

/** A reader of row times for one way of keeping them. */
export function timeReaderOf(timing: Timing): RowTimeReader {
	const stamp = emptyStamp();
	const reader: RowTimeReader = { stamp, ms: NaN, read: () => false };
	const scan = (cells: readonly string[], column: number): boolean => scanStamp(cells[column] ?? '', stamp);
	const setMs = (ms: number): boolean => {
		reader.ms = ms;
		return Number.isFinite(ms);
	};
	reader.read = readOf(timing, stamp, scan, setMs);
	return reader;
}

function readOf(
	timing: Timing,
	stamp: Stamp,
	scan: (cells: readonly string[], column: number) => boolean,
	setMs: (ms: number) => boolean
): Read {
	const carrier = dateCarrier();
	switch (timing.kind) {
		case 'moment':
			return (cells) => {
				if (!scan(cells, timing.column) || stamp.shape === 'none' || stamp.msOfDay === noTime) return false;
				if (stamp.isOrdinal && !timing.isOrdinal) return false;
				if (timing.zone !== null) readZone(stamp, cells[timing.zone]);
				return true;
			};
		case 'date':
			return (cells) => scan(cells, timing.column) && stamp.shape !== 'none' && atMidnight(stamp);
		case 'time-of-day':
			return (cells) => {
				const isClock = scan(cells, timing.column) && stamp.msOfDay !== noTime;
				const isLength = setMs(elapsedMs(cells[timing.column] ?? ''));
				stamp.shape = 'none';
				return isClock || isLength;
			};
		case 'date-and-time':
			return (cells) => readDateAndTime(timing, stamp, cells, carrier);
		case 'parts':
			return (cells) => readParts(timing, stamp, cells);
		case 'epoch':
			return (cells) => setMs(epochMsOf(numberOf(cells[timing.column]), timing.unit));
		case 'serial-day':
			return (cells) => setMs(serialMs(timing, cells));
		case 'elapsed':
			return (cells) => setMs(readElapsed(cells[timing.column], timing.unitMs));
		case 'counted':
			return (cells) => setMs(numberOf(cells[timing.column]));
		case 'day-and-clock':
			return (cells) =>
				setMs(numberOf(cells[timing.day]) * msPerDay + clockOfDigits(cells[timing.time] ?? '', timing.form));
		case 'none':
			return (cells) => {
				setMs(timing.index === null ? NaN : numberOf(cells[timing.index]));
				return true;
			};
	}
}
