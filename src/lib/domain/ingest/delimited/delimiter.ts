import { cellKindOf, epochUnitOf, type CellKind } from '../cells/cell-kind';
import { delimiters, splitRow, type Delimiter } from './split-row';

export interface RowShape {
	readonly width: number;
	readonly hasMoment: boolean;
	readonly values: number;
	readonly texts: number;
}

/** Cells that tell what a row is made of; those behind them are more of the same. */
const mostCellsForShape = 512;

/** What kinds of cells a row is made of. */
export function shapeOf(cells: readonly string[]): RowShape {
	let width = cells.length;
	while (width > 1 && (cells[width - 1] ?? '').trim() === '') width--;
	let values = 0;
	let texts = 0;
	let hasMoment = false;
	for (const cell of cells.length > mostCellsForShape ? cells.slice(0, mostCellsForShape) : cells) {
		const kind: CellKind = cellKindOf(cell);
		const isEpoch = kind === 'number' && epochUnitOf(Number(cell)) !== null;
		if (kind === 'moment' || kind === 'date' || kind === 'time' || isEpoch) hasMoment = true;
		else if (kind === 'number') values++;
		else if (kind === 'text') texts++;
	}
	return { width, hasMoment, values, texts };
}

/** Lines spread over the whole text: the first and last few, and some between. */
export function sampleIndexes(count: number, wanted: number): number[] {
	if (count <= wanted) return Array.from({ length: count }, (_, i) => i);
	const edge = Math.floor(wanted / 4);
	const picked = new Set<number>();
	for (let i = 0; i < edge; i++) picked.add(i).add(count - 1 - i);
	const step = (count - 2 * edge) / (wanted - 2 * edge);
	for (let at = edge; at < count - edge; at += step) picked.add(Math.floor(at));
	return [...picked].sort((a, b) => a - b);
}

interface Fit {
	readonly delimiter: Delimiter | null;
	readonly score: number;
	readonly texts: number;
}

/** Rows with a moment and no figure that are like those with one: no more words than they have. */
function silentAmong({
	timed,
	silent,
	texts
}: {
	timed: number;
	silent: readonly number[];
	texts: number;
}): number {
	return timed === 0 ? 0 : silent.filter((own) => own <= texts / timed).length;
}

function fitOf(lines: readonly string[], delimiter: Delimiter): Fit {
	const groups = new Map<number, { timed: number; plain: number; silent: number[]; texts: number }>();
	for (const line of lines) {
		const cells = splitRow(line, delimiter);
		if (cells.length < 2) continue;
		const shape = shapeOf(cells);
		const group = groups.get(cells.length) ?? { timed: 0, plain: 0, silent: [], texts: 0 };
		if (shape.hasMoment && shape.values > 0) group.timed++;
		else if (shape.values > 0 && shape.texts === 0 && !shape.hasMoment) group.plain++;
		else if (shape.hasMoment) group.silent.push(shape.texts);
		else continue;
		if (shape.values > 0) group.texts += shape.texts;
		groups.set(cells.length, group);
	}
	let best: Fit = { delimiter, score: 0, texts: 0 };
	for (const group of groups.values()) {
		// A moment without a figure is a row like the others where others of its width have one.
		const score = group.timed + silentAmong(group) + group.plain * 0.4;
		if (score > best.score) best = { delimiter, score, texts: group.texts / (group.timed + group.plain) };
	}
	return best;
}

const commaFigure = /^\s*[-+\u2212]?\d{1,3},\d{1,4}\s*$/;

/** Lines of one figure each, whose comma is the decimal sign: no head above them has a comma of its own. */
function isDecimalComma(lines: readonly string[]): boolean {
	const first = lines.findIndex((line) => commaFigure.test(line));
	const head = lines.slice(0, Math.max(0, first)).at(-1) ?? '';
	const figures = lines.filter((line) => commaFigure.test(line)).length;
	const others = lines.filter((line) => /^[-+\d.,\s]+$/.test(line) && !commaFigure.test(line)).length;
	const wholes = lines.filter((line) => commaFigure.test(line)).map((line) => parseInt(line, 10));
	// 1,45 2,47 3,46: a count and a figure.
	const isCount = wholes.every((n, i) => i === 0 || n === (wholes[i - 1] ?? 0) + 1);
	return first >= 0 && !head.includes(',') && figures > 2 && others === 0 && !isCount;
}

/**
 * The delimiter under which most lines fall into a moment and values. Null where lines hold one cell each.
 * A delimiter that leaves words unexplained loses against one that explains them at equal score.
 */
export function findDelimiter(lines: readonly string[]): Delimiter | null {
	const fits = delimiters.map((delimiter) => fitOf(lines, delimiter));
	const best = fits.reduce((a, b) =>
		b.score > a.score * 1.02 || (b.score >= a.score * 0.98 && b.texts < a.texts - 0.5) ? b : a
	);
	if (best.score === 0 || (best.delimiter === ',' && isDecimalComma(lines))) return null;
	return best.delimiter;
}
