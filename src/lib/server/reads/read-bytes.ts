import { readFileSync } from 'node:fs';
import type { ReadContext } from '../../domain/ingest/ingestion';
import { readExport } from '../../domain/ingest/read-export';
import { canonicalTraceBytes } from '../../domain/trace/digest';
import { usualIntervalMs } from '../../domain/trace/interval';
import { packTrace } from '../../domain/trace/pack';
import type { StoredIngestion } from '../../schemas/read';
import { sha256Hex } from '../storage/sha256';
import { linesOfFile, type LinesFound, type LinesWish } from './lines-of-file';
import { summaryOf } from './stored-understanding';

/** The reader whose understanding is stored; a change of what it understands takes a new version. */
export const readerVersion = '1.0.0';

/** What is asked of the reader; of a file on this machine's disk a thread is sent the path, not a copy. */
export type ReadOrder = ReadWish & ({ bytes: Uint8Array } | { path: string });

interface ReadWish {
	context: ReadContext;
	/** Traces are packed only for a read that is being kept. */
	withTraces: boolean;
	/** Some lines of the file instead. */
	lines?: LinesWish;
}

/** A channel's readings in one blob, with what the row says of them. */
export interface PackedTrace {
	ordinal: number;
	name: string;
	unit: string;
	decimals: number;
	readings: number;
	firstMs: number;
	lastMs: number;
	usualIntervalMs: number;
	minCelsius: number | null;
	maxCelsius: number | null;
	meanCelsius: number | null;
	packed: Uint8Array;
	contentSha256: string;
	/** The temperature that is assessed; the others are kept beside it. */
	isChosen: boolean;
}

/** What the reader answers. */
export interface ReadResult {
	summary: StoredIngestion;
	traces: PackedTrace[];
	lines?: LinesFound | null;
}

/** Reads an export, and packs its temperatures where they are wanted. */
export function readBytes(order: ReadOrder): ReadResult {
	const { context, withTraces } = order;
	const bytes = 'bytes' in order ? order.bytes : readFileSync(order.path);
	const ingestion = readExport(bytes, context);
	const summary = summaryOf(ingestion, context);
	if (order.lines) return { summary, traces: [], lines: linesOfFile(bytes, ingestion, order.lines) };
	if (ingestion.kind !== 'ok' || !withTraces) return { summary, traces: [] };
	const { channels, temperature } = ingestion.understanding;
	const traces = channels.flatMap(({ trace, name, minCelsius, maxCelsius, meanCelsius }, ordinal) => {
		if (!trace || trace.times.length === 0) return [];
		return {
			ordinal,
			name,
			unit: trace.unit,
			decimals: trace.decimals,
			readings: trace.times.length,
			firstMs: trace.times[0] ?? 0,
			lastMs: trace.times[trace.times.length - 1] ?? 0,
			usualIntervalMs: usualIntervalMs(trace.times),
			minCelsius,
			maxCelsius,
			meanCelsius,
			packed: packTrace(trace),
			contentSha256: sha256Hex(canonicalTraceBytes(trace)),
			isChosen: ordinal === temperature
		};
	});
	return { summary, traces };
}
