import { mantissaAndExponent } from './binary';

// Source of method and coefficients: FreeBSD msun / fdlibm 5.3, e_log.c. Error below 1 ulp.
const ln2High = 6.9314718036912381649e-1;
const ln2Low = 1.90821492927058770002e-10;
const l1 = 6.66666666666673513e-1;
const l2 = 3.999999999940941908e-1;
const l3 = 2.857142874366239149e-1;
const l4 = 2.222219843214978396e-1;
const l5 = 1.818357216161805012e-1;
const l6 = 1.531383769920937332e-1;
const l7 = 1.479819860511658591e-1;

/** Natural logarithm, the same digits in every engine. */
export function ln(x: number): number {
	if (Number.isNaN(x) || x < 0) return NaN;
	if (x === 0) return -Infinity;
	if (x === Infinity) return x;
	const { mantissa, exponent } = mantissaAndExponent(x);
	const f = mantissa - 1;
	if (f === 0) return exponent === 0 ? 0 : exponent * ln2High + exponent * ln2Low;
	const s = f / (2 + f);
	const z = s * s;
	const w = z * z;
	const even = w * (l2 + w * (l4 + w * l6));
	const odd = z * (l1 + w * (l3 + w * (l5 + w * l7)));
	const r = even + odd;
	const low = exponent * ln2Low;
	const high = exponent * ln2High;
	// Far from 1 the halved square is taken apart, as in the original: it saves the last bit.
	if (mantissa >= 1.38 || mantissa <= 0.71) {
		const half = 0.5 * f * f;
		return exponent === 0 ? f - (half - s * (half + r)) : high - (half - (s * (half + r) + low) - f);
	}
	return exponent === 0 ? f - s * (f - r) : high - (s * (f - r) - low - f);
}
