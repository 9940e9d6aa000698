import { ownRoom, type Room } from './room';

/** The values of a trace, coldest first, its own coldest and warmest at the ends, and which of them each reading is. */
export interface Levels {
	readonly values: Int32Array;
	readonly levelOf: Int32Array;
	readonly blocks: LevelBlocks;
}

/** So many readings make a block. */
export const blockReadings = 64;

/** The coldest and the warmest level of each block: who looks for readings past a limit passes over the others. */
export interface LevelBlocks {
	readonly coldest: Int32Array;
	readonly warmest: Int32Array;
}

/** Up to this span of values a table by value is kept; past it (many decimals) a map. */
const widestTable = 1 << 20;
/** With this many readings for each value of the span, values nobody read may stand among the levels. */
const readingsPerValue = 8;

/**
 * A logger writes few distinct temperatures: what depends on the temperature alone is worked out once a level.
 * In a long trace the values between the coldest and the warmest are levels too, read or not: nothing need be looked up.
 */
export function levelsOf(scaled: Int32Array, room: Room = ownRoom): Levels {
	const blocks = blocksOf(scaled);
	const min = blocks.coldest.reduce((least, value) => Math.min(least, value), Infinity);
	const max = blocks.warmest.reduce((most, value) => Math.max(most, value), -Infinity);
	const span = max - min;
	if (span * readingsPerValue < scaled.length) return bySpan(scaled, min, span, blocks, room);
	const { values, levelOf } = span < widestTable ? byTable(scaled, min, max, room) : byMap(scaled, room);
	return { values, levelOf, blocks: blocksOf(levelOf) };
}

function bySpan(scaled: Int32Array, min: number, span: number, blocks: LevelBlocks, room: Room): Levels {
	const levelOf = room.wholes('level', scaled.length);
	for (let i = 0; i < levelOf.length; i++) levelOf[i] = (scaled[i] as number) - min;
	return {
		values: Int32Array.from({ length: span + 1 }, (_, level) => min + level),
		levelOf,
		blocks: {
			coldest: blocks.coldest.map((value) => value - min),
			warmest: blocks.warmest.map((value) => value - min)
		}
	};
}

function byTable(scaled: Int32Array, min: number, max: number, room: Room) {
	const table = new Int32Array(Math.max(0, max - min + 1));
	for (let i = 0; i < scaled.length; i++) table[(scaled[i] as number) - min] = 1;
	const values: number[] = [];
	for (let at = 0; at < table.length; at++) {
		if (table[at] === 1) table[at] = values.push(at + min) - 1;
	}
	const levelOf = room.wholes('level', scaled.length);
	for (let i = 0; i < scaled.length; i++) levelOf[i] = table[(scaled[i] as number) - min] as number;
	return { values: Int32Array.from(values), levelOf };
}

function byMap(scaled: Int32Array, room: Room) {
	const values = Int32Array.from(new Set(scaled)).sort();
	const known = new Map<number, number>();
	values.forEach((value, level) => known.set(value, level));
	const levelOf = room.wholes('level', scaled.length);
	for (let i = 0; i < scaled.length; i++) levelOf[i] = known.get(scaled[i] as number) as number;
	return { values, levelOf };
}

/** The blocks of readings, by their levels or by anything that rises with the temperature. */
export function blocksOf(levelOf: Int32Array): LevelBlocks {
	const count = Math.ceil(levelOf.length / blockReadings);
	const coldest = new Int32Array(count);
	const warmest = new Int32Array(count);
	for (let block = 0; block < count; block++) {
		const from = block * blockReadings;
		const to = Math.min(from + blockReadings, levelOf.length);
		let low = levelOf[from] as number;
		let high = low;
		for (let i = from + 1; i < to; i++) {
			const level = levelOf[i] as number;
			low = level < low ? level : low;
			high = level > high ? level : high;
		}
		coldest[block] = low;
		warmest[block] = high;
	}
	return { coldest, warmest };
}
