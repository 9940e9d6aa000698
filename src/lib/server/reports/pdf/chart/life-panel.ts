import { hoursPerDay } from '../../../../domain/units';
import type { Chapter } from '../draft';
import { palette, sizePoints } from '../palette';
import { days, decimal } from '../text';
import type { Frame } from './frame';
import { element, pathThrough, textElement, type Node } from './svg';
import { stacked } from './words-room';

type Point = readonly [number, number];

/** Life left with its band, the need dashed, the opening balance as the drop before the first reading. */
export function lifePanel(chapter: Chapter, frame: Frame): Node[] {
	const { assessment, series } = chapter;
	const need = frame.lifeY(assessment.neededHours);
	const ink = { stroke: palette.ink, fill: 'none' };
	const nodes: Node[] = [...grid(frame)];
	const low = points(series?.times, series?.remainingLowHours, frame);
	const high = points(series?.times, series?.remainingHighHours, frame);
	if (low.length > 0 && high.length > 0) {
		nodes.push(
			element('path', {
				d: `${pathThrough([...high, ...low.reverse()])}Z`,
				fill: palette.edge,
				'fill-opacity': 0.3
			})
		);
	}
	nodes.push(
		element('path', {
			d: `M${frame.left - 3} ${need}H${frame.right}`,
			...ink,
			'stroke-width': 0.8,
			'stroke-dasharray': '5 2'
		})
	);
	const line = points(series?.times, series?.remainingHours, frame);
	const first = line[0];
	if (first !== undefined) {
		nodes.push(
			element('path', {
				d: `M${first[0]} ${frame.lifeY(assessment.fullLifeHours)}V${first[1]}`,
				...ink,
				'stroke-width': 1.2,
				'stroke-dasharray': '1.2 1.4'
			})
		);
		nodes.push(
			element('path', { d: pathThrough(line), ...ink, 'stroke-width': 1.25, 'stroke-linejoin': 'round' })
		);
	}
	return [...nodes, ...labels(chapter, frame)];
}

function points(
	times: readonly number[] | undefined,
	hours: readonly (number | null)[] | null | undefined,
	frame: Frame
): Point[] {
	if (times === undefined || hours === null || hours === undefined) return [];
	return times.flatMap((ms, i) => {
		const left = hours[i] ?? null;
		return left === null ? [] : [[frame.x(ms), frame.lifeY(left)] as const];
	});
}

function grid(frame: Frame): Node[] {
	return frame.lifeTicks.flatMap((tick) => {
		const y = frame.lifeY(tick * hoursPerDay);
		const isBase = tick === 0;
		return [
			element('path', {
				d: `M${frame.left - 3} ${y}H${frame.right}`,
				stroke: isBase ? palette.ink : palette.rule,
				'stroke-width': isBase ? 0.8 : 0.6,
				fill: 'none'
			}),
			textElement(frame.left - 6, y + 2.7, decimal(tick, 0), {
				family: 'Mono',
				size: sizePoints.chartFigure,
				color: palette.ink2,
				anchor: 'end'
			})
		];
	});
}

function labels({ assessment }: Chapter, frame: Frame): Node[] {
	const left = assessment.remainingHours.value;
	const items = [
		{
			item: { value: days(assessment.neededHours), word: 'd needed', bold: false },
			at: frame.lifeY(assessment.neededHours)
		},
		{ item: { value: days(left), word: 'd left', bold: true }, at: frame.lifeY(left) }
	];
	const opening = `opening balance ${decimal(assessment.openingHours.value, 1)} h`;
	const pitch = 10;
	const lowest = frame.lifeBottom - pitch;
	const raised = items.map(({ item, at }) => ({ item, at: Math.min(at, lowest) }));
	return [
		textElement(frame.left + 5, frame.lifeTop - 4, opening, {
			family: 'Semi',
			size: sizePoints.chartWord,
			color: palette.ink2
		}),
		...stacked(raised, pitch).flatMap(({ item, at }) => [
			textElement(frame.right + 30, at + 2.8, item.value, {
				family: 'Mono',
				size: sizePoints.chartFigure,
				bold: item.bold,
				color: palette.ink,
				anchor: 'end'
			}),
			textElement(frame.right + 33, at + 2.8, item.word, {
				family: 'Semi',
				size: sizePoints.chartWord,
				bold: true,
				color: palette.ink
			})
		])
	];
}
