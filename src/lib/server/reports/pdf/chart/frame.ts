import type { Chapter, Draft } from '../draft';
import { hoursPerDay } from '../../../../domain/units';

/** Heights down the chart, in points. */
export const rows = {
	top: 24,
	panel: 138,
	axis: 27,
	legs: 17,
	gap: 14,
	life: 70,
	foot: 6
} as const;

/** Scales of the two panels on their one time axis. */
export interface Frame {
	readonly width: number;
	readonly height: number;
	readonly left: number;
	readonly right: number;
	readonly fromMs: number;
	readonly toMs: number;
	readonly temperatureTop: number;
	readonly temperatureBottom: number;
	readonly legsTop: number;
	readonly lifeTop: number;
	readonly lifeBottom: number;
	readonly temperatureTicks: readonly number[];
	readonly lifeTicks: readonly number[];
	x(ms: number): number;
	/** °C to y. */
	y(celsius: number): number;
	/** Hours of life to y; life starts at zero. */
	lifeY(hours: number): number;
}

/** Settles the scales from all that will be drawn. */
export function frameOf(draft: Draft, chapter: Chapter): Frame {
	const { assessment } = chapter;
	const left = 24;
	const right = draft.sheet.mainWidth - 68;
	const [fromMs, toMs] = journey(chapter);
	const temperatureTop = rows.top;
	const temperatureBottom = temperatureTop + rows.panel;
	const legsTop = temperatureBottom + rows.axis;
	const lifeTop = legsTop + rows.legs + rows.gap;
	const lifeBottom = lifeTop + rows.life;
	const shown = temperaturesOf(chapter).map(draft.thermometer.value);
	const temperatureTicks = niceTicks(Math.min(...shown), Math.max(...shown), 8);
	const lowest = temperatureTicks[0] ?? 0;
	const highest = temperatureTicks.at(-1) ?? 1;
	const lifeTicks = niceTicks(0, Math.max(assessment.fullLifeHours, assessment.neededHours) / hoursPerDay, 3);
	const lifeTop1 = lifeTicks.at(-1) ?? 1;
	const clamp = (y: number) => Math.min(Math.max(y, temperatureTop), temperatureBottom);
	return {
		width: draft.sheet.mainWidth,
		height: lifeBottom + rows.foot,
		left,
		right,
		fromMs,
		toMs,
		temperatureTop,
		temperatureBottom,
		legsTop,
		lifeTop,
		lifeBottom,
		temperatureTicks,
		lifeTicks,
		x: (ms) => left + ((ms - fromMs) / (toMs - fromMs)) * (right - left),
		y: (celsius) =>
			clamp(
				temperatureBottom - ((draft.thermometer.value(celsius) - lowest) / (highest - lowest)) * rows.panel
			),
		lifeY: (hours) =>
			Math.max(lifeBottom - (Math.max(hours, 0) / hoursPerDay / lifeTop1) * rows.life, lifeTop)
	};
}

function journey({ assessment, series, others }: Chapter): [number, number] {
	const drawn = series === null ? others : [series, ...others];
	const starts = [assessment.windowFromAt, ...drawn.map((one) => one.fromAt)].map((at) => Date.parse(at));
	const ends = [assessment.windowToAt, ...drawn.map((one) => one.toAt)].map((at) => Date.parse(at));
	const fromMs = Math.min(...starts);
	return [fromMs, Math.max(...ends, fromMs + 60_000)];
}

function temperaturesOf({ assessment, series, others }: Chapter): number[] {
	const readings = [series, ...others].flatMap((one) => one?.celsius ?? []);
	const limits = [
		assessment.upperCelsius,
		assessment.lowerCelsius,
		assessment.freezingCelsius,
		assessment.minCelsius,
		assessment.maxCelsius
	];
	return [...readings, ...limits].filter((celsius) => celsius !== null);
}

/** Round ticks that enclose both ends, at most `most` steps; at least one step. */
export function niceTicks(low: number, high: number, most: number): number[] {
	const span = Math.max(high - low, 1e-6);
	const decade = 10 ** Math.floor(Math.log10(span / most));
	const step =
		[1, 2, 3, 5, 6, 10, 20]
			.map((factor) => factor * decade)
			.find((size) => Math.ceil(high / size) - Math.floor(low / size) <= most) ?? span;
	const first = Math.floor(low / step + 1e-9);
	const last = Math.max(Math.ceil(high / step - 1e-9), first + 1);
	return Array.from({ length: last - first + 1 }, (_, i) => Number(((first + i) * step).toPrecision(12)));
}
