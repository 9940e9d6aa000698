import type { ContentSvg } from 'pdfmake/interfaces';
import { legLetter, type Chapter, type Draft } from '../draft';
import { palette, sizePoints } from '../palette';
import { decimal } from '../text';
import { excursionAreas, excursionBands, excursionLabels } from './excursion-bands';
import { frameOf, rows, type Frame } from './frame';
import { lifePanel } from './life-panel';
import { attributes, element, textElement, type Node } from './svg';
import { timeAxis } from './time-axis';
import { limits, traces } from './traces';
import { fitting, widthOf } from './words-room';

/** The trace as vectors: temperature above, legs under the hours, life left below, on one time axis. */
export function traceChart(draft: Draft, chapter: Chapter): ContentSvg {
	const frame = frameOf(draft, chapter);
	const { excursions } = chapter.assessment;
	const nodes: Node[] = [
		...excursionBands(excursions, frame),
		...grid(frame),
		...(chapter.series === null ? [] : excursionAreas(excursions, chapter.series, frame)),
		...handovers(chapter, frame),
		...limits(chapter, draft, frame),
		...traces(chapter, frame),
		...timeAxis(draft, frame),
		...legsStrip(chapter, frame),
		...lifePanel(chapter, frame),
		...excursionLabels(excursions, frame)
	];
	const view = attributes({
		viewBox: `0 0 ${frame.width} ${frame.height}`,
		width: frame.width,
		height: frame.height
	});
	return { svg: `<svg ${view}>${nodes.join('')}</svg>`, width: frame.width, height: frame.height };
}

function grid(frame: Frame): Node[] {
	const [first = 0, second = 1] = frame.temperatureTicks;
	const last = frame.temperatureTicks.at(-1) ?? 1;
	const decimals = Number.isInteger(second - first) ? 0 : 1;
	return frame.temperatureTicks.flatMap((tick) => {
		const y = frame.temperatureBottom - ((tick - first) / (last - first)) * rows.panel;
		return [
			element('path', {
				d: `M${frame.left - 3} ${y}H${frame.right}`,
				stroke: palette.rule,
				'stroke-width': 0.6,
				fill: 'none'
			}),
			textElement(frame.left - 6, y + 2.7, decimal(tick, decimals), {
				family: 'Mono',
				size: sizePoints.chartFigure,
				color: palette.ink2,
				anchor: 'end'
			})
		];
	});
}

/** Dotted through both panels. */
function handovers({ assessment }: Chapter, frame: Frame): Node[] {
	const instants = new Set(assessment.legs.flatMap((leg) => [leg.fromMs, leg.toMs]));
	return [...instants]
		.filter((ms) => ms >= frame.fromMs && ms <= frame.toMs)
		.map((ms) => {
			const x = frame.x(ms);
			const d = `M${x} ${frame.temperatureTop}V${frame.temperatureBottom}M${x} ${frame.lifeTop}V${frame.lifeBottom}`;
			return element('path', {
				d,
				stroke: palette.edge,
				'stroke-width': 0.7,
				'stroke-dasharray': '1 2',
				fill: 'none'
			});
		});
}

function legsStrip({ assessment }: Chapter, frame: Frame): Node[] {
	const height = rows.legs;
	const look = { size: sizePoints.chartWord, color: palette.ink } as const;
	const boxes = assessment.legs.flatMap((leg) => {
		const from = frame.x(Math.max(leg.fromMs, frame.fromMs));
		const to = frame.x(Math.min(leg.toMs, frame.toMs));
		if (to <= from) return [];
		const width = to - from;
		const letter = legLetter(leg.ordinal);
		const baseline = frame.legsTop + height / 2 + 3;
		const holder = fitting(leg.holder, 'Semi', look.size, width - 20);
		const letterWidth = widthOf(letter, 'Semi', look.size);
		const x = holder === null ? from + width / 2 : from + 5;
		const anchor = holder === null ? 'middle' : 'start';
		return [
			element('rect', {
				x: from,
				y: frame.legsTop,
				width,
				height,
				fill: palette.sheet,
				stroke: palette.ink,
				'stroke-width': 0.7
			}),
			...(width < letterWidth + 1
				? []
				: [textElement(x, baseline, letter, { ...look, family: 'Semi', bold: true, anchor })]),
			...(holder === null ? [] : [textElement(from + 15, baseline, holder, { ...look, family: 'Semi' })])
		];
	});
	if (boxes.length === 0) return [];
	return [
		...boxes,
		textElement(frame.right + 6, frame.legsTop + height / 2 + 3, 'legs', {
			...look,
			family: 'Semi',
			color: palette.ink2
		})
	];
}
