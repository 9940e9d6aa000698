import type { Chapter, Draft } from '../draft';
import { palette, sizePoints } from '../palette';
import type { SeriesView } from '../../../../schemas/docket';
import { hoursMinutes } from '../text';
import type { Frame } from './frame';
import { element, pathThrough, textElement, type Node } from './svg';
import { stacked, widthOf } from './words-room';

/** More quiet traces than this are a bundle: their names would cover it. */
export const namedOthers = 4;

/** Others quietly behind, the governing trace in ink, gaps dotted and bracketed. */
export function traces(chapter: Chapter, frame: Frame): Node[] {
	const quiet = chapter.others.map((series) => trace(series, frame, palette.edge, 0.7));
	if (chapter.series === null) return quiet;
	return [
		...quiet,
		...gaps(chapter, chapter.series, frame),
		trace(chapter.series, frame, palette.ink, 1.25),
		...traceNames(chapter, frame)
	];
}

function trace(series: SeriesView, frame: Frame, stroke: string, width: number): Node {
	const points = series.times.map((ms, i) => {
		const celsius = series.celsius[i] ?? null;
		return celsius === null ? null : ([frame.x(ms), frame.y(celsius)] as const);
	});
	return element('path', {
		d: pathThrough(points) || 'M0 0',
		stroke,
		'stroke-width': width,
		'stroke-linejoin': 'round',
		fill: 'none'
	});
}

/** Quiet traces are named where they stand furthest from the governing one. */
function traceNames({ series, others }: Chapter, frame: Frame): Node[] {
	if (series === null || others.length > namedOthers) return [];
	const names = others.flatMap((other) => {
		let at: { item: { label: string; x: number }; at: number } | null = null;
		let furthest = 3;
		for (let i = 0; i < other.times.length; i++) {
			const [ms, celsius] = [other.times[i] ?? 0, other.celsius[i] ?? null];
			const own = nearest(series, ms);
			if (celsius === null || own === null) continue;
			const distance = Math.abs(frame.y(celsius) - frame.y(own));
			if (distance <= furthest) continue;
			furthest = distance;
			at = { item: { label: other.label, x: frame.x(ms) }, at: frame.y(celsius) + 9 };
		}
		return at === null ? [] : [at];
	});
	return stacked(names, 9).map(({ item, at }) =>
		textElement(item.x, at, item.label, {
			family: 'Semi',
			size: sizePoints.chartWord,
			color: palette.ink,
			anchor: 'middle'
		})
	);
}

function nearest(series: SeriesView, ms: number): number | null {
	let [low, high] = [0, series.times.length - 1];
	while (low < high) {
		const middle = (low + high) >> 1;
		if ((series.times[middle] ?? 0) < ms) low = middle + 1;
		else high = middle;
	}
	return series.celsius[low] ?? null;
}

function gaps({ assessment }: Chapter, series: SeriesView, frame: Frame): Node[] {
	return assessment.gaps.flatMap((gap) => {
		const [fromMs, toMs] = [Date.parse(gap.fromAt), Date.parse(gap.toAt)];
		const [from, to] = [nearest(series, fromMs), nearest(series, toMs)];
		const [x1, x2] = [frame.x(fromMs), frame.x(toMs)];
		const [y1, y2] = [frame.y(from ?? to ?? 0), frame.y(to ?? from ?? 0)];
		const above = Math.min(y1, y2) - 9;
		const line = { stroke: palette.ink2, 'stroke-width': 0.8, fill: 'none' };
		const text = `gap ${hoursMinutes((toMs - fromMs) / 60_000)}`;
		const half = widthOf(text, 'Semi', sizePoints.chartWord) / 2;
		const at = Math.min(Math.max((x1 + x2) / 2, frame.left + half), frame.right - half);
		return [
			element('path', {
				d: `M${x1} ${y1}L${x2} ${y2}`,
				...line,
				stroke: palette.ink,
				'stroke-dasharray': '1 1.6'
			}),
			element('path', { d: `M${x1} ${above + 3}V${above}H${x2}V${above + 3}`, ...line }),
			textElement(at, above - 3, text, {
				family: 'Semi',
				size: sizePoints.chartWord,
				color: palette.ink2,
				anchor: 'middle'
			})
		];
	});
}

/** Limits as lines with value and word in the right gutter. */
export function limits({ assessment }: Chapter, draft: Draft, frame: Frame): Node[] {
	const all = [
		{ celsius: assessment.ceilingCelsius, word: 'ceiling', color: palette.hull, dash: '4 2' },
		{ celsius: assessment.upperCelsius, word: 'upper', color: palette.rope, dash: null },
		{ celsius: assessment.lowerCelsius, word: 'lower', color: palette.deep, dash: null },
		{ celsius: assessment.freezingCelsius, word: 'freezing', color: palette.hull, dash: '4 2' }
	];
	const highest = draft.thermometer.celsius(frame.temperatureTicks.at(-1) ?? 0);
	const drawn = all.flatMap(({ celsius, ...item }) =>
		celsius === null || celsius > highest ? [] : [{ item: { ...item, celsius }, at: frame.y(celsius) }]
	);
	const labels = stacked(drawn, 10).flatMap(({ item, at }) => {
		const value = draft.thermometer.reading(item.celsius);
		const x = frame.right + 30;
		return [
			textElement(x, at + 2.8, value, {
				family: 'Mono',
				size: sizePoints.chartFigure,
				color: item.color,
				anchor: 'end'
			}),
			textElement(x + 3, at + 2.8, item.word, {
				family: 'Semi',
				size: sizePoints.chartWord,
				color: item.color,
				bold: true
			})
		];
	});
	const lines = drawn.map(({ item, at }) =>
		element('path', {
			d: `M${frame.left - 3} ${at}H${frame.right}`,
			stroke: item.color,
			'stroke-width': 0.9,
			fill: 'none',
			...(item.dash !== null && { 'stroke-dasharray': item.dash })
		})
	);
	return [...lines, ...labels];
}
