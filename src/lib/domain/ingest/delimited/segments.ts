import { cellKindOf } from '../cells/cell-kind';
import { meaningOf } from '../layout/words';
import { unitWithin } from '../cells/unit-words';
import { emptyStamp, noTime, scanStamp, type Stamp } from '../times/stamp';
import { findBody, isHeaderOnly, type Body, type RawRows } from './body';
import { shapeOf } from './delimiter';

/** A stretch of rows with heads of its own. Rows are counted in the whole file. */
export interface Segment {
	/** First row of what stands above the heads. */
	readonly from: number;
	readonly to: number;
	readonly body: Body;
}

/** Lines above a table's heads belong to it, up to so many. */
const longestPreamble = 500;
const mostSegments = 64;

/** Heads begin with a letter and hold few digits; anything else is not worth splitting. */
function mayBeHeads(text: string): boolean {
	const code = text.charCodeAt(text.charCodeAt(0) === 34 ? 1 : 0);
	if (Number.isNaN(code) || (code >= 48 && code <= 57) || code === 45) return false;
	return text.length < 400 && (text.match(/\d/g)?.length ?? 0) < 12;
}

function isReading(cells: readonly string[]): boolean {
	const shape = shapeOf(cells);
	return shape.hasMoment && shape.values > 0;
}

/** Rows below the first body that are heads again: of the same table or of another. */
function headRows(rows: RawRows, textOf: (row: number) => string, body: Body): number[] {
	const found: number[] = [];
	const heading = body.header === null ? null : textOf(body.header).trim();
	for (let row = body.first + 1; row < rows.count && found.length < mostSegments; row++) {
		const text = textOf(row);
		if (!mayBeHeads(text)) continue;
		if (text.trim() === heading) found.push(row);
		else {
			const cells = rows.cells(row);
			if (cells.length > 1 && isHeaderOnly(cells) && !isReading(cells)) found.push(row);
		}
	}
	return found;
}

function preambleStart(rows: RawRows, head: number, after: number): number {
	let from = head;
	while (from - 1 > after && head - from < longestPreamble && !isReading(rows.cells(from - 1))) from--;
	return from;
}

/** Every table of the file with the rows that belong to it; the first one's body is known. */
export function segmentsOf(rows: RawRows, textOf: (row: number) => string, body: Body): Segment[] {
	const heads = headRows(rows, textOf, body);
	if (heads.length === 0) return [{ from: 0, to: rows.count, body }];
	const starts = heads.map((head, i) => preambleStart(rows, head, heads[i - 1] ?? body.first));
	const segments: Segment[] = [{ from: 0, to: starts[0] ?? rows.count, body }];
	starts.forEach((from, i) => {
		const to = starts[i + 1] ?? rows.count;
		const own = findBody({ count: to - from, cells: (row) => rows.cells(row + from) });
		if (own === null)
			segments.push({ from, to, body: { first: to, header: heads[i] ?? from, units: null, isTimed: false } });
		else
			segments.push({
				from,
				to,
				body: {
					...own,
					first: own.first + from,
					header: own.header === null ? (heads[i] ?? null) : own.header + from,
					units: own.units === null ? null : own.units + from
				}
			});
	});
	return segments;
}

/** True for a table of times and temperatures, or one whose heads say nothing against it. */
export function isRecording(rows: RawRows, { body, to }: Segment): boolean {
	let readings = 0;
	for (let row = body.first; row < Math.min(to, body.first + 20) && readings < 2; row++)
		if (isReading(rows.cells(row)) || !body.isTimed) readings++;
	if (readings < 2) return false;
	if (body.header === null) return true;
	const heads = [...rows.cells(body.header), ...(body.units === null ? [] : rows.cells(body.units))];
	const meanings = heads.map((head) => meaningOf(head).quantity);
	return (
		meanings.includes('temperature') ||
		heads.some((head) => unitWithin(head) !== null) ||
		meanings.every((m) => m === null)
	);
}

const [one, other] = [emptyStamp(), emptyStamp()];

function momentIn(cells: readonly string[], into: Stamp): boolean {
	const kinds = cells.map(cellKindOf);
	const first = (kind: string): string | undefined => cells[kinds.findIndex((k) => k === kind)];
	const text = first('moment') ?? `${first('date') ?? ''} ${first('time') ?? ''}`;
	return scanStamp(text.trim(), into) && into.shape !== 'none';
}

/** −1 where the first moment is earlier in every order of day and month, 1 later, 0 where it depends or is the same. */
function compare(a: Stamp, b: Stamp): number {
	const in24 = (stamp: Stamp): number => (stamp.msOfDay === noTime ? 0 : stamp.msOfDay);
	const orders = a.shape === 'open' || b.shape === 'open' ? (['cba', 'cab'] as const) : (['abc'] as const);
	const signs = orders.map((order) => {
		for (const part of order) {
			const key = part === 'a' ? 'a' : part === 'b' ? 'b' : 'c';
			if (a[key] !== b[key]) return a[key] < b[key] ? -1 : 1;
		}
		return Math.sign(in24(a) - in24(b));
	});
	return signs.every((sign) => sign === signs[0]) ? (signs[0] ?? 0) : 0;
}

/** True where the later table starts before the earlier one ends: two clocks, not one recording that goes on. */
export function overlaps(rows: RawRows, earlier: Segment, later: Segment): boolean {
	let last = earlier.to - 1;
	while (last > earlier.body.first && !isReading(rows.cells(last))) last--;
	if (!momentIn(rows.cells(last), one) || !momentIn(rows.cells(later.body.first), other)) return false;
	return compare(other, one) < 0;
}
