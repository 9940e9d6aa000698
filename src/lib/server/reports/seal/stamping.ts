import type { Stamp } from './cms';
import { requestTimestamp } from './timestamp';

/** What became of the wish for a timestamp; a seal without one is whole all the same. */
export type TimestampOutcome =
	| { readonly state: 'off' }
	| { readonly state: 'stamped'; readonly authority: string; readonly at: string }
	| { readonly state: 'failed'; readonly authority: string; readonly why: string };

/**
 * Stamps a signature by the authority at an address, if there is one. It never fails: a report is not kept waiting by
 * somebody else's server, it is sealed without a timestamp, and the outcome says so.
 */
export function stampingBy(timestampUrl: string | null): { stamp: Stamp; outcome: () => TimestampOutcome } {
	let outcome: TimestampOutcome = { state: 'off' };
	async function stamp(signature: Uint8Array): Promise<Uint8Array | null> {
		if (timestampUrl === null) return null;
		const authority = new URL(timestampUrl).host;
		try {
			const { token, at } = await requestTimestamp(signature, timestampUrl);
			outcome = { state: 'stamped', authority, at: at.toISOString() };
			return token;
		} catch (error) {
			outcome = { state: 'failed', authority, why: error instanceof Error ? error.message : String(error) };
			return null;
		}
	}
	return { stamp, outcome: () => outcome };
}
