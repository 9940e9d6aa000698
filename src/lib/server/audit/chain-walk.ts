import { sha256Hex } from '../storage/sha256';
import { emptyHeadSha256, entryText, type HashedEntry } from './entry-text';
import { isInRanges, rangesOf, type Ranges } from './ranges';

/** What can be wrong with a chain. */
export const chainFaults = [
	'entry-changed',
	'entry-missing',
	'not-following',
	'payload-changed',
	'payload-missing',
	'payload-blanked',
	'tail-missing',
	'entry-added',
	'head-missing',
	'head-differs',
	'checkpoint-differs'
] as const;
export type ChainFaultKind = (typeof chainFaults)[number];

/** The first thing wrong with a chain, and with which entry. */
export interface ChainFault {
	chainId: string;
	seq: number;
	fault: ChainFaultKind;
}

/** An entry as it is stored, with its text; null once retention has blanked it, undefined where its row is gone. */
export interface StoredEntry extends HashedEntry {
	sha256: string;
	text: string | null | undefined;
}

/** Where a chain stood when something outside it took note. */
export interface KnownHead {
	length: number;
	headSha256: string;
}

/** Walks one chain entry by entry, oldest first, and stops at the first that is not as it was written. */
export class ChainWalk {
	private previousSha256 = emptyHeadSha256;
	private seq = 0;
	private readonly blanked: number[] = [];
	private readonly declared: Ranges = [];
	private readonly known: Map<number, string>;
	private readonly knownLength: number;

	constructor(
		private readonly chainId: string,
		checkpoints: readonly KnownHead[] = []
	) {
		this.known = new Map(checkpoints.map(({ length, headSha256 }) => [length, headSha256]));
		this.knownLength = Math.max(0, ...this.known.keys());
	}

	/** @returns what is wrong with this entry, or null. */
	take(entry: StoredEntry): ChainFault | null {
		const seq = ++this.seq;
		if (entry.seq !== seq) return this.fault('entry-missing');
		if (sha256Hex(entryText(entry)) !== entry.sha256) return this.fault('entry-changed');
		// Sound in itself, but not made after the one before it: put in, replaced or moved.
		if (entry.previousSha256 !== this.previousSha256) return this.fault('not-following');
		if (entry.text === undefined) return this.fault('payload-missing');
		if (entry.text === null) this.blanked.push(seq);
		else if (sha256Hex(entry.text) !== entry.payloadSha256) return this.fault('payload-changed');
		const known = this.known.get(seq);
		if (known !== undefined && known !== entry.sha256) return this.fault('checkpoint-differs');
		if (entry.type === 'retention.blanked' && entry.text) this.declared.push(...rangesOf(entry.text));
		this.previousSha256 = entry.sha256;
		return null;
	}

	/** After the last entry: what is wrong with the chain's end, or null. */
	end(head: KnownHead | null): ChainFault | null {
		if (!head) return this.fault('head-missing');
		const length = Math.max(head.length, this.knownLength);
		if (length > this.seq) return { chainId: this.chainId, seq: this.seq + 1, fault: 'tail-missing' };
		if (head.length < this.seq) return { chainId: this.chainId, seq: head.length + 1, fault: 'entry-added' };
		if (head.headSha256 !== this.previousSha256) return this.fault('head-differs');
		const secret = this.blanked.find((seq) => !isInRanges(seq, this.declared));
		return secret === undefined ? null : { chainId: this.chainId, seq: secret, fault: 'payload-blanked' };
	}

	private fault(fault: ChainFaultKind): ChainFault {
		return { chainId: this.chainId, seq: this.seq, fault };
	}
}
