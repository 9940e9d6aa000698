/** What a chain starts from. */
export const emptyHeadSha256 = '0'.repeat(64);

/** What an entry's hash covers. */
export interface HashedEntry {
	chainId: string;
	seq: number;
	type: string;
	actorId: string | null;
	actorKind: string;
	/** Null in entries from before it was kept: their hashes cover nothing of it. */
	sessionKind: string | null;
	occurredAt: Date;
	requestId: string;
	address: string;
	payloadSha256: string;
	previousSha256: string;
}

/** The fields an entry's hash covers, in this order, one a line. Verification builds the same text from the row. */
export function entryText(entry: HashedEntry): string {
	return [
		entry.chainId,
		entry.seq,
		entry.type,
		entry.actorId ?? '',
		entry.actorKind,
		entry.occurredAt.toISOString(),
		entry.requestId,
		entry.address,
		entry.payloadSha256,
		entry.previousSha256,
		...(entry.sessionKind === null ? [] : [entry.sessionKind])
	].join('\n');
}
