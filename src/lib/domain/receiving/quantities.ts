import { decidedGroups } from './line-groups';
import type { Outcome } from './recommendation';

/** What a partly taken load comes to, in the largest unit its papers count in. */
export interface PartQuantities {
	readonly unit: 'pallets' | 'cases';
	readonly taken: number;
	readonly refused: number;
	readonly held: number;
}

interface DecidedGroup {
	readonly outcome: Outcome;
	readonly cases: number;
	readonly pallets: number;
}

interface DecidedLine {
	readonly outcome: DecidedGroup | null;
	readonly groups?: readonly DecidedGroup[];
}

const kindOf = (outcome: Outcome) =>
	outcome === 'reject' ? 'refused' : outcome === 'hold' ? 'held' : 'taken';

/** Counts pallets where every decided group has some, else cases: a refused half pallet must not read as none. */
export function partQuantities(lines: readonly DecidedLine[]): PartQuantities {
	const decided = lines.flatMap(decidedGroups);
	const unit = decided.every(({ pallets }) => pallets > 0) ? 'pallets' : 'cases';
	const sum = (kind: 'taken' | 'refused' | 'held') =>
		decided.filter(({ outcome }) => kindOf(outcome) === kind).reduce((total, one) => total + one[unit], 0);
	return { unit, taken: sum('taken'), refused: sum('refused'), held: sum('held') };
}
