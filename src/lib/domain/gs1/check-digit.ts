/** Keys that end in a check digit, by their whole length. Source: GS1 General Specifications, 7.9. */
export const keyLengths = { gtin8: 8, gtin12: 12, gtin13: 13, gtin14: 14, gln: 13, sscc: 18 } as const;
export type Gs1Key = keyof typeof keyLengths;

const gtinLengths: readonly number[] = [
	keyLengths.gtin8,
	keyLengths.gtin12,
	keyLengths.gtin13,
	keyLengths.gtin14
];

/**
 * The digit that completes a key: from the right, weights 3, 1, 3, 1 …; up to the next multiple of ten.
 * Null where the text is not digits alone.
 */
export function checkDigit(withoutCheckDigit: string): number | null {
	if (!/^\d+$/.test(withoutCheckDigit)) return null;
	let sum = 0;
	[...withoutCheckDigit].reverse().forEach((digit, i) => {
		sum += Number(digit) * (i % 2 === 0 ? 3 : 1);
	});
	return (10 - (sum % 10)) % 10;
}

/** Whether the text is a whole key of that kind with a right check digit; spaces are not digits. */
export function isValidKey(key: Gs1Key, text: string): boolean {
	return text.length === keyLengths[key] && hasRightCheckDigit(text);
}

/** Whether the text is a GTIN of any of the four lengths. */
export function isValidGtin(text: string): boolean {
	return gtinLengths.includes(text.length) && hasRightCheckDigit(text);
}

function hasRightCheckDigit(text: string): boolean {
	const expected = checkDigit(text.slice(0, -1));
	return expected !== null && String(expected) === text.slice(-1);
}

/** A GTIN of any length as the fourteen digits that data carriers hold; null where it is none. */
export function gtin14Of(text: string): string | null {
	return isValidGtin(text) ? text.padStart(keyLengths.gtin14, '0') : null;
}

/** The key completed by its check digit; null where the text is not digits or not one short of the key's length. */
export function completedKey(key: Gs1Key, withoutCheckDigit: string): string | null {
	const digit = checkDigit(withoutCheckDigit);
	if (digit === null || withoutCheckDigit.length !== keyLengths[key] - 1) return null;
	return withoutCheckDigit + String(digit);
}
