import type { DispositionInput } from '../../schemas/disposition';
import { sha256Hex } from '../storage/sha256';

/** What is decided of each line, as the text a review is bound to: the approval must say the same. */
export function decisionText(lines: DispositionInput['lines']): string {
	const plain = lines
		.map(({ lineId, outcome, condition, reason }) => ({ lineId, outcome, condition, reason }))
		.sort((a, b) => (a.lineId < b.lineId ? -1 : 1));
	return JSON.stringify(plain);
}

export function decisionSha256(lines: DispositionInput['lines']): string {
	return sha256Hex(decisionText(lines));
}
