import { z } from 'zod';

/** Nothing typed is nothing known: blank text counts as null. */
function blankToNull(value: unknown): unknown {
	if (value === undefined || value === null) return null;
	return typeof value === 'string' && value.trim() === '' ? null : value;
}

/** Text as typed, trimmed; null when blank. */
export function optionalText(longest: number) {
	return z
		.preprocess(blankToNull, z.string().trim().max(longest, `At most ${longest} characters.`).nullable())
		.default(null);
}

/** Text that must be there. */
export function text(longest: number, missing: string) {
	return z.string({ error: missing }).trim().min(1, missing).max(longest, `At most ${longest} characters.`);
}

/** A number typed with a decimal point or comma and a true or typed minus; a JSON number as it is. */
export function optionalNumber(from: number, to: number, unit = '') {
	const bounds = `Between ${from} and ${to}${unit ? ` ${unit}` : ''}.`;
	return z
		.preprocess(
			(value) => {
				const filled = blankToNull(value);
				if (typeof filled !== 'string') return filled;
				const plain = filled.trim().replace(/[−–]/, '-').replace(',', '.');
				return /^[-+]?(\d+\.?\d*|\.\d+)$/.test(plain) ? Number(plain) : filled;
			},
			z.number({ error: 'A number, such as 4.5.' }).min(from, bounds).max(to, bounds).nullable()
		)
		.default(null);
}

/** A whole number of cases, pallets and the like. */
export function optionalCount(to: number) {
	return optionalNumber(0, to).refine(
		(value) => value === null || Number.isInteger(value),
		'A whole number.'
	);
}

export const optionalId = z
	.preprocess(blankToNull, z.uuid({ error: 'Choose one from the list.' }).nullable())
	.default(null);

/** A yes or no of a form's tick or radio; null when nobody said. */
export const optionalFlag = z
	.preprocess(
		(value) => {
			if (value === true || value === 'yes' || value === 'on' || value === 'true') return true;
			if (value === false || value === 'no' || value === 'false') return false;
			return blankToNull(value);
		},
		z.boolean({ error: 'Yes or no.' }).nullable()
	)
	.default(null);

/** A time as a person writes it: by the site's clock, or with its offset. The use case knows the zone. */
export const wallTime = z
	.preprocess(
		blankToNull,
		z
			.string()
			.trim()
			.regex(
				/^\d{4}-\d{2}-\d{2}[T ]\d{2}:\d{2}(:\d{2}(\.\d{1,3})?)?\s?(Z|[+-]\d{2}:?\d{2})?$/,
				'A day and time, such as 2026-04-03T09:22.'
			)
			.nullable()
	)
	.default(null);

export const optionalDay = z
	.preprocess(blankToNull, z.iso.date({ error: 'A day, such as 2026-04-03.' }).nullable())
	.default(null);

/**
 * Rows of a form: a row with nothing typed in it is no row. Each keeps the place it had, so that what is wrong with
 * it can be said beside it.
 */
export function rowsOf<Row extends z.ZodType<object>>(
	row: Row,
	options: { most: number; ignore?: readonly string[] }
) {
	const isEmpty = (value: unknown) =>
		typeof value !== 'object' ||
		value === null ||
		Object.entries(value).every(
			([name, cell]) => options.ignore?.includes(name) || blankToNull(cell) === null || isBlankList(cell)
		);
	return z
		.array(
			z.preprocess((value) => (isEmpty(value) ? null : value), row.nullable()),
			{ error: 'A list.' }
		)
		.max(options.most, `At most ${options.most} rows.`)
		.default([])
		.transform((rows) =>
			rows.flatMap((value, at) => (value === null ? [] : [{ ...(value as z.output<Row>), at }]))
		);
}

function isBlankList(cell: unknown): boolean {
	return Array.isArray(cell) && cell.every((item) => blankToNull(item) === null);
}
