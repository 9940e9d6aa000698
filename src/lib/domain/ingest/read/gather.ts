import { emptyNumber, scanNumber, type NumberText } from '../cells/number-text';
import type { Table } from '../layout/table';
import type { Timing } from '../layout/timing';
import type { TemperatureUnit } from '../../units';
import type { Gathered, GatheredTimes, GatheredValues, RowFault } from './gathered';
import { regularRowsOf, type RegularRows } from './regular-rows';
import { timeReaderOf, type RowTime } from './row-time';

/** Of a row at which the channel was not due: neither a reading nor missing. */
const notDue = 2;

interface ValueCollector {
	readonly column: number;
	readonly mantissa: Float64Array;
	readonly decimals: Uint8Array;
	readonly isMissing: Uint8Array;
	readonly units: Set<TemperatureUnit>;
	commas: number;
}

function collectorOf(column: number, rows: number): ValueCollector {
	return {
		column,
		mantissa: new Float64Array(rows),
		decimals: new Uint8Array(rows),
		isMissing: new Uint8Array(rows),
		units: new Set(),
		commas: 0
	};
}

function timesOf(rows: number): GatheredTimes {
	return {
		a: new Int16Array(rows),
		b: new Uint8Array(rows),
		c: new Int16Array(rows),
		isSettled: new Uint8Array(rows),
		hasDate: new Uint8Array(rows),
		msOfDay: new Int32Array(rows),
		offsetMinutes: new Int16Array(rows),
		ms: new Float64Array(rows)
	};
}

function keepTime(times: GatheredTimes, at: number, time: RowTime): void {
	const { stamp } = time;
	times.a[at] = stamp.a;
	times.b[at] = stamp.b;
	times.c[at] = stamp.c;
	times.isSettled[at] = stamp.shape === 'open' ? 0 : stamp.shape === 'named' ? 2 : 1;
	times.hasDate[at] = stamp.shape === 'none' ? 0 : 1;
	times.msOfDay[at] = stamp.msOfDay;
	times.offsetMinutes[at] = stamp.offsetMinutes;
	times.ms[at] = time.ms;
}

function keepValue(
	value: ValueCollector,
	at: number,
	cells: readonly string[],
	number: NumberText,
	isSparse: boolean
): void {
	const cell = cells[value.column] ?? '';
	const state = scanNumber(cell, number);
	if (state === 'number') keepNumber(value, at, number);
	else value.isMissing[at] = isSparse && cell === '' ? notDue : 1;
}

function keepNumber(value: ValueCollector, at: number, number: NumberText): void {
	value.mantissa[at] = number.mantissa;
	value.decimals[at] = number.decimals;
	if (number.unit !== null) value.units.add(number.unit);
	if (number.hasComma) value.commas++;
}

/** The same of a row that was read in place. */
function keepRegular(collectors: readonly ValueCollector[], at: number, regular: RegularRows): void {
	for (let k = 0; k < collectors.length; k++) {
		const [collector, number] = [collectors[k], regular.numbers[k]];
		if (collector === undefined || number === undefined) continue;
		if (regular.isBlank[k] === 1) collector.isMissing[at] = 1;
		else keepNumber(collector, at, number);
	}
}

function finished({ units, commas, ...value }: ValueCollector): GatheredValues {
	const [unit] = units;
	return {
		...value,
		unit: units.size === 1 && unit !== undefined ? unit : null,
		hasMixedUnits: units.size > 1,
		commaCount: commas
	};
}

/** The values of further columns over rows that were kept before. */
export function gatherValues(
	table: Table,
	{ rows, count }: Pick<Gathered, 'rows' | 'count'>,
	columns: readonly number[]
): GatheredValues[] {
	const collectors = columns.map((column) => collectorOf(column, count));
	const number = emptyNumber();
	const regular = regularRowsOf(table, null, columns);
	for (let i = 0; i < count; i++) {
		if (regular?.read(rows[i] ?? 0, null) === true) {
			keepRegular(collectors, i, regular);
			continue;
		}
		const cells = table.cells(rows[i] ?? 0);
		for (const collector of collectors) keepValue(collector, i, cells, number, table.isSparse === true);
	}
	return collectors.map(finished);
}

const isBlankRow = (cells: readonly string[]): boolean => cells.every((cell) => cell.trim() === '');

/** Reads the time and the values of every row once; rows that are no readings are told apart, not guessed at. */
export function gather(
	table: Table,
	timing: Timing,
	columns: readonly number[],
	/** Columns without which a row is too short to be read. */
	needed: readonly number[] = columns
): Gathered {
	const size = table.rowCount;
	const times = timesOf(size);
	const collectors = columns.map((column) => collectorOf(column, size));
	const lines = new Int32Array(size);
	const rows = new Int32Array(size);
	const time = timeReaderOf(timing);
	const number = emptyNumber();
	const heading = table.header.join('\u0001').toLowerCase();
	const pending: RowFault[] = [];
	const faults: RowFault[] = [];
	let zoneWord: string | null = null;
	let count = 0;
	let lastRow = -1;
	const width = Math.max(-1, ...needed);
	const regular = regularRowsOf(table, timing, columns);
	const keepRow = (row: number): void => {
		if (pending.length > 0) for (const fault of pending.splice(0)) faults.push(fault);
		keepTime(times, count, time);
		lines[count] = table.lineOf(row);
		rows[count++] = row;
		lastRow = row;
	};
	for (let row = 0; row < size; row++) {
		if (regular?.read(row, time) === true) {
			keepRegular(collectors, count, regular);
			keepRow(row);
			continue;
		}
		const cells = table.cells(row);
		const hasTime =
			time.read(cells) && (timing.kind !== 'none' || cells.some((c) => scanNumber(c, number) === 'number'));
		const isShort =
			table.kind === 'delimited' && needed.length > 0 && cells.length <= Math.min(width, ...needed);
		if (!hasTime || isShort) {
			if (!isBlankRow(cells))
				pending.push({ code: faultOf(cells, heading, hasTime), line: table.lineOf(row) });
			regular?.forget();
			continue;
		}
		zoneWord ??= time.stamp.zoneWord;
		for (const collector of collectors) keepValue(collector, count, cells, number, table.isSparse === true);
		keepRow(row);
		regular?.learn(row, time);
	}
	const footerLines = pending.map(({ line }) => line);
	return {
		count,
		lines,
		rows,
		times,
		values: collectors.map(finished),
		faults,
		footerFrom: lastRow + 1,
		footerLines,
		zoneWord
	};
}

function faultOf(cells: readonly string[], heading: string, hasTime: boolean): RowFault['code'] {
	if (
		heading !== '' &&
		cells
			.map((cell) => cell.trim())
			.join('\u0001')
			.toLowerCase() === heading
	)
		return 'header-repeated';
	return hasTime ? 'short-row' : 'bad-time';
}
