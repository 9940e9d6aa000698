import type { ContentSvg } from 'pdfmake/interfaces';
import { hoursPerDay } from '../../../domain/units';
import type { DocketLineView } from '../../../schemas/docket';
import { attributes, element, textElement, type Node } from './chart/svg';
import { palette } from './palette';

const heightPoints = 27;
const base = 11;

/** Ink to the low, hollow from low to high, a caret at the need, dotted for the shortfall, a tick a day. */
export function lifeRule(line: DocketLineView, widthPoints: number): ContentSvg | null {
	const life = line.remainingHours;
	if (life === null) return null;
	const wholeDays = Math.max(line.fullLifeHours, line.neededHours, life.high, hoursPerDay) / hoursPerDay;
	const x = (hours: number) => (Math.max(hours, 0) / hoursPerDay / wholeDays) * (widthPoints - 2) + 1;
	const need = x(line.neededHours);
	const nodes: Node[] = [
		element('rect', { x: 1, y: base - 6, width: x(life.low) - 1, height: 6, fill: palette.ink }),
		element('rect', {
			x: x(life.low),
			y: base - 5.6,
			width: Math.max(x(life.high) - x(life.low), 0.1),
			height: 5.2,
			fill: 'none',
			stroke: palette.ink,
			'stroke-width': 0.7
		}),
		element('path', {
			d: `M1 ${base}H${widthPoints - 1}`,
			stroke: palette.edge,
			'stroke-width': 0.7,
			fill: 'none'
		}),
		element('path', { d: `M${need} ${base}V3`, stroke: palette.ink, 'stroke-width': 0.9, fill: 'none' }),
		element('path', { d: `M${need - 2.6} 0.4H${need + 2.6}L${need} 4Z`, fill: palette.ink })
	];
	if (life.low < line.neededHours) {
		const from = Math.max(x(life.low), 1);
		nodes.push(
			element('path', {
				d: `M${from} ${base - 3}H${need}`,
				stroke: palette.hull,
				'stroke-width': 1,
				'stroke-dasharray': '1 1.4',
				fill: 'none'
			})
		);
	}
	nodes.push(...dayTicks(wholeDays, widthPoints, x));
	const view = attributes({
		viewBox: `0 0 ${widthPoints} ${heightPoints}`,
		width: widthPoints,
		height: heightPoints
	});
	return { svg: `<svg ${view}>${nodes.join('')}</svg>`, width: widthPoints, height: heightPoints };
}

function dayTicks(wholeDays: number, widthPoints: number, x: (hours: number) => number): Node[] {
	const tickDays = wholeDays <= 40 ? 1 : Math.ceil(wholeDays / 40);
	const labelDays =
		[1, 2, 3, 5, 6, 7, 10, 14, 20, 30, 50, 100, 200, 400].find((step) => wholeDays / step <= 4) ?? 1000;
	const nodes: Node[] = [];
	for (let day = 0; day <= wholeDays + 1e-9; day++) {
		const isLabelled = day % labelDays === 0;
		const at = x(day * hoursPerDay);
		if (day % tickDays === 0 || isLabelled) {
			nodes.push(
				element('path', {
					d: `M${at} ${base}V${base + (isLabelled ? 4 : 2.4)}`,
					stroke: palette.edge,
					'stroke-width': 0.7,
					fill: 'none'
				})
			);
		}
		if (!isLabelled) continue;
		const isLast = at > widthPoints - 8;
		const anchor = day === 0 ? 'start' : isLast ? 'end' : 'middle';
		nodes.push(
			textElement(day === 0 ? 0 : Math.min(at, widthPoints), 24.6, String(day), {
				family: 'Mono',
				size: 7.5,
				anchor,
				color: palette.ink2
			})
		);
	}
	return nodes;
}
