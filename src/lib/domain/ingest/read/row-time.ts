import { emptyNumber, scanNumber } from '../cells/number-text';
import type { Timing } from '../layout/timing';
import { msPerDay } from '../times/calendar';
import { emptyStamp, noOffset, noTime, scanStamp, type Stamp } from '../times/stamp';

/** The time of one row; filled anew by each `read`. */
export interface RowTime {
	readonly stamp: Stamp;
	/** Epoch, serial or elapsed time in ms, NaN where the stamp holds it. */
	ms: number;
}

export interface RowTimeReader extends RowTime {
	read(cells: readonly string[]): boolean;
}

const number = emptyNumber();
const epochFactors = { s: 1000, ms: 1, us: 0.001 } as const;

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

/** Milliseconds of `26:10:00`, `1d 02:10:00`, `1.02:10:00`; NaN when it is no running time. */
export function elapsedMs(text: string): number {
	const match =
		/^\s*(?:(\d+)\s*(?:d|days?|tage?|j|,|\.)?\s+|(\d+)\.(?=\d+:))?(\d{1,5}):(\d{2})(?::(\d{2})(?:[.,](\d{1,3}))?)?\s*$/i.exec(
			text
		);
	if (match === null) return NaN;
	const days = Number(match[1] ?? match[2] ?? 0);
	const minutes = Number(match[3]) * 60 + Number(match[4]);
	return (
		days * msPerDay +
		minutes * 60_000 +
		Number(match[5] ?? 0) * 1000 +
		Number((match[6] ?? '').padEnd(3, '0'))
	);
}

function readElapsed(cell: string | undefined, unitMs: number | null): number {
	const running = elapsedMs(cell ?? '');
	if (!Number.isNaN(running)) return running;
	const count = numberOf(cell);
	// A bare count without a unit says nothing of its length.
	return unitMs === null ? NaN : Math.round(count * unitMs);
}

const separateTime = emptyStamp();

function readDateAndTime(stamp: Stamp, date: string | undefined, time: string | undefined): boolean {
	if (!scanStamp((time ?? '').trim(), separateTime) || separateTime.msOfDay === noTime) return false;
	if (!scanStamp((date ?? '').trim(), stamp) || stamp.shape === 'none') return false;
	stamp.msOfDay = separateTime.msOfDay;
	stamp.offsetMinutes = separateTime.offsetMinutes;
	stamp.zoneWord = separateTime.zoneWord;
	return true;
}

/** A reader of row times for one way of keeping them. */
export function timeReaderOf(timing: Timing): RowTimeReader {
	const stamp = emptyStamp();
	const reader: RowTimeReader = { stamp, ms: NaN, read: () => false };
	const setMs = (ms: number): boolean => {
		reader.ms = ms;
		return Number.isFinite(ms);
	};
	const readers: Record<Timing['kind'], (cells: readonly string[]) => boolean> = {
		moment: (cells) =>
			timing.kind === 'moment' &&
			scanStamp(cells[timing.column] ?? '', stamp) &&
			stamp.shape !== 'none' &&
			stamp.msOfDay !== noTime,
		date: (cells) =>
			timing.kind === 'date' &&
			scanStamp(cells[timing.column] ?? '', stamp) &&
			stamp.shape !== 'none' &&
			atMidnight(stamp),
		'time-of-day': (cells) =>
			timing.kind === 'time-of-day' && scanStamp(cells[timing.column] ?? '', stamp) && stamp.shape === 'none',
		'date-and-time': (cells) =>
			timing.kind === 'date-and-time' && readDateAndTime(stamp, cells[timing.date], cells[timing.time]),
		epoch: (cells) =>
			timing.kind === 'epoch' && setMs(epochMsOf(numberOf(cells[timing.column]), timing.unit)),
		'serial-day': (cells) =>
			timing.kind === 'serial-day' &&
			setMs(Math.round((numberOf(cells[timing.column]) - serialOf1970) * 86_400) * 1000),
		elapsed: (cells) => timing.kind === 'elapsed' && setMs(readElapsed(cells[timing.column], timing.unitMs)),
		none: () => true
	};
	reader.read = readers[timing.kind];
	return reader;
}

function atMidnight(stamp: Stamp): boolean {
	if (stamp.msOfDay === noTime) stamp.msOfDay = 0;
	if (stamp.offsetMinutes === noOffset) stamp.zoneWord = null;
	return true;
}
