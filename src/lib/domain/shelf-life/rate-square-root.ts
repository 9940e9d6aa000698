import { steadyPiece, type RatePiece } from './piece';

/**
 * rate = ((T − Tmin)/(Tref − Tmin))², and 0 at or below Tmin, where the parabola would rise again.
 * Source: Ratkowsky et al. 1982, √k = b(T − Tmin); relative form with Tmin −10 °C for fresh fish: FAO Fisheries
 * Technical Paper 348 (Huss 1995), 6.1.
 */
export function squareRootPieces(minCelsius: number, referenceCelsius: number): RatePiece[] {
	const span = referenceCelsius - minCelsius;
	const root = (celsius: number) => (celsius - minCelsius) / span;
	return [
		steadyPiece(-Infinity, minCelsius, 0),
		{
			fromCelsius: minCelsius,
			toCelsius: Infinity,
			rateAt: (celsius) => root(celsius) * root(celsius),
			// ∫u² over a straight line from u1 to u2 is its length × (u1² + u1·u2 + u2²)/3, exactly.
			meanRate: (from, to, fromRate, toRate) => (fromRate + root(from) * root(to) + toRate) / 3
		}
	];
}
