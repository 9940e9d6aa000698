import { timesPowerOfTwo } from './binary';

// Source of method and coefficients: FreeBSD msun / fdlibm 5.3, e_exp.c. Error below 1 ulp.
// Every step is an IEEE 754 add, multiply or divide, so each engine gives the same digits; Math.exp does not.
const ln2High = 6.9314718036912381649e-1;
const ln2Low = 1.90821492927058770002e-10;
const log2E = 1.4426950408889634;
const p1 = 1.66666666666666019037e-1;
const p2 = -2.77777777770155933842e-3;
const p3 = 6.6137563214379343612e-5;
const p4 = -1.6533902205465251539e-6;
const p5 = 4.13813679705723846039e-8;

/** Above this the result exceeds the largest double, below the other it is under half the smallest. */
const overflowAbove = 709.782712893384;
const underflowBelow = -745.1332191019411;

/** e to the power x, the same digits in every engine. */
export function exp(x: number): number {
	if (Number.isNaN(x)) return x;
	if (x > overflowAbove) return Infinity;
	if (x < underflowBelow) return 0;
	const isSmall = Math.abs(x) <= 0.5 * 0.6931471805599453;
	// The sign of x decides which way half an ln 2 is rounded, as in the original.
	const k = isSmall ? 0 : Math.trunc(log2E * x + (x < 0 ? -0.5 : 0.5));
	const high = x - k * ln2High;
	const low = k * ln2Low;
	const r = high - low;
	const square = r * r;
	const c = r - square * (p1 + square * (p2 + square * (p3 + square * (p4 + square * p5))));
	if (isSmall) return 1 - ((r * c) / (c - 2) - r);
	return timesPowerOfTwo(1 - (low - (r * c) / (2 - c) - high), k);
}
