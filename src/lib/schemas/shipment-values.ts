/** The text that stands in a form's field named `lines.0.lot`, of what was sent or what is kept; blank without one. */
export function valueAt(values: unknown, path: string): string {
	let at: unknown = values;
	for (const key of path.split('.')) {
		if (typeof at !== 'object' || at === null) return '';
		at = Reflect.get(at, key);
	}
	if (Array.isArray(at)) return at.join('\n');
	return at === undefined || at === null || typeof at === 'object' ? '' : String(at);
}

/** How many rows of that name stand in the form. */
export function rowsAt(values: unknown, name: string): number {
	const rows = typeof values === 'object' && values !== null ? Reflect.get(values, name) : null;
	return Array.isArray(rows) ? rows.length : 0;
}
