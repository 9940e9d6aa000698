import type { Content } from 'pdfmake/interfaces';
import type { Draft } from './draft';
import { palette, sizePoints } from './palette';
import { figure, label, sentence } from './type-styles';

/** More than this many lines are left to the table; the counterfoil is one page high. */
export const linesShown = 8;

export function hairline(widthPoints: number, above: number): Content {
	return {
		canvas: [{ type: 'line', x1: 0, y1: 0, x2: widthPoints, y2: 0, lineWidth: 0.6, lineColor: palette.rule }],
		margin: [0, above, 0, 8]
	};
}

/** A word on the left, a figure on the right. */
export function pair(name: string, value: Content, widthPoints: number): Content {
	return {
		columns: [
			{ ...sentence(name), width: '*' },
			{ stack: [value], alignment: 'right', width: widthPoints * 0.52 }
		],
		margin: [0, 1.5, 0, 1.5]
	};
}

/** Number and rule, at the head of every counterfoil. */
export function counterfoilTop(draft: Draft): Content[] {
	return [
		label('Counterfoil'),
		figure(draft.docket.number, { size: sizePoints.number, margin: [0, 1, 0, 0] }),
		hairline(draft.sheet.stubWidth, 9)
	];
}
