import type { Channel, Ingestion, Understanding } from '../../domain/ingest/ingestion';

/** A channel without its readings: those stand in the trace. */
export type ChannelSummary = Omit<Channel, 'trace' | 'lines'> & { readings: number; unit: string | null };

/** What was understood of a file, as it is kept beside the read; a question or a refusal likewise. */
export type StoredIngestion =
	| Exclude<Ingestion, { kind: 'ok' }>
	| { kind: 'ok'; understanding: Omit<Understanding, 'channels'> & { channels: ChannelSummary[] } };

/** What was understood, without the readings. */
export function summaryOf(ingestion: Ingestion): StoredIngestion {
	if (ingestion.kind !== 'ok') return ingestion;
	const channels = ingestion.understanding.channels.map(({ trace, lines: _, ...channel }) => ({
		...channel,
		readings: trace?.times.length ?? 0,
		unit: trace?.unit ?? null
	}));
	return { kind: 'ok', understanding: { ...ingestion.understanding, channels } };
}

/** What a read's row says was understood; null where nothing was written down. */
export function parseUnderstanding(text: string | null): StoredIngestion | null {
	return text === null ? null : (JSON.parse(text) as StoredIngestion);
}

/** Names the layout a read was understood by. */
export function layoutFingerprintOf(text: string | null): string | null {
	const stored = parseUnderstanding(text);
	return stored?.kind === 'ok' ? stored.understanding.layout.fingerprint : null;
}
