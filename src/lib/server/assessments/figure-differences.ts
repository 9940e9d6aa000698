/** A stored figure that is not what it was recomputed to. */
export interface FigureDifference {
	/** As in `legs.2.usedHours`. */
	path: string;
	stored: unknown;
	recomputed: unknown;
}

function isNode(value: unknown): value is Record<string, unknown> {
	return typeof value === 'object' && value !== null;
}

/**
 * Every leaf of the stored figures that differs, in their order; with `isWhole` also what was not stored.
 * Numbers are compared to the last digit.
 */
export function figureDifferences(
	stored: unknown,
	recomputed: unknown,
	isWhole: boolean,
	path = ''
): FigureDifference[] {
	if (!isNode(stored) || !isNode(recomputed)) {
		return Object.is(stored, recomputed) ? [] : [{ path, stored, recomputed }];
	}
	const keys = isWhole ? new Set([...Object.keys(stored), ...Object.keys(recomputed)]) : Object.keys(stored);
	return [...keys].flatMap((key) =>
		figureDifferences(stored[key], recomputed[key], isWhole, path === '' ? key : `${path}.${key}`)
	);
}

/** The largest relative difference between numbers; 0 where none differ. */
export function largestRelative(differences: readonly FigureDifference[]): number {
	return differences.reduce((largest, { stored, recomputed }) => {
		if (typeof stored !== 'number' || typeof recomputed !== 'number') return largest;
		const scale = Math.max(Math.abs(stored), Math.abs(recomputed));
		return Math.max(largest, Math.abs(stored - recomputed) / scale);
	}, 0);
}
