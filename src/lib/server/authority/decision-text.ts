import type { DispositionInput } from '../../schemas/disposition';
import { sha256Hex } from '../storage/sha256';

/** What is said of a group; a whole line says nothing more, and reads as it did before there were groups. */
function given(group: object): object {
	const said = Object.entries(group).filter(([, value]) => (value ?? null) !== null);
	return Object.fromEntries(said.sort(([a], [b]) => (a < b ? -1 : 1)));
}

/** What is decided of each line, as the text a review is bound to: the approval must say the same. */
export function decisionText(lines: DispositionInput['lines']): string {
	const plain = lines
		.map(({ lineId, outcome, condition, reason, ...group }) => ({
			...{ lineId, outcome, condition, reason },
			...given(group)
		}))
		.sort((a, b) => (a.lineId < b.lineId ? -1 : 1));
	return JSON.stringify(plain);
}

export function decisionSha256(lines: DispositionInput['lines']): string {
	return sha256Hex(decisionText(lines));
}
