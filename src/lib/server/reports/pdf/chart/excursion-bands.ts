import type { Excursion } from '../../../../domain/receiving/assessment';
import type { SeriesView } from '../../../../schemas/docket';
import { palette, sizePoints } from '../palette';
import { decimal } from '../text';
import type { Frame } from './frame';
import { coordinate, element, pathThrough, textElement, type Node } from './svg';
import { apart, widthOf } from './words-room';

const hatchPitch = 4;

/** Pale bands over both panels: plain where too warm, hatched where too cold. */
export function excursionBands(excursions: readonly Excursion[], frame: Frame): Node[] {
	return excursions.flatMap((excursion) => {
		const [x, width] = extent(excursion, frame);
		const panels = [
			[frame.temperatureTop, frame.temperatureBottom],
			[frame.lifeTop, frame.lifeBottom]
		] as const;
		const isCold = excursion.kind === 'too-cold';
		return panels.flatMap(([top, bottom]) => [
			element('rect', {
				x,
				y: top,
				width,
				height: bottom - top,
				fill: isCold ? palette.deepWash : palette.ropeWash
			}),
			...(isCold ? [hatch(x, top, width, bottom - top)] : [])
		]);
	});
}

/** Never so thin that print loses it. */
function extent(excursion: Excursion, frame: Frame): [number, number] {
	const from = frame.x(Math.max(excursion.fromMs, frame.fromMs));
	const to = frame.x(Math.min(excursion.toMs, frame.toMs));
	return [from, Math.max(to - from, 1.4)];
}

/** Lines at 45° cut to a rectangle. */
export function hatch(x: number, y: number, width: number, height: number): Node {
	let path = '';
	for (let offset = hatchPitch; offset < width + height; offset += hatchPitch) {
		const fromX = Math.min(offset, width);
		const toX = Math.max(offset - height, 0);
		path += `M${coordinate(x + fromX)} ${coordinate(y + offset - fromX)}L${coordinate(x + toX)} ${coordinate(y + offset - toX)}`;
	}
	return element('path', {
		d: path || 'M0 0',
		stroke: palette.deep,
		'stroke-width': 0.5,
		'stroke-opacity': 0.55,
		fill: 'none'
	});
}

/** Full strength between limit and trace: that area is the degree-minutes. */
export function excursionAreas(excursions: readonly Excursion[], series: SeriesView, frame: Frame): Node[] {
	return excursions.flatMap((excursion) => {
		const limitY = frame.y(excursion.limitCelsius);
		const isCold = excursion.kind === 'too-cold';
		const points = series.times.flatMap((ms, i): [number, number][] => {
			const celsius = series.celsius[i];
			if (celsius === undefined || celsius === null || ms < excursion.fromMs || ms > excursion.toMs)
				return [];
			const beyond = isCold
				? Math.min(celsius, excursion.limitCelsius)
				: Math.max(celsius, excursion.limitCelsius);
			return [[frame.x(ms), frame.y(beyond)]];
		});
		const first = points[0];
		const last = points.at(-1);
		if (first === undefined || last === undefined) return [];
		const [from, width] = extent(excursion, frame);
		const outline = [[from, limitY], ...points, [from + width, limitY]] as const;
		const fill = isCold ? palette.deep : palette.ropeBand;
		return [element('path', { d: `${pathThrough(outline)}Z`, fill, 'fill-opacity': isCold ? 0.5 : 1 })];
	});
}

/** Caps with E-numbers and severity above, the life each cost at the foot of the life panel. */
export function excursionLabels(excursions: readonly Excursion[], frame: Frame): Node[] {
	const word = {
		family: 'Semi',
		size: sizePoints.chartWord,
		bold: true,
		color: palette.ink,
		anchor: 'middle'
	} as const;
	const cost = {
		family: 'Mono',
		size: sizePoints.chartFigure,
		color: palette.ink,
		anchor: 'middle'
	} as const;
	const middles = excursions.map((excursion, i) => ({
		item: { excursion, number: `E${i + 1}` },
		at: middle(excursion, frame)
	}));
	const name = ({ excursion, number }: { excursion: Excursion; number: string }) =>
		excursion.severity === 'critical' ? `${number} critical` : number;
	const costText = ({ excursion }: { excursion: Excursion }) => `−${decimal(excursion.costHours, 1)} h`;
	const heads = apart(middles, (item) => widthOf(name(item), 'Semi', word.size), 3);
	const feet = apart(middles, (item) => widthOf(costText(item), 'Mono', cost.size), 3);
	return [
		...excursions.map((excursion) => {
			const [x, width] = extent(excursion, frame);
			return element('rect', {
				x,
				y: frame.temperatureTop - 2.2,
				width,
				height: 2.2,
				fill: excursion.kind === 'too-cold' ? palette.deep : palette.rope
			});
		}),
		...heads.map(({ item, at }) => textElement(at, frame.temperatureTop - 6, name(item), word)),
		...feet.map(({ item, at }) => textElement(at, frame.lifeBottom - 4, costText(item), cost))
	];
}

function middle(excursion: Excursion, frame: Frame): number {
	const [x, width] = extent(excursion, frame);
	return x + width / 2;
}
