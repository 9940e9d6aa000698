import { decimal, lifeHours } from '../../format';
import { words } from '../words';
import { gutterLabel } from './draw-limits';
import {
	clipped,
	crisp,
	figureFont,
	figureFontStrong,
	line,
	text,
	wordFontQuiet,
	wordFontStrong,
	type Drawing,
	type Pen
} from './drawing';
import { spreadLabels } from './spread-labels';

/** The band from the low to the high of the life that is left. */
export function drawLifeBand(pen: Pen, { model, palette }: Drawing): void {
	if (!model.life) return;
	const [times, , low = [], high = []] = model.life;
	clipped(pen, () => {
		pen.ctx.beginPath();
		for (let at = 0; at < times.length; at++) {
			const value = high[at];
			if (typeof value === 'number') pen.ctx.lineTo(pen.x(times[at] ?? 0), pen.y(value));
		}
		for (let at = times.length - 1; at >= 0; at--) {
			const value = low[at];
			if (typeof value === 'number') pen.ctx.lineTo(pen.x(times[at] ?? 0), pen.y(value));
		}
		pen.ctx.globalAlpha = 0.4;
		pen.ctx.fillStyle = palette.edge;
		pen.ctx.fill();
	});
}

/** What is needed, dashed, and what is left at the end, both named in the gutter. */
export function drawNeed(pen: Pen, drawing: Drawing): void {
	const { model, palette, locale } = drawing;
	const left = lastOf(model.life?.[1] ?? []);
	const labels = [];
	if (model.neededDays !== null) {
		pen.ctx.strokeStyle = palette.ink;
		pen.ctx.lineWidth = 1.5;
		pen.ctx.setLineDash([6, 4]);
		const y = crisp(pen.y(model.neededDays));
		line(pen, pen.left, y, pen.right, y);
		pen.ctx.setLineDash([]);
		labels.push({ days: model.neededDays, word: words.needed, font: figureFont, wordFont: wordFontStrong });
	}
	if (left !== null)
		labels.push({ days: left, word: `d ${words.left}`, font: figureFontStrong, wordFont: wordFontStrong });
	const placed = spreadLabels(
		labels.map(({ days }) => pen.y(days)),
		18
	);
	labels.forEach(({ days, ...label }, at) => {
		gutterLabel(pen, drawing, placed[at] ?? 0, {
			...label,
			value: decimal(days, 1, locale),
			colour: palette.ink
		});
	});
}

function lastOf(values: ArrayLike<number | null | undefined>): number | null {
	for (let at = values.length - 1; at >= 0; at--) {
		const value = values[at];
		if (typeof value === 'number') return value;
	}
	return null;
}

/** What was gone before the first reading: dots from the full life down to where the line begins. */
export function drawOpening(pen: Pen, { model, palette, locale, layout }: Drawing): void {
	if (model.openingHours === null || !model.window || !model.life) return;
	const x = pen.x(model.window.fromMs);
	if (x < pen.left - 1 || x > pen.right) return;
	const begins = pen.y(model.fullDays - model.openingHours / 24);
	pen.ctx.strokeStyle = palette.ink;
	pen.ctx.lineWidth = 1.7;
	pen.ctx.setLineDash([1.7, 2.2]);
	line(pen, x, pen.y(model.fullDays), x, begins);
	pen.ctx.setLineDash([]);
	if (layout.isNarrow) return;
	const y = Math.max(pen.top + 7, pen.y(model.fullDays) - 9);
	text(pen, words.openingBalance, x + 8, y, { font: wordFontQuiet, colour: palette.ink2 });
	const wide = pen.ctx.measureText(words.openingBalance).width;
	text(pen, `${lifeHours(model.openingHours, locale)} h`, x + 12 + wide, y, {
		font: figureFont,
		colour: palette.ink2
	});
}
