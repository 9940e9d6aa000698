import type { Quantity } from '../../trace/trace';
import type { TemperatureUnit } from '../../units';
import { emptyStamp, noTime, scanStamp } from '../times/stamp';
import { cellKindOf, epochUnitOf, type CellKind, type EpochUnit } from '../cells/cell-kind';
import { isUnitCell, unitWithin, wholeUnitOf } from '../cells/unit-words';
import { sampleIndexes } from '../delimited/delimiter';
import type { Table } from './table';
import { meaningOf, type HeaderMeaning } from './words';

/** What is known of one column from its head and a sample of its cells. */
export interface Column {
	readonly index: number;
	readonly name: string;
	readonly meaning: HeaderMeaning;
	readonly unit: TemperatureUnit | null;
	/** Unit as written in a row of units; empty without one. */
	readonly unitText: string;
	/** Share of the sampled rows whose cell is of the kind. */
	readonly share: Readonly<Record<CellKind, number>>;
	/** Smallest and largest number of the sample, NaN without any. */
	readonly low: number;
	readonly high: number;
	/** True where each number is greater than the one above it by the same amount. */
	readonly isCounter: boolean;
	/** True where each of the first numbers is greater than the one above it. */
	readonly isRising: boolean;
	readonly epochUnit: EpochUnit | null;
	/** The first few different texts of its cells. */
	readonly texts: readonly string[];
	/** Every moment of it stands at midnight: its clock says nothing. */
	readonly isIdleClock: boolean;
	/** Every moment of it stands on a spreadsheet's day zero (1899 to 1904): its date says nothing. */
	readonly isIdleDate: boolean;
	/** The one text all its sampled cells hold, such as a unit repeated in every row; null when they differ. */
	readonly constant: string | null;
	/** First filled cell, as an example. */
	readonly example: string;
}

const sampledRows = 400;

interface Tally {
	counts: Record<CellKind, number>;
	numbers: number[];
	texts: Set<string>;
	example: string;
	moments: number;
	idleClocks: number;
	idleDates: number;
}

const fewTexts = 6;
const stamp = emptyStamp();

function tallyMoment(cell: string, tally: Tally): void {
	if (!scanStamp(cell, stamp)) return;
	tally.moments++;
	if (stamp.msOfDay === 0 || stamp.msOfDay === noTime) tally.idleClocks++;
	const year = stamp.shape === 'open' ? stamp.c : stamp.a;
	if (year >= 1899 && year <= 1904) tally.idleDates++;
}

function emptyTally(): Tally {
	return {
		counts: { blank: 0, missing: 0, number: 0, moment: 0, date: 0, time: 0, text: 0 },
		numbers: [],
		texts: new Set(),
		example: '',
		moments: 0,
		idleClocks: 0,
		idleDates: 0
	};
}

function isCounting(numbers: readonly number[]): boolean {
	if (numbers.length < 2) return false;
	const step = (numbers[1] ?? 0) - (numbers[0] ?? 0);
	return (
		step !== 0 &&
		Number.isInteger(step) &&
		numbers.every((n, i) => i === 0 || n - (numbers[i - 1] ?? 0) === step)
	);
}

function columnOf(table: Table, index: number, tally: Tally, rows: number): Column {
	const name = table.header[index] ?? '';
	const share = { ...tally.counts };
	for (const kind of ['blank', 'missing', 'number', 'moment', 'date', 'time', 'text'] as const)
		share[kind] /= Math.max(1, rows);
	const ownUnit = wholeUnitOf(table.units[index] ?? '');
	const { numbers } = tally;
	const first = numbers[0] ?? NaN;
	const epochUnit = epochUnitOf(first);
	return {
		index,
		name,
		meaning: meaningOf(name),
		unit: unitWithin(name) ?? ownUnit,
		unitText: (table.units[index] ?? '').trim(),
		share,
		low: numbers.length === 0 ? NaN : Math.min(...numbers),
		high: numbers.length === 0 ? NaN : Math.max(...numbers),
		isCounter: isCounting(numbers),
		isRising:
			numbers.length > 1 && numbers.slice(0, 20).every((n, i) => i === 0 || n > (numbers[i - 1] ?? 0)),
		texts: [...tally.texts],
		isIdleClock: tally.moments > 0 && tally.idleClocks === tally.moments,
		isIdleDate: tally.moments > 0 && tally.idleDates === tally.moments,
		epochUnit: epochUnit !== null && numbers.every((n) => epochUnitOf(n) === epochUnit) ? epochUnit : null,
		constant: tally.texts.size === 1 && tally.counts.blank === 0 ? tally.example : null,
		example: tally.example
	};
}

/** Profiles every column over the first rows and a sample of the rest. */
export function profileColumns(table: Table): Column[] {
	const tallies: Tally[] = [];
	// Neighbouring rows at the start tell a counter; rows spread over the file tell the rest.
	const head = Array.from({ length: Math.min(20, table.rowCount) }, (_, i) => i);
	const spread = sampleIndexes(table.rowCount, sampledRows);
	const counted: number[][] = [];
	for (const row of head) {
		table.cells(row).forEach((cell, i) => {
			const n = Number(cell);
			if (cell.trim() !== '' && Number.isFinite(n)) (counted[i] ??= []).push(n);
		});
	}
	const filledIn = (cells: readonly string[]): number => cells.filter((cell) => cell.trim() !== '').length;
	const width = table.rowCount === 0 ? 0 : filledIn(table.cells(0));
	let profiled = 0;
	for (const row of spread) {
		const cells = table.cells(row);
		// Footers and blank lines fill fewer cells; they would water down the shares of a short file.
		if (filledIn(cells) * 2 <= width) continue;
		profiled++;
		cells.forEach((cell, i) => {
			const tally = (tallies[i] ??= emptyTally());
			const kind = cellKindOf(cell);
			tally.counts[kind]++;
			if (tally.texts.size < fewTexts) tally.texts.add(cell.trim());
			if (kind === 'moment' || kind === 'date') tallyMoment(cell, tally);
			if (tally.example === '' && kind !== 'blank') tally.example = cell.trim();
			const n = Number(cell.trim().replace(',', '.'));
			if ((kind === 'number' || /^\d{9,19}$/.test(cell.trim())) && Number.isFinite(n)) tally.numbers.push(n);
		});
	}
	return Array.from({ length: Math.max(table.header.length, tallies.length) }, (_, i) => {
		const column = columnOf(table, i, tallies[i] ?? emptyTally(), profiled);
		return { ...column, isCounter: isCounting(counted[i] ?? []) };
	});
}

/** The unit of another quantity that stands behind every figure: `81.5 %`; empty where none does. */
function unitBeside(texts: readonly string[]): string {
	const signs = new Set(
		texts.filter((text) => text !== '').map((text) => /^[-+\d.,\s]*\d\s*(\D+)$/.exec(text)?.[1] ?? '')
	);
	const [sign = ''] = signs;
	return signs.size === 1 && isUnitCell(sign) && wholeUnitOf(sign) === null ? sign : '';
}

/** Quantity of a value column: what its head says, else temperature where its unit is one, else not known. */
export function quantityOf(column: Column): Quantity | null {
	if (column.meaning.quantity !== null) return column.meaning.quantity;
	if (column.unit !== null) return 'temperature';
	if (column.meaning.isTime) return null;
	// A unit of something else (%RH, lx, V) explains the column as well as its head would.
	const unitText = column.unitText === '' ? unitBeside(column.texts) : column.unitText;
	return unitText === '' ? null : (meaningOf(unitText).quantity ?? 'other');
}

/** The temperature unit that a column of its own repeats in every row; null without one. */
export function unitColumnOf(columns: readonly Column[]): TemperatureUnit | null {
	const units = columns.map(({ constant }) =>
		constant === null || /^[\d.,-]/.test(constant) ? null : wholeUnitOf(constant)
	);
	return units.find((unit) => unit !== null) ?? null;
}
