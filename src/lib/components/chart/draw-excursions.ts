import { lifeHours } from '../../format';
import { areasBeyond } from './beyond-limit';
import type { ChartExcursion } from './chart-model';
import { clipped, figureFont, hatch, line, text, wordFontStrong, type Drawing, type Pen } from './drawing';

/** A pale band over the whole panel; an excursion of a minute is still two px wide. */
export function drawBands(pen: Pen, { model, palette }: Drawing, isHatched: boolean): void {
	clipped(pen, () => {
		for (const excursion of model.excursions) {
			const { x, width } = bandOf(pen, excursion);
			pen.ctx.fillStyle = excursion.kind === 'too-warm' ? palette['rope-wash'] : palette['deep-wash'];
			pen.ctx.fillRect(x, pen.top, width, pen.bottom - pen.top);
			if (excursion.kind === 'too-warm' || !isHatched) continue;
			pen.ctx.save();
			pen.ctx.beginPath();
			pen.ctx.rect(x, pen.top, width, pen.bottom - pen.top);
			pen.ctx.clip();
			pen.ctx.globalAlpha = 0.3;
			hatch(pen, x, x + width, palette.deep);
			pen.ctx.restore();
		}
	});
}

/** Full strength between limit and trace: that area is the degree-minutes. */
export function drawAreas(pen: Pen, { model, palette }: Drawing): void {
	const [times = [], celsius = []] = model.traces;
	clipped(pen, () => {
		for (const excursion of model.excursions) {
			const from = firstFrom(times, excursion.fromMs) - 1;
			const to = firstFrom(times, excursion.toMs) + 2;
			const side = excursion.kind === 'too-warm' ? 'above' : 'below';
			const areas = areasBeyond(
				times.slice(Math.max(0, from), to),
				celsius.slice(Math.max(0, from), to),
				excursion.limit,
				side
			);
			for (const area of areas) {
				pen.ctx.save();
				pen.ctx.beginPath();
				for (const point of area) pen.ctx.lineTo(pen.x(point.ms), pen.y(point.celsius));
				pen.ctx.closePath();
				if (excursion.kind === 'too-warm') {
					pen.ctx.fillStyle = palette['rope-band'];
					pen.ctx.fill();
				} else {
					pen.ctx.clip();
					hatch(pen, pen.x(area[0]?.ms ?? 0), pen.x(area.at(-1)?.ms ?? 0), palette.deep);
				}
				pen.ctx.restore();
			}
		}
	});
}

/** A 3 px cap with the excursion's name, and its severity where there is room and it is critical. */
export function drawCaps(pen: Pen, { model, palette, layout }: Drawing): void {
	let lastRight = -Infinity;
	for (const excursion of model.excursions) {
		const { x, width } = bandOf(pen, excursion);
		if (x + width < pen.left || x > pen.right) continue;
		const from = Math.max(pen.left, x);
		const to = Math.min(pen.right, x + width);
		pen.ctx.strokeStyle = excursion.kind === 'too-warm' ? palette.rope : palette.deep;
		pen.ctx.lineWidth = 3;
		line(pen, from, pen.top - 2, to, pen.top - 2);
		const isNamed = excursion.severity === 'critical' && !layout.isNarrow;
		const words = isNamed ? `${excursion.name} ${excursion.severity}` : excursion.name;
		pen.ctx.font = wordFontStrong;
		const wide = pen.ctx.measureText(words).width;
		const at =
			wide <= to - from ? from : Math.max(pen.left, Math.min(pen.right - wide, (from + to - wide) / 2));
		if (at < lastRight + 4) continue;
		text(pen, words, at, pen.top - 13, { font: wordFontStrong, colour: palette.ink });
		lastRight = at + wide;
	}
}

/** The life it cost, at the foot of the life panel. */
export function drawCosts(pen: Pen, { model, palette, locale }: Drawing): void {
	let lastRight = -Infinity;
	for (const excursion of model.excursions) {
		const { x, width } = bandOf(pen, excursion);
		if (x + width < pen.left || x > pen.right) continue;
		const words = `${lifeHours(-excursion.costHours, locale)} h`;
		pen.ctx.font = figureFont;
		const half = pen.ctx.measureText(words).width / 2;
		const middle = Math.min(pen.right - half, Math.max(pen.left + half, x + width / 2));
		if (middle - half < lastRight + 6) continue;
		text(pen, words, middle, pen.bottom - 13, { font: figureFont, colour: palette.ink, align: 'center' });
		lastRight = middle + half;
	}
}

function bandOf(pen: Pen, excursion: ChartExcursion): { x: number; width: number } {
	const x = pen.x(excursion.fromMs);
	return { x, width: Math.max(2, pen.x(excursion.toMs) - x) };
}

function firstFrom(times: ArrayLike<number>, ms: number): number {
	let low = 0;
	let high = times.length;
	while (low < high) {
		const middle = (low + high) >> 1;
		if ((times[middle] ?? 0) < ms) low = middle + 1;
		else high = middle;
	}
	return low;
}
