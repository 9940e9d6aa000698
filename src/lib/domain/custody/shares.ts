import type { LegUse } from '../receiving/assessment';

export const shareBases = ['over-use', 'used'] as const;
/** What a leg's share is a share of: the life lost beyond the allowances, or all the life used. Rows say which. */
export type ShareBasis = (typeof shareBases)[number];

/** A leg's share in whole percent; the shares of a docket add up to 100. */
export interface LegShare {
	readonly ordinal: number;
	readonly basis: ShareBasis;
	readonly percent: number;
}

/**
 * Each leg's share of what was lost or used, in whole percent that add up to 100.
 * By over-use a leg that stayed within its allowance has none; empty where no leg lost anything, or an allowance is
 * not known.
 */
export function legShares(legs: readonly LegUse[], basis: ShareBasis): LegShare[] {
	if (basis === 'over-use' && legs.some((leg) => leg.overHours === null)) return [];
	const parts = legs.map((leg) => Math.max(0, basis === 'used' ? leg.usedHours : (leg.overHours as number)));
	const percents = wholeShares(parts);
	return percents === null
		? []
		: legs.map(({ ordinal }, i) => ({ ordinal, basis, percent: percents[i] as number }));
}

const whole = 100;

/**
 * Parts as whole percents that add up to 100, by the largest remainder; of equal remainders the earlier part's.
 * Null where there is nothing to share. Source: the method of Hamilton, apportionment of 1792.
 */
export function wholeShares(parts: readonly number[]): number[] | null {
	const total = parts.reduce((sum, part) => sum + part, 0);
	if (total <= 0) return null;
	const exact = parts.map((part) => (part / total) * whole);
	const shares = exact.map(Math.floor);
	const missing = whole - shares.reduce((sum, share) => sum + share, 0);
	const byRemainder = exact
		.map((share, i) => ({ i, remainder: share - Math.floor(share) }))
		.sort((a, b) => b.remainder - a.remainder || a.i - b.i);
	for (const { i } of byRemainder.slice(0, missing)) shares[i] = (shares[i] as number) + 1;
	return shares;
}
