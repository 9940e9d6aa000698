const bits = new DataView(new ArrayBuffer(8));

/** 2 to the power k for −1022 ≤ k ≤ 1023, by setting the exponent bits: exact. */
function normalPowerOfTwo(k: number): number {
	bits.setUint32(0, (k + 1023) << 20);
	bits.setUint32(4, 0);
	return bits.getFloat64(0);
}

/** x × 2^k, exact unless the result is subnormal; k may lie outside the range of a double's exponent. */
export function timesPowerOfTwo(x: number, k: number): number {
	if (k > 1023) return x * normalPowerOfTwo(1023) * normalPowerOfTwo(k - 1023);
	// 54 more than needed, so that only the last product rounds.
	if (k < -1022) return x * normalPowerOfTwo(k + 54) * normalPowerOfTwo(-54);
	return x * normalPowerOfTwo(k);
}

/** x = mantissa × 2^exponent with √½ ≤ mantissa < √2, for positive normal and subnormal x. */
export function mantissaAndExponent(x: number): { readonly mantissa: number; readonly exponent: number } {
	const isSubnormal = x < 2.2250738585072014e-308;
	bits.setFloat64(0, isSubnormal ? x * 18014398509481984 : x);
	const high = bits.getUint32(0);
	const fractionHigh = high & 0xfffff;
	// 0x95f64: where the fraction passes √2, the original's rounding constant.
	const isUpperHalf = ((fractionHigh + 0x95f64) & 0x100000) !== 0;
	bits.setUint32(0, fractionHigh | (isUpperHalf ? 0x3fe00000 : 0x3ff00000));
	const exponent = (high >>> 20) - 1023 + (isUpperHalf ? 1 : 0) - (isSubnormal ? 54 : 0);
	return { mantissa: bits.getFloat64(0), exponent };
}
