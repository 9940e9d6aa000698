import { exp } from '../math/exp';

/**
 * A stretch of temperatures over which the rate of ageing is one smooth formula.
 * Rates are relative to 1 at the spec's reference temperature; `meanRate` is the exact mean while the temperature
 * runs in a straight line between two temperatures of the piece, whose rates are known already.
 */
export interface RatePiece {
	readonly fromCelsius: number;
	readonly toCelsius: number;
	rateAt(celsius: number): number;
	meanRate(fromCelsius: number, toCelsius: number, fromRate: number, toRate: number): number;
}

/** The same rate all through: outside the model, below the chilling threshold, at or below a square root's zero. */
export function steadyPiece(fromCelsius: number, toCelsius: number, rate: number): RatePiece {
	return { fromCelsius, toCelsius, rateAt: () => rate, meanRate: () => rate };
}

/** rate = anchorRate × e^(slope × (T − anchor)): Q10 models and the stretches of a storage-life table. */
export function exponentialPiece(
	fromCelsius: number,
	toCelsius: number,
	slopePerCelsius: number,
	anchorCelsius: number,
	anchorRate: number
): RatePiece {
	return {
		fromCelsius,
		toCelsius,
		rateAt: (celsius) => anchorRate * exp(slopePerCelsius * (celsius - anchorCelsius)),
		meanRate: (from, to, fromRate, toRate) => logMean(fromRate, toRate, slopePerCelsius * (to - from))
	};
}

/** Below this half-difference of logarithms the series is used: its dropped term is under 2e-17. */
const seriesBelow = 0.4;

/**
 * Logarithmic mean (b − a)/(ln b − ln a), the mean of an exponential from a to b; `lnRatio` is ln(b/a).
 * Near a = b the quotient loses digits, so there it is √(ab) · sinh(h)/h as a series, h half of ln(b/a).
 */
export function logMean(a: number, b: number, lnRatio: number): number {
	const half = lnRatio / 2;
	if (Math.abs(half) >= seriesBelow) return (b - a) / lnRatio;
	const square = half * half;
	const series =
		1 + (square / 6) * (1 + (square / 20) * (1 + (square / 42) * (1 + (square / 72) * (1 + square / 110))));
	return Math.sqrt(a * b) * series;
}
