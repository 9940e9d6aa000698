import { maxDecimals } from '../bounds';
import type { NumberText } from './number-text';

const mostDigits = 15;

/**
 * Reads the plain numbers that nearly every cell holds (`-4.5`, ` 12,25`), in place: no string is cut out. False for
 * anything else, which `scanNumber` must then judge; `into` is spoiled by that.
 */
export function readPlainNumber(text: string, from: number, to: number, into: NumberText): boolean {
	let i = from;
	let end = to;
	while (i < end && text.charCodeAt(i) === 32) i++;
	while (end > i && text.charCodeAt(end - 1) === 32) end--;
	const isNegative = text.charCodeAt(i) === 45;
	if (isNegative) i++;
	const first = i;
	let separator = 0;
	let separatorAt = end;
	let value = 0;
	for (; i < end; i++) {
		const code = text.charCodeAt(i);
		if (code >= 48 && code <= 57) value = value * 10 + (code - 48);
		else if ((code === 46 || code === 44) && separator === 0 && i > first) {
			separator = code;
			separatorAt = i;
		} else return false;
	}
	const decimals = separator === 0 ? 0 : end - separatorAt - 1;
	const isWhole = end > first && end - first <= mostDigits;
	if (!isWhole || decimals > maxDecimals || (separator !== 0 && decimals === 0)) return false;
	into.mantissa = isNegative && value !== 0 ? -value : value;
	into.decimals = decimals;
	into.hasComma = separator === 44;
	into.unit = null;
	return true;
}
