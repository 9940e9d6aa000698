import { decodeBytes } from './decode/decode-bytes';
import { findLines } from './delimited/lines';
import type { Channel } from './ingestion';

/** A line is shown to here; JSON without line ends is one of many megabytes. */
export const longestShown = 2000;

/** A physical line of a file. */
export interface OriginalLine {
	/** Counted from 1. */
	readonly line: number;
	readonly text: string;
	/** Longer than is shown. */
	readonly isCut: boolean;
}

/** Lines of a file as they stand in it, decoded and nothing else; null where its bytes are no text. */
export function originalLines(
	bytes: Uint8Array,
	fromLine: number,
	count: number
): { readonly total: number; readonly lines: readonly OriginalLine[] } | null {
	const decoded = decodeBytes(bytes);
	if ('code' in decoded) return null;
	const { text } = decoded;
	const { count: total, starts, ends } = findLines(text);
	const lines: OriginalLine[] = [];
	for (let line = Math.max(1, fromLine); line < fromLine + count && line <= total; line++) {
		const [start, end] = [starts[line - 1] ?? 0, ends[line - 1] ?? 0];
		const shownTo = Math.min(end, start + longestShown);
		lines.push({ line, text: printable(text.slice(start, shownTo)), isCut: shownTo < end });
	}
	return { total, lines };
}

/** What would steer a screen, or turn the order of its letters about, is shown as a sign that stands for nothing. */
function printable(text: string): string {
	return text.replace(/[^\P{Cc}\t]|[\u202a-\u202e\u2066-\u2069\u200e\u200f]/gu, '\ufffd');
}

/** Index in a channel's readings of one at just this moment; -1 without. Times ascend. */
export function readingAt({ trace }: Channel, ms: number): number {
	const times = trace?.times ?? new Float64Array();
	let [low, high] = [0, times.length - 1];
	while (low <= high) {
		const middle = (low + high) >> 1;
		const at = times[middle] ?? 0;
		if (at === ms) return middle;
		if (at < ms) low = middle + 1;
		else high = middle - 1;
	}
	return -1;
}
