import { z } from 'zod';

/** Rows on one page of a list; well under what a phone can draw at once. */
export const rowsPerPage = 40;

/**
 * What every list takes from its address: words to look for, order and page. A faulty part counts as not given,
 * since an address is written by hand too.
 */
export function listQuery<const Sorts extends readonly [string, ...string[]]>(sorts: Sorts) {
	return z.object({
		q: z.string().trim().max(100).catch(''),
		sort: z.enum(sorts).catch(sorts[0] as Sorts[number]),
		dir: z.enum(['asc', 'desc']).catch('asc'),
		page: z.coerce.number().int().min(1).max(100_000).catch(1)
	});
}

/** A choice in an address; without a valid one the first stands. */
export function choice<const Values extends readonly [string, ...string[]]>(values: Values) {
	return z.enum(values).catch(values[0] as Values[number]);
}

/** The parameters of an address as a plain object, the last of a name counting. */
export function queryOf(parameters: URLSearchParams): Record<string, string> {
	return Object.fromEntries(parameters);
}

/** The address of the same list with some parts changed; an empty part is left out, and a change goes to page one. */
export function listHref(
	path: string,
	now: URLSearchParams,
	changes: Record<string, string | number>
): string {
	const next = new URLSearchParams(now);
	next.delete('page');
	for (const [name, value] of Object.entries(changes)) {
		if (value === '') next.delete(name);
		else next.set(name, String(value));
	}
	const text = next.toString();
	return text ? `${path}?${text}` : path;
}
