import { zoneName } from '../../format-time';
import {
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
import { timeTicks } from './time-ticks';

/** Hours under the temperature panel, days under the hours, the zone once at the right. */
export function drawTimeAxis(pen: Pen, { palette, view, zone, locale, layout }: Drawing): void {
	const { hours, days } = timeTicks(view.fromMs, view.toMs, zone, pen.right - pen.left, locale);
	pen.ctx.lineWidth = 1;
	pen.ctx.strokeStyle = palette.edge;
	const base = crisp(pen.bottom);
	for (const tick of hours) {
		const x = crisp(pen.x(tick.ms));
		line(pen, x, base, x, base + 4);
		text(pen, tick.text, x, base + 13, {
			font: tick.isMidnight ? figureFontStrong : figureFont,
			colour: tick.isMidnight ? palette.ink : palette.ink2,
			align: 'center'
		});
	}
	for (const tick of days) {
		const x = tick.isAtEdge ? pen.left : clampLabel(pen, tick.text, pen.x(tick.ms));
		const align = tick.isAtEdge ? 'left' : 'center';
		text(pen, tick.text, x, base + (hours.length > 0 ? 30 : 13), {
			font: wordFontStrong,
			colour: palette.ink,
			align
		});
	}
	const gutter = pen.right + (layout.isNarrow ? 4 : 12);
	text(pen, zoneName(view.toMs, zone), gutter, base + 13, { font: wordFontQuiet, colour: palette.ink2 });
}

/** A day that begins near an edge is moved in, not cut. */
function clampLabel(pen: Pen, words: string, x: number): number {
	pen.ctx.font = wordFontStrong;
	const half = pen.ctx.measureText(words).width / 2;
	return Math.min(pen.right - half + 24, Math.max(pen.left + half, x));
}
