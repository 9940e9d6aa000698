import { exp } from '../math/exp';
import { ln } from '../math/ln';
import { compensatedSum } from '../math/sum';
import type { FitFault, Fitted } from './fit-lines';
import type { LifePoint } from './spec';

/** How far Tmin may lie below the coldest point: nearer the model has no room, farther it is a straight line. */
const nearestCelsius = 1e-3;
const farthestCelsius = 200;
const trials = 400;
/**
 * ln life = level − 2 ln(T − Tmin): the level follows from Tmin, and Tmin is sought where the scatter about it is
 * least, first on a grid in the logarithm of its distance below the coldest point, then by halving the bracket in
 * which the slope of the scatter changes its sign.
 * Source of the form: Ratkowsky et al. 1982.
 */
export function fitSquareRoot(points: readonly LifePoint[]): Fitted | FitFault {
	const coldest = points[0]?.celsius ?? 0;
	if (new Set(points.map(({ celsius }) => celsius)).size < 2) return 'points-too-few';
	const scatterAt = (lnDistance: number) => scatter(points, coldest - exp(lnDistance)).squares;
	const from = ln(nearestCelsius);
	const step = (ln(farthestCelsius) - from) / trials;
	let best = 0;
	for (let i = 1; i <= trials; i++) if (scatterAt(from + i * step) < scatterAt(from + best * step)) best = i;
	if (best === 0 || best === trials) return 'minimum-not-settled';
	const lnDistance = narrowed(points, from + (best - 1) * step, from + (best + 1) * step);
	const minCelsius = coldest - exp(lnDistance);
	const { level } = scatter(points, minCelsius);
	return {
		model: { kind: 'square-root', minCelsius },
		anchor: { celsius: coldest, lifeHours: exp(level - 2 * lnDistance) },
		figures: 2
	};
}

function scatter(points: readonly LifePoint[], minCelsius: number) {
	const levels = points.map(({ celsius, lifeHours }) => ln(lifeHours) + 2 * ln(celsius - minCelsius));
	const level = compensatedSum(levels) / levels.length;
	const off = levels.map((one) => one - level);
	return {
		level,
		squares: compensatedSum(off.map((one) => one * one)),
		/** Falls towards a warmer Tmin where positive; the sign is all that is asked. */
		slope: compensatedSum(off.map((one, i) => one / ((points[i]?.celsius ?? 0) - minCelsius)))
	};
}

/** Where the scatter's slope changes its sign, as near as a double can tell. */
function narrowed(points: readonly LifePoint[], from: number, to: number): number {
	const coldest = points[0]?.celsius ?? 0;
	const isPositive = (lnDistance: number) => scatter(points, coldest - exp(lnDistance)).slope > 0;
	const signBelow = isPositive(from);
	let [low, high] = [from, to];
	for (;;) {
		const middle = low + (high - low) / 2;
		if (middle <= low || middle >= high) return middle;
		if (isPositive(middle) === signBelow) low = middle;
		else high = middle;
	}
}
