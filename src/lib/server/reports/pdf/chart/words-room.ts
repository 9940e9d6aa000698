/** Mean advance of a character against the type size: enough to keep labels apart, not to set type. */
const advance = { Mono: 0.6, Semi: 0.5, Barlow: 0.55, Noto: 0.6 } as const;

export function widthOf(text: string, family: keyof typeof advance, sizePoints: number): number {
	return [...text].length * advance[family] * sizePoints;
}

/** As much of the text as fits, with an ellipsis; null where not even three letters do. */
export function fitting(
	text: string,
	family: keyof typeof advance,
	sizePoints: number,
	roomPoints: number
): string | null {
	const letters = [...text];
	const most = Math.floor(roomPoints / (advance[family] * sizePoints));
	if (letters.length <= most) return text;
	return most < 4
		? null
		: `${letters
				.slice(0, most - 1)
				.join('')
				.trimEnd()}…`;
}

interface Placed<Item> {
	readonly item: Item;
	readonly at: number;
}

/** Labels along a line, first come first placed; one that would touch its left neighbour is left out. */
export function apart<Item>(
	items: readonly Placed<Item>[],
	widthOfItem: (item: Item) => number,
	marginPoints: number
): Placed<Item>[] {
	const kept: Placed<Item>[] = [];
	let taken = -Infinity;
	for (const placed of [...items].sort((a, b) => a.at - b.at)) {
		const half = widthOfItem(placed.item) / 2;
		if (placed.at - half < taken + marginPoints) continue;
		kept.push(placed);
		taken = placed.at + half;
	}
	return kept;
}

/** Labels down a gutter: moved down as far as needed to clear the one above, none left out. */
export function stacked<Item>(items: readonly Placed<Item>[], pitchPoints: number): Placed<Item>[] {
	let lowest = -Infinity;
	return [...items]
		.sort((a, b) => a.at - b.at)
		.map(({ item, at }) => {
			lowest = Math.max(at, lowest + pitchPoints);
			return { item, at: lowest };
		});
}
