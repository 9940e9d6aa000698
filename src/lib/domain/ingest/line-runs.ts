/** Readings one after the other whose lines follow each other at one distance. */
export interface LineRun {
	/** Line of the first of them, from 1. */
	readonly line: number;
	/** Lines from one to the next; negative in a file that runs backwards. */
	readonly step: number;
	readonly count: number;
}

/** Line numbers in a few words: a file is one run for as long as nothing was set aside. */
export function lineRuns(lines: ArrayLike<number>): LineRun[] {
	const runs: LineRun[] = [];
	let from = 0;
	while (from < lines.length) {
		const line = lines[from] as number;
		const step = from + 1 < lines.length ? (lines[from + 1] as number) - line : 1;
		let to = from + 1;
		while (to < lines.length && (lines[to] as number) - (lines[to - 1] as number) === step) to++;
		runs.push({ line, step, count: to - from });
		from = to;
	}
	return runs;
}

/** All line numbers of these runs, one a reading. */
export function linesOfRuns(runs: readonly LineRun[]): Int32Array {
	const lines = new Int32Array(runs.reduce((sum, { count }) => sum + count, 0));
	let at = 0;
	for (const { line, step, count } of runs) {
		for (let i = 0; i < count; i++) lines[at++] = line + step * i;
	}
	return lines;
}
