import { exp } from '../math/exp';
import { ln } from '../math/ln';
import { celsiusFromKelvin, kelvinFromCelsius } from '../units';
import type { RatePiece } from './piece';
import type { LifePoint } from './spec';

/** J/(mol·K), exact. Source: CODATA 2018. */
export const gasConstant = 8.314462618;
const joulesPerKilojoule = 1000;

// Five-point Gauss–Legendre on (−1, 1). Source: Abramowitz & Stegun, table 25.4.
const innerNode = 0.538469310105683;
const outerNode = 0.906179845938664;
const middleWeight = 128 / 225;
const innerWeight = 0.478628670499366;
const outerWeight = 0.236926885056189;

/** A line that falls by more than e^60 is cut there: near absolute zero it would take parts without number. */
const deepestFall = 60;

/**
 * rate = e^((Ea/R)(1/Tref − 1/T)), T in kelvin.
 *
 * The mean over a straight line of temperature has no elementary form. It is taken by five-point Gauss–Legendre on
 * equal parts over each of which ln rate changes by at most 1. The remainder of that rule on a part of length h is
 * h¹¹ (5!)⁴ f⁽¹⁰⁾ / (11 (10!)³) (Abramowitz & Stegun 25.4.30); for f = e^(cT) with |ch| ≤ 1 that is under 4e-13 × e
 * of the part's integral, and 1/T bends ln rate too little to add a digit. So the figure is good to 1e-11 relative,
 * a hundred times closer than promised.
 */
export function arrheniusPiece(
	activationEnergyKilojoulesPerMole: number,
	referenceCelsius: number
): RatePiece {
	const theta = (activationEnergyKilojoulesPerMole * joulesPerKilojoule) / gasConstant;
	const reference = kelvinFromCelsius(referenceCelsius);
	// One quotient, so that the difference of two nearly equal reciprocals keeps its digits.
	const lnRate = (celsius: number) => {
		const kelvin = kelvinFromCelsius(celsius);
		// Nothing happens at absolute zero; a reading lowered by the accuracy may pass it.
		if (kelvin <= 0) return -Infinity;
		return (theta * (kelvin - reference)) / (kelvin * reference);
	};
	const rateAt = (celsius: number) => exp(lnRate(celsius));
	const meanBetween = (from: number, to: number) => {
		const parts = Math.max(1, Math.ceil(Math.abs(lnRate(to) - lnRate(from))));
		const width = (to - from) / parts;
		let sum = 0;
		for (let i = 0; i < parts; i++) sum += gaussMean(rateAt, from + width * (i + 0.5), width / 2);
		return sum / parts;
	};
	return {
		fromCelsius: -Infinity,
		toCelsius: Infinity,
		rateAt,
		meanRate: (from, to) => {
			const warmest = lnRate(to);
			if (warmest - lnRate(from) > deepestFall) {
				// 1/T at which ln rate is that much lower; what lies colder adds less than the last digit.
				const cut = celsiusFromKelvin(1 / (1 / kelvinFromCelsius(to) + deepestFall / theta));
				return (meanBetween(cut, to) * (to - cut)) / (to - from);
			}
			return meanBetween(from, to);
		}
	};
}

function gaussMean(rateAt: (celsius: number) => number, middle: number, half: number): number {
	const inner = rateAt(middle - innerNode * half) + rateAt(middle + innerNode * half);
	const outer = rateAt(middle - outerNode * half) + rateAt(middle + outerNode * half);
	return (middleWeight * rateAt(middle) + innerWeight * inner + outerWeight * outer) / 2;
}

/** Activation energy from lives at two temperatures: Ea = R ln(t1/t2) / (1/T1 − 1/T2), in kJ/mol. */
export function activationEnergyFromLives(lower: LifePoint, upper: LifePoint): number {
	const lowerKelvin = kelvinFromCelsius(lower.celsius);
	const upperKelvin = kelvinFromCelsius(upper.celsius);
	const perKelvin = ln(lower.lifeHours / upper.lifeHours) * gasConstant * lowerKelvin * upperKelvin;
	return perKelvin / (upperKelvin - lowerKelvin) / joulesPerKilojoule;
}
