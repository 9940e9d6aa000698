import { hoursMinutes } from '../../format';
import { words } from '../words';
import { clipped, crisp, figureFont, line, text, wordFontQuiet, type Drawing, type Pen } from './drawing';

/** Handovers dotted through the panel, and dots over what was trimmed because it was not the journey. */
export function drawCustody(pen: Pen, { model, palette, view }: Drawing): void {
	clipped(pen, () => {
		pen.ctx.strokeStyle = palette.edge;
		pen.ctx.lineWidth = 1;
		pen.ctx.setLineDash([1, 3]);
		for (const leg of model.legs) {
			const x = crisp(pen.x(leg.fromMs));
			line(pen, x, pen.top, x, pen.bottom);
		}
		pen.ctx.setLineDash([]);
		if (!model.window) return;
		dots(pen, pen.x(view.fromMs), pen.x(model.window.fromMs), palette.edge);
		dots(pen, pen.x(model.window.toMs), pen.x(view.toMs), palette.edge);
	});
}

function dots(pen: Pen, from: number, to: number, colour: string): void {
	if (to - from < 1) return;
	pen.ctx.fillStyle = colour;
	for (let x = from + 1; x < to; x += 4) {
		for (let y = pen.top + 2; y < pen.bottom; y += 4) pen.ctx.fillRect(x, y, 1.2, 1.2);
	}
}

/** A gap is bridged by dots, bracketed above with its length. */
export function drawGaps(pen: Pen, { model, palette, layout }: Drawing): void {
	const [times = [], values = []] = model.traces;
	clipped(pen, () => {
		for (const gap of model.gaps) {
			const before = lastBefore(times, values, gap.fromMs);
			const after = firstAfter(times, values, gap.toMs);
			if (before === null || after === null) continue;
			const x1 = pen.x(gap.fromMs);
			const x2 = pen.x(gap.toMs);
			pen.ctx.strokeStyle = palette.ink;
			pen.ctx.lineWidth = 1.7;
			pen.ctx.setLineDash([1.7, 2.4]);
			line(pen, x1, pen.y(before), x2, pen.y(after));
			pen.ctx.setLineDash([]);
			const y = crisp(Math.max(pen.top + 18, pen.y(Math.max(before, after)) - 20));
			bracket(pen, x1, x2, y, palette.ink2);
			if (layout.isNarrow && x2 - x1 < 8) continue;
			const length = hoursMinutes((gap.toMs - gap.fromMs) / 60_000);
			const middle = (x1 + x2) / 2;
			text(pen, words.gap, middle - 5, y - 9, { font: wordFontQuiet, colour: palette.ink2, align: 'right' });
			text(pen, length, middle - 2, y - 9, { font: figureFont, colour: palette.ink2 });
		}
	});
}

function bracket(pen: Pen, x1: number, x2: number, y: number, colour: string): void {
	pen.ctx.strokeStyle = colour;
	pen.ctx.lineWidth = 1;
	pen.ctx.beginPath();
	pen.ctx.moveTo(crisp(x1), y + 4);
	pen.ctx.lineTo(crisp(x1), y);
	pen.ctx.lineTo(crisp(x2), y);
	pen.ctx.lineTo(crisp(x2), y + 4);
	pen.ctx.stroke();
}

type Column = ArrayLike<number | null | undefined>;

function lastBefore(times: ArrayLike<number>, values: Column, ms: number): number | null {
	for (let at = times.length - 1; at >= 0; at--) {
		const value = values[at];
		if ((times[at] ?? Infinity) <= ms && typeof value === 'number') return value;
	}
	return null;
}

function firstAfter(times: ArrayLike<number>, values: Column, ms: number): number | null {
	for (let at = 0; at < times.length; at++) {
		const value = values[at];
		if ((times[at] ?? -Infinity) >= ms && typeof value === 'number') return value;
	}
	return null;
}

/** The quiet traces are named on the line, where they part most from the one that governs. */
export function drawTraceNames(pen: Pen, { model, palette, view }: Drawing): void {
	const [times = [], ...columns] = model.traces;
	const governing = columns[0] ?? [];
	columns.slice(1).forEach((column, at) => {
		let widest = -1;
		let place = -1;
		for (let row = 0; row < times.length; row++) {
			const value = column[row];
			const first = governing[row];
			const ms = times[row] ?? 0;
			if (typeof value !== 'number' || typeof first !== 'number' || ms < view.fromMs || ms > view.toMs)
				continue;
			if (Math.abs(value - first) > widest) {
				widest = Math.abs(value - first);
				place = row;
			}
		}
		const value = column[place];
		if (typeof value !== 'number') return;
		const y = pen.y(value) + ((governing[place] ?? 0) > value ? 10 : -10);
		text(pen, model.labels[at + 1] ?? '', pen.x(times[place] ?? 0), y, {
			font: figureFont,
			colour: palette.ink,
			align: 'center'
		});
	});
}
