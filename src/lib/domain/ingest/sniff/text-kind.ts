/** JSON by its first characters. A section head such as `[Readings]` is no JSON: no list starts with a bare word. */
export function textKindOf(text: string): 'json' | 'delimited' {
	// eslint-disable-next-line no-control-regex
	const start = /^[\s\ufeff\u001e]*/.exec(text)?.[0].length ?? 0;
	const head = text.slice(start, start + 200);
	if (head.startsWith('{')) return /^\{\s*(["}]|$)/.test(head) ? 'json' : 'delimited';
	return /^\[\s*(["{[\]\-\d]|(true|false|null|NaN)\b|$)/.test(head) ? 'json' : 'delimited';
}
