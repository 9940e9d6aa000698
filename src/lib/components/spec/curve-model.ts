import type { LifePoint, Spec } from '../../domain/shelf-life/spec';
import { celsiusFromFahrenheit, hoursPerDay, type TemperatureUnit } from '../../domain/units';
import { inUnit } from '../../format';
import { lifeHoursAt, spokenFor } from './life-at';

/** Days a log axis of life names. */
const namedDays = [
	0.1, 0.2, 0.3, 0.5, 0.7, 1, 1.5, 2, 3, 4, 5, 7, 10, 14, 20, 28, 40, 60, 90, 120, 180, 270, 365, 540, 730,
	1095, 1460, 2190, 2920, 4380
];
const mostTicks = 11;
const samples = 160;

export interface CurveDrawing {
	plot: { left: number; right: number; top: number; bottom: number };
	x: (celsius: number) => number;
	y: (lifeHours: number) => number;
	celsiusTicks: { x: number; degrees: number }[];
	dayTicks: { y: number; days: number }[];
	/** The model speaks for what lies between these. */
	inside: { left: number; right: number };
	line: string;
	/** Rate held: before and after. */
	heldLines: string[];
	/** The version this one is held against. */
	otherLine: string | null;
	/** Lives the model is drawn through. */
	entered: { x: number; y: number }[];
	published: { number: number; x: number; y: number; top: number; bottom: number }[];
}

export interface CurveSize {
	width: number;
	height: number;
}

/** Everything the curve's picture needs, in pixels. Life is on a log scale, so that an exponential is a straight line. */
export function drawCurve(
	spec: Spec,
	other: Spec | null,
	unit: TemperatureUnit,
	size: CurveSize
): CurveDrawing {
	const plot = { left: 44, right: size.width - 14, top: 22, bottom: size.height - 26 };
	const spoken = spokenFor(spec);
	const celsius = celsiusSpan(spec, spoken);
	const days = daySpan(spec, spoken, celsius);
	const x = (at: number) =>
		plot.left + ((at - celsius.from) / (celsius.to - celsius.from)) * (plot.right - plot.left);
	const y = (hours: number) => {
		const share =
			(Math.log(hours / hoursPerDay) - Math.log(days.from)) / (Math.log(days.to) - Math.log(days.from));
		return plot.bottom - share * (plot.bottom - plot.top);
	};
	const path = (of: Spec, from: number, to: number) => pathOf(of, from, to, x, y, plot);
	return {
		plot,
		x,
		y,
		celsiusTicks: celsiusTicks(celsius, unit).map((degrees) => ({ x: x(celsiusOf(degrees, unit)), degrees })),
		dayTicks: dayTicks(days).map((tick) => ({ y: y(tick * hoursPerDay), days: tick })),
		inside: { left: x(spoken.fromCelsius), right: x(spoken.toCelsius) },
		line: path(spec, spoken.fromCelsius, spoken.toCelsius),
		heldLines: [path(spec, celsius.from, spoken.fromCelsius), path(spec, spoken.toCelsius, celsius.to)],
		otherLine: other && path(other, celsius.from, celsius.to),
		entered: enteredLives(spec).map((point) => ({ x: x(point.celsius), y: y(point.lifeHours) })),
		published: publishedPoints(spec, x, y)
	};
}

interface Span {
	from: number;
	to: number;
}

function celsiusSpan(spec: Spec, spoken: { fromCelsius: number; toCelsius: number }): Span {
	const marked = [
		spoken.fromCelsius,
		spoken.toCelsius,
		spec.referenceCelsius,
		spec.freezingCelsius,
		spec.ceilingCelsius,
		spec.upper?.celsius ?? null,
		spec.lower?.celsius ?? null,
		...spec.sources.map(({ point }) => point?.celsius ?? null)
	].filter((celsius) => celsius !== null);
	const [least, most] = [Math.min(...marked), Math.max(...marked)];
	const room = Math.max(1, (most - least) * 0.12);
	return { from: Math.floor(least - room), to: Math.ceil(most + room * 2) };
}

/** From the shortest life within the model to the longest, with what is published; to named days outward. */
function daySpan(spec: Spec, spoken: { fromCelsius: number; toCelsius: number }, celsius: Span): Span {
	const hours = [
		lifeHoursAt(spec, spoken.toCelsius),
		lifeHoursAt(spec, Math.max(spoken.fromCelsius, celsius.from)),
		...spec.sources.flatMap(({ point, lifeHoursHigh }) => [point?.lifeHours ?? null, lifeHoursHigh])
	].filter((life): life is number => life !== null && life > 0 && Number.isFinite(life));
	const least = Math.min(...hours, spec.fullLifeHours) / hoursPerDay;
	const most = Math.max(...hours, spec.fullLifeHours) / hoursPerDay;
	return {
		from: [...namedDays].reverse().find((days) => days <= least * 0.75) ?? least * 0.75,
		to: namedDays.find((days) => days >= most * 1.2) ?? most * 1.2
	};
}

function dayTicks({ from, to }: Span): number[] {
	const within = namedDays.filter((days) => days >= from && days <= to);
	const every = Math.ceil(within.length / mostTicks);
	return within.filter((_, at) => at % every === 0);
}

function celsiusTicks({ from, to }: Span, unit: TemperatureUnit): number[] {
	const [first, last] = [inUnit(from, unit), inUnit(to, unit)];
	const step = [1, 2, 5, 10, 20].find((size) => (last - first) / size <= 9) ?? 50;
	const ticks: number[] = [];
	for (let at = Math.ceil(first / step) * step; at <= last; at += step) ticks.push(at);
	return ticks;
}

function celsiusOf(degrees: number, unit: TemperatureUnit): number {
	return unit === 'fahrenheit' ? celsiusFromFahrenheit(degrees) : degrees;
}

/** The life line of a spec over a stretch; cut off where it leaves the picture. */
function pathOf(
	spec: Spec,
	from: number,
	to: number,
	x: (celsius: number) => number,
	y: (hours: number) => number,
	plot: CurveDrawing['plot']
): string {
	if (!(to > from)) return '';
	const parts: string[] = [];
	let isDown = false;
	for (let at = 0; at <= samples; at++) {
		const celsius = from + ((to - from) * at) / samples;
		const hours = lifeHoursAt(spec, celsius);
		const height = hours === null ? -Infinity : y(hours);
		if (height < plot.top - 0.5 || height > plot.bottom + 0.5) isDown = false;
		else {
			parts.push(`${isDown ? 'L' : 'M'}${x(celsius).toFixed(1)} ${height.toFixed(1)}`);
			isDown = true;
		}
	}
	return parts.join('');
}

function enteredLives({ model }: Spec): readonly LifePoint[] {
	if (model.kind === 'two-lives') return [model.lower, model.upper];
	return model.kind === 'life-table' ? model.points : [];
}

/** A printed range stands as a bar with its point at the middle of the log scale. */
function publishedPoints(
	spec: Spec,
	x: (celsius: number) => number,
	y: (hours: number) => number
): CurveDrawing['published'] {
	return spec.sources.flatMap(({ point, lifeHoursHigh }, at) => {
		if (!point) return [];
		const [bottom, top] = [y(point.lifeHours), y(lifeHoursHigh ?? point.lifeHours)];
		return [{ number: at + 1, x: x(point.celsius), y: (top + bottom) / 2, top, bottom }];
	});
}
