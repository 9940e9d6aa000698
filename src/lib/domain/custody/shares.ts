/**
 * Figures rounded to `decimals` so that they add up to their rounded total: the largest remainders are rounded up.
 * Ties go to the earlier figure. Works for negative figures too.
 */
export function roundedToTotal(figures: readonly number[], decimals: number): number[] {
	const scale = Number(`1e${decimals}`);
	const total = Math.round(figures.reduce((sum, figure) => sum + figure, 0) * scale);
	const floors = figures.map((figure) => Math.floor(figure * scale));
	let missing = total - floors.reduce((sum, floor) => sum + floor, 0);
	const byRemainder = figures
		.map((figure, i) => ({ i, remainder: figure * scale - (floors[i] as number) }))
		.sort((a, b) => b.remainder - a.remainder || a.i - b.i);
	for (const { i } of byRemainder) {
		if (missing <= 0) break;
		floors[i] = (floors[i] as number) + 1;
		missing -= 1;
	}
	return floors.map((floor) => floor / scale);
}

/** Fractions of a whole as percentages that add up to exactly what the fractions do, 100 for a whole. */
export function percentages(fractions: readonly number[], decimals = 1): number[] {
	return roundedToTotal(
		fractions.map((fraction) => fraction * 100),
		decimals
	);
}
