import type { Channel, Ingestion } from '../../domain/ingest/ingestion';
import { lineRuns, type LineRun } from '../../domain/ingest/line-runs';
import { originalLines, readingAt } from '../../domain/ingest/original-lines';
import { celsiusFromScaled } from '../../domain/units';
import type { FileLine } from '../../schemas/file-lines';

/** Which lines: from a line on, the line of one reading of a channel, or the numbers alone of all its readings. */
export type LinesWish =
	{ fromLine: number; count: number } | { channel: number; atMs: number } | { runsOf: number };

/** What a file says there; null where it is no text, or has no such reading. */
export interface LinesFound {
	total: number;
	lines: FileLine[];
	/** Line numbers of a channel's readings, where those were asked for. */
	runs?: readonly LineRun[];
}

/** Lines of a file, each with the reading that was made of it. */
export function linesOfFile(bytes: Uint8Array, ingestion: Ingestion, wish: LinesWish): LinesFound | null {
	const understood = ingestion.kind === 'ok' ? ingestion.understanding : null;
	if ('runsOf' in wish)
		return { total: 0, lines: [], runs: lineRuns(understood?.channels[wish.runsOf]?.lines ?? []) };
	const ordinal = 'channel' in wish ? wish.channel : (understood?.temperature ?? 0);
	const channel = understood?.channels[ordinal] ?? null;
	if ('fromLine' in wish) return withReadings(originalLines(bytes, wish.fromLine, wish.count), channel);
	const line = channel === null ? undefined : channel.lines?.[readingAt(channel, wish.atMs)];
	return line === undefined ? null : withReadings(originalLines(bytes, line, 1), channel);
}

function withReadings(found: ReturnType<typeof originalLines>, channel: Channel | null): LinesFound | null {
	if (found === null) return null;
	const numbers = new Set(found.lines.map(({ line }) => line));
	const readingOf = new Map<number, number>();
	channel?.lines?.forEach((line, at) => {
		if (numbers.has(line) && !readingOf.has(line)) readingOf.set(line, at);
	});
	const lines = found.lines.map((line) => ({ ...line, ...readingOn(channel, readingOf.get(line.line)) }));
	return { total: found.total, lines };
}

function readingOn(channel: Channel | null, at: number | undefined): Pick<FileLine, 'atMs' | 'celsius'> {
	const trace = channel?.trace;
	if (!trace || at === undefined) return { atMs: null, celsius: null };
	const celsius = celsiusFromScaled(trace.scaled[at] ?? 0, trace.decimals, trace.unit);
	return { atMs: trace.times[at] ?? null, celsius };
}
