/** What a form's action answered: bad input with the user's values, or a refusal. */
export interface FormAnswer {
	values?: Record<string, unknown>;
	issues?: Record<string, string>;
}

function at(values: Record<string, unknown>, path: string): unknown {
	return path
		.split('.')
		.reduce<unknown>(
			(held, key) =>
				typeof held === 'object' && held !== null ? (held as Record<string, unknown>)[key] : undefined,
			values
		);
}

/** What stands in a text field: what the user typed before it was refused, else what is kept. */
export function keptText(answer: FormAnswer | null | undefined, path: string, stored = ''): string {
	if (!answer?.values) return stored;
	const value = at(answer.values, path);
	return typeof value === 'string' ? value : '';
}

/** Whether a tick box is ticked; of several with one name, the one with `value`. */
export function keptTick(
	answer: FormAnswer | null | undefined,
	path: string,
	stored: boolean,
	value?: string
): boolean {
	if (!answer?.values) return stored;
	const held = at(answer.values, path);
	if (value === undefined) return held === 'on' || held === true;
	return Array.isArray(held) ? held.includes(value) : held === value;
}
