import type { ClockProposal } from '../../domain/ingest/read/clock-proposal';
import { duration } from '../../format';

const against: Readonly<Record<ClockProposal['evidence'], string>> = {
	'after-upload': 'after the upload',
	'after-arrival': 'after the arrival',
	'before-arrival': 'before the arrival'
};

/** What a correction did, without who did it: `Every reading moved 2 h earlier`. */
export function clockMovedText(shiftMs: number): string {
	return `Every reading moved ${duration(Math.abs(shiftMs))} ${shiftMs < 0 ? 'earlier' : 'later'}`;
}

/** What the clock of a logger may have wrong, and by how much; a person decides. */
export function clockProposalText({ kind, shiftMs, evidence }: ClockProposal): string {
	const apart = duration(Math.abs(shiftMs));
	const way = shiftMs < 0 ? 'ahead' : 'behind';
	const found = `The last reading lies ${apart} ${against[evidence]}.`;
	return kind === 'zone'
		? `${found} That is whole hours: the times may be of another zone, ${apart} ${way}. Nothing has been changed.`
		: `${found} The logger’s clock may run ${apart} ${way}. Nothing has been changed.`;
}
