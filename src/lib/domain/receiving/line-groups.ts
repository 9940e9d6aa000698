import type { Outcome } from './recommendation';

/** The kinds of condition goods are accepted under. */
export const conditionKinds = [
	'shorter-date',
	'sort-rework',
	'use-first',
	'nearer-customer',
	'concession'
] as const;
export type ConditionKind = (typeof conditionKinds)[number];

/** Where a group of goods stands or goes. */
export const whereaboutsKinds = ['dock', 'store', 'quarantine', 'returned', 'dumped'] as const;
export type Whereabouts = (typeof whereaboutsKinds)[number];

export interface Counts {
	readonly cases: number;
	readonly pallets: number;
}

/** A group as it was written down: a count left out is the whole line's, where the group is the whole line. */
export type WrittenCounts = { readonly [Count in keyof Counts]?: number | null };

export type CountFault =
	| { readonly code: 'count-missing'; readonly group: number; readonly unit: keyof Counts }
	| { readonly code: 'group-empty'; readonly group: number }
	| {
			readonly code: 'counts-differ';
			readonly unit: keyof Counts;
			readonly grouped: number;
			readonly received: number;
	  };

/** The counts of a line's groups; one group without counts is the whole line. */
export function groupCounts(line: Counts, groups: readonly WrittenCounts[]): Counts[] {
	const isWhole = groups.length === 1;
	return groups.map(({ cases, pallets }) => ({
		cases: cases ?? (isWhole ? line.cases : 0),
		pallets: pallets ?? (isWhole ? line.pallets : 0)
	}));
}

const sumOf = (groups: readonly Counts[], unit: keyof Counts) =>
	groups.reduce((total, group) => total + group[unit], 0);

/**
 * What is wrong with the counts of a line's groups: each has its own, none is empty, and together they are what was
 * received, no case more or less.
 */
export function countFault(line: Counts, groups: readonly WrittenCounts[]): CountFault | null {
	const units = line.pallets > 0 ? (['cases', 'pallets'] as const) : (['cases'] as const);
	if (groups.length > 1)
		for (const [index, group] of groups.entries()) {
			const missing = units.find((unit) => (group[unit] ?? null) === null);
			if (missing) return { code: 'count-missing', group: index + 1, unit: missing };
			if (!group.cases) return { code: 'group-empty', group: index + 1 };
		}
	const counts = groupCounts(line, groups);
	const unit = (['cases', 'pallets'] as const).find((one) => sumOf(counts, one) !== line[one]);
	return unit ? { code: 'counts-differ', unit, grouped: sumOf(counts, unit), received: line[unit] } : null;
}

/** Whether an outcome and the place the goods go to contradict each other. */
export function isPlaceAgainst(outcome: Outcome, whereabouts: Whereabouts): boolean {
	const isGone = whereabouts === 'returned' || whereabouts === 'dumped';
	return outcome === 'reject' ? whereabouts === 'store' : isGone;
}

/** Where goods stand when nobody says otherwise: what is taken in the store, what is not in quarantine. */
export function usualWhereabouts(outcome: Outcome): Whereabouts {
	return outcome === 'accept' || outcome === 'conditions' ? 'store' : 'quarantine';
}

const gravest: readonly Outcome[] = ['reject', 'hold', 'conditions', 'accept'];

/** The one word for a line whose groups end differently: the gravest of them, never a milder one. */
export function gravestOutcome(outcomes: readonly Outcome[]): Outcome {
	return gravest.find((one) => outcomes.includes(one)) ?? 'hold';
}

interface Decided<Group> {
	readonly outcome: Group | null;
	readonly groups?: readonly Group[];
}

/** What a line was decided as: its groups, or the whole line as the only one; nothing while it is undecided. */
export function decidedGroups<Group>({ outcome, groups }: Decided<Group>): readonly Group[] {
	if (groups && groups.length > 0) return groups;
	return outcome === null ? [] : [outcome];
}
