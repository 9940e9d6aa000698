import { ln } from '../math/ln';
import { pow } from '../math/pow';
import { exponentialPiece, steadyPiece, type RatePiece } from './piece';
import type { LifePoint, Q10Band } from './spec';

const celsiusPerQ10 = 10;

/** rate = Q10^((T − Tref)/10). Source: van 't Hoff's rule as used for produce, USDA Agriculture Handbook 66. */
export function constantQ10Pieces(q10: number, referenceCelsius: number): RatePiece[] {
	return [exponentialPiece(-Infinity, Infinity, ln(q10) / celsiusPerQ10, referenceCelsius, 1)];
}

/** Q10 = (longer life / shorter life)^(10/(T2 − T1)), temperatures in °C: 10 C° are 18 F°. */
export function q10FromTwoLives(lower: LifePoint, upper: LifePoint): number {
	return pow(lower.lifeHours / upper.lifeHours, celsiusPerQ10 / (upper.celsius - lower.celsius));
}

/** Q10 from two rates, such as respiration at two temperatures; any unit, as long as both have it. */
export function q10FromTwoRates(
	lowerCelsius: number,
	lowerRate: number,
	upperCelsius: number,
	upperRate: number
): number {
	return pow(upperRate / lowerRate, celsiusPerQ10 / (upperCelsius - lowerCelsius));
}

/** One exponential through both lives, relative to the reference temperature. */
export function twoLivesPieces(lower: LifePoint, upper: LifePoint, referenceCelsius: number): RatePiece[] {
	const slope = ln(lower.lifeHours / upper.lifeHours) / (upper.celsius - lower.celsius);
	return [exponentialPiece(-Infinity, Infinity, slope, referenceCelsius, 1)];
}

/**
 * Each band has its own Q10; the rate runs on without a jump from band to band.
 * Source of the form: Saltveit, "Respiratory metabolism", USDA Agriculture Handbook 66. Outside the bands nothing
 * is known and the rate is held.
 */
export function bandedQ10Pieces(bands: readonly Q10Band[], referenceCelsius: number): RatePiece[] {
	const sorted = [...bands].sort((a, b) => a.fromCelsius - b.fromCelsius);
	let rate = 1 / relativeToFirst(sorted, referenceCelsius);
	return sorted.map((band) => {
		const slope = ln(band.q10) / celsiusPerQ10;
		const piece = exponentialPiece(band.fromCelsius, band.toCelsius, slope, band.fromCelsius, rate);
		rate *= pow(band.q10, (band.toCelsius - band.fromCelsius) / celsiusPerQ10);
		return band.q10 === 1
			? steadyPiece(band.fromCelsius, band.toCelsius, piece.rateAt(band.fromCelsius))
			: piece;
	});
}

/** Rate at a temperature where the foot of the lowest band is 1. */
function relativeToFirst(sorted: readonly Q10Band[], celsius: number): number {
	let rate = 1;
	for (const band of sorted) {
		const reached = Math.min(celsius, band.toCelsius) - band.fromCelsius;
		if (reached > 0) rate *= pow(band.q10, reached / celsiusPerQ10);
	}
	return rate;
}
