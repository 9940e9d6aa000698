/** Upload names are words of a stranger: only letters, digits, dot, dash and underscore go into the report. */
export function safeFileName(name: string): string {
	const safe = name
		.normalize('NFKD')
		.replace(/[^\w.-]+/g, '_')
		.replace(/^[._]+/, '')
		.slice(-80);
	return safe || 'export';
}
