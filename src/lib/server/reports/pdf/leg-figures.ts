import type { LegUse } from '../../../domain/receiving/assessment';
import { addUp } from '../../../format';
import { decimal } from './text';

/** One leg's printed figures, in tenths of an hour, so that rows and columns add up on paper. */
export interface LegFigures {
	readonly allowedTenths: number | null;
	readonly usedTenths: number;
	readonly tooWarmTenths: number | null;
	readonly tooLateTenths: number | null;
	readonly overTenths: number | null;
}

/**
 * Rounds each column by the largest remainder to its own rounded total; over-use is then the sum of its two parts
 * and use that of allowance and over-use, so that no printed sum is off by a tenth.
 */
export function legFigures(legs: readonly LegUse[]): LegFigures[] {
	const allowed = tenths(legs.map((leg) => leg.allowedHours));
	const warm = tenths(legs.map((leg) => leg.tooWarmHours));
	const late = tenths(legs.map((leg) => leg.tooLateHours));
	return legs.map((leg, i) => {
		const [allowedTenths, tooWarmTenths, tooLateTenths] = [
			allowed[i] ?? null,
			warm[i] ?? null,
			late[i] ?? null
		];
		const overTenths =
			tooWarmTenths === null || tooLateTenths === null ? null : tooWarmTenths + tooLateTenths;
		const usedTenths =
			allowedTenths === null || overTenths === null
				? Math.round(leg.usedHours * 10)
				: allowedTenths + overTenths;
		return { allowedTenths, usedTenths, tooWarmTenths, tooLateTenths, overTenths };
	});
}

function tenths(hours: readonly (number | null)[]): (number | null)[] {
	const known = addUp(
		hours.filter((value) => value !== null),
		1
	);
	let next = 0;
	return hours.map((value) => (value === null ? null : Math.round((known[next++] ?? 0) * 10)));
}

/** A column's printed total; null where a leg has no figure. */
export function totalTenths(figures: readonly (number | null)[]): number | null {
	return figures.reduce<number | null>(
		(sum, value) => (sum === null || value === null ? null : sum + value),
		0
	);
}

/** Tenths as text, an en dash where there is none. */
export function tenthsText(value: number | null): string {
	return value === null ? '–' : decimal(value / 10, 1);
}

/** Over-use over all legs, split; null where some leg has no allowance. */
export function overUseOf(
	legs: readonly LegUse[]
): { over: string; tooWarm: string; tooLate: string } | null {
	const figures = legFigures(legs);
	const over = totalTenths(figures.map((leg) => leg.overTenths));
	if (legs.length === 0 || over === null) return null;
	return {
		over: tenthsText(over),
		tooWarm: tenthsText(totalTenths(figures.map((leg) => leg.tooWarmTenths))),
		tooLate: tenthsText(totalTenths(figures.map((leg) => leg.tooLateTenths)))
	};
}
