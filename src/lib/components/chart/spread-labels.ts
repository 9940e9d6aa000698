/**
 * Moves labels apart that would overlap, as little as possible and in their order: where two are too close, both give
 * way. Positions in px from the top.
 */
export function spreadLabels(wantedPx: readonly number[], gapPx: number): number[] {
	const order = wantedPx.map((px, at) => ({ px, at })).sort((a, b) => a.px - b.px || a.at - b.at);
	for (let round = 0; round < 20; round++) {
		let isMoved = false;
		for (let at = 1; at < order.length; at++) {
			const upper = order[at - 1];
			const lower = order[at];
			if (!upper || !lower || lower.px - upper.px >= gapPx - 0.01) continue;
			const middle = (upper.px + lower.px) / 2;
			upper.px = middle - gapPx / 2;
			lower.px = middle + gapPx / 2;
			isMoved = true;
		}
		if (!isMoved) break;
	}
	const placed = [...wantedPx];
	for (const { px, at } of order) placed[at] = px;
	return placed;
}
