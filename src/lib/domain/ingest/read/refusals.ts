import type { Ingestion, RefusalCode } from '../ingestion';

/** A refusal with the line at which it shows and what was found there. */
export function refused(
	code: RefusalCode,
	line: number | null = null,
	found: string | null = null
): Ingestion {
	return { kind: 'refused', code, line, found };
}
