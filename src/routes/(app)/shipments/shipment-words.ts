import type { MarkKind } from '$lib/components/ui/mark';
import type { Stage, Verdict } from '$lib/schemas/docket';
import type { stageFilters } from '$lib/schemas/shipment-list';

/** Where a docket stands, as mark and word. */
export interface StageWord {
	word: string;
	mark: MarkKind | null;
}

const stages: Record<Exclude<Stage, 'done'>, StageWord> = {
	expected: { word: 'Expected', mark: 'expected' },
	'at-the-door': { word: 'At the door', mark: 'at-the-door' },
	'on-hold': { word: 'On hold', mark: 'hold' }
};

const verdicts: Record<Verdict, StageWord> = {
	accepted: { word: 'Accepted', mark: 'accept' },
	conditions: { word: 'With conditions', mark: 'conditions' },
	// Some in, some refused: no tick over a part.
	part: { word: 'Taken in part', mark: null },
	rejected: { word: 'Rejected', mark: 'reject' }
};

export function stageWord(row: { stage: Stage; isCancelled?: boolean; verdict?: Verdict | null }): StageWord {
	if (row.isCancelled) return { word: 'Cancelled', mark: null };
	if (row.stage !== 'done') return stages[row.stage];
	return row.verdict ? verdicts[row.verdict] : { word: 'Done', mark: null };
}

export const stageOptions: readonly { value: (typeof stageFilters)[number]; label: string }[] = [
	{ value: 'any', label: 'All' },
	{ value: 'expected', label: 'Expected' },
	{ value: 'at-the-door', label: 'At the door' },
	{ value: 'on-hold', label: 'On hold' },
	{ value: 'done', label: 'Done' },
	{ value: 'cancelled', label: 'Cancelled' }
];
