import type { Outcome } from './recommendation';

/** What a partly taken load comes to, in the largest unit its papers count in. */
export interface PartQuantities {
	readonly unit: 'pallets' | 'cases';
	readonly taken: number;
	readonly refused: number;
}

interface DecidedLine {
	readonly outcome: { readonly outcome: Outcome; readonly cases: number; readonly pallets: number } | null;
}

/** Counts pallets where every decided line has some, else cases: a refused half pallet must not read as none. */
export function partQuantities(lines: readonly DecidedLine[]): PartQuantities {
	const decided = lines.flatMap(({ outcome }) => (outcome ? [outcome] : []));
	const unit = decided.every(({ pallets }) => pallets > 0) ? 'pallets' : 'cases';
	const sum = (isRefused: boolean) =>
		decided
			.filter(({ outcome }) => (outcome === 'reject') === isRefused)
			.reduce((total, one) => total + one[unit], 0);
	return { unit, taken: sum(false), refused: sum(true) };
}
