/** JSON by its first character; a section head such as `[Readings]` is not JSON, and no JSON starts so. */
export function textKindOf(text: string): 'json' | 'delimited' {
	// eslint-disable-next-line no-control-regex
	const start = /^[\s\ufeff\u001e]*/.exec(text)?.[0].length ?? 0;
	const head = text.slice(start, start + 200);
	if (head.startsWith('{')) return /^\{\s*("|\}|$)/.test(head) ? 'json' : 'delimited';
	if (!head.startsWith('[')) return 'delimited';
	return /^\[\s*(["{[\]]|-?\d|true|false|null|NaN|$)/.test(head) && !/^\[[^\]\n]*\]\s*[^\s,\]{[]/.test(head)
		? 'json'
		: 'delimited';
}
