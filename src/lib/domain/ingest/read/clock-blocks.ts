import type { Gathered } from './gathered';

/** Rows in logged order with their times and usual step. */
export interface Run {
	readonly rows: readonly number[];
	readonly times: Float64Array;
	readonly usualMs: number;
}

/** Neighbouring rows of a run between two steps back; `to` is exclusive. */
export interface Block {
	readonly from: number;
	readonly to: number;
	readonly firstMs: number;
	readonly lastMs: number;
}

/** Splits a run wherever time steps back. */
export function blocksOf({ times }: Run): Block[] {
	const blocks: Block[] = [];
	let from = 0;
	for (let k = 1; k <= times.length; k++) {
		if (k < times.length && (times[k] ?? 0) >= (times[k - 1] ?? 0)) continue;
		blocks.push({ from, to: k, firstMs: times[from] ?? 0, lastMs: times[k - 1] ?? 0 });
		from = k;
	}
	return blocks;
}

const halfHourMs = 30 * 60_000;
const tightShare = 0.9;
/** Rows late by a few places are out of order; more of them between other rows are a second recording. */
const fewRows = 3;

/** Whether two rows hold the same figures in every column that was gathered. */
function isRepeat({ values }: Gathered, a: number, b: number): boolean {
	return values.every(
		({ mantissa, decimals, isMissing }) =>
			isMissing[a] === isMissing[b] && mantissa[a] === mantissa[b] && decimals[a] === decimals[b]
	);
}

interface Sorted {
	/** Steps shorter than the usual one, repeats of the same row left out. */
	readonly crowded: number;
	/** Times that stand twice with different figures. */
	readonly clashing: number;
	readonly longestMs: number;
}

function sortedSteps({ rows, times, usualMs }: Run, gathered: Gathered): Sorted {
	const order = Array.from({ length: rows.length }, (_, k) => k);
	order.sort((p, q) => (times[p] ?? 0) - (times[q] ?? 0));
	let [crowded, clashing, longestMs] = [0, 0, 0];
	for (let i = 1; i < order.length; i++) {
		const [p, q] = [order[i - 1] ?? 0, order[i] ?? 0];
		const step = (times[q] ?? 0) - (times[p] ?? 0);
		if (step === 0) {
			if (!isRepeat(gathered, rows[p] ?? 0, rows[q] ?? 0)) clashing++;
		} else if (step < usualMs * tightShare) crowded++;
		longestMs = Math.max(longestMs, step);
	}
	return { crowded, clashing, longestMs };
}

/** The longest and the number of short steps as the rows stand. */
function fileSteps({ times, usualMs }: Run): { readonly crowded: number; readonly longestMs: number } {
	let [crowded, longestMs] = [0, 0];
	for (let k = 1; k < times.length; k++) {
		const step = (times[k] ?? 0) - (times[k - 1] ?? 0);
		if (step > 0 && step < usualMs * tightShare) crowded++;
		longestMs = Math.max(longestMs, step);
	}
	return { crowded, longestMs };
}

/**
 * Whether rows that step back belong to one recording: put in order of time they run on evenly, filling each other's
 * holes or repeating each other. Else the clock was set back.
 */
export function isOneRecording(run: Run, blocks: readonly Block[], gathered: Gathered): boolean {
	const late = blocks.slice(1).reduce((rows, block) => {
		const reached = Math.max(
			...blocks.filter((other) => other.from < block.from).map(({ lastMs }) => lastMs)
		);
		let behind = 0;
		for (let k = block.from; k < block.to; k++) if ((run.times[k] ?? 0) <= reached) behind++;
		return rows + behind;
	}, 0);
	const sorted = sortedSteps(run, gathered);
	const written = fileSteps(run);
	const isEven = sorted.longestMs <= Math.max(written.longestMs, 3 * run.usualMs, halfHourMs);
	if (late <= fewRows) return isEven;
	return isEven && sorted.clashing <= fewRows && sorted.crowded <= written.crowded + fewRows;
}
