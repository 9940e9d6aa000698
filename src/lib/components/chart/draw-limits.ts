import { decimal } from '../../format';
import { words } from '../words';
import type { LimitLine } from './chart-model';
import { crisp, figureFont, line, text, wordFont, type Drawing, type Pen } from './drawing';
import type { Palette } from './palette';
import { spreadLabels } from './spread-labels';

/** Limits as lines, stops dashed, each with its value and word in the gutter. */
export function drawLimits(pen: Pen, drawing: Drawing): void {
	const shown = drawing.model.limits.filter(({ value }) => isInside(pen, pen.y(value)));
	pen.ctx.lineWidth = 1.5;
	for (const limit of shown) {
		pen.ctx.strokeStyle = colourOf(limit, drawing.palette);
		pen.ctx.setLineDash(isStop(limit) ? [5, 3] : []);
		line(pen, pen.left, crisp(pen.y(limit.value)), pen.right, crisp(pen.y(limit.value)));
	}
	pen.ctx.setLineDash([]);
	const wanted = shown.map(({ value }) => pen.y(value));
	const placed = spreadLabels(wanted, 15);
	shown.forEach((limit, at) => {
		const label = { value: decimal(limit.value, 1, drawing.locale), word: words.limits[limit.kind] };
		gutterLabel(pen, drawing, placed[at] ?? 0, { ...label, colour: colourOf(limit, drawing.palette) });
	});
}

function isInside(pen: Pen, y: number): boolean {
	return y >= pen.top - 1 && y <= pen.bottom + 1;
}

function isStop(limit: LimitLine): boolean {
	return limit.kind === 'freezing' || limit.kind === 'ceiling';
}

function colourOf(limit: LimitLine, palette: Palette): string {
	if (isStop(limit)) return palette.hull;
	return limit.kind === 'upper' ? palette.rope : palette.deep;
}

interface GutterLabel {
	value: string;
	word: string;
	colour: string;
	font?: string;
	wordFont?: string;
}

/** Value to the right of its column, word after it; on a phone the value alone. */
export function gutterLabel(pen: Pen, { layout }: Drawing, y: number, label: GutterLabel): void {
	if (layout.isNarrow) {
		text(pen, label.value, pen.right + 4, y, { font: label.font ?? figureFont, colour: label.colour });
		return;
	}
	const column = pen.right + 36;
	text(pen, label.value, column, y, { font: label.font ?? figureFont, colour: label.colour, align: 'right' });
	text(pen, label.word, column + 4, y, { font: label.wordFont ?? wordFont, colour: label.colour });
}
