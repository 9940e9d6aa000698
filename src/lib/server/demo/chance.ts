/** Numbers that look like chance and are the same on every machine and day for the same seed. */
export interface Chance {
	/** From 0 up to 1. */
	next(): number;
	/** A whole number, both ends included. */
	whole(from: number, to: number): number;
	pick<Item>(items: readonly [Item, ...Item[]]): Item;
}

/** FNV-1a over UTF-16 units, for a seed of 32 bits. */
function seedOf(text: string): number {
	let hash = 0x811c9dc5;
	for (let at = 0; at < text.length; at++) hash = Math.imul(hash ^ text.charCodeAt(at), 0x01000193);
	return hash >>> 0;
}

/** Opens a row of chance under a name; a name of its own for each load keeps the others as they are when one changes. */
export function chanceOf(name: string): Chance {
	let state = seedOf(name);
	// mulberry32: good enough for scenery, and short.
	const next = () => {
		state = (state + 0x6d2b79f5) >>> 0;
		let mixed = Math.imul(state ^ (state >>> 15), state | 1);
		mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
		return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
	};
	return {
		next,
		whole: (from, to) => from + Math.floor(next() * (to - from + 1)),
		pick: (items) => items[Math.floor(next() * items.length)] ?? items[0]
	};
}
