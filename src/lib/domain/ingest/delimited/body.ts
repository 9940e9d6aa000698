import { isUnitCell } from '../cells/unit-words';
import { meaningOf } from '../layout/words';
import { wideHeadsIn } from '../layout/wide-heads';
import { shapeOf, type RowShape } from './delimiter';

/** Access to the rows of a delimited file, split on demand. */
export interface RawRows {
	readonly count: number;
	cells(row: number): readonly string[];
}

export interface Body {
	readonly first: number;
	readonly header: number | null;
	/** Row above the header that names groups of columns, used where a head is only a unit. */
	readonly units: number | null;
	readonly isTimed: boolean;
}

function isBlank(cells: readonly string[]): boolean {
	return cells.every((cell) => cell.trim() === '');
}

const isReading = (shape: RowShape, isTimed: boolean): boolean =>
	isTimed ? shape.hasMoment && shape.values > 0 : shape.values > 0 && shape.texts === 0 && !shape.hasMoment;

/** A moment with nothing but words for no value beside it: the sensor was silent. */
const isSilent = (shape: RowShape, width: number): boolean =>
	shape.hasMoment && shape.values === 0 && shape.texts === 0 && shape.width === width && width > 1;

/** A recording may begin with rows at which the sensor was silent. */
function withSilentRows(rows: RawRows, first: number, width: number): number {
	let at = first;
	while (at > 0 && isSilent(shapeOf(rows.cells(at - 1)), width)) at--;
	return at;
}

function firstReading(rows: RawRows, isTimed: boolean): number {
	let fallback = -1;
	for (let row = 0; row < rows.count; row++) {
		const shape = shapeOf(rows.cells(row));
		if (!isReading(shape, isTimed)) continue;
		if (fallback < 0) fallback = row;
		// One reading-like line may be a line of the preamble; a second of the same width follows in the body.
		for (let next = row + 1, seen = 0; next < rows.count && seen < 3; next++) {
			const cells = rows.cells(next);
			if (isBlank(cells)) continue;
			seen++;
			const other = shapeOf(cells);
			if (isReading(other, isTimed) && Math.abs(other.width - shape.width) <= 1) return row;
			if (isTimed && isSilent(other, shape.width)) return row;
		}
		if (row - fallback > 5000) break;
	}
	return fallback;
}

function rowAbove(rows: RawRows, row: number): number | null {
	for (let above = row - 1; above >= 0 && above >= row - 4; above--)
		if (!isBlank(rows.cells(above))) return above;
	return null;
}

function looksLikeHeader(cells: readonly string[], width: number): boolean {
	const filled = cells.filter((cell) => cell.trim() !== '');
	if (filled.length === 0) return false;
	if (wideHeadsIn(cells) !== null) return true;
	const shape = shapeOf(cells);
	if (shape.hasMoment || (shape.values > 0 && shape.values >= shape.texts)) return false;
	if (width === 1) return filled.length === 1 && !/[:=]\s*\S/.test(filled[0] ?? '');
	return filled.length >= Math.max(2, Math.ceil(width / 2)) && !/[:=]\s*$/.test(filled[0] ?? '');
}

/** Where readings begin, and which of the rows above are heads and units. */
export function findBody(rows: RawRows): Body | null {
	const timed = firstReading(rows, true);
	const found = timed >= 0 ? timed : firstReading(rows, false);
	if (found < 0) return null;
	const width = shapeOf(rows.cells(found)).width;
	const first = timed >= 0 ? withSilentRows(rows, found, width) : found;
	let header = rowAbove(rows, first);
	let units: number | null = null;
	if (header !== null && isUnitRow(rows.cells(header))) {
		units = header;
		header = rowAbove(rows, header);
	}
	if (header !== null && !looksLikeHeader(rows.cells(header), width)) header = null;
	// "Time;°C" is a row of units only below a row of heads; alone it is the heads.
	if (header === null && units !== null) [header, units] = [units, null];
	return { first, header, units, isTimed: timed >= 0 };
}

function isUnitRow(cells: readonly string[]): boolean {
	const filled = cells.filter((cell) => cell.trim() !== '');
	const units = filled.filter(isUnitCell).length;
	return (
		units > 0 &&
		filled.every(
			(cell) => isUnitCell(cell) || /^[[(]?(yyyy|dd|mm|hh|jjjj|tt|utc|gmt|iso|-$)/i.test(cell.trim())
		)
	);
}

/** True when a line without readings is still the head of a table: it names a time and a measured quantity. */
export function isHeaderOnly(cells: readonly string[]): boolean {
	const meanings = cells.map(meaningOf);
	return meanings.some((m) => m.isTime || m.isElapsed) && meanings.some((m) => m.quantity !== null);
}
