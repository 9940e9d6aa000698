import { sha256Hex } from '../storage/sha256';
import { Refusal } from '../refusals';

/** A short mark of what a record looks like now; its form carries it, and a save by another changes it. */
export function revisionOf(fields: Record<string, unknown>): string {
	return sha256Hex(JSON.stringify(fields)).slice(0, 16);
}

/** @throws Refusal `changed-meanwhile` where the record no longer looks as it did when the form was drawn */
export function assertUnchanged(seenRevision: string, fields: Record<string, unknown>): void {
	if (seenRevision !== revisionOf(fields))
		throw new Refusal(
			'changed-meanwhile',
			'Somebody saved other values while this form was open. Open it again, look, then change it.'
		);
}
