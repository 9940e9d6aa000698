import { z } from 'zod';
import { completedKey, isValidKey } from '../domain/gs1/check-digit';

/** Text of a field, trimmed; empty allowed. */
export function optionalText(longest: number) {
	return z.string().trim().max(longest, `Keep it to ${longest} characters.`).default('');
}

/** Text that must be there. */
export function neededText(longest: number, empty: string) {
	return z.string({ error: empty }).trim().min(1, empty).max(longest, `Keep it to ${longest} characters.`);
}

/** A tick box: sent as `on`, or not at all. */
export const ticked = z
	.union([z.literal('on'), z.literal('true'), z.literal('')])
	.optional()
	.transform((value) => value === 'on' || value === 'true');

/** Several tick boxes of one name: none, one, or a list. */
export function tickedOf<Item extends z.ZodType<string>>(item: Item) {
	return z.preprocess((value) => {
		if (value === undefined || value === '') return [];
		return Array.isArray(value) ? value : [value];
	}, z.array(item).max(200));
}

export const emailField = z
	.string({ error: 'Enter an e-mail address.' })
	.trim()
	.toLowerCase()
	.min(1, 'Enter an e-mail address.')
	.max(254, 'An e-mail address has at most 254 characters.')
	.pipe(z.email('That is not an e-mail address: it needs a name, an @ and a domain.'));

/** A day without a time, as a date field sends it; empty is none. */
export const optionalDay = z
	.union([z.literal(''), z.iso.date('Write the day as year-month-day, such as 2026-04-03.')])
	.default('')
	.transform((on) => on || null);

export const neededDay = z.iso.date('Write the day as year-month-day, such as 2026-04-03.');

/** A number as people type it, with a point or a comma; `null` when the field is empty. */
export function decimalField(fault: string, { min, max }: { min: number; max: number }) {
	return z
		.string()
		.trim()
		.default('')
		.transform((text, context) => {
			if (text === '') return null;
			const plain = text.replace('−', '-').replace(',', '.');
			const value = /^[+-]?\d{1,9}(\.\d{1,6})?$/.test(plain) ? Number(plain) : Number.NaN;
			if (Number.isFinite(value) && value >= min && value <= max) return value;
			context.addIssue({ code: 'custom', message: fault });
			return z.NEVER;
		});
}

/** A whole number in a range; needed. */
export function wholeField(fault: string, { min, max }: { min: number; max: number }) {
	return decimalField(fault, { min, max }).transform((value, context) => {
		if (value !== null && Number.isInteger(value)) return value;
		context.addIssue({ code: 'custom', message: fault });
		return z.NEVER;
	});
}

/** What is wrong with a GLN, or null. Source: GS1 General Specifications, 3.7.9 and 7.9: thirteen digits, the last a check. */
export function glnFault(text: string): string | null {
	if (isValidKey('gln', text)) return null;
	if (!/^\d{13}$/.test(text)) return `A GLN has 13 digits; this has ${text.length}.`;
	const right = completedKey('gln', text.slice(0, 12));
	return `The last digit is a check digit, and with these it would be ${right?.at(-1) ?? '?'}. Compare the number.`;
}

/** A GLN, spaces and dashes left out; empty is none. */
export const glnField = z
	.string()
	.default('')
	.transform((text) => text.replace(/[\s-]/g, ''))
	.superRefine((text, context) => {
		const fault = text === '' ? null : glnFault(text);
		if (fault) context.addIssue({ code: 'custom', message: fault });
	})
	.transform((text) => text || null);

/** What the record looked like when its form was drawn, so that nobody overwrites what another has saved since. */
export const revisionField = z.string().max(64).default('');
