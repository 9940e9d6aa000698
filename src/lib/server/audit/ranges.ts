/** Runs of sequence numbers, both ends in. */
export type Ranges = [from: number, to: number][];

/** `[1, 2, 3, 7]` as `"1-3,7"`. */
export function rangesText(numbers: readonly number[]): string {
	const ranges: Ranges = [];
	for (const n of [...numbers].sort((a, b) => a - b)) {
		const last = ranges.at(-1);
		if (last && n <= last[1] + 1) last[1] = n;
		else ranges.push([n, n]);
	}
	return ranges.map(([from, to]) => (from === to ? `${from}` : `${from}-${to}`)).join(',');
}

/** The entries a retention entry says it blanked, from its stored text; none where that says none. */
export function rangesOf(text: string): Ranges {
	const data: unknown = JSON.parse(text);
	const entries = typeof data === 'object' && data !== null && 'entries' in data ? data.entries : '';
	if (typeof entries !== 'string') return [];
	return [...entries.matchAll(/(\d+)(?:-(\d+))?/g)].map(([, from, to]) => [Number(from), Number(to ?? from)]);
}

export function isInRanges(n: number, ranges: Ranges): boolean {
	return ranges.some(([from, to]) => n >= from && n <= to);
}
