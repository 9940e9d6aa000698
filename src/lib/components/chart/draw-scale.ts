import { decimal } from '../../format';
import { crisp, figureFont, line, text, type Drawing, type Pen } from './drawing';

/** Hairlines at the ticks with their figures at the left, and the base line in ink. */
export function drawScale(pen: Pen, { palette, locale }: Drawing, ticks: readonly number[]): void {
	const digits = ticks.every(Number.isInteger) ? 0 : 1;
	pen.ctx.lineWidth = 1;
	for (const tick of ticks) {
		const y = crisp(pen.y(tick));
		pen.ctx.strokeStyle = palette.rule;
		if (y < pen.bottom - 1) line(pen, pen.left, y, pen.right, y);
		text(pen, decimal(tick, digits, locale), pen.left - 7, y, {
			font: figureFont,
			colour: palette.ink2,
			align: 'right'
		});
	}
	pen.ctx.strokeStyle = palette.edge;
	pen.ctx.lineWidth = 1.5;
	line(pen, pen.left, crisp(pen.bottom), pen.right, crisp(pen.bottom));
}
