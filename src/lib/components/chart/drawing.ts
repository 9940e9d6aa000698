import type uPlot from 'uplot';
import type { TemperatureUnit } from '../../domain/units';
import type { ChartModel } from './chart-model';
import type { Window } from './cursor';
import type { Palette } from './palette';

/** Sizes of the two panels in CSS px. */
export interface Layout {
	widthPx: number;
	/** Room at the left for the scale, at the right for the names of the limits. */
	leftPx: number;
	rightPx: number;
	topPx: number;
	axisPx: number;
	temperaturePx: number;
	lifePx: number;
	/** On a phone: no words in the gutter, legs as letters. */
	isNarrow: boolean;
}

/** All that a drawing rests on. */
export interface Drawing {
	model: ChartModel;
	palette: Palette;
	layout: Layout;
	view: Window;
	zone: string;
	locale: string;
	unit: TemperatureUnit;
}

export function layoutOf(widthPx: number): Layout {
	const isNarrow = widthPx < 560;
	return {
		widthPx,
		leftPx: isNarrow ? 26 : 30,
		rightPx: isNarrow ? 40 : 92,
		topPx: 24,
		axisPx: 42,
		temperaturePx: isNarrow ? 264 : 300,
		lifePx: isNarrow ? 132 : 152,
		isNarrow
	};
}

/** A canvas in CSS px, with the panel's edges and its two scales. */
export interface Pen {
	ctx: CanvasRenderingContext2D;
	left: number;
	top: number;
	right: number;
	bottom: number;
	x: (ms: number) => number;
	y: (value: number) => number;
}

/** Draws in CSS px: whatever the drawing sets on the canvas is put back afterwards. */
export function withPen(chart: uPlot, draw: (pen: Pen) => void): void {
	const ratio = chart.bbox.width > 0 ? chart.bbox.width / chart.over.clientWidth : 1;
	const left = chart.bbox.left / ratio;
	const top = chart.bbox.top / ratio;
	chart.ctx.save();
	chart.ctx.scale(ratio, ratio);
	// The dashes of the last trace that was drawn would go on.
	chart.ctx.setLineDash([]);
	draw({
		ctx: chart.ctx,
		left,
		top,
		right: left + chart.bbox.width / ratio,
		bottom: top + chart.bbox.height / ratio,
		x: (ms) => left + chart.valToPos(ms, 'x'),
		y: (value) => top + chart.valToPos(value, 'y')
	});
	chart.ctx.restore();
}

export const figureFont = '400 11px "Roboto Mono"';
export const figureFontStrong = '600 11px "Roboto Mono"';
export const wordFont = '500 12.5px "Barlow Semi Condensed"';
export const wordFontQuiet = '400 12.5px "Barlow Semi Condensed"';
export const wordFontStrong = '600 12.5px "Barlow Semi Condensed"';

export function line(pen: Pen, x1: number, y1: number, x2: number, y2: number): void {
	pen.ctx.beginPath();
	pen.ctx.moveTo(x1, y1);
	pen.ctx.lineTo(x2, y2);
	pen.ctx.stroke();
}

/** A hairline falls on whole pixels, or it would be grey and two wide. */
export function crisp(px: number): number {
	return Math.round(px) + 0.5;
}

export interface TextStyle {
	font: string;
	colour: string;
	align?: CanvasTextAlign;
}

export function text(pen: Pen, words: string, x: number, y: number, style: TextStyle): void {
	pen.ctx.font = style.font;
	pen.ctx.fillStyle = style.colour;
	pen.ctx.textAlign = style.align ?? 'left';
	pen.ctx.textBaseline = 'middle';
	pen.ctx.fillText(words, x, y);
}

/** Only what lies inside the panel is drawn. */
export function clipped(pen: Pen, draw: () => void): void {
	pen.ctx.save();
	pen.ctx.beginPath();
	pen.ctx.rect(pen.left, pen.top, pen.right - pen.left, pen.bottom - pen.top);
	pen.ctx.clip();
	draw();
	pen.ctx.restore();
}

/** Diagonals 5 px apart over the current clip, between these edges. */
export function hatch(pen: Pen, x1: number, x2: number, colour: string): void {
	const height = pen.bottom - pen.top;
	pen.ctx.strokeStyle = colour;
	pen.ctx.lineWidth = 1.4;
	// The grid of diagonals is fixed to the panel, so that bands and areas over each other match.
	const step = 5 * Math.SQRT2;
	const from = pen.left + Math.floor((x1 - height - pen.left) / step) * step;
	for (let x = from; x < x2; x += step) line(pen, x, pen.bottom, x + height, pen.top);
}
