import { exp } from './exp';
import { ln } from './ln';

/** Largest whole exponent done by multiplying: exact where the result is, and never worse than by logarithm. */
const largestWholeExponent = 64;

/**
 * base to the power exponent for a positive base, the same digits in every engine.
 * Relative error under (2 + |exponent × ln base|) ulp: for any rate a product can have, below 1e-14.
 */
export function pow(base: number, exponent: number): number {
	if (!(base > 0)) return NaN;
	if (!Number.isInteger(exponent) || Math.abs(exponent) > largestWholeExponent)
		return exp(exponent * ln(base));
	return exponent < 0 ? 1 / wholePower(base, -exponent) : wholePower(base, exponent);
}

function wholePower(base: number, exponent: number): number {
	let result = 1;
	let square = base;
	for (let left = exponent; left > 0; left = Math.floor(left / 2)) {
		if (left % 2 === 1) result *= square;
		if (left > 1) square *= square;
	}
	return result;
}
