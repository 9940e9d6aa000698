import { z } from 'zod';
import type { DocketView } from '$lib/schemas/docket';
import type { ReviewView } from '$lib/schemas/signing';
import { groupFields, type GroupFields } from './groups';

const reviewedRows = z.array(z.looseObject({ lineId: z.string() }));

interface Reviewed {
	by: string;
	/** The groups of each line, by its id, as the reviewer sent them. */
	groups: ReadonlyMap<string, GroupFields[]>;
}

/**
 * The last review of the evidence as it stands, newer than any signature: what the approver's form begins with, so that
 * both sign the same decision word for word. Null where there is none.
 */
export function reviewedGroups(
	reviews: readonly ReviewView[],
	signatures: DocketView['signatures']
): Reviewed | null {
	const signedAt = signatures.at(-1)?.signedAt ?? '';
	const review = reviews.filter(({ isOfThis, at }) => isOfThis && at > signedAt).at(-1);
	if (!review) return null;
	const groups = new Map<string, GroupFields[]>();
	for (const row of reviewedRows.parse(JSON.parse(review.decision)))
		groups.set(row.lineId, [...(groups.get(row.lineId) ?? []), groupFields(row)]);
	return { by: review.by, groups };
}
