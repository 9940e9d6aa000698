import type { Ingestion, ReadContext } from '../../domain/ingest/ingestion';
import type { StoredIngestion } from '../../schemas/read';

/** What was understood, without the readings, beside the knowledge it was understood with. */
export function summaryOf(ingestion: Ingestion, context: ReadContext): StoredIngestion {
	if (ingestion.kind !== 'ok') return { ...ingestion, context };
	const { understanding } = ingestion;
	const channels = understanding.channels.map(({ trace, lines: _lines, longSteps: _steps, ...channel }) => ({
		...channel,
		unit: trace?.unit ?? null
	}));
	return { kind: 'ok', context, ...understanding, channels };
}

/** What a read's row says was understood; null where nothing was written down. */
export function parseUnderstanding(text: string | null): StoredIngestion | null {
	return text === null ? null : (JSON.parse(text) as StoredIngestion);
}

/** Names the layout a read was understood by. */
export function layoutFingerprintOf(text: string | null): string | null {
	const stored = parseUnderstanding(text);
	return stored?.kind === 'ok' ? stored.layout.fingerprint : null;
}
