import { emptyNumber, type NumberText } from '../cells/number-text';
import { readPlainNumber } from '../cells/plain-number';
import { cellFinderOf, type CellFinder } from '../delimited/cell-finder';
import type { RowText, Table } from '../layout/table';
import { columnsOf, type Timing } from '../layout/timing';
import { clockPatternOf, type ClockPattern } from '../times/clock-pattern';
import { epochMsOf, type RowTime } from './row-time';

/**
 * Reads rows that are like the last one that was read in full, straight from the text. It never decides anything: a
 * row with any other form is declined, and is read in full.
 */
export interface RegularRows {
	/** One for each value column, of the row read last. */
	readonly numbers: readonly NumberText[];
	/** 1 where that row has a blank instead. */
	readonly isBlank: Uint8Array;
	/** Takes a row whose time was read in full as the pattern of those that follow. */
	learn(row: number, time: RowTime): void;
	/** Forgets the pattern: the last time that was read in full was none. */
	forget(): void;
	/** Fills `numbers`, `isBlank` and `time`; false, with nothing of worth in them, for a row of another form. */
	read(row: number, time: RowTime | null): boolean;
}

type TimeReader = Pick<RegularRows, 'learn' | 'forget'> & { read(time: RowTime): boolean };

/** Seconds, ms or µs since 1970 as bare digits. */
function epochReader(text: string, cells: CellFinder, timing: Timing & { kind: 'epoch' }): TimeReader {
	const number = emptyNumber();
	return {
		learn: () => {},
		forget: () => {},
		read: (time) => {
			const [from, to] = [cells.from[timing.column] ?? 0, cells.to[timing.column] ?? 0];
			if (!readPlainNumber(text, from, to, number) || number.decimals > 0 || number.mantissa < 0)
				return false;
			time.ms = epochMsOf(number.mantissa, timing.unit);
			return true;
		}
	};
}

/** Dates and clocks: the date must be that of the pattern, the clock is read. */
function calendarReader(
	text: string,
	cells: CellFinder,
	date: number | null,
	clock: number,
	/** A clock without a date may turn out to be a length of time. */
	isLength = false
): TimeReader {
	const pattern: ClockPattern = clockPatternOf(text);
	let isLearned = false;
	let dateFrom = 0;
	let dateLength = 0;
	const isSameDate = (column: number): boolean => {
		const from = cells.from[column] ?? 0;
		if ((cells.to[column] ?? 0) - from !== dateLength) return false;
		for (let i = 0; i < dateLength; i++)
			if (text.charCodeAt(from + i) !== text.charCodeAt(dateFrom + i)) return false;
		return true;
	};
	return {
		learn: (row, { stamp }) => {
			isLearned =
				cells.find(row) && pattern.learn(cells.from[clock] ?? 0, cells.to[clock] ?? 0, stamp.msOfDay);
			if (date === null) return;
			dateFrom = cells.from[date] ?? 0;
			dateLength = (cells.to[date] ?? 0) - dateFrom;
			// A blank date stands for the one above it, until midnight passes: that is counted in full.
			if (isBlankCell(text, dateFrom, dateFrom + dateLength)) isLearned = false;
		},
		forget: () => {
			isLearned = false;
		},
		read: (time) => {
			if (!isLearned || (date !== null && !isSameDate(date))) return false;
			const msOfDay = pattern.read(cells.from[clock] ?? 0, cells.to[clock] ?? 0);
			if (msOfDay < 0) return false;
			time.stamp.msOfDay = msOfDay;
			if (isLength) time.ms = msOfDay;
			return true;
		}
	};
}

function timeReaderOf({ text }: RowText, cells: CellFinder, timing: Timing): TimeReader | null {
	if (timing.kind === 'epoch') return epochReader(text, cells, timing);
	// A zone or a half of the day in a cell of its own may change from row to row.
	if ('zone' in timing && timing.zone !== null) return null;
	if (timing.kind === 'date-and-time')
		return timing.half === null ? calendarReader(text, cells, timing.date, timing.time) : null;
	return timing.kind === 'moment' || timing.kind === 'time-of-day'
		? calendarReader(text, cells, null, timing.column, timing.kind === 'time-of-day')
		: null;
}

const isBlankCell = (text: string, from: number, to: number): boolean => {
	for (let i = from; i < to; i++) if (text.charCodeAt(i) !== 32) return false;
	return true;
};

const untimed: TimeReader = { learn: () => {}, forget: () => {}, read: () => true };

/**
 * A reader of regular rows; null where the table or its times have no form that can be followed. Without a timing it
 * reads values only.
 */
export function regularRowsOf(
	table: Table,
	timing: Timing | null,
	columns: readonly number[]
): RegularRows | null {
	const { rowText } = table;
	if (!rowText || table.isSparse === true) return null;
	const { text } = rowText;
	const timeColumns = timing === null ? [] : columnsOf(timing);
	const cells = cellFinderOf(rowText, 1 + Math.max(0, ...timeColumns, ...columns));
	const times = timing === null ? untimed : timeReaderOf(rowText, cells, timing);
	if (times === null) return null;
	const numbers = columns.map(() => emptyNumber());
	const isBlank = new Uint8Array(columns.length);
	const read = (row: number, time: RowTime | null): boolean => {
		if (!cells.find(row) || (time !== null && !times.read(time))) return false;
		for (let k = 0; k < numbers.length; k++) {
			const number = numbers[k];
			const [from, to] = [cells.from[columns[k] ?? 0] ?? 0, cells.to[columns[k] ?? 0] ?? 0];
			isBlank[k] = isBlankCell(text, from, to) ? 1 : 0;
			if (number === undefined || (isBlank[k] === 0 && !readPlainNumber(text, from, to, number)))
				return false;
		}
		return true;
	};
	return { numbers, isBlank, learn: times.learn, forget: times.forget, read };
}
