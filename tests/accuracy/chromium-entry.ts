import type { ReadContext } from '../../src/lib/domain/ingest/ingestion';
import { readAndAssess } from './read-and-assess';

/** What the page offers to the test: bytes come in as base64, the way a browser can be handed them. */
const offered = {
	readAndAssess: (base64: string, context: ReadContext): string =>
		readAndAssess(
			Uint8Array.from(atob(base64), (letter) => letter.charCodeAt(0)),
			context
		)
};

Object.assign(globalThis, { offered });

export type Offered = typeof offered;
