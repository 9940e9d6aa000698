import { exp } from '../math/exp';
import { leastSquares } from '../math/least-squares';
import { ln } from '../math/ln';
import { kelvinFromCelsius } from '../units';
import { gasConstant } from './rate-arrhenius';
import type { LifePoint, Q10Band, RateModel } from './spec';

/** A model and one life it gives: the rest follows from its rates. */
export interface Fitted {
	readonly model: RateModel;
	readonly anchor: LifePoint;
	/** How many figures were fitted. */
	readonly figures: number;
}

/** Why no model of a kind fits: too few temperatures, warm lasting longer, or Tmin left open by the points. */
export type FitFault = 'points-too-few' | 'life-longer-when-warmer' | 'minimum-not-settled';

const celsiusPerBand = 10;

const logsOf = (points: readonly LifePoint[]) => points.map(({ lifeHours }) => ln(lifeHours));
const onesOf = (points: readonly LifePoint[]) => points.map(() => 1);

/** ln life is a straight line in temperature: Q10 = e^(−10 slope). */
export function fitConstantQ10(points: readonly LifePoint[]): Fitted | FitFault {
	const [level, slope] =
		leastSquares([onesOf(points), points.map(({ celsius }) => celsius)], logsOf(points)) ?? [];
	if (level === undefined || slope === undefined) return 'points-too-few';
	if (slope > 0) return 'life-longer-when-warmer';
	return {
		model: { kind: 'constant-q10', q10: exp(-celsiusPerBand * slope) },
		anchor: anchorAt(points, (celsius) => level + slope * celsius),
		figures: 2
	};
}

/** ln life is a straight line in 1/T, T in kelvin: Ea = R × slope. */
export function fitArrhenius(points: readonly LifePoint[]): Fitted | FitFault {
	// Thousands over kelvin, so that the slope is of the size of its column.
	const inverse = (celsius: number) => 1000 / kelvinFromCelsius(celsius);
	const [level, slope] =
		leastSquares([onesOf(points), points.map(({ celsius }) => inverse(celsius))], logsOf(points)) ?? [];
	if (level === undefined || slope === undefined) return 'points-too-few';
	if (slope <= 0) return 'life-longer-when-warmer';
	return {
		model: { kind: 'arrhenius', activationEnergyKilojoulesPerMole: gasConstant * slope },
		anchor: anchorAt(points, (celsius) => level + slope * inverse(celsius)),
		figures: 2
	};
}

/**
 * ln life is a broken line with its knees at whole tens of degrees. A knee that the points cannot settle, or beyond
 * which warm would last longer, is left out and the bands beside it become one.
 */
export function fitBandedQ10(points: readonly LifePoint[]): Fitted | FitFault {
	const coldest = points[0]?.celsius ?? 0;
	const warmest = points[points.length - 1]?.celsius ?? 0;
	let knees: number[] = [];
	for (let at = Math.floor(coldest / celsiusPerBand) * celsiusPerBand; at < warmest; at += celsiusPerBand)
		if (at > coldest) knees.push(at);
	for (;;) {
		const line = brokenLine(points, knees);
		const faulty = line ? line.slopes.findIndex((slope) => slope > 0) : 0;
		if (line && faulty === -1) return bandsOf(points, knees, line);
		if (knees.length === 0) return line ? 'life-longer-when-warmer' : 'points-too-few';
		const dropped = line ? Math.min(faulty, knees.length - 1) : thinnest(points, knees);
		knees = knees.filter((_, i) => i !== dropped);
	}
}

interface BrokenLine {
	readonly level: number;
	readonly slopes: readonly number[];
}

function brokenLine(points: readonly LifePoint[], knees: readonly number[]): BrokenLine | null {
	const coldest = points[0]?.celsius ?? 0;
	const columns = [coldest, ...knees].map((knee) => points.map(({ celsius }) => Math.max(0, celsius - knee)));
	const found = leastSquares([onesOf(points), ...columns], logsOf(points));
	if (!found) return null;
	const [level = 0, ...turns] = found;
	let slope = 0;
	return { level, slopes: turns.map((turn) => (slope += turn)) };
}

/** The knee with the fewest temperatures in the bands beside it: the one the points say least about. */
function thinnest(points: readonly LifePoint[], knees: readonly number[]): number {
	const counts = knees.map((_, i) => {
		const from = knees[i - 1] ?? -Infinity;
		const to = knees[i + 1] ?? Infinity;
		return new Set(points.map(({ celsius }) => celsius).filter((one) => one > from && one < to)).size;
	});
	return counts.indexOf(Math.min(...counts));
}

function bandsOf(points: readonly LifePoint[], knees: readonly number[], line: BrokenLine): Fitted {
	const warmest = points[points.length - 1]?.celsius ?? 0;
	const coldest = points[0]?.celsius ?? 0;
	const bands: Q10Band[] = [coldest, ...knees].map((fromCelsius, i) => ({
		fromCelsius,
		toCelsius: knees[i] ?? warmest,
		q10: exp(-celsiusPerBand * (line.slopes[i] ?? 0))
	}));
	const anchor = { celsius: coldest, lifeHours: exp(line.level) };
	return { model: { kind: 'banded-q10', bands }, anchor, figures: bands.length + 1 };
}

function anchorAt(points: readonly LifePoint[], lnLife: (celsius: number) => number): LifePoint {
	const celsius = points[0]?.celsius ?? 0;
	return { celsius, lifeHours: exp(lnLife(celsius)) };
}
