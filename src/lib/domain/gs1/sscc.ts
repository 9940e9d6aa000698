import { completedKey, isValidKey } from './check-digit';

/** Application identifier of the SSCC. Source: GS1 General Specifications, 3.3.1. */
const ssccIdentifier = '00';

/**
 * An SSCC as printed beside its bar code: extension digit, company prefix, serial reference, check digit, apart.
 * `prefixDigits` is the length of the company prefix, seven where nobody said. Text that is no SSCC stays as it is.
 */
export function formattedSscc(sscc: string, prefixDigits = 7): string {
	if (!isValidKey('sscc', sscc)) return sscc;
	const serialAt = 1 + prefixDigits;
	return [sscc.slice(0, 1), sscc.slice(1, serialAt), sscc.slice(serialAt, 17), sscc.slice(17)].join(' ');
}

/** The eighteen digits of an SSCC as scanned or typed: without spaces and without a leading (00) or 00. Null if none. */
export function ssccOf(text: string): string | null {
	const digits = text.replace(/[\s()]/g, '');
	const bare = digits.length === 20 && digits.startsWith(ssccIdentifier) ? digits.slice(2) : digits;
	return isValidKey('sscc', bare) ? bare : null;
}

/** An SSCC from its parts; the extension digit stands in front. Null where they do not make seventeen digits. */
export function composedSscc(extensionDigit: number, companyPrefix: string, serial: number): string | null {
	if (!Number.isInteger(serial) || serial < 0) return null;
	const reference = String(serial).padStart(16 - companyPrefix.length, '0');
	return completedKey('sscc', `${extensionDigit}${companyPrefix}${reference}`);
}
